import fc from 'fast-check';
import * as z from 'zod';

/** A schema as z.toJSONSchema writes it, as far as making values for it goes. */
interface JsonSchema {
  type?: string;
  const?: unknown;
  enum?: unknown[];
  format?: string;
  pattern?: string;
  minItems?: number;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: number;
  properties?: Record<string, JsonSchema>;
  required?: string[];
  propertyNames?: JsonSchema;
  additionalProperties?: JsonSchema | boolean;
  items?: JsonSchema;
  anyOf?: JsonSchema[];
  oneOf?: JsonSchema[];
}

/** Words and numbers that have broken programs before: control characters, half characters, keys of prototypes, extremes. */
const ODD_TEXTS = [
  '',
  ' ',
  '\u0000',
  'a\u0000b',
  '\ud800',
  '\u202etxet',
  'x\r\nBcc: everybody@hollowmere.example',
  '__proto__',
  'constructor',
  '../../etc/passwd',
  "'; drop table lots; --",
  '=1+1',
  '{{subject}}',
  '<script>1</script>',
  'NaN',
  '-1',
  '1e400',
  '9'.repeat(400),
  '🔌'.repeat(40),
  'ش',
];
const ODD_NUMBERS = [0, -0, -1, 0.5, 1e308, -1e308, 5e-324, 2 ** 31, 2 ** 53, Number.MAX_SAFE_INTEGER];

const oddText = fc.oneof(fc.constantFrom(...ODD_TEXTS), fc.string({ unit: 'binary', maxLength: 60 }));
const oddNumber = fc.oneof(fc.constantFrom(...ODD_NUMBERS), fc.double({ noNaN: true, noDefaultInfinity: true }));
const deep = fc.integer({ min: 1, max: 500 }).map((depth) => {
  let value: unknown = 'deep';
  for (let level = 0; level < depth; level += 1) value = level % 2 === 0 ? [value] : { value };
  return value;
});

/** Any value JSON can carry, the odd ones often. */
export const oddValue: fc.Arbitrary<unknown> = fc.oneof(
  oddText,
  oddNumber,
  fc.constantFrom(null, true, false, [], {}),
  fc.jsonValue({ maxDepth: 3 }),
  fc.constantFrom(JSON.parse('{"__proto__":{"admin":true},"constructor":{"prototype":1}}') as unknown),
  deep,
);

const FORMATS: Record<string, fc.Arbitrary<string>> = {
  email: fc.constantFrom('someone@hollowmere.example', 'o.neil+lots@hollowmere.example', 'QUALITY@hollowmere.example'),
  uuid: fc.uuid(),
  date: fc.constantFrom('2026-03-12', '0001-01-01', '9999-12-31', '2028-02-29'),
  'date-time': fc.constantFrom(
    '2026-03-12T08:00:00.000Z',
    '2026-03-12T08:00Z',
    '0001-01-01T00:00:00Z',
    '9999-12-31T23:59:59.999999999999Z',
  ),
};

const plainText = fc.constantFrom('Hollowmere', '12', '12.1', '4.7k', '1e300', 'KES', 'P-001', '2026', 'Kestrin Power');

function fittingText({ format, pattern }: JsonSchema): fc.Arbitrary<string> {
  if (format !== undefined && FORMATS[format]) return FORMATS[format];
  if (pattern !== undefined) return fc.stringMatching(new RegExp(pattern));
  return fc.oneof({ weight: 4, arbitrary: plainText }, { weight: 1, arbitrary: oddText });
}

function bounds(schema: JsonSchema, widest: number): { min: number; max: number } {
  const min = schema.minimum ?? schema.exclusiveMinimum ?? -widest;
  return { min: Math.max(min, -widest), max: Math.min(schema.maximum ?? widest, widest) };
}

/** Numbers within the bounds of the schema, small ones often, the bounds themselves and what lies around them. */
function fittingNumber(schema: JsonSchema): fc.Arbitrary<number> {
  if (schema.type === 'integer') {
    const { min, max } = bounds(schema, 2 ** 31);
    const small = fc.integer({ min: Math.max(min, 1), max: Math.min(max, 5) });
    return fc.oneof({ weight: 6, arbitrary: small }, { weight: 2, arbitrary: fc.integer({ min, max }) });
  }
  const { min, max } = bounds(schema, 1e300);
  const least = Math.max(min, 0.001);
  const usual = fc.double({ min: least, max: Math.max(least, Math.min(max, 0.9)), noNaN: true });
  return fc.oneof(
    { weight: 6, arbitrary: usual },
    { weight: 2, arbitrary: fc.double({ min, max, noNaN: true }) },
    { weight: 1, arbitrary: fc.constantFrom(min, max, ...ODD_NUMBERS) },
  );
}

/** Values for names whose values must refer to something to get anywhere. */
export type Hints = Readonly<Record<string, fc.Arbitrary<unknown>>>;

function fittingObject(schema: JsonSchema, hints: Hints): fc.Arbitrary<unknown> {
  const entries = Object.entries(schema.properties ?? {});
  const known = Object.fromEntries(entries.map(([name, inner]) => [name, hints[name] ?? valueFor(inner, hints)]));
  if (entries.length === 0 && typeof schema.additionalProperties === 'object')
    return fc.dictionary(oddText, valueFor(schema.additionalProperties, hints), { maxKeys: 3 });
  return fc.record(known, { requiredKeys: schema.required ?? [] });
}

function fitting(schema: JsonSchema, hints: Hints): fc.Arbitrary<unknown> {
  if (schema.const !== undefined) return fc.constant(schema.const);
  if (schema.enum) return fc.constantFrom(...schema.enum);
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return fc.oneof(...choices.map((choice) => valueFor(choice, hints)));
  switch (schema.type) {
    case 'object':
      return fittingObject(schema, hints);
    case 'array':
      return fc.array(valueFor(schema.items ?? {}, hints), { minLength: schema.minItems ?? 0, maxLength: 3 });
    case 'string':
      return fittingText(schema);
    case 'integer':
    case 'number':
      return fittingNumber(schema);
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    default:
      return oddValue;
  }
}

/** Mostly what the schema asks for, now and then something else in its place. */
function valueFor(schema: JsonSchema, hints: Hints): fc.Arbitrary<unknown> {
  return fc.oneof({ weight: 60, arbitrary: fitting(schema, hints) }, { weight: 1, arbitrary: oddValue });
}

/** Bodies, queries or parameters for a schema of the contract: near enough to it to get past the door, odd inside. */
export function inputFor(schema: z.ZodType, hints: Hints): fc.Arbitrary<unknown> {
  const described = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as JsonSchema;
  return fc.oneof({ weight: 20, arbitrary: fitting(described, hints) }, { weight: 1, arbitrary: oddValue });
}
