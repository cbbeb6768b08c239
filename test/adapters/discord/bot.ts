/** The bot as it runs, with the real client and real records, against the local counterpart. */
import { FLEET } from '../../../commands/index.ts';
import { sketchesOf } from '../../../src/adapters/common/draw.ts';
import type { Log } from '../../../src/adapters/common/log.ts';
import type { Drawn } from '../../../src/adapters/common/pieces.ts';
import { type DiscordOptions, openDiscord, register } from '../../../src/adapters/discord/index.ts';
import { type Answer, type Desk, openRecordsDesk } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { openStore } from '../../../src/store/index.ts';
import { openPeople } from '../../platforms/discord/people.ts';
import { openPlatform, type Platform } from '../../platforms/discord/platform.ts';
import { bodyCheck } from '../../platforms/discord/schemas.ts';
import { APPLICATION, TOKEN } from '../../platforms/discord/world.ts';
import { newPlace, type TestPlace } from '../../support/places.ts';
import { START } from '../../support/records.ts';
import { until } from '../../support/until.ts';

const CHECK = bodyCheck();

export type Noted = {
  readonly what: string;
  readonly details: Readonly<Record<string, unknown>>;
};

/** The pictures of an answer with their words; the drawing itself is tested elsewhere. */
export const drawn = (answer: Answer): Promise<readonly Drawn[]> =>
  Promise.resolve(
    sketchesOf(answer, en).map(({ name, alt }) => ({
      name: `${name}.png`,
      bytes: new Uint8Array(64),
      alt,
    })),
  );

/** A platform with the bot's commands, and records: what is still there when the bot is not. */
export type Scene = { readonly platform: Platform; readonly place: TestPlace };

export const registerIn = (platform: Platform, fleet = FLEET) =>
  register({
    token: TOKEN,
    application: APPLICATION,
    guild: null,
    api: platform.api,
    dryRun: false,
    book: en,
    fleet,
    print: () => undefined,
  });

/** Before the bot has said what can be asked for. */
export const newScene = async (): Promise<Scene> => ({
  platform: await openPlatform(CHECK),
  place: await newPlace('sqlite'),
});

const openScene = async (): Promise<Scene> => {
  const scene = await newScene();
  await registerIn(scene.platform);
  return scene;
};

export type Wanted = Partial<DiscordOptions> & {
  readonly breakDesk?: (desk: Desk) => Desk;
  readonly scene?: Scene;
};

export const openBot = async ({
  breakDesk = (desk) => desk,
  scene: given,
  ...more
}: Wanted = {}) => {
  const scene = given ?? (await openScene());
  const { platform, place } = scene;
  const faults: Noted[] = [];
  const notes: Noted[] = [];
  const log: Log = {
    fault: (what, details) => void faults.push({ what, details }),
    note: (what, details) => void notes.push({ what, details }),
  };
  const store = await openStore(place);
  const desk = openRecordsDesk(FLEET, store, {
    platform: 'discord',
    program: 'test',
    now: () => START,
    onFault: (error) => log.fault('records', { error }),
  });
  let toBeShown = 0;
  const counting: Desk = {
    ...desk,
    answer: async (call) => {
      const answer = await desk.answer(call);
      if (answer.kind === 'card' && answer.card.pictures.length > 0) toBeShown += 1;
      return answer;
    },
  };
  const leave = async (): Promise<void> => {
    await store.close();
    await platform.stop();
    await place.remove();
  };
  const bot = await openDiscord({
    token: TOKEN,
    api: platform.api,
    desk: breakDesk(counting),
    book: en,
    log,
    draw: drawn,
    ...more,
  }).catch(async (error: unknown) => {
    await leave();
    throw error;
  });
  const { posted } = platform;
  return {
    scene,
    platform,
    bot,
    desk,
    people: openPeople(platform),
    faults,
    notes,
    /** The message that comes of something, and how it was acknowledged. */
    next: async <T>(act: () => Promise<T> | T) => {
      const before = posted.length;
      const acked = await act();
      await until(() => posted.length > before, 'a reply');
      const message = posted[before];
      if (message === undefined) throw new Error('no reply');
      return { acked, message };
    },
    /** Nothing more comes of what was answered: pictures follow their card. */
    quiet: async (): Promise<void> => {
      const shown = () => posted.filter(({ files }) => files.length > 0).length;
      await until(() => shown() >= toBeShown, 'the pictures');
      await new Promise((done) => setTimeout(done, 5));
    },
    /** No call for a while: whatever was still on its way, files among it, has come. */
    still: async (ms = 300): Promise<void> => {
      for (let seen = -1; seen !== platform.calls.length; ) {
        seen = platform.calls.length;
        await new Promise((done) => setTimeout(done, ms));
      }
    },
    /** The form that comes of something. */
    nextForm: async (act: () => Promise<unknown>) => {
      const before = platform.forms.length;
      await act();
      await until(() => platform.forms.length > before, 'a form');
      const form = platform.forms[before];
      if (form === undefined) throw new Error('no form');
      return form;
    },
    /** The bot ends; the platform and the records stay for another. */
    end: async (): Promise<void> => {
      await bot.stop();
      await store.close();
    },
    stop: async (): Promise<void> => {
      await bot.stop();
      await leave();
    },
  };
};
export type Bot = Awaited<ReturnType<typeof openBot>>;
