import { PassThrough } from 'node:stream';
import { FLEET } from '../../../commands/index.ts';
import { deliverBy, PHONE_WIDTH, runChannel } from '../../../src/adapters/terminal/index.ts';
import { openRecordsDesk } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { newRecords, START } from '../../support/records.ts';
import { adapterContract, type Opening, type Said } from '../contract/adapterContract.ts';

const CHANNEL = 'floor';
const THREAD = '3fa2';

/** What a phone's width broke into lines is read as one. */
const open: Opening = async (listen) => {
  const { store } = await newRecords('sqlite');
  const faults: string[] = [];
  const all: Said[] = [];
  const desk = listen(
    openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now: () => START }),
  );
  const shown = (text: string, thread: string | null): Said => ({
    text,
    channel: CHANNEL,
    thread,
    only: null,
    rings: [],
  });
  const deliver = deliverBy(en, (line) => {
    const [, thread = null] = /#floor\/([^\s:,.]+)/u.exec(line) ?? [];
    all.push(shown(line, thread));
    return Promise.resolve();
  });
  return {
    ask: async (words, { thread = false } = {}) => {
      const input = new PassThrough();
      const output = new PassThrough();
      const chunks: Buffer[] = [];
      output.on('data', (chunk: Buffer) => chunks.push(chunk));
      const where = thread ? `/in #${CHANNEL}/${THREAD}\n` : '';
      input.end(`${where}${words}\n`);
      await runChannel({
        desk,
        book: en,
        input,
        output,
        interactive: false,
        opening: [],
        pictures: null,
        width: () => PHONE_WIDTH,
        onFault: (error) => faults.push(String(error)),
      });
      const text = Buffer.concat(chunks).toString();
      const said = shown(text, thread ? THREAD : null);
      all.push(said);
      return [said];
    },
    deliver: (effect, delivering) => deliver(effect, { ...delivering, shop: 'terminal' }),
    place: `${CHANNEL}/`,
    channel: CHANNEL,
    thread: THREAD,
    said: () => all,
    pinned: () => 0,
    loseSends: () => undefined,
    faults: () => faults,
    complaints: () => [],
    stop: () => Promise.resolve(),
  };
};

adapterContract(
  'the terminal',
  {
    threads: true,
    privateReplies: false,
    pins: false,
    asksByForm: false,
    repeats: false,
    losesSends: false,
  },
  open,
);
