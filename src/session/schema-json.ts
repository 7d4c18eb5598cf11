import * as z from 'zod/mini';
import { sessionSchema } from './schema.ts';

/** The session format as a JSON Schema (draft 2020-12), for `thrice schema` and for editors. */
export function schemaJson(): Record<string, unknown> {
  const schema = z.toJSONSchema(sessionSchema()) as Record<string, unknown>;
  const { $schema, ...rest } = schema;
  return {
    $schema,
    title: 'thrice session',
    description: 'A job of timber beams. Quantities are texts with their units.',
    ...rest,
  };
}
