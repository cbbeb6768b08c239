import { FLEET } from '../commands/index.ts';
import { manifestFor } from './adapters/slack/index.ts';
import { en } from './phrases/index.ts';

const [url] = process.argv.slice(2);
process.stdout.write(`${JSON.stringify(manifestFor(en, FLEET, url ?? null), null, 2)}\n`);
