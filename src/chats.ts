import { openDraw } from './adapters/common/draw.ts';
import type { Log } from './adapters/common/log.ts';
import { TokenRefused as DiscordTokenRefused, openDiscord } from './adapters/discord/index.ts';
import { openSlack, TokenRefused as SlackTokenRefused } from './adapters/slack/index.ts';
import type { Config, ConfigFault } from './config.ts';
import type { Deliverer } from './deliveries.ts';
import type { Desk } from './desk/index.ts';
import type { Renderer } from './drawing/index.ts';
import type { Book } from './phrases/index.ts';

export type Chats = {
  readonly book: Book;
  /** Each platform has shops of its own. */
  readonly deskFor: (platform: 'discord' | 'slack') => Desk;
  readonly render: Renderer;
  readonly log: Log;
  readonly print: (line: string) => void;
  /** A platform is gone for good, in a sentence; nothing brings it back but another start. */
  readonly onEnded: (sentence: string) => void;
};

type Started = { readonly stop: () => Promise<void> };
export type Running = Started & {
  /** What takes effects to the platforms that are running. */
  readonly deliverers: readonly Deliverer[];
};

/** A platform that could not be started, in a sentence. */
export class ChatFault extends Error {}

/** The sentences for what is wrong with the environment. */
export const sentencesFor = (book: Book, faults: readonly ConfigFault[]): readonly string[] =>
  faults.map(({ variable, fault }) => book.config[fault](variable));

const nameOf = (error: unknown): string => (error instanceof Error ? error.name : 'unknown fault');

const sentenceOf = (book: Book, platform: string, error: unknown): string => {
  if (error instanceof SlackTokenRefused) return book.chat.tokenWrong(error.variable);
  if (error instanceof DiscordTokenRefused) return book.chat.tokenWrong('DISCORD_TOKEN');
  return book.chat.cannotStart(platform, nameOf(error));
};

const started = async <T extends Started>(
  { book, print }: Chats,
  platform: string,
  opening: Promise<T>,
  shopsOf: (running: T) => number,
): Promise<T> => {
  try {
    const running = await opening;
    print(book.chat.connected(platform, shopsOf(running)));
    return running;
  } catch (error) {
    throw new ChatFault(sentenceOf(book, platform, error));
  }
};

/** Starts every platform that the environment asks for; none stays up where one cannot start. */
export const startChats = async (chats: Chats, { discord, slack }: Config): Promise<Running> => {
  const { book, deskFor, render, log } = chats;
  const draw = openDraw(book, render, (error) => log.fault('drawing', { error }));
  const running: Started[] = [];
  const deliverers: Deliverer[] = [];
  const stop = async (): Promise<void> => {
    await Promise.allSettled(running.map((each) => each.stop()));
  };
  try {
    if (slack !== null) {
      const desk = deskFor('slack');
      const opening = openSlack({ ...slack, desk, book, log, draw });
      const opened = await started(chats, 'Slack', opening, ({ teams }) => teams.length);
      running.push(opened);
      deliverers.push({ platform: 'slack', shops: opened.teams, deliver: opened.deliver });
    }
    if (discord !== null) {
      const { token, api } = discord;
      const desk = deskFor('discord');
      const onEnded = (error: Error): void => {
        chats.onEnded(
          error instanceof DiscordTokenRefused
            ? sentenceOf(book, 'Discord', error)
            : book.chat.connectionEnded('Discord'),
        );
      };
      const opening = openDiscord({ token, api, desk, book, log, draw, onEnded });
      const opened = await started(chats, 'Discord', opening, ({ shops }) => shops);
      running.push(opened);
      deliverers.push({ platform: 'discord', shops: null, deliver: opened.deliver });
    }
  } catch (error) {
    await stop();
    throw error;
  }
  return { deliverers, stop };
};
