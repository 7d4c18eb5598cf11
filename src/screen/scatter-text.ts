import { SCATTER_ASSUMES, scatterCOV, scatterOf } from '../explore/scatter/scatter.ts';
import { showRatio } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';

/** Ratios at the 95th and the 5th percentile of E; null where nobody has said how the wood scatters. */
export function bandOf(member: Member, ratio: number): readonly [number, number] | null {
  const COV = scatterCOV(member);
  if (COV === null || COV === 0) return null;
  const { stiff, soft } = scatterOf(ratio, COV);
  return [stiff, soft];
}

/** The share of members over the deflection limit with its assumption, each line short enough for the smallest screen. */
export function scatterRemarks(member: Member, ratio: number | null): string[] {
  if (ratio === null) return ['scatter: no deflection is checked here'];
  const COV = scatterCOV(member);
  if (COV === null) return ['scatter: nobody has stated a COV of E for this wood; it can be typed under y'];
  const { over, stiff, soft } = scatterOf(ratio, COV);
  return [
    `${shareText(over)} over the deflection limit: E normal, COV ${COV} (NDS App. F)`,
    `deflection ${showRatio(stiff)} to ${showRatio(soft)}, 5th to 95th percentile; ${SCATTER_ASSUMES}`,
  ];
}

const PERCENT = 100;

/** "12 % of members"; ends are told as what they are near. */
function shareText(share: number): string {
  const percent = share * PERCENT;
  const text =
    percent < 0.1
      ? '<0.1'
      : percent > 99.9
        ? '>99.9'
        : percent < 10 || percent > 90
          ? percent.toFixed(1)
          : percent.toFixed(0);
  return `${text} % of members`;
}
