/**
 * Names of what is posted because of a question. Each is made from the question's code and what
 * happened to it, never from chance: who does the same thing twice queues it once.
 */
export const KEY_START = 'question ';

const keyOf = (code: string, rest: string): string => `${KEY_START}${code} ${rest}`;

export const postKey = (code: string): string => keyOf(code, 'post');
export const threadKey = (code: string): string => keyOf(code, 'thread');
export const answerKey = (code: string, number: number): string =>
  keyOf(code, `answer ${String(number)}`);
export const reopenKey = (code: string, round: number): string =>
  keyOf(code, `reopen ${String(round)}`);
export const reminderKey = (code: string, round: number, number: number): string =>
  keyOf(code, `again ${String(round)}.${String(number)}`);
/** The posted card as it stands from a version on; the first version is the post itself. */
export const shownKey = (code: string, version: number): string =>
  version <= 1 ? postKey(code) : keyOf(code, `shown ${String(version)}`);

/** The code of the question that a key is about. */
export const codeInKey = (key: string): string | null =>
  key.startsWith(KEY_START) ? (key.slice(KEY_START.length).split(' ')[0] ?? null) : null;
