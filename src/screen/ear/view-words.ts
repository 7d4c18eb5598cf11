import { showRatio } from '../../quantity/index.ts';
import type { GaugeView, RackRowView, View } from '../view.ts';
import { sentence } from './spelled.ts';

/** The explorer's view in sentences, in the order of worth: verdict, knobs, powers, proportion, rack, remarks, keys. */
export function viewWords(view: View): string[] {
  return [
    ...titleWords(view),
    ...verdictWords(view),
    `Knobs: ${view.knobs.map(({ label, value }, at) => `${label} ${value}${at === view.knob ? ', in hand' : ''}`).join('; ')}`,
    ...view.gauges.map(gaugeWords),
    ...view.others.map(
      ({ label, ratio, governs }) => `${label} ${showRatio(ratio)}${governs ? ', governs' : ''}`,
    ),
    rulerWords(view),
    ...rackWords(view),
    ...(view.handover ? [`Handover: ${view.handover}`] : []),
    ...view.remarks,
    `Keys: ${view.foot.map(({ keys, does }) => `${keys} ${does}`).join(', ')}, Control L says all of this again`,
  ].map(sentence);
}

/** Which member this is. */
export function titleWords({ title }: View): string[] {
  return [`${title.session}. Member ${title.member}, ${title.position}, ${title.method}, ${title.kept}`].map(
    sentence,
  );
}

/** Pass or fail, what stops it, what would do. */
export function verdictWords({ verdict }: View): string[] {
  return [`${verdict.passes ? 'Passes' : 'Fails'}. ${verdict.reason}`, ...verdict.cures].map(sentence);
}

/** "Span 15 ft 3 in": the knob in hand and where it stands. */
export function knobWords(view: View): string {
  const knob = view.knobs[view.knob];
  return knob === undefined ? '' : sentence(`${knob.label} ${knob.value}`);
}

function gaugeWords({ label, ratio, nudge, governs, demand, alone }: GaugeView): string {
  if (ratio === null) return `${label}: not checked`;
  const change = nudge === null || Math.abs(nudge) < HALF_A_HUNDREDTH ? '' : `, ${changeWords(nudge)}`;
  return `${label} ${showRatio(ratio)}${change}${governs ? ', governs' : ''}; ${demand}; ${alone}`;
}

/** What two decimals do not show. */
const HALF_A_HUNDREDTH = 0.005;

/** "up 0.04", "down 0.10". */
export function changeWords(change: number): string {
  return `${change < 0 ? 'down' : 'up'} ${Math.abs(change).toFixed(2)}`;
}

function rulerWords({ ruler }: View): string {
  const stands =
    ruler.standsTo === null ? 'it stands at no l/h' : `everything stands to ${ruler.standsTo.toFixed(1)}`;
  return `l/h ${ruler.now.toFixed(1)}; ${stands}`;
}

/** As many sizes as a listener keeps in mind. */
const SIZES_SAID = 6;

function rackWords({ rack }: View): string[] {
  const { rows, current, lightest } = rack;
  // From the size at hand or the lit one, whichever is lighter, and the one before it.
  const marked = [current, lightest].filter((at) => at >= 0);
  const first = Math.max(0, Math.min(...(marked.length > 0 ? marked : [0])) - 1);
  const near = rows.slice(first, first + SIZES_SAID);
  const said = new Set([...near, ...marked.map((at) => rows[at]!)]);
  return [
    `Stock sizes of ${rack.wood}, ${rows.length} of them, lightest first; e says all, with their reach`,
    ...[...said].map((row) => {
      const at = rows.indexOf(row);
      const lit = at === lightest ? (rack.litWord ?? 'lightest that passes') : '';
      return rowWords(row, at === current, lit, rack.weightUnit);
    }),
  ];
}

function rowWords(row: RackRowView, current: boolean, lit: string, unit: string): string {
  const [shear, bending, deflection] = row.ratios.map((ratio) =>
    ratio === null ? 'none' : showRatio(ratio),
  );
  return [
    `${row.named ?? row.label}${current ? ', the size at hand' : ''}${lit === '' ? '' : `, ${lit}`}`,
    `${row.weight} ${unit}`,
    `shear ${shear}, bending ${bending}, deflection ${deflection}`,
    row.passes ? 'passes' : `stopped by ${row.stops}`,
    ...(row.reach === '' ? [] : [`reach ${row.reach}`]),
  ].join('; ');
}
