import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { FLEET } from '../commands/index.ts';
import {
  deliverBy,
  personId,
  runChannel,
  sentenceText,
  speakerCalled,
  widthOf,
  writePictures,
  written,
} from './adapters/terminal/index.ts';
import { openDeliveries } from './deliveries.ts';
import { openRecordsDesk } from './desk/index.ts';
import { openRenderer } from './drawing/index.ts';
import { en } from './phrases/index.ts';
import { openQuestionReminders } from './reminders.ts';
import { openStore, type Store, type StorePlace } from './store/index.ts';

const onFault = (error: unknown): void => {
  process.stderr.write(
    `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
};

/** Where a run writes to; one that is fed from a file writes nothing, unless it is asked to. */
const folderFor = (asked: string | undefined, interactive: boolean): string | null => {
  if (asked !== undefined && asked !== '') return asked;
  return interactive ? join(tmpdir(), `wholetooth-${String(process.pid)}`) : null;
};

/** The desk of the local channel, a shop of its own with records like any other. */
export const localDesk = (store: Store, now: () => number) =>
  openRecordsDesk(FLEET, store, {
    platform: 'terminal',
    program: process.env['npm_package_version'] ?? '',
    now,
    outsideId: personId,
    onFault,
  });

/** Takes effects to the local channel, where each is a line. */
export const localDeliveries = (
  store: Store,
  now: () => number,
  print: (line: string) => Promise<void>,
) => {
  const terminal = { platform: 'terminal', shops: null, deliver: deliverBy(en, print) };
  // One at a time: what happens is told in the order in which it was decided.
  return openDeliveries(store, [terminal], { now, onFault, concurrency: 1 });
};

/** Answers in this terminal, or what comes from a file, until the input ends. */
export const runLocalChannel = async (
  place: StorePlace,
  begin: { readonly as?: string; readonly opening?: readonly string[] } = {},
): Promise<void> => {
  const { values } = parseArgs({
    options: { phone: { type: 'boolean', default: false }, as: { type: 'string' } },
    allowPositionals: true,
  });
  // A reader that goes away (`| head`) is the end of the conversation, not a fault.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    process.exit(error.code === 'EPIPE' ? 0 : 1);
  });
  const interactive = process.stdin.isTTY;
  const render = openRenderer();
  const store = await openStore(place);
  const width = (): number => widthOf(process.stdout.columns, values.phone);
  const deliveries = localDeliveries(store, Date.now, (line) =>
    written(process.stdout, `${sentenceText(line, width())}\n`),
  );
  // What is due later comes up by itself while somebody is there to read it.
  const reminders = openQuestionReminders(store, {
    now: Date.now,
    onQueued: deliveries.nudge,
    onFault,
  });
  if (interactive) {
    deliveries.start();
    reminders.start();
  }
  const { WHOLETOOTH_PICTURES: pictures, WHOLETOOTH_FILES: files } = process.env;
  const folder = folderFor(pictures, interactive);
  const as = values.as ?? begin.as;
  await runChannel({
    desk: localDesk(store, Date.now),
    book: en,
    input: process.stdin,
    output: process.stdout,
    interactive,
    opening: begin.opening ?? en.terminal.opening,
    ...(as === undefined ? {} : { speaker: speakerCalled(as) }),
    pictures:
      folder === null
        ? null
        : (answer, line) =>
            writePictures(
              answer,
              { folder, prefix: `${String(line)}-` },
              { book: en, render, onFault },
            ),
    files: folderFor(files, interactive),
    width,
    onFault,
    settle: async () => {
      await reminders.remindDue();
      return await deliveries.deliverDue();
    },
  });
  await reminders.stop();
  await deliveries.stop();
  await store.close();
};
