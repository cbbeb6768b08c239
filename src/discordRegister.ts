import { parseArgs } from 'node:util';
import { config as loadEnvironment } from 'dotenv';
import { FLEET } from '../commands/index.ts';
import { type NotRegistered, register } from './adapters/discord/index.ts';
import { sentencesFor } from './chats.ts';
import { configOf } from './config.ts';
import { en } from './phrases/index.ts';

const { values } = parseArgs({ options: { 'dry-run': { type: 'boolean', default: false } } });

const print = (line: string): void => {
  process.stdout.write(`${line}\n`);
};

const refuse = (sentences: readonly string[]): void => {
  process.stderr.write(`${sentences.join('\n')}\n`);
  process.exitCode = 1;
};

const sentenceFor = ({ wrong, fault }: NotRegistered): string => {
  const { tokenWrong, registration } = en.chat;
  if (wrong === 'DISCORD_TOKEN') return tokenWrong(wrong);
  if (wrong === 'DISCORD_TEST_GUILD') return registration.notMember;
  return wrong === null ? registration.failed(fault) : en.config.malformed(wrong);
};

loadEnvironment({ quiet: true });
const found = configOf(process.env);
if ('faults' in found) refuse(sentencesFor(en, found.faults));
else if (found.config.discord === null)
  refuse(
    sentencesFor(en, [
      { variable: 'DISCORD_TOKEN', fault: 'missing' },
      { variable: 'DISCORD_APPLICATION_ID', fault: 'missing' },
    ]),
  );
else {
  const { token, application, testGuild: guild, api } = found.config.discord;
  const result = await register({
    token,
    application,
    guild,
    api,
    dryRun: values['dry-run'],
    book: en,
    fleet: FLEET,
    print,
  });
  if ('fault' in result) refuse([sentenceFor(result)]);
}
