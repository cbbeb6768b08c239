import { isDeepStrictEqual } from 'node:util';
import vm from 'node:vm';
import type { CalcFunction } from './calcFunctions.ts';

/**
 * Reads the formula card above a function: a sentence, the formula, a table of symbols, what is
 * assumed, sources and worked examples.
 */
export interface FormulaCard {
  readonly sentence: string;
  readonly formula: readonly string[];
  /** Cells of each table line, the heading first and without the line under it. */
  readonly table: readonly (readonly string[])[];
  /** The line beginning with "Assumes" and what it runs on to, or nothing. */
  readonly assumption: string;
  readonly sources: readonly string[];
  readonly examples: readonly string[];
}

export interface Known {
  readonly sources: ReadonlySet<string>;
  readonly units: ReadonlySet<string>;
}

const HEADING = ['symbol', 'meaning', 'unit', 'range'];
const NO_UNIT = '-';

export function readCard(comment: string): FormulaCard {
  const lines = comment
    .replace(/^\s*\/\*\*/, '')
    .replace(/\*\/\s*$/, '')
    .split('\n')
    .map((line) => line.replace(/^\s*\* ?/, '').trimEnd());
  const firstTag = lines.findIndex((line) => line.startsWith('@'));
  const body = firstTag < 0 ? lines : lines.slice(0, firstTag);
  const tags = firstTag < 0 ? [] : joinTags(lines.slice(firstTag));
  const tagged = (tag: string) =>
    tags.filter((text) => text.startsWith(`${tag} `)).map((text) => text.slice(tag.length).trim());
  return {
    sentence: firstParagraph(body),
    formula: body.filter((line) => /^ {4,}\S/.test(line)).map((line) => line.trim()),
    table: body
      .filter((line) => line.startsWith('|'))
      .map(cellsOf)
      .filter(isNotRule),
    assumption: assumptionIn(body),
    sources: tagged('@source'),
    examples: tagged('@example'),
  };
}

function assumptionIn(lines: readonly string[]): string {
  const start = lines.findIndex((line) => /^Assumes\s+\S/.test(line));
  if (start < 0) return '';
  const text = lines.slice(start);
  const end = text.indexOf('');
  return (end < 0 ? text : text.slice(0, end)).join(' ');
}

/** A tag may run on over the next lines. */
function joinTags(lines: readonly string[]): string[] {
  const tags: string[] = [];
  for (const line of lines) {
    const before = tags.at(-1);
    if (line.startsWith('@') || before === undefined) tags.push(line);
    else tags[tags.length - 1] = `${before} ${line.trim()}`.trimEnd();
  }
  return tags;
}

function firstParagraph(lines: readonly string[]): string {
  const start = lines.findIndex((line) => line !== '');
  const text = start < 0 ? [] : lines.slice(start);
  const end = text.indexOf('');
  return (end < 0 ? text : text.slice(0, end)).join(' ');
}

const cellsOf = (line: string): string[] =>
  line
    .replace(/^\|/, '')
    .replace(/(?<!\\)\|$/, '')
    .split(/(?<!\\)\|/)
    .map((cell) => cell.trim());

const isNotRule = (cells: readonly string[]): boolean =>
  !cells.every((cell) => /^:?-{2,}:?$/.test(cell));

/** What is wrong with the card of a function, in words; nothing when it is in order. */
export function defectsOf(
  fn: CalcFunction,
  known: Known,
  scope: Readonly<Record<string, unknown>>,
): string[] {
  if (fn.comment === null) return ['has no formula card'];
  const card = readCard(fn.comment);
  const [heading, ...rows] = card.table;
  return [
    ...sentenceDefects(card.sentence),
    ...(card.formula.length > 0 ? [] : ['has no formula (a block indented by four spaces)']),
    ...(isDeepStrictEqual(heading, HEADING) ? [] : [`table is not headed ${HEADING.join(' | ')}`]),
    ...rows.flatMap((row) => rowDefects(row, known)),
    ...argumentDefects(fn, rows),
    ...(card.assumption !== '' ? [] : ['has no line beginning with "Assumes"']),
    ...sourceDefects(card.sources, known),
    ...(card.examples.length > 0 ? [] : ['has no @example']),
    ...card.examples.flatMap((example) => exampleDefects(example, resultUnits(rows), scope)),
  ];
}

function sentenceDefects(sentence: string): string[] {
  if (!/^[^|@\s].*\.$/.test(sentence)) return ['does not open with a sentence'];
  return /[.!?]\s+\p{Lu}/u.test(sentence) ? ['opens with more than one sentence'] : [];
}

function rowDefects(row: readonly string[], { units }: Known): string[] {
  const [symbol = '', meaning, unit = ''] = row;
  if (row.length !== HEADING.length) {
    return [`row "${symbol}" has ${row.length} cells (a bar inside a cell is written \\|)`];
  }
  return [
    ...(meaning ? [] : [`row "${symbol}" has no meaning`]),
    ...(unit === NO_UNIT || units.has(unit)
      ? []
      : [`row "${symbol}" has the unknown unit "${unit}"`]),
  ];
}

