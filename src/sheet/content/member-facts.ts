import type { Checked } from '../../explore/checked.ts';
import { showRatio } from '../../quantity/index.ts';
import { checkAndPlace, patternText } from '../../timber/place-words.ts';

/** The largest ratio of a member, "none" where nothing can meet it; empty where nothing was checked. */
export function ratioOf({ governing, worst }: Checked): string {
  return governing === null ? '' : showRatio(worst);
}

/** A member that carries nothing but itself does not pass. */
export function unloaded({ report }: Checked): boolean {
  return report.cautions.some(({ id }) => id === 'unloaded');
}

/** "Bending over support 2 governs at 1.28, D+L, live on span 1." */
export function governsSentence(each: Checked): string {
  const { member, report, governing, checks } = each;
  if (report.refused !== null) return `A rule forbids this section: ${report.refused}.`;
  if (unloaded(each)) return 'It carries nothing but itself: give it a load.';
  const result = checks.find(({ id }) => id === governing);
  if (result === undefined) return 'Nothing could be checked.';
  const where = checkAndPlace(member, result, true);
  const loads = result.combination === '' ? '' : `, ${result.combination}${patternText(result)}`;
  if (!Number.isFinite(result.ratio)) return `${where} governs, untied${loads}.`;
  return `${where} governs at ${showRatio(result.ratio)}${loads}.`;
}
