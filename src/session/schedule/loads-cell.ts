import { parseQuantity, quoted } from '../../quantity/index.ts';
import { SessionFault } from '../fault.ts';
import type { LoadFile } from '../schema.ts';

/** "snow 850 lb at 5 ft", "dead 60 plf from 0 ft to 8 ft", "live 0 plf .. 90 plf": kind, how much, where. */
const LOAD = /^(\S+) +(.+?)(?: *\.\. *(.+?))?(?: +at +(.+?))?(?: +from +(.+?))?(?: +to +(.+?))?$/;

/** The loads of a cell as the session file has them; `path` is where they go. Throws SessionFault. */
export function readLoadsCell(text: string, path: readonly (string | number)[]): object[] {
  return text
    .split(';')
    .map((part) => part.trim())
    .filter((part) => part !== '')
    .map((part, index) => {
      const parts = LOAD.exec(part);
      if (parts === null)
        throw new SessionFault([...path, index], `${quoted(part)} is no load; write snow 850 lb at 5 ft`);
      const [, kind, amount, end, at, from, to] = parts;
      const isPoint = end === undefined && parseQuantity('pointLoad', amount!).ok;
      const load = isPoint ? { point: amount } : { line: end === undefined ? amount : [amount, end] };
      return {
        kind,
        ...load,
        ...(at === undefined ? {} : { at }),
        ...(from === undefined ? {} : { from }),
        ...(to === undefined ? {} : { to }),
      };
    });
}

/** The loads of a member's record in one cell, each quantity as it is written there. */
export function writeLoadsCell(loads: readonly LoadFile[]): string {
  return loads
    .map(({ kind, line, point, at, from, to }) =>
      [
        kind,
        point ?? (typeof line === 'string' ? line : line?.join(' .. ')),
        ...(at === undefined ? [] : ['at', at]),
        ...(from === undefined ? [] : ['from', from]),
        ...(to === undefined ? [] : ['to', to]),
      ].join(' '),
    )
    .join('; ');
}
