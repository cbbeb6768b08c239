import type { Command } from '../../desk/index.ts';

export type Parameter = Command['parameters'][number];

/** For what only names something: a whole text never goes through here. */
export const shortened = (text: string, most: number): string =>
  text.length <= most ? text : `${text.slice(0, most - 1)}…`;

/** Counts are typed as numbers; everything else may carry a unit and is typed as text. */
const WHOLE: ReadonlySet<string> = new Set(['teeth', 'turns', 'pieces']);
export const isWhole = (parameter: Parameter): boolean =>
  parameter.measures?.some((measure) => WHOLE.has(measure)) === true;

/** Only said or not said. */
export const isSwitch = (parameter: Parameter): boolean =>
  parameter.closed === true && (parameter.values ?? []).every(([, value]) => value === true);

/** One phrase for each thing that can be said, or null where that is no closed list. */
export const phrasesOf = (parameter: Parameter): readonly string[] | null => {
  if (parameter.closed !== true) return null;
  const phrases = new Map<string, string>();
  for (const [phrase, value] of parameter.values ?? []) {
    const key = JSON.stringify(value);
    if (!phrases.has(key)) phrases.set(key, phrase);
  }
  return [...phrases.values()];
};

/** Those that come first where a platform cannot show all; the records stand in their own order. */
export const byWeight = ({ foremost, parameters }: Command): readonly Parameter[] => [
  ...foremost.flatMap((name) => parameters.filter((each) => each.name === name)),
  ...parameters.filter((each) => !foremost.includes(each.name)),
];
