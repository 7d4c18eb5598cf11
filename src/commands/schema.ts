import { schemaJson } from '../session/index.ts';
import { STATUS } from './status.ts';

/** `thrice schema`: the JSON Schema of the session file. */
export function schema(print: (text: string) => void): number {
  print(`${JSON.stringify(schemaJson(), null, 2)}\n`);
  return STATUS.yes;
}
