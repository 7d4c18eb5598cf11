import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

export type SectionPart = 'area' | 'modulus' | 'inertia';

/** Sizes as the section stands, and the properties asked for. */
export function sectionLines(work: Work, parts: readonly SectionPart[]): WorkingLine[] {
  const { figures: f, member, wood } = work;
  const { plies } = member.section;
  const { b, d, area, modulus, inertia } = wood.at;
  const lines: WorkingLine[] = [{ heading: 'section' }];
  const flat = member.section.flat ? { note: 'laid flat: width and depth change places' } : {};
  lines.push(
    plies > 1
      ? {
          symbol: 'b',
          formula: 'plies x width',
          numbers: `${plies} x ${f.size(b / plies)}`,
          result: f.size(b),
          ...flat,
        }
      : { symbol: 'b', result: f.size(b), ...flat },
    { symbol: 'd', result: f.size(d) },
  );
  for (const part of parts) {
    if (part === 'area') {
      lines.push({
        symbol: 'A',
        formula: 'b d',
        numbers: `${f.size(b)} x ${f.size(d)}`,
        result: f.area(area),
      });
    } else if (part === 'modulus') {
      const numbers = `${f.size(b)} x (${f.size(d)})^2 / 6`;
      lines.push({ symbol: 'S', formula: 'b d^2 / 6', numbers, result: f.modulus(modulus) });
    } else {
      const numbers = `${f.size(b)} x (${f.size(d)})^3 / 12`;
      lines.push({ symbol: 'I', formula: 'b d^3 / 12', numbers, result: f.inertia(inertia) });
    }
  }
  return lines;
}
