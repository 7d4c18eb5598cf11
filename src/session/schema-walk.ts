import type * as z from 'zod/mini';
import type { Path } from './fault.ts';

type Schema = z.core.$ZodType;

/** The schema of what stands under a key or index; undefined where nothing may. */
export function childSchema(schema: Schema, step: string | number): Schema | undefined {
  const def = bare(schema)._zod.def as Def;
  switch (def.type) {
    case 'object':
      return Object.hasOwn(def.shape!, step) ? def.shape![step] : undefined;
    case 'array':
      return isIndex(step) ? def.element : undefined;
    case 'tuple':
      return isIndex(step) ? def.items![Number(step)] : undefined;
    case 'union':
      for (const option of def.options!) {
        const child = childSchema(option, step);
        if (child !== undefined) return child;
      }
      return undefined;
    default:
      return undefined;
  }
}

/** The schema at a path from `root`; undefined where the path leads nowhere. */
export function schemaAt(root: Schema, path: Path): Schema | undefined {
  let schema: Schema | undefined = root;
  for (const step of path) {
    if (schema === undefined) return undefined;
    schema = childSchema(schema, step);
  }
  return schema;
}

/** The keys that an object takes; none for anything else. */
export function keysOf(schema: Schema | undefined): string[] {
  if (schema === undefined) return [];
  const def = bare(schema)._zod.def as Def;
  return def.type === 'object' ? Object.keys(def.shape!) : [];
}

/** True for a list, also where a single value may stand in for it. */
export function isList(schema: Schema): boolean {
  const def = bare(schema)._zod.def as Def;
  return def.type === 'array' || def.type === 'tuple' || (def.type === 'union' && def.options!.some(isList));
}

/** Without `optional`. */
function bare(schema: Schema): Schema {
  const def = schema._zod.def as Def;
  return def.type === 'optional' ? bare(def.innerType!) : schema;
}

function isIndex(step: string | number): boolean {
  return /^\d+$/.test(String(step));
}

/** The part of a zod definition that is walked here. */
interface Def {
  readonly type: string;
  readonly shape?: Readonly<Record<string | number, Schema>>;
  readonly element?: Schema;
  readonly items?: readonly Schema[];
  readonly options?: readonly Schema[];
  readonly innerType?: Schema;
}
