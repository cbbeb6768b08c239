import { setImmediate as nextTurn } from 'node:timers/promises';
import PQueue from 'p-queue';
import type { Desk } from '../../desk/index.ts';

/** Answers worked on side by side: enough that records far away are not waited for one by one. Judgement. */
const AT_ONCE = 4;

/**
 * A desk that lets everything else have its turn between two answers. Without that, two hundred
 * who ask at once keep the program from hearing the next one until the last of them is answered.
 */
export const inTurns = (desk: Desk, atOnce = AT_ONCE): Desk => {
  const queue = new PQueue({ concurrency: atOnce });
  return {
    ...desk,
    answer: (call) =>
      queue.add(async () => {
        await nextTurn();
        return await desk.answer(call);
      }),
  };
};
