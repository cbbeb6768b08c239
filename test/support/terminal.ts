/** The local channel as it runs from a pipe: lines go in, everything that is shown comes back. */
import { PassThrough } from 'node:stream';
import {
  deliverBy,
  PHONE_WIDTH,
  personId,
  runChannel,
  sentenceText,
  written,
} from '../../src/adapters/terminal/index.ts';
import type { Speaker } from '../../src/adapters/terminal/speaker.ts';
import { openDeliveries } from '../../src/deliveries.ts';
import { type Command, openRecordsDesk } from '../../src/desk/index.ts';
import { en } from '../../src/phrases/index.ts';
import { openQuestionReminders } from '../../src/reminders.ts';
import type { Store } from '../../src/store/index.ts';

export type Played = {
  readonly store: Store;
  readonly fleet: readonly Command[];
  readonly lines: readonly string[];
  readonly now?: () => number;
  readonly speaker?: Speaker;
  readonly files?: string;
};

/** Everything that is shown, after the opening. */
export const play = async (played: Played): Promise<string> => {
  const { store, fleet, lines, now = Date.now, speaker, files = null } = played;
  const input = new PassThrough();
  const output = new PassThrough();
  const said: Buffer[] = [];
  output.on('data', (chunk: Buffer) => said.push(chunk));
  const faults: unknown[] = [];
  const onFault = (fault: unknown): void => void faults.push(fault);
  const deliver = deliverBy(en, (line) => written(output, `${sentenceText(line, PHONE_WIDTH)}\n`));
  const terminal = { platform: 'terminal', shops: null, deliver };
  const { deliverDue } = openDeliveries(store, [terminal], { now, onFault, concurrency: 1 });
  const reminders = openQuestionReminders(store, { now, onQueued: () => undefined, onFault });
  input.end(lines.map((line) => `${line}\n`).join(''));
  await runChannel({
    desk: openRecordsDesk(fleet, store, {
      platform: 'terminal',
      program: 'test',
      now,
      outsideId: personId,
      onFault,
    }),
    book: en,
    input,
    output,
    interactive: false,
    opening: [],
    ...(speaker === undefined ? {} : { speaker }),
    pictures: null,
    files,
    width: () => PHONE_WIDTH,
    onFault,
    settle: async () => {
      await reminders.remindDue();
      return await deliverDue();
    },
  });
  if (faults.length > 0) throw new Error(`faults: ${faults.map(String).join('\n')}`);
  return Buffer.concat(said).toString();
};
