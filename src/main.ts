import { config as loadEnvironment } from 'dotenv';
import { FLEET } from '../commands/index.ts';
import { ChatFault, sentencesFor, startChats } from './chats.ts';
import { type Config, configOf } from './config.ts';
import { openDeliveries } from './deliveries.ts';
import { openRecordsDesk } from './desk/index.ts';
import { openRenderer } from './drawing/index.ts';
import { runLocalChannel } from './localChannel.ts';
import { openLog } from './log.ts';
import { en } from './phrases/index.ts';
import { recordsFault, recordsPlace } from './records.ts';
import { openQuestionReminders } from './reminders.ts';
import { openStore } from './store/index.ts';
import { startUpkeep } from './upkeep.ts';

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
  // Whoever stops it while it starts has it stop at once.
  let end = (code: number): void => process.exit(code);
  process.once('SIGINT', () => end(0));
  process.once('SIGTERM', () => end(0));
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
      render: openRenderer(),
      log,
      print: (line) => process.stdout.write(`${line}\n`),
      onEnded: (sentence) => {
        process.stderr.write(`${sentence}\n`);
        end(1);
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
  const reminders = openQuestionReminders(store, {
    now: Date.now,
    onQueued: deliveries.nudge,
    onFault,
  });
  reminders.start();
  const upkeep = startUpkeep(store, { now: Date.now, onFault });
  end = (code) => {
    reminders
      .stop()
      .then(() => upkeep.stop())
      .then(() => deliveries.stop())
      .then(() => running.stop())
      .then(() => store.close())
      .then(
        () => process.exit(code),
        () => process.exit(1),
      );
  };
};

loadEnvironment({ quiet: true });
const found = configOf(process.env);
if ('faults' in found) refuse(sentencesFor(en, found.faults));
else {
  const { config } = found;
  const isLocal = config.discord === null && config.slack === null;
  await (isLocal ? runLocalChannel(recordsPlace()) : chat(config)).catch((error: unknown) => {
    const sentence = error instanceof ChatFault ? error.message : recordsFault(error);
    if (sentence === null) throw error;
    refuse([sentence]);
  });
}
