import type { CombinationSet } from '../loads/loading.ts';
import type { Units } from '../quantity/index.ts';
import { stockFault } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { type Path, SessionFault } from './fault.ts';
import { keep, present, type Raw, rawAt } from './keep.ts';
import { readMember } from './read-member.ts';
import type { DesignFile, MemberFile } from './schema.ts';
import type { Pin } from './session.ts';
import { writeMember } from './write-member.ts';

/** What a member is called, which its designs do not differ in. */
type Named = Pick<Member, 'name' | 'note' | 'count'>;

/** The designs set aside of a member: whole records, but for its name, note and count. Throws SessionFault. */
export function readPins(
  file: MemberFile,
  written: unknown,
  combinations: CombinationSet,
  path: Path,
): Pin[] | undefined {
  return file.pins?.map(({ note, design }, at) => {
    const place = [...path, 'pins', at, 'design'];
    const member = readMember(recordOf(file, design), combinations, place);
    const fault = stockFault(member);
    if (fault !== null)
      throw new SessionFault(
        [...place, ...(fault.path === 'wet' ? 'service' : fault.path).split('.')],
        fault.reason,
      );
    const raw = (rawAt(written, 'pins') as readonly unknown[])[at];
    return { note: note ?? '', member, written: raw };
  });
}

function recordOf(file: Pick<MemberFile, 'name' | 'note' | 'count'>, design: DesignFile): MemberFile {
  const { name, note, count } = file;
  return {
    ...design,
    name,
    ...(note === undefined ? {} : { note }),
    ...(count === undefined ? {} : { count }),
  };
}

/** `pins` as the file holds them, each value as the user wrote it while unchanged; nothing where there is none. */
export function writePins(
  pins: readonly Pin[] | undefined,
  named: Named,
  raw: unknown,
  units: Units,
): unknown {
  if (pins === undefined || pins.length === 0) return rawAt(raw, 'pins') === undefined ? undefined : [];
  return pins.map((pin): Raw => {
    const design = rawAt(pin.written, 'design');
    const member = { ...pin.member, name: named.name, note: named.note, count: named.count };
    const before = readBefore(design, member);
    const { name: _name, note: _note, count: _count, ...record } = writeMember(member, design, before, units);
    const note = rawAt(pin.written, 'note');
    return present({ note: keep(note, note as string | undefined, pin.note, ''), design: record });
  });
}

/** What a raw design was read as; undefined where it never was in a file. */
function readBefore(design: unknown, member: Member): Member | undefined {
  if (design === undefined) return undefined;
  try {
    return readMember(recordOf(member, design as DesignFile), member.combinations, []);
  } catch (fault) {
    if (fault instanceof SessionFault) return undefined;
    throw fault;
  }
}
