import { pino } from 'pino';
import type { Log } from './adapters/common/log.ts';

/** Tokens and addresses that carry one, wherever they stand in a text. */
const SECRET =
  /\bxox[a-z]-[\w-]+|\bxapp-[\w-]+|\b[\w-]{23,28}\.[\w-]{6}\.[\w-]{27,}|\b(?:https?|wss?|postgres(?:ql)?):\/\/\S+/gu;

const scrubbed = (text: string): string => text.replaceAll(SECRET, '…');

/** Of an error only its name and its way, never what it carries: that may hold a whole request. */
const plain = (value: unknown): unknown => {
  if (typeof value === 'string') return scrubbed(value);
  if (value instanceof Error)
    return { name: value.name, stack: scrubbed(value.stack ?? value.message) };
  return typeof value === 'object' && value !== null ? '…' : value;
};

const plainly = (details: Readonly<Record<string, unknown>>): Record<string, unknown> =>
  Object.fromEntries(Object.entries(details).map(([name, value]) => [name, plain(value)]));

/** One line of JSON for each thing that went wrong, and nothing secret in it. */
export const openLog = (write: (line: string) => void): Log => {
  const logger = pino({ base: null }, { write });
  return {
    fault: (what, details) => logger.error(plainly(details), what),
    note: (what, details) => logger.info(plainly(details), what),
  };
};
