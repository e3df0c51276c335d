import type { JsonSchema } from './openapi';

type Part = JsonSchema | boolean | undefined;
const STEP = '    ';

const plain = (part: Part): JsonSchema => (typeof part === 'object' ? part : {});

function limits({ minLength, maxLength, minimum, maximum, exclusiveMinimum, minItems, maxItems, format }: JsonSchema): string {
  const range = (low: number | undefined, high: number | undefined): string => (low === undefined && high === undefined ? '' : `${low ?? ''}…${high ?? ''}`);
  // the schema of a whole number names the limits of the number type; they tell a reader nothing
  const sizes = range(minimum === Number.MIN_SAFE_INTEGER ? undefined : minimum ?? (typeof exclusiveMinimum === 'number' ? exclusiveMinimum : undefined), maximum === Number.MAX_SAFE_INTEGER ? undefined : maximum);
  const told = [format, range(minLength, maxLength), sizes, range(minItems, maxItems)].filter((text) => text !== undefined && text !== '');
  return told.length === 0 ? '' : ` (${told.join(', ')})`;
}

function listOf(schema: JsonSchema, indent: string): string {
  const { prefixItems, items } = schema;
  if (Array.isArray(prefixItems)) return `[${prefixItems.map((one) => shape(plain(one), indent)).join(', ')}]`;
  return `list of ${shape(plain(Array.isArray(items) ? items[0] : items), indent)}${limits(schema)}`;
}

function fieldsOf({ properties = {}, required = [], additionalProperties }: JsonSchema, indent: string): string {
  const names = Object.entries(properties);
  if (names.length === 0) return typeof additionalProperties === 'object' ? `{ any name: ${shape(additionalProperties, indent)} }` : '{}';
  const deeper = indent + STEP;
  return `{\n${names.map(([name, one]) => `${deeper}${name}${required.includes(name) ? '' : '?'}: ${shape(plain(one), deeper)}`).join('\n')}\n${indent}}`;
}

/** A schema as a reader takes it in: names, kinds and limits, indented. `?` = may be left out. */
export function shape(schema: JsonSchema, indent = ''): string {
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return choices.map((one) => shape(plain(one), indent)).join(' or ');
  if (schema.allOf) return shape(plain(schema.allOf[0]), indent);
  if (schema.const !== undefined) return JSON.stringify(schema.const);
  if (schema.enum) return schema.enum.map((one) => JSON.stringify(one)).join(' or ');
  if (schema.type === 'object') return fieldsOf(schema, indent);
  if (schema.type === 'array') return listOf(schema, indent);
  if (schema.type === 'string') return `text${limits(schema)}`;
  if (schema.type === 'integer') return `whole number${limits(schema)}`;
  if (schema.type === 'number') return `number${limits(schema)}`;
  if (schema.type === 'boolean') return 'true or false';
  if (schema.type === 'null') return 'null';
  return 'anything';
}
