import type { Units } from '../quantity/index.ts';
import type { Session, SessionMember } from '../session/session.ts';
import type { CheckId } from '../timber/report.ts';

/** What a sheet is asked for. */
export interface Job {
  readonly session: Session;
  /** Those of the session that the sheet is of, one or more. */
  readonly members: readonly SessionMember[];
  readonly units: Units;
  /** The checks to keep; null for all. */
  readonly only: readonly CheckId[] | null;
  /** Stands in place of the title block's; null leaves that one. */
  readonly date: string | null;
}
