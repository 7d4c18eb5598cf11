import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { schemaJson } from '../../src/session/schema-json.ts';
import { SAMPLES } from '../support/samples.ts';

interface Node {
  readonly type?: string;
  readonly properties?: Readonly<Record<string, Node>>;
  readonly required?: readonly string[];
  readonly items?: Node;
  readonly prefixItems?: readonly Node[];
  readonly anyOf?: readonly Node[];
  readonly enum?: readonly unknown[];
  readonly const?: unknown;
  readonly additionalProperties?: boolean;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly maxItems?: number;
  readonly description?: string;
}

/** The parts of JSON Schema that the format uses, judged independently of the program's own reader. */
function accepts(schema: Node, value: unknown): boolean {
  if (schema.anyOf) return schema.anyOf.some((one) => accepts(one, value));
  if (schema.const !== undefined) return value === schema.const;
  if (schema.enum && !schema.enum.includes(value)) return false;
  switch (schema.type) {
    case 'object': {
      if (value === null || typeof value !== 'object' || Array.isArray(value)) return false;
      const record = value as Record<string, unknown>;
      if ((schema.required ?? []).some((key) => !(key in record))) return false;
      return Object.entries(record).every(([key, entry]) => {
        const property = schema.properties?.[key];
        return property ? accepts(property, entry) : schema.additionalProperties !== false;
      });
    }
    case 'array':
      return (
        Array.isArray(value) &&
        value.length <= (schema.maxItems ?? Infinity) &&
        value.every((entry, i) => accepts(schema.prefixItems?.[i] ?? schema.items ?? {}, entry))
      );
    case 'integer':
    case 'number':
      return (
        typeof value === 'number' &&
        (schema.type === 'number' || Number.isInteger(value)) &&
        value >= (schema.minimum ?? -Infinity) &&
        value <= (schema.maximum ?? Infinity)
      );
    case 'string':
      return typeof value === 'string';
    case 'boolean':
      return typeof value === 'boolean';
    default:
      return true;
  }
}

const schema = schemaJson() as Node & Record<string, unknown>;
const member = schema.properties!.members!.items!;

describe('the JSON Schema of the format', () => {
  test('is plain JSON that names its dialect', () => {
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
  });

  test('requires what the contract requires and knows no other keys', () => {
    expect(schema.required).toEqual(['thrice', 'members']);
    expect(member.required).toEqual(['name', 'spans', 'stock', 'section']);
    expect(schema.additionalProperties).toBe(false);
    expect(member.additionalProperties).toBe(false);
  });

  test('knows every key of the contract', () => {
    expect(Object.keys(member.properties!)).toEqual(
      expect.arrayContaining(
        `name note use count spans overhangs supports fixed bearing spacing tributary area loads selfWeight stock section
        service temperature incised repetitive seasoned bracing bracingBottom shearAt limits creep notch liveReduction
        tiedDown flat slope maxDepth maxWidth`.split(/\s+/),
      ),
    );
  });

  test('says of a quantity what it is and how it is written', () => {
    expect(member.properties!.spans!.items!.description).toContain('14 ft');
    expect(member.properties!.area!.properties!.live!.description).toContain('40 psf');
  });

  test.each(SAMPLES)('accepts the sample $title', ({ file }) => {
    expect(accepts(schema, JSON.parse(readFileSync(file, 'utf8')))).toBe(true);
  });

  test.each([[{ thrice: 2 }], [{ title: 3 }], [{ unknown: 1 }], [{ members: [{ name: 'G1' }] }]])(
    'does not accept a sample with %j laid over it',
    (over) => {
      const sample = JSON.parse(readFileSync('sessions/boathouse.json', 'utf8'));
      expect(accepts(schema, { ...sample, ...over })).toBe(false);
    },
  );
});
