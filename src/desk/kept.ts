import type { Answer } from './answer.ts';
import type { Call } from './call.ts';

/**
 * Answers as they were given, by the interaction that asked for them. A button carries only that
 * name and a number: what it sends stands here.
 */
export type KeptAnswers = {
  readonly keep: (call: Call, answer: Answer) => Promise<void> | void;
  readonly recall: (call: Pick<Call, 'shop'>, of: string) => Promise<Answer | null> | Answer | null;
};

/** Most answers kept by a process that has no records. Judgement. */
const MOST = 1000;

/** For a channel that lives no longer than its process. */
export const keptInProcess = (): KeptAnswers => {
  const answers = new Map<string, Answer>();
  return {
    keep: (call, answer) => {
      answers.set(call.interactionId, answer);
      const [oldest] = answers.keys();
      if (answers.size > MOST && oldest !== undefined) answers.delete(oldest);
    },
    recall: (_call, of) => answers.get(of) ?? null,
  };
};
