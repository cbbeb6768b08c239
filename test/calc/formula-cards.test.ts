import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { SOURCES } from '../../src/calc/sources.ts';
import { UNITS } from '../../src/calc/units.ts';
import { arrowsOf, filesIn, functionsOf, importsOf, programOf } from '../support/calcFunctions.ts';
import { defectsOf, type Known } from '../support/formulaCards.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const calc = path.join(root, 'src', 'calc');
const files = filesIn(calc);
const known: Known = { sources: new Set(Object.keys(SOURCES)), units: new Set(UNITS) };
const short = (file: string): string => path.relative(calc, file);

/** The inside of a folder is its own affair; what others see is its index. */
const isInner = (file: string): boolean =>
  path.dirname(file) !== calc && path.basename(file) !== 'index.ts';

const exportsOf = async (file: string): Promise<[string, unknown][]> =>
  Object.entries((await import(/* @vite-ignore */ file)) as Record<string, unknown>);

const everyExport = (await Promise.all(files.map(exportsOf))).flat();
const scope = Object.fromEntries(everyExport);

const program = programOf(root, files);
const functions = functionsOf(program, files);

describe('formula cards', () => {
  it('are found', () => {
    expect(functions.map(({ name }) => name)).toContain('materialById');
  });

  it.each(functions.map((fn) => [`${short(fn.file)}:${fn.line} ${fn.name}`, fn] as const))(
    '%s',
    (_, fn) => {
      expect(defectsOf(fn, known, scope)).toEqual([]);
    },
  );
});

describe('what the calculations export', () => {
  it('one name means one thing, so an example cannot be read two ways', () => {
    const twice = everyExport.filter(([name, value]) => !Object.is(scope[name], value));
    expect(twice.map(([name]) => name)).toEqual([]);
  });

  it('functions others may call are declarations, except the units', () => {
    const arrows = files.flatMap((file) => arrowsOf(program, file).map((name) => ({ file, name })));
    expect(arrows.map(({ name }) => name)).toContain('mm');
    const seen = arrows.filter(({ file }) => !isInner(file) && short(file) !== 'units.ts');
    expect(seen.map(({ file, name }) => `${short(file)} ${name}`)).toEqual([]);
  });

  it('others reach a folder through its index', () => {
    const others = ['src', 'commands'].flatMap((folder) => filesIn(path.join(root, folder)));
    const past = others.flatMap((file) =>
      importsOf(file)
        .filter((target) => target.startsWith(`${calc}${path.sep}`) && isInner(target))
        .filter((target) => path.dirname(target) !== path.dirname(file))
        .map((target) => `${path.relative(root, file)} → ${short(target)}`),
    );
    expect(past).toEqual([]);
  });
});
