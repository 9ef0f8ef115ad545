import fc, { type Arbitrary } from 'fast-check';
import * as z from 'zod';

type JsonSchema = z.core.JSONSchema.BaseSchema;

/** Values that have broken other programs. */
const HOSTILE: readonly unknown[] = [
  null,
  '',
  ' ',
  '0',
  -1,
  0,
  1e308,
  -1e-308,
  Number.MAX_SAFE_INTEGER + 2,
  true,
  [],
  [[]],
  {},
  { toString: 'x', valueOf: 1, length: -1 },
  JSON.parse('{"__proto__": {"x": 1}, "constructor": {"prototype": 1}}'),
  "'; drop table areas; --",
  '" or ""="',
  '<img src=x onerror=alert(1)>',
  '{{7*7}}',
  '%00',
  '\u0000',
  '\uD800',
  '\u202E\uFEFF',
  '../../../../etc/passwd',
  '=cmd|x',
  'x'.repeat(5000),
  'é'.normalize('NFD').repeat(300),
  '9'.repeat(400),
  '2026-02-30',
  '0000-00-00T00:00:00.000Z',
  '-271821-04-20T00:00:00.000Z',
  'NaN',
  'Infinity',
  '1e999',
];

const hostile: Arbitrary<unknown> = fc.oneof(
  fc.constantFrom(...HOSTILE),
  fc.jsonValue({ maxDepth: 3 }),
  fc.string({ unit: 'binary' }),
);

/** Inputs for a schema: most of them nearly right, some right, some nowhere near. */
export function inputFor(schema: z.ZodType): Arbitrary<unknown> {
  const json = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as JsonSchema;
  const valid = arbitraryOf(json, json);
  return fc.oneof(
    { weight: 3, arbitrary: valid },
    { weight: 5, arbitrary: fc.tuple(valid, fc.nat(), hostile).map(spoilOne) },
    { weight: 1, arbitrary: hostile },
  );
}

function arbitraryOf(schema: JsonSchema, root: JsonSchema): Arbitrary<unknown> {
  const target = resolve(schema, root);
  if (target.const !== undefined) return fc.constant(target.const);
  if (target.enum) return fc.constantFrom(...target.enum);
  const choices = target.anyOf ?? target.oneOf;
  if (choices) return fc.oneof(...choices.map((it) => arbitraryOf(it as JsonSchema, root)));
  switch (target.type) {
    case 'object':
      return objectOf(target, root);
    case 'array':
      return listOf(target, root);
    case 'string':
      return textOf(target);
    case 'integer':
      return fc.integer({
        min: Math.max(target.minimum ?? -1000, -1e9),
        max: Math.min(target.maximum ?? 1000, 1e9),
      });
    case 'number':
      return numberOf(target);
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    default:
      return fc.jsonValue({ maxDepth: 2 });
  }
}

function resolve(schema: JsonSchema, root: JsonSchema): JsonSchema {
  if (schema.$ref === undefined) return schema;
  if (schema.$ref === '#') return root;
  const name = schema.$ref.split('/').at(-1) ?? '';
  return resolve((root.$defs?.[name] ?? {}) as JsonSchema, root);
}

function objectOf(schema: JsonSchema, root: JsonSchema): Arbitrary<unknown> {
  const fields = Object.entries(schema.properties ?? {}).map(
    ([name, field]) => [name, arbitraryOf(field as JsonSchema, root)] as const,
  );
  if (fields.length === 0 && typeof schema.additionalProperties === 'object') {
    const item = arbitraryOf(schema.additionalProperties as JsonSchema, root);
    return fc.dictionary(fc.string({ minLength: 1, maxLength: 20 }), item, { maxKeys: 3 });
  }
  const requiredKeys = (schema.required ?? []).filter((key) => key in (schema.properties ?? {}));
  return fc.record(Object.fromEntries(fields), { requiredKeys });
}

function listOf(schema: JsonSchema, root: JsonSchema): Arbitrary<unknown> {
  const [first, ...rest] = (schema.prefixItems ?? []) as JsonSchema[];
  if (first) return fc.tuple(...[first, ...rest].map((item) => arbitraryOf(item, root)));
  const item = arbitraryOf((schema.items ?? {}) as JsonSchema, root);
  const minLength = schema.minItems ?? 0;
  return fc.array(item, {
    minLength,
    maxLength: Math.max(minLength, Math.min(schema.maxItems ?? 3, 3)),
  });
}

function textOf(schema: JsonSchema): Arbitrary<string> {
  if (schema.format === 'date') return fc.constantFrom('2026-12-01', '2024-02-29', '1999-01-31');
  if (schema.format === 'date-time') return fc.constantFrom('2026-12-01T09:00:00.000Z');
  if (schema.format === 'email') return fc.emailAddress();
  const minLength = Math.min(schema.minLength ?? 0, 50);
  const maxLength = Math.max(minLength, Math.min(schema.maxLength ?? 60, 60));
  return fc.oneof(
    fc.string({ minLength, maxLength, unit: 'grapheme' }),
    fc.constantFrom('abc', 'Europe/Berlin', 'a-name_2').map((it) => it.padEnd(minLength, 'x')),
  );
}

function numberOf(schema: JsonSchema): Arbitrary<number> {
  const min = Number(schema.minimum ?? schema.exclusiveMinimum ?? -1e6);
  const max = Number(schema.maximum ?? schema.exclusiveMaximum ?? 1e6);
  return fc.oneof(
    fc.double({ min, max, noNaN: true }),
    fc.constantFrom(min, max, (min + max) / 2),
    fc.integer({ min: Math.ceil(Math.max(min, -1e6)), max: Math.floor(Math.min(max, 1e6)) }),
  );
}

/** Puts something hostile at one place of a value, or adds a key, or takes one away. */
function spoilOne([value, pick, evil]: [unknown, number, unknown]): unknown {
  if (typeof value !== 'object' || value === null) return evil;
  const copy: Record<string, unknown> | unknown[] = Array.isArray(value)
    ? [...(value as unknown[])]
    : { ...(value as Record<string, unknown>) };
  const keys = Object.keys(copy);
  const target = copy as Record<string, unknown>;
  const key = keys[pick % Math.max(1, keys.length)];
  if (key === undefined || pick % 7 === 0) target[`extra${pick % 3}`] = evil;
  else if (pick % 7 === 1) Reflect.deleteProperty(target, key);
  else if (pick % 2 === 0) target[key] = evil;
  else target[key] = spoilOne([target[key], Math.floor(pick / 7), evil]);
  return copy;
}
