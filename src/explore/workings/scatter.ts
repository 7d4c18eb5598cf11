import { plain, ratioText, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { powersOf } from '../powers.ts';
import { ratiosOf } from '../ratios.ts';
import { FIFTH, SCATTER_ASSUMES, scatterCOV, scatterOf } from '../scatter/scatter.ts';
import type { Asked } from './about.ts';

/** What the scatter of E does to the deflection; nothing where no deflection is checked or nobody has said a COV. */
export function scatterLines({ member }: Pick<Asked, 'member'>): WorkingLine[] {
  const { ratio, check } = powersOf(ratiosOf(member))[2];
  const COV = scatterCOV(member);
  if (ratio === null || check === null || COV === null) return [];
  const { stiff, soft, over } = scatterOf(ratio, COV);
  const end = (symbol: string, sign: '+' | '-', value: number, which: string): WorkingLine => ({
    symbol,
    formula: `ratio / (1 ${sign} ${FIFTH} COV)`,
    numbers: `${plain(ratio)} / (1 ${sign} ${FIFTH} x ${plain(COV)})`,
    result: ratioText(value),
    note: `with E at its ${which} percentile, ${FIFTH} standard deviations from the mean`,
  });
  return [
    { note: `${SCATTER_ASSUMES}. Deflection goes with 1 / E.` },
    { symbol: 'ratio', result: plain(ratio), note: `${WORKINGS_WORD[check]}, with the listed E` },
    {
      symbol: 'COV',
      result: plain(COV),
      note: 'standard deviation of E over its mean',
      clause: 'NDS Appendix F',
    },
    end('stiff', '+', stiff, '95th'),
    end('soft', '-', soft, '5th'),
    { heading: 'members over the limit' },
    { note: 'over it are those whose E is under ratio times the mean' },
    ...(COV === 0
      ? []
      : [
          {
            symbol: 'z',
            formula: '(ratio - 1) / COV',
            numbers: `(${plain(ratio)} - 1) / ${plain(COV)}`,
            result: plain((ratio - 1) / COV),
          },
        ]),
    {
      symbol: 'share',
      formula: 'normal distribution below z',
      result: `${plain(100 * over)} %`,
      clause: 'Abramowitz & Stegun 7.1.6, 7.1.14',
    },
  ];
}
