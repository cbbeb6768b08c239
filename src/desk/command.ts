import { z } from 'zod';
import type { Card } from '../card/index.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import type {
  AnyParameter,
  Cursor,
  Names,
  Parameter,
  ReadLine,
  ShopUnits,
} from '../words/index.ts';
import type { Attached, Place } from './call.ts';
import type { Effect } from './effect.ts';
import type { Role } from './role.ts';
import type { Visit } from './visit.ts';

/** What a command knows besides what was typed. */
export type Context = {
  /** The line as typed, for building the lines of buttons. */
  readonly text: string;
  readonly read: ReadLine;
  /** The shop's unit: what bare numbers are in and what is shown first. */
  readonly units: ShopUnits;
  /** Every command, for the help. */
  readonly fleet: readonly Command[];
  /** The last set-up, check, plan or trouble this person was answered in this place. */
  readonly last: Card | null;
  /** The shop's records, open for one change; null where nothing is kept. */
  readonly visit: Visit | null;
  readonly place: Place;
  readonly attached: readonly Attached[];
  /** What another line would be answered now. Nothing of it is kept. */
  readonly again: (line: string) => Promise<Reply>;
};

/** What a card was worked out from: kept with it, so that it can be found and held against today. */
export type About = {
  readonly request: unknown;
  /** The line it was worked out from, where that is not the one that was typed. */
  readonly words?: string;
  /** Ids of what the shop's own lists gave to it. */
  readonly wheel: string | null;
  readonly machine: string | null;
  readonly material: string | null;
  /** The row of the table of materials. */
  readonly base: string | null;
};

export type Reply =
  | {
      readonly card: Card;
      readonly effects: readonly Effect[];
      readonly about?: About;
      readonly files?: readonly string[];
    }
  | { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };

/** Reads what stands right behind a command's name; null where nothing of its kind stands there. */
export type Lead = (
  cursor: Cursor,
  names: Names,
) =>
  | { readonly value: unknown; readonly used: number }
  | { readonly refusal: Refusal; readonly choices: readonly Suggestion[] }
  | null;

/** What a person can ask for. One record feeds words, options, forms, help and manifest. */
export type Command = {
  /** `['knurl', 'setup']`. */
  readonly path: readonly [root: string, ...verbs: string[]];
  /** A line that shows it at work; parsed and run by a test. */
  readonly examples: readonly string[];
  readonly parameters: readonly AnyParameter[];
  /** The parameter that is read first and only there, before all others; words of its own may be theirs. */
  readonly lead?: { readonly name: string; readonly read: Lead };
  /** Names of those to show first where a platform cannot show them all. */
  readonly foremost: readonly string[];
  /** It is given a file; a platform asks for one. */
  readonly takesFile?: boolean;
  /** Everyone of this role and above may. */
  readonly allowed: Role;
  readonly run: (context: Context, given: unknown) => Reply | Promise<Reply>;
};

/** A field of a command's parameters: its type for the program, its words for people. */
export const said = <T>(parameter: Parameter<T>) =>
  z
    .custom<T>((value) => value !== undefined)
    .optional()
    .meta({ parameter });

/** The words of a field. */
export const parameterOf = (field: z.core.$ZodType): AnyParameter => {
  const parameter = z.globalRegistry.get(field)?.['parameter'];
  if (parameter === undefined) throw new Error('a parameter without words');
  return parameter as AnyParameter;
};

/** A command whose `run` gets its parameters typed. */
export const defineCommand = <S extends z.ZodRawShape>(definition: {
  readonly path: Command['path'];
  readonly examples: readonly string[];
  readonly parameters: z.ZodObject<S>;
  readonly foremost?: readonly (keyof S & string)[];
  readonly lead?: { readonly name: keyof S & string; readonly read: Lead };
  readonly takesFile?: boolean;
  readonly allowed: Role;
  readonly run: (context: Context, given: z.infer<z.ZodObject<S>>) => Reply | Promise<Reply>;
}): Command => ({
  path: definition.path,
  examples: definition.examples,
  parameters: Object.values(definition.parameters.shape).map(parameterOf),
  foremost: definition.foremost ?? [],
  ...(definition.lead === undefined ? {} : { lead: definition.lead }),
  ...(definition.takesFile === true ? { takesFile: true } : {}),
  allowed: definition.allowed,
  run: (context, given) => definition.run(context, definition.parameters.parse(given)),
});

export const cardReply = (card: Card, effects: readonly Effect[] = [], about?: About): Reply =>
  about === undefined ? { card, effects } : { card, effects, about };
export const refuse = (refusal: Refusal, choices: readonly Suggestion[] = []): Reply => ({
  refusal,
  choices,
});
