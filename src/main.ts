import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { config as loadEnvironment } from 'dotenv';
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
import { ChatFault, sentencesFor, startChats } from './chats.ts';
import { type Config, configOf } from './config.ts';
import { openDeliveries } from './deliveries.ts';
import { openRecordsDesk } from './desk/index.ts';
import { openRenderer } from './drawing/index.ts';
import { openLog } from './log.ts';
import { en } from './phrases/index.ts';
import { recordsFault, recordsPlace } from './records.ts';
import { openStore } from './store/index.ts';

const { values } = parseArgs({
  options: { phone: { type: 'boolean', default: false }, as: { type: 'string' } },
});

// A reader that goes away (`| head`) is the end of the conversation, not a fault.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  process.exit(error.code === 'EPIPE' ? 0 : 1);
});

const { WHOLETOOTH_PICTURES: asked } = process.env;
const interactive = process.stdin.isTTY;
// A run that is fed from a file writes no files, unless it is asked to.
const folder =
  asked !== undefined && asked !== ''
    ? asked
    : interactive
      ? join(tmpdir(), `wholetooth-${String(process.pid)}`)
      : null;
const render = openRenderer();

/** Says what is wrong and ends with an exit code that a supervisor of processes understands. */
const refuse = (sentences: readonly string[]): never => {
  process.stderr.write(`${sentences.join('\n')}\n`);
  process.exit(1);
};

/** Answers on the chat platforms until it is told to stop. */
const chat = async (config: Config): Promise<void> => {
  const log = openLog((line) => process.stderr.write(line));
  const store = await openStore(recordsPlace());
  const onFault = (error: unknown): void => log.fault('records', { error });
  // Nothing is delivered before there is a platform to deliver it to.
  let nudge = (): void => undefined;
  let end = (): void => process.exit(1);
  const running = await startChats(
    {
      book: en,
      deskFor: (platform) =>
        openRecordsDesk(FLEET, store, {
          platform,
          program: process.env['npm_package_version'] ?? '',
          now: Date.now,
          onAnswered: () => nudge(),
          onFault,
        }),
      render,
      log,
      print: (line) => process.stdout.write(`${line}\n`),
      onEnded: (sentence) => {
        process.stderr.write(`${sentence}\n`);
        end();
      },
    },
    config,
  ).catch(async (error: unknown) => {
    await store.close();
    throw error;
  });
  const deliveries = openDeliveries(store, running.deliverers, { now: Date.now, onFault });
  nudge = deliveries.nudge;
  deliveries.start();
  const stop = (code: number): void => {
    deliveries
      .stop()
      .then(() => running.stop())
      .then(() => store.close())
      .then(
        () => process.exit(code),
        () => process.exit(1),
      );
  };
  end = () => stop(1);
  process.once('SIGINT', () => stop(0));
  process.once('SIGTERM', () => stop(0));
};

/** The local channel is a shop of its own, with records like any other. */
const terminal = async (): Promise<void> => {
  const store = await openStore(recordsPlace());
  const width = (): number => widthOf(process.stdout.columns, values.phone);
  const onFault = (error: unknown): void => {
    process.stderr.write(
      `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
  };
  const deliver = deliverBy(en, (line) =>
    written(process.stdout, `${sentenceText(line, width())}\n`),
  );
  // One at a time: what happens is told in the order in which it was decided.
  const deliveries = openDeliveries(store, [{ platform: 'terminal', shops: null, deliver }], {
    now: Date.now,
    onFault,
    concurrency: 1,
  });
  // What is due later comes up by itself while somebody is there to read it.
  if (interactive) deliveries.start();
  await runChannel({
    desk: openRecordsDesk(FLEET, store, {
      platform: 'terminal',
      program: process.env['npm_package_version'] ?? '',
      now: Date.now,
      outsideId: personId,
      onFault,
    }),
    book: en,
    input: process.stdin,
    output: process.stdout,
    interactive,
    ...(values.as === undefined ? {} : { speaker: speakerCalled(values.as) }),
    pictures:
      folder === null
        ? null
        : (answer, line) =>
            writePictures(
              answer,
              { folder, prefix: `${String(line)}-` },
              { book: en, render, onFault },
            ),
    width,
    onFault,
    settle: deliveries.deliverDue,
  });
  await deliveries.stop();
  await store.close();
};

loadEnvironment({ quiet: true });
const found = configOf(process.env);
if ('faults' in found) refuse(sentencesFor(en, found.faults));
else {
  const { config } = found;
  const isLocal = config.discord === null && config.slack === null;
  await (isLocal ? terminal() : chat(config)).catch((error: unknown) => {
    const sentence = error instanceof ChatFault ? error.message : recordsFault(error);
    if (sentence === null) throw error;
    refuse([sentence]);
  });
}
