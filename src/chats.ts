import { openDraw } from './adapters/common/draw.ts';
import type { Log } from './adapters/common/log.ts';
import { TokenRefused as DiscordTokenRefused, openDiscord } from './adapters/discord/index.ts';
import { openSlack, TokenRefused as SlackTokenRefused } from './adapters/slack/index.ts';
import type { Config, ConfigFault } from './config.ts';
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
};

export type Running = { readonly stop: () => Promise<void> };

/** A platform that could not be started, in a sentence. */
export class ChatFault extends Error {}

/** The sentences for what is wrong with the environment. */
export const sentencesFor = (book: Book, faults: readonly ConfigFault[]): readonly string[] =>
  faults.map(({ variable, fault }) => book.config[fault](variable));

const nameOf = (error: unknown): string => (error instanceof Error ? error.name : 'unknown fault');

const started = async <T extends Running & { readonly shops: number }>(
  { book, print }: Chats,
  platform: string,
  opening: Promise<T>,
): Promise<T> => {
  try {
    const running = await opening;
    print(book.chat.connected(platform, running.shops));
    return running;
  } catch (error) {
    if (error instanceof SlackTokenRefused)
      throw new ChatFault(book.chat.tokenWrong(error.variable));
    if (error instanceof DiscordTokenRefused)
      throw new ChatFault(book.chat.tokenWrong('DISCORD_TOKEN'));
    throw new ChatFault(book.chat.cannotStart(platform, nameOf(error)));
  }
};

/** Starts every platform that the environment asks for; none stays up where one cannot start. */
export const startChats = async (chats: Chats, { discord, slack }: Config): Promise<Running> => {
  const { book, deskFor, render, log } = chats;
  const draw = openDraw(book, render, (error) => log.fault('drawing', { error }));
  const running: Running[] = [];
  const stop = async (): Promise<void> => {
    await Promise.allSettled(running.map((each) => each.stop()));
  };
  try {
    if (slack !== null) {
      const desk = deskFor('slack');
      running.push(await started(chats, 'Slack', openSlack({ ...slack, desk, book, log, draw })));
    }
    if (discord !== null) {
      const { token, api } = discord;
      const desk = deskFor('discord');
      running.push(
        await started(chats, 'Discord', openDiscord({ token, api, desk, book, log, draw })),
      );
    }
  } catch (error) {
    await stop();
    throw error;
  }
  return { stop };
};
