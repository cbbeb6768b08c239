import { parseArgs } from 'node:util';
import { FLEET } from '../commands/index.ts';
import { runChannel, widthOf } from './adapters/terminal/index.ts';
import { openDesk, plainShop } from './desk/index.ts';
import { en } from './phrases/index.ts';

const { values } = parseArgs({
  options: { phone: { type: 'boolean', default: false }, units: { type: 'string', default: 'in' } },
});

// A reader that goes away (`| head`) is the end of the conversation, not a fault.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  process.exit(error.code === 'EPIPE' ? 0 : 1);
});

await runChannel({
  desk: openDesk(FLEET, plainShop(values.units === 'mm' ? 'mm' : 'in')),
  book: en,
  input: process.stdin,
  output: process.stdout,
  interactive: process.stdin.isTTY,
  width: () => widthOf(process.stdout.columns, values.phone),
  onFault: (error) => {
    process.stderr.write(
      `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    );
  },
});
