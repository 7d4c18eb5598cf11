import { incisingReason } from '../factors/incising.ts';
import { repetitiveReason } from '../factors/repetitive.ts';
import { temperatureReason } from '../factors/temperature.ts';
import { wetServiceReason } from '../factors/wet-service.ts';
import type { Product } from '../member.ts';
import type { Factor } from '../report.ts';
import { factorLine } from './clause.ts';
import { factorText } from './figures.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** A reference design value on its way to the adjusted one. */
export interface Adjusting {
  /** "Fb" */
  readonly symbol: string;
  /** psi */
  readonly reference: number;
  readonly factors: readonly Factor[];
  /** How some of the factors come, by symbol. */
  readonly formulas?: Readonly<Record<string, { readonly formula: string; readonly numbers: string }>>;
  /** The adjusted value as the checks have it, psi. */
  readonly adjusted: number;
  /** Factors that the value has, left out of the list where nothing makes them differ from 1. */
  readonly silent: readonly SilentSymbol[];
  /** The reference value and what leaves it alone are said already. */
  readonly stated?: boolean;
}

/** Where the factors of a product are listed. */
const ADJUSTMENT: Readonly<Record<Product, string>> = {
  'dimension lumber': 'NDS Table 4.3.1',
  'machine stress rated': 'NDS Table 4.3.1',
  timber: 'NDS Table 4.3.1',
  glulam: 'NDS Table 5.3.1',
  LVL: 'NDS Table 8.3.1',
  custom: 'NDS 2.3',
};

export type SilentSymbol = 'CM' | 'Ct' | 'Ci' | 'Cr' | 'CD';

/** Reference value, factors with their reasons, and the product. */
export function capacityLines(work: Work, adjusting: Adjusting): WorkingLine[] {
  const { figures: f, values } = work;
  const { symbol, reference, factors, adjusted, formulas } = adjusting;
  const clause = ADJUSTMENT[work.member.stock.product];
  const lines: WorkingLine[] = [
    ...(adjusting.stated === true
      ? []
      : [{ symbol, result: f.stress(reference), note: values.status, clause: values.source }]),
    ...factors.map((factor) => factorLine(factor, formulas?.[factor.symbol])),
  ];
  const silent = silentReasons(work, adjusting);
  if (silent !== null && adjusting.stated !== true) lines.push({ note: silent });
  const used = applied(factors);
  if (used.length === 0) {
    lines.push({ symbol: `${symbol}'`, formula: symbol, result: f.stress(adjusted), clause });
    return lines;
  }
  lines.push({
    symbol: `${symbol}'`,
    formula: [symbol, ...used.map((factor) => factor.symbol)].join(' x '),
    numbers: [f.stress(reference), ...used.map(({ value }) => factorText(value))].join(' x '),
    result: f.stress(adjusted),
    clause,
  });
  return lines;
}

/** Factors that enter the product: of CL and CV the lesser alone (NDS 5.3.6). */
export function applied(factors: readonly Factor[]): Factor[] {
  const CL = factors.find(({ symbol }) => symbol === 'CL');
  const CV = factors.find(({ symbol }) => symbol === 'CV');
  if (CL === undefined || CV === undefined) return [...factors];
  const left = CV.value < CL.value ? CL : CV;
  return factors.filter((factor) => factor !== left);
}

function silentReasons(work: Work, { factors, silent }: Adjusting): string | null {
  const { units, wood } = work;
  const { service, temperature, incised, repetitive } = wood.conditions;
  const wet = service === 'wet';
  const reasonOf = (symbol: SilentSymbol): string => {
    switch (symbol) {
      case 'CM':
        return wetServiceReason(wet, wood.rules.wet, 'Fv', 0, units);
      case 'Ct':
        return temperatureReason(temperature, wet, units);
      case 'Ci':
        return incisingReason(incised);
      case 'Cr':
        return repetitiveReason(wood.rules.repetitive, repetitive, wood.at.plies, units);
      case 'CD':
        return 'duration of load does not count here, NDS 2.3.2';
    }
  };
  const left = silent.filter((symbol) => !factors.some((factor) => factor.symbol === symbol));
  return left.length === 0
    ? null
    : `also 1.0: ${left.map((symbol) => `${symbol} (${reasonOf(symbol)})`).join(', ')}`;
}
