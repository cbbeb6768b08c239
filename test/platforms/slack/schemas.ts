import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { Ajv, type ValidateFunction } from 'ajv';
import { createGenerator } from 'ts-json-schema-generator';
import type { Bodies } from './bodies.ts';

const SOURCE = fileURLToPath(new URL('bodies.ts', import.meta.url));
const root = fileURLToPath(new URL('../../..', import.meta.url));

type Node = Record<string, unknown>;
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

const versionOf = (name: string): string => {
  const file = path.join(root, 'node_modules', name, 'package.json');
  return (JSON.parse(fs.readFileSync(file, 'utf8')) as { version: string }).version;
};

/** Making the schema takes seconds and depends on three packages and one file: kept beside them. */
const made = (): Node => {
  const versions = ['@slack/types', '@slack/bolt', 'ts-json-schema-generator'].map(versionOf);
  const name = `slack-${versions.join('-')}-${String(fs.statSync(SOURCE).size)}.json`;
  const file = path.join(root, 'node_modules', '.cache', 'wholetooth', name);
  if (fs.existsSync(file)) return JSON.parse(fs.readFileSync(file, 'utf8')) as Node;
  const schema = createGenerator({
    path: SOURCE,
    type: 'Bodies',
    skipTypeCheck: true,
    additionalProperties: false,
    jsDoc: 'extended',
  }).createSchema('Bodies');
  fs.mkdirSync(path.dirname(file), { recursive: true });
  const mine = `${file}.${String(process.pid)}`;
  fs.writeFileSync(mine, JSON.stringify(schema));
  fs.renameSync(mine, file);
  return schema as Node;
};

export const slackSchema = (): Node => withLimits(made()) as Node;

export type BodyCheck = (kind: keyof Bodies, body: unknown) => string | null;

/** Tells what is wrong with a body, or null where it is right. */
export const bodyCheck = (): BodyCheck => {
  const ajv = new Ajv({ strict: false, allErrors: false, validateFormats: false });
  ajv.addSchema(slackSchema(), 'slack');
  const validators = new Map<string, ValidateFunction>();
  return (kind, body) => {
    const ref = `slack#/definitions/Bodies/properties/${kind}`;
    const validate = validators.get(kind) ?? ajv.compile({ $ref: ref });
    validators.set(kind, validate);
    if (validate(body)) return null;
    return `${kind}: ${ajv.errorsText(validate.errors)} in ${JSON.stringify(body).slice(0, 600)}`;
  };
};
