/** A line as its options: what a person would fill in instead of typing it. */
import { FLEET } from '../../../commands/index.ts';
import { type Command, route } from '../../../src/desk/index.ts';
import {
  type AnyParameter,
  MATERIAL_PHRASES,
  type Names,
  readLine,
  type Span,
  spanOf,
  tokensOf,
  vocabularyOf,
} from '../../../src/words/index.ts';
import type { People, Value } from '../../platforms/discord/people.ts';

type Said = { readonly value: unknown; readonly text: string };

/** What the examples call the shop's own things. */
const NAMES: Names = { wheels: ['Old Faithful'], machines: ['Big lathe'] };

const textOf = (line: string, spans: readonly Span[]): string =>
  spans.map(({ start, end }) => line.slice(start, end)).join(' ');

/** Every parameter that a line says, in the words it says it with. */
const saidIn = (command: Command, line: string): ReadonlyMap<string, Said> => {
  const way = route(line, FLEET);
  if (!('command' in way) || way.command !== command) throw new Error(`not for it: ${line}`);
  const cursor = { text: line, tokens: tokensOf(line), at: way.skip, units: 'in' } as const;
  const first = command.lead?.read(cursor, NAMES) ?? null;
  const lead = first !== null && 'value' in first ? first : null;
  const vocabulary = vocabularyOf(command.parameters, MATERIAL_PHRASES);
  const result = readLine(line, vocabulary, 'in', NAMES, way.skip + (lead?.used ?? 0));
  if ('refusal' in result) throw new Error(`refused: ${line} ${JSON.stringify(result.refusal)}`);
  const { values, spans } = result.read;
  const said = [...values].map(
    ([name, value]) => [name, { value, text: textOf(line, spans.get(name) ?? []) }] as const,
  );
  if (command.lead === undefined || lead === null) return new Map(said);
  const text = textOf(line, [spanOf(cursor, lead.used)]);
  return new Map([[command.lead.name, { value: lead.value, text }], ...said]);
};

type Option = ReturnType<People['optionsOf']>[number];
const BOOLEAN = 5;
const WHOLE = 4;

/** What the option of a parameter is filled with. */
const valueFor = (option: Option, parameter: AnyParameter, { value, text }: Said): Value => {
  if (option.type === BOOLEAN) return true;
  if (option.type === WHOLE) return Number(/\d+/u.exec(text)?.[0]);
  if (option.choices !== undefined) {
    const key = JSON.stringify(value);
    const phrase = parameter.values?.find(([, each]) => JSON.stringify(each) === key)?.[0];
    if (phrase === undefined) throw new Error(`no choice for ${parameter.name}: ${text}`);
    return phrase;
  }
  return parameter.text === true && typeof value === 'string' ? value : text;
};

const optionName = (name: string): string =>
  name.replaceAll(/[A-Z]/gu, (letter) => `-${letter.toLowerCase()}`);

/** The options that say what a line says; what has no option of its own is said in the words. */
export const optionsFor = (
  people: People,
  command: Command,
  line: string,
): Readonly<Record<string, Value>> => {
  const options = people.optionsOf(command.path);
  const filled: Record<string, Value> = {};
  const left: string[] = [];
  for (const [name, said] of saidIn(command, line)) {
    const option = options.find((each) => each.name === optionName(name));
    const parameter = command.parameters.find((each) => each.name === name);
    if (option === undefined || parameter === undefined) left.push(said.text);
    else filled[option.name] = valueFor(option, parameter, said);
  }
  return left.length === 0 ? filled : { ...filled, words: left.join(' ') };
};

/** A line without the name of its command. */
export const restOf = (line: string): string => {
  const way = route(line, FLEET);
  const first = 'command' in way ? tokensOf(line)[way.skip] : undefined;
  return first === undefined ? '' : line.slice(first.start);
};
