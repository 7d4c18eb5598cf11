import type * as FileSystem from 'node:fs';
import { tally } from '../support/tally.ts';

/** How the disk fails; nothing of it while a test has not said so. */
const how = {
  /** Steps and bytes until the program dies: from then on nothing it asks for happens. */
  steps: Number.POSITIVE_INFINITY,
  bytes: Number.POSITIVE_INFINITY,
  /** Bytes until the disk is full. */
  room: Number.POSITIVE_INFINITY,
  /** Most bytes of one write. */
  most: Number.POSITIVE_INFINITY,
  links: true,
  dead: false,
  reached: 0,
};
const HEALTHY = { ...how };

function fail(as: Partial<typeof how>): void {
  tally('faults injected');
  Object.assign(how, HEALTHY, as);
}

export const failing = {
  dieAfter(limits: { readonly steps?: number; readonly bytes?: number }): void {
    fail(limits);
  },
  fullAfter(room: number): void {
    fail({ room });
  },
  takes(most: number): void {
    fail({ most });
  },
  withoutLinks(): void {
    fail({ links: false });
  },
  /** A healthy disk again; gives how many steps were asked for. */
  stop(): number {
    const { reached } = how;
    Object.assign(how, HEALTHY);
    return reached;
  },
};

function fault(code: string): Error {
  return Object.assign(new Error(code), { code });
}

function step<T>(run: () => T): T {
  if (how.dead || how.reached >= how.steps) {
    how.dead = true;
    throw new Error('died');
  }
  how.reached += 1;
  return run();
}

/** Node's file system on a disk that fails as a test says: for what this program writes with. */
export function onFailingDisk(fs: typeof FileSystem): Partial<typeof FileSystem> {
  const guarded = <K extends keyof typeof FileSystem>(name: K) =>
    ((...args: unknown[]) =>
      step(() => (fs[name] as (...all: unknown[]) => unknown)(...args))) as (typeof fs)[K];
  const writeSync = ((to: number, bytes: Uint8Array, at: number): number => {
    if (how.dead) throw new Error('died');
    const wanted = bytes.length - at;
    const taken = Math.min(wanted, how.most, how.room, how.bytes);
    if (taken === 0 && wanted > 0 && how.room === 0) throw fault('ENOSPC');
    how.room -= taken;
    how.bytes -= taken;
    if (taken > 0) fs.writeSync(to, bytes, at, taken);
    if (how.bytes === 0) {
      how.dead = true;
      throw new Error('died');
    }
    return step(() => taken);
  }) as typeof fs.writeSync;
  const linkSync = ((from: string, to: string) =>
    step(() => {
      if (!how.links) throw fault('EPERM');
      fs.linkSync(from, to);
    })) as typeof fs.linkSync;
  const mocked = {
    openSync: guarded('openSync'),
    closeSync: guarded('closeSync'),
    fsyncSync: guarded('fsyncSync'),
    renameSync: guarded('renameSync'),
    rmSync: guarded('rmSync'),
    chmodSync: guarded('chmodSync'),
    chownSync: guarded('chownSync'),
    writeSync,
    linkSync,
  };
  return { ...fs, ...mocked, default: { ...fs, ...mocked } } as Partial<typeof FileSystem>;
}
