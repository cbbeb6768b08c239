import { type Checked, checkedAgainst, type Node, schemaOf } from '../common/typeSchemas.ts';
import type { Bodies } from './bodies.ts';

const isNode = (value: unknown): value is Node =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** The most a doc comment allows of its field: `Maximum length for this field is 75 characters`. */
export const mostIn = (description: string): number | null => {
  const found =
    /(?:max(?:imum)?\b|up to)(?:(?!\bminimum\b|\beach\b)[^.\d])*?(\d+)\s*(?:characters?|elements?|items?|blocks?|options?|\{@link|\.|$)/iu.exec(
      description.replaceAll(/\s+/gu, ' '),
    );
  return found === null ? null : Number(found[1]);
};

/** A field with its limit: of its characters, of its items, or of the text inside it. */
const limited = (field: Node): Node => {
  const { description } = field;
  const most = typeof description === 'string' ? mostIn(description) : null;
  if (most === null) return field;
  if (field['type'] === 'array') return { ...field, maxItems: most };
  if (field['type'] === 'string') return { ...field, maxLength: most };
  if (field['type'] !== undefined) return field;
  const inside = { properties: { text: { type: 'string', maxLength: most } } };
  return { allOf: [field, inside] };
};

/** Reads the limits out of the comments, everywhere in the schema. */
const withLimits = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.map(withLimits);
  if (!isNode(value)) return value;
  const walked = Object.fromEntries(
    Object.entries(value).map(([key, each]) => [key, withLimits(each)]),
  );
  const { properties } = walked;
  if (!isNode(properties)) return walked;
  const fields = Object.entries(properties).map(([name, field]) => [
    name,
    isNode(field) ? limited(field) : field,
  ]);
  return { ...walked, properties: Object.fromEntries(fields) as Node };
};

const SOURCE = new URL('bodies.ts', import.meta.url);

export const slackSchema = (): Node =>
  withLimits(schemaOf('slack', SOURCE, ['@slack/types', '@slack/bolt'])) as Node;

export type BodyCheck = Checked<Bodies>;

export const bodyCheck = (): BodyCheck => checkedAgainst<Bodies>(slackSchema());
