import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { FLEET } from '../commands/index.ts';
import { runChannel, widthOf, writePictures } from './adapters/terminal/index.ts';
import { openDesk, plainShop } from './desk/index.ts';
import { openRenderer } from './drawing/index.ts';
import { en } from './phrases/index.ts';

const { values } = parseArgs({
  options: { phone: { type: 'boolean', default: false }, units: { type: 'string', default: 'in' } },
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

await runChannel({
  desk: openDesk(FLEET, plainShop(values.units === 'mm' ? 'mm' : 'in')),
  book: en,
  input: process.stdin,
  output: process.stdout,
  interactive,
  pictures:
    folder === null
      ? null
      : (answer, line) =>
          writePictures(answer, { folder, prefix: `${String(line)}-` }, { book: en, render }),
  width: () => widthOf(process.stdout.columns, values.phone),
  onFault: (error) => {
    process.stderr.write(
      `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
  },
});