const isResult = ([symbol]: readonly string[]): boolean => symbol?.startsWith('→') ?? false;

/** `H (height)` explains the argument `height`. */
const explained = ([symbol = '']: readonly string[]): string =>
  /\(([\p{L}_$][\p{L}\d_$]*)\)$/u.exec(symbol)?.[1] ?? symbol;

function argumentDefects(fn: CalcFunction, rows: readonly (readonly string[])[]): string[] {
  const given = rows.filter((row) => !isResult(row));
  const names = new Set(given.map(explained));
  const missing = fn.arguments.flatMap(({ explainedBy }) => {
    const lacking = explainedBy.map((set) => set.filter((name) => !names.has(name)));
    return lacking.some((set) => set.length === 0) ? [] : (lacking[0] ?? []);
  });
  const possible = new Set(fn.arguments.flatMap(({ explainedBy }) => explainedBy.flat()));
  const gone = given.filter((row) => explained(row) !== row[0] && !possible.has(explained(row)));
  return [
    ...missing.map((name) => `argument "${name}" has no row`),
    ...gone.map((row) => `row "${row[0] ?? ''}" explains no argument`),
    ...(rows.some(isResult) ? [] : ['has no result row (its symbol begins with →)']),
  ];
}

/** Ids of the sources a card names, each once. */
export const sourceIds = (card: FormulaCard): readonly string[] => [
  ...new Set(card.sources.map((source) => source.split(/\s/)[0] ?? '')),
];

/** Symbols that a card's table explains, results apart, as its formula writes them. */
export const symbolsOf = (card: FormulaCard): readonly string[] =>
  card.table
    .slice(1)
    .filter((row) => !isResult(row))
    .map(([symbol = '']) => symbol.replace(/\s*\(.*$/, ''));

function sourceDefects(sources: readonly string[], known: Known): string[] {
  if (sources.length === 0) return ['has no @source'];
  return sources.flatMap((source) => {
    const parts = /^(\S+)(?:\s+\(.*\))?$/.exec(source);
    if (!parts) return [`@source ${source}: what stands after the id belongs in brackets`];
    const id = parts[1] ?? '';
    return known.sources.has(id) ? [] : [`@source ${id} is not in the register`];
  });
}

const resultUnits = (rows: readonly (readonly string[])[]): string[] =>
  rows.filter(isResult).map((row) => row[2] ?? NO_UNIT);

function exampleDefects(
  example: string,
  units: readonly string[],
  scope: Readonly<Record<string, unknown>>,
): string[] {
  const cut = example.lastIndexOf('// ');
  if (cut < 0) return [`@example ${example}: prints no result (// 1.25 mm)`];
  const expression = example.slice(0, cut).trim();
  const printed = example.slice(cut + 2).trim();
  let actual: unknown;
  try {
    actual = evaluate(expression, scope);
  } catch (error) {
    return [`@example ${expression} throws: ${String(error)}`];
  }
  return disagreement(actual, printed, units).map((fault) => `@example ${expression}: ${fault}`);
}

function evaluate(expression: string, scope: Readonly<Record<string, unknown>>): unknown {
  const code = `'use strict'; return (${expression});`;
  const run = vm.compileFunction(code, Object.keys(scope)) as (...values: unknown[]) => unknown;
  return run(...Object.values(scope));
}

const NUMBER = /^([-−]?\d+(?:\.(\d+))?(?:e([-+]?\d+))?)(?:\s+(?!\()(\S+))?(?:\s+\(.*\))?$/i;

/** A number agrees to half a unit of its last printed digit; anything else exactly, as JSON. */
function disagreement(actual: unknown, printed: string, units: readonly string[]): string[] {
  const number = NUMBER.exec(printed);
  if (!number) return exactly(actual, printed);
  const [, digits = '', decimals = '', exponent = '0', unit] = number;
  const value = Number(digits.replace('−', '-'));
  const half = 0.5 * 10 ** (Number(exponent) - decimals.length);
  const hair = 1e-9 * half + 1e-12 * Math.abs(value);
  const agrees = typeof actual === 'number' && Math.abs(actual - value) <= half + hair;
  return [
    ...(agrees ? [] : [`gives ${JSON.stringify(actual)}, printed ${printed}`]),
    ...(unit === undefined || units.includes(unit) ? [] : [`no result is in ${unit}`]),
  ];
}

function exactly(actual: unknown, printed: string): string[] {
  let wanted: unknown;
  try {
    wanted = JSON.parse(printed);
  } catch {
    return [`cannot read the printed result ${printed}`];
  }
  const same = isDeepStrictEqual(actual, wanted);
  return same ? [] : [`gives ${JSON.stringify(actual)}, printed ${printed}`];
}
