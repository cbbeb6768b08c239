import { type Checked, checkedAgainst, type Node, schemaOf } from '../common/typeSchemas.ts';
import type { Bodies } from './bodies.ts';

const SOURCE = new URL('bodies.ts', import.meta.url);

export type BodyCheck = Checked<Bodies>;

/** What the generator leaves empty where it cannot follow a type says nothing. */
const isEmpty = (key: string, value: unknown): boolean =>
  (key === 'enum' && Array.isArray(value) && value.length === 0) ||
  (key === 'properties' && JSON.stringify(value) === '{}');

const withoutEmpty = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.map(withoutEmpty);
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value) as readonly (readonly [string, unknown])[];
  const isBlank = entries.some(([key, each]) => key === 'properties' && isEmpty(key, each));
  return Object.fromEntries(
    entries
      .filter(([key, each]) => !isEmpty(key, each) && !(isBlank && key === 'type'))
      .map(([key, each]) => [key, withoutEmpty(each)]),
  );
};

/** Flags are added together, so they are any number; permissions are such a number, written out. */
const inSum = (name: string, definition: unknown): unknown => {
  if (name.endsWith('Flags')) return { type: 'integer', minimum: 0 };
  return name === 'Permissions' ? { type: 'string', pattern: '^\\d+$' } : definition;
};

const withSums = (schema: Node): Node => {
  const definitions = Object.entries(schema['definitions'] as Node).map(([name, each]) => [
    name,
    inSum(name, each),
  ]);
  return { ...schema, definitions: Object.fromEntries(definitions) as Node };
};

/** Holds what the counterpart sends against the types of the platform. */
export const bodyCheck = (): BodyCheck => {
  const made = schemaOf('discord', SOURCE, ['discord-api-types']);
  return checkedAgainst<Bodies>(withSums(withoutEmpty(made) as Node));
};
