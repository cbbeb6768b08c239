/** A bot in a process of its own, so that its event loop can be watched: this one, or a bare one. */
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { Client, Events, GatewayIntentBits, InteractionResponseType, Routes } from 'discord.js';
import { FLEET } from '../../commands/index.ts';
import { openDiscord } from '../../src/adapters/discord/index.ts';
import { openRecordsDesk } from '../../src/desk/index.ts';
import { en } from '../../src/phrases/index.ts';
import { openStore } from '../../src/store/index.ts';
import { TOKEN } from '../platforms/discord/world.ts';

export type Told = {
  readonly api: string;
  /** Where this one keeps its records; the bare one keeps nothing and says this. */
  readonly bot: { readonly file: string } | { readonly says: unknown };
};

const RESOLUTION_MS = 1;

const ours = async (api: string, file: string): Promise<void> => {
  const store = await openStore({ engine: 'sqlite', file });
  await openDiscord({
    token: TOKEN,
    api,
    desk: openRecordsDesk(FLEET, store, { platform: 'discord', program: 'bench', now: Date.now }),
    book: en,
    log: { fault: () => undefined, note: () => undefined },
  });
};

/** As little as a bot of this library can do: say what it always says. */
const bare = async (api: string, data: unknown): Promise<void> => {
  const client = new Client({
    intents: [GatewayIntentBits.Guilds],
    shardCount: 1,
    rest: { api, retries: 0 },
  });
  client.on(Events.InteractionCreate, ({ id, token }) => {
    const body = { type: InteractionResponseType.ChannelMessageWithSource, data };
    void client.rest.post(Routes.interactionCallback(id, token), { body, auth: false });
  });
  const ready = new Promise((done) => client.once(Events.ClientReady, done));
  await client.login(TOKEN);
  await ready;
};

const { api, bot } = JSON.parse(process.argv[2] ?? '') as Told;
const loop = monitorEventLoopDelay({ resolution: RESOLUTION_MS });
// Told to begin, it watches; told to end, it says for how long nothing else had its turn.
process.on('message', (said) => {
  if (said === 'begin') {
    loop.reset();
    loop.enable();
    process.send?.('watching');
    return;
  }
  loop.disable();
  process.send?.({ blockedMs: loop.max / 1e6 });
});
await ('file' in bot ? ours(api, bot.file) : bare(api, bot.says));
process.send?.('ready');
