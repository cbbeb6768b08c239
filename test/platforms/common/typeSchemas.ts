/** JSON schemas made from the types that a platform's own package publishes. */
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { Ajv, type ValidateFunction } from 'ajv';
import { createGenerator } from 'ts-json-schema-generator';

const root = fileURLToPath(new URL('../../..', import.meta.url));

export type Node = Record<string, unknown>;

const versionOf = (name: string): string => {
  const file = path.join(root, 'node_modules', name, 'package.json');
  return (JSON.parse(fs.readFileSync(file, 'utf8')) as { version: string }).version;
};

/**
 * The schema of the type `Bodies` in a file. Making it takes seconds and depends on that file and
 * the packages its types come from: kept beside the packages.
 */
export const schemaOf = (platform: string, file: URL, packages: readonly string[]): Node => {
  const source = fileURLToPath(file);
  const versions = [...packages, 'ts-json-schema-generator'].map(versionOf);
  const name = `${platform}-${versions.join('-')}-${String(fs.statSync(source).size)}.json`;
  const kept = path.join(root, 'node_modules', '.cache', 'wholetooth', name);
  if (fs.existsSync(kept)) return JSON.parse(fs.readFileSync(kept, 'utf8')) as Node;
  const schema = createGenerator({
    path: source,
    type: 'Bodies',
    skipTypeCheck: true,
    additionalProperties: false,
    jsDoc: 'extended',
  }).createSchema('Bodies');
  fs.mkdirSync(path.dirname(kept), { recursive: true });
  const mine = `${kept}.${String(process.pid)}`;
  fs.writeFileSync(mine, JSON.stringify(schema));
  fs.renameSync(mine, kept);
  return schema as Node;
};

/** Tells what is wrong with a body, or null where it is right. */
export type Checked<Bodies> = (kind: keyof Bodies, body: unknown) => string | null;

export const checkedAgainst = <Bodies>(schema: Node): Checked<Bodies> => {
  const ajv = new Ajv({ strict: false, allErrors: false, validateFormats: false });
  ajv.addSchema(schema, 'bodies');
  const validators = new Map<keyof Bodies, ValidateFunction>();
  return (kind, body) => {
    const ref = `bodies#/definitions/Bodies/properties/${String(kind)}`;
    const validate = validators.get(kind) ?? ajv.compile({ $ref: ref });
    validators.set(kind, validate);
    if (validate(body)) return null;
    return `${String(kind)}: ${ajv.errorsText(validate.errors)} in ${JSON.stringify(body).slice(0, 600)}`;
  };
};
