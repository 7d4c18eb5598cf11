import { isComplete } from './candidates.ts';
import type { Member } from './member.ts';

export interface Caution {
  readonly id: string;
  readonly text: string;
}

/** What every output says (issue of preliminary sizing). */
export const CAUTIONS: readonly Caution[] = [
  {
    id: 'preliminary',
    text: 'Preliminary sizing for discussion. Local code and a licensed professional decide.',
  },
  {
    id: 'not-covered',
    text:
      'Not covered: connections, concentrated live loads of the code, snow drift and ponding unless typed, earthquake, ' +
      'fire, vibration beyond the advice here, torsion, bending about both axes, holes, tapered or curved members, ' +
      'treatment effects beyond Ci, existing or damaged timber.',
  },
];

/** Beware of these in particular for one member, most pressing first. */
export function cautionsOf(member: Member, loaded: boolean, frequency: number | null): Caution[] {
  const cautions: Caution[] = [];
  const add = (id: string, text: string) => cautions.push({ id, text });
  const { section, stock, typedFactors } = member;
  if (!loaded) add('unloaded', 'The member carries nothing but itself: give it loads.');
  for (const [symbol, typed] of Object.entries(typedFactors ?? {})) {
    add(`typed-${symbol}`, `${symbol} ${typed.value} is typed: ${typed.reason}`);
  }
  if (section.plies > 1) {
    add(
      'ply-fastening',
      `The ${section.plies} plies act as one only if fastened together to share load: fastening is not checked.`,
    );
  }
  if (stock.product === 'LVL' && !isComplete(stock)) {
    add(
      'typical-LVL',
      'LVL values are a typical set (common practice, no source): use the values of the maker’s report.',
    );
  }
  if (frequency !== null && frequency < SUGGESTED_FREQUENCY) {
    add(
      'frequency',
      `First frequency ${frequency.toFixed(1)} Hz, under ${SUGGESTED_FREQUENCY}: the floor may feel lively (advice, not code).`,
    );
  }
  if (member.notch.left > 0 || member.notch.right > 0) {
    add(
      'notch',
      'Bending and deflection are those of the full depth; the notch is checked in shear at its end.',
    );
  }
  return cautions;
}

/** Suggested first frequency of a light floor without people on it, Hz (common practice). */
export const SUGGESTED_FREQUENCY = 15;
