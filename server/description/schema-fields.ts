/** The parts of a JSON schema that a reader is shown. */
export interface Schema {
  type?: string | string[];
  const?: unknown;
  enum?: unknown[];
  format?: string;
  properties?: Record<string, Schema>;
  required?: string[];
  items?: Schema;
  anyOf?: Schema[];
  oneOf?: Schema[];
  allOf?: Schema[];
}

/** A field by its place in the body, as `characteristics[].key`. */
export interface Field {
  place: string;
  type: string;
  required: boolean;
}

function choicesOf(schema: Schema): Schema[] {
  return schema.anyOf ?? schema.oneOf ?? schema.allOf ?? [];
}

function typeOf(schema: Schema): string {
  if (schema.const !== undefined) return JSON.stringify(schema.const);
  if (schema.enum) return schema.enum.map((word) => JSON.stringify(word)).join(' | ');
  const choices = choicesOf(schema);
  if (choices.length > 0) return [...new Set(choices.map(typeOf))].join(' | ');
  const type = [schema.type ?? 'anything'].flat().join(' | ');
  return schema.format === undefined ? type : `${type} (${schema.format})`;
}

/** Fields of all alternatives together, the first description of each place. */
function nestedFields(schema: Schema, place: string): Field[] {
  const nested = [
    ...fieldsOf(schema, place),
    ...(schema.items ? nestedFields(schema.items, `${place}[]`) : []),
    ...choicesOf(schema).flatMap((choice) => nestedFields(choice, place)),
  ];
  return nested.filter((field, index) => nested.findIndex((other) => other.place === field.place) === index);
}

/** Every field of a schema with its nested ones, in reading order. */
export function fieldsOf(schema: Schema, place = ''): Field[] {
  return Object.entries(schema.properties ?? {}).flatMap(([name, inner]) => {
    const here = place === '' ? name : `${place}.${name}`;
    const required = schema.required?.includes(name) ?? false;
    return [{ place: here, type: typeOf(inner), required }, ...nestedFields(inner, here)];
  });
}
