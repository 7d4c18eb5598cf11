import { KIND_LETTER, type Link, type LinkEnd, LOAD_KINDS } from '../loads/index.ts';
import { showInches, showQuantity, showSpan, type Units } from '../quantity/index.ts';

/** "left end", "support 2". */
export function endText(end: LinkEnd): string {
  return typeof end === 'number' ? `support ${end + 1}` : `${end} end`;
}

/** Which reaction lands how: `J1 right end every 16"`, `G2 support 2 at 5'-0"`. */
export function linkText(link: Link, units: Units): string {
  const place =
    link.type === 'point' ? `at ${showSpan(link.at, units)}` : `every ${showInches(link.every, units)}`;
  return `${link.member} ${endText(link.end)} ${place}`;
}

/** What it brings by kind: "D 120, L 320 plf", "L 850 to -210 lb"; "nothing" where it brings none. */
export function borneText(link: Link, units: Units): string {
  const kind = link.type === 'point' ? 'pointLoad' : 'lineLoad';
  const by = link.type === 'point' ? 1 : 1 / link.every;
  const parts = LOAD_KINDS.flatMap((each) => {
    const borne = link.bears?.[each];
    if (borne === undefined || (borne.max === 0 && borne.min === 0)) return [];
    const [max, unit] = showQuantity(kind, by * borne.max, units).split(' ') as [string, string];
    const down = borne.min < 0 && borne.min < borne.max;
    const to = down ? ` to ${showQuantity(kind, by * borne.min, units).split(' ')[0]}` : '';
    return [{ text: `${KIND_LETTER[each]} ${max}${to}`, unit }];
  });
  return parts.length === 0 ? 'nothing' : `${parts.map(({ text }) => text).join(', ')} ${parts[0]!.unit}`;
}
