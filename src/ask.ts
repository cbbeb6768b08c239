import { parseArgs } from 'node:util';
import { FLEET } from '../commands/index.ts';
import {
  answerJson,
  cardText,
  pictureLines,
  spoken,
  terminalCall,
  widthOf,
  writePictures,
} from './adapters/terminal/index.ts';
import { type Answer, openDesk, plainShop } from './desk/index.ts';
import { openRenderer } from './drawing/index.ts';
import { en } from './phrases/index.ts';

/** Exit statuses of `ask`: a card, a refusal, a call that makes no sense. */
const CARD = 0;
const REFUSAL = 1;
const MISUSE = 2;

const misuse = (sentence: string): never => {
  process.stderr.write(`${sentence}\n`);
  process.exit(MISUSE);
};

const argumentsOf = () => {
  try {
    return parseArgs({
      allowPositionals: true,
      options: {
        units: { type: 'string', default: 'in' },
        json: { type: 'boolean', default: false },
        phone: { type: 'boolean', default: false },
        pictures: { type: 'string' },
      },
    });
  } catch {
    return misuse(en.terminal.usage);
  }
};

const printed = (answer: Answer, json: boolean, phone: boolean): string =>
  json
    ? JSON.stringify(answerJson(answer, en))
    : cardText(spoken(answer, en), widthOf(process.stdout.columns, phone));

// A reader that goes away (`| head`) has read what it wanted.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  process.exit(error.code === 'EPIPE' ? CARD : MISUSE);
});

const { values, positionals } = argumentsOf();
const { units } = values;
if (units !== 'in' && units !== 'mm') misuse(en.terminal.unitsArgument);
const desk = openDesk(FLEET, plainShop(units === 'mm' ? 'mm' : 'in'));
const answer = await desk.answer(terminalCall(positionals.join(' '), 1));
/** Where the pictures were written, or that nothing but them is missing. */
const pictured = async (folder: string): Promise<string> => {
  // The line about it is all there is to say: nobody reads a log of one answer.
  const writing = { book: en, render: openRenderer(), onFault: () => undefined };
  const paths = await writePictures(answer, { folder, prefix: '' }, writing).catch(() => []);
  return pictureLines(answer, paths, en)
    .map((line) => `${line}\n`)
    .join('');
};

const written = (stream: NodeJS.WriteStream, text: string): Promise<void> =>
  new Promise((done) => {
    stream.write(text, () => {
      done();
    });
  });

await written(process.stdout, `${printed(answer, values.json, values.phone)}\n`);
if (values.pictures !== undefined)
  // What a program reads is the answer alone.
  await written(values.json ? process.stderr : process.stdout, await pictured(values.pictures));
process.exit(answer.kind === 'card' ? CARD : REFUSAL);
