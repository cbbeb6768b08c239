import { z } from 'zod';
import { line, row } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  said,
} from '../../src/desk/index.ts';
import {
  changeSetting,
  MINUTES_OF_DAY,
  type QuietHours,
  type SettingName,
  type Settings,
  settingsOf,
} from '../../src/shop/index.ts';
import {
  numberOfKind,
  plainText,
  type Reader,
  textOf,
  vocabularyOf,
} from '../../src/words/index.ts';
import { reviewMonths } from '../knurl/standardFields.ts';
import { settingFacts } from './facts.ts';
import { recordsOf } from './named.ts';
import { refused, shopCard, visiting } from './visit.ts';

/** Where something goes: into the channel this is typed in, nowhere, or a channel's own id. */
type Target = 'here' | 'nowhere' | { readonly channel: string };

const text: Reader<string> = (cursor, names) =>
  textOf(() => vocabularyOf(records()))(cursor, names);

const target: Reader<Target> = (cursor, names) => {
  const reading = text(cursor, names);
  if (reading === null || 'refusal' in reading) return reading;
  const { value, used } = reading;
  if (value === 'here' || value === 'nowhere') return { value, used };
  return { value: { channel: value }, used };
};

/** `22:00`, `22`, `10pm`, `6.30 am`: the minute of the day, or null where it is none. */
const minuteOf = (typed: string): number | null => {
  const parts = /^(?<hour>\d{1,2})(?:[:.h](?<minute>\d{2}))?\s*(?<half>am|pm)?$/u.exec(
    typed,
  )?.groups;
  if (parts === undefined) return null;
  const { half } = parts;
  const hour = Number(parts['hour']);
  const minute = Number(parts['minute'] ?? 0);
  if (minute > 59 || (half === undefined ? hour > 24 : hour < 1 || hour > 12)) return null;
  const ofDay = half === undefined ? hour : (hour % 12) + (half === 'pm' ? 12 : 0);
  return (ofDay * 60 + minute) % MINUTES_OF_DAY;
};

type Quiet = QuietHours | 'never';

const NEVER: ReadonlySet<string> = new Set(['none', 'never', 'off', 'no']);

/** `22:00-06:00`, `10pm to 6am`, `none`. */
const quietHours: Reader<Quiet> = (cursor, names) => {
  const reading = text(cursor, names);
  if (reading === null || 'refusal' in reading) return reading;
  const { value, used } = reading;
  const typed = plainText(value).trim();
  if (NEVER.has(typed)) return { value: 'never', used };
  const [from = null, to = null, ...more] = typed.split(/\s*(?:-|to|until|till)\s*/u).map(minuteOf);
  if (from !== null && to !== null && more.length === 0) return { value: { from, to }, used };
  const examples = ['quiet 22:00-06:00', 'quiet none'];
  return { refusal: { code: 'missing', parameter: 'quietHours', word: value, examples } };
};

const channelField = (name: string, keywords: readonly string[]) =>
  said<Target>({
    name,
    read: target,
    keywords,
    text: true,
    examples: [`${keywords[0] ?? ''} here`],
  });

const fields = {
  shopUnits: said<'in' | 'mm'>({
    name: 'shopUnits',
    read: () => null,
    closed: true,
    values: [
      ...['inch', 'units in', 'units inch', 'units inches'].map(
        (phrase) => [phrase, 'in'] as const,
      ),
      ...['metric', 'units mm', 'units metric'].map((phrase) => [phrase, 'mm'] as const),
    ],
    examples: ['units mm', 'units in'],
  }),
  language: said<string>({
    name: 'language',
    read: text,
    keywords: ['language'],
    text: true,
    examples: ['language en'],
  }),
  timeZone: said<string>({
    name: 'timeZone',
    read: text,
    keywords: ['time zone', 'timezone', 'zone'],
    text: true,
    examples: ['time zone Europe/Berlin', 'time zone America/Chicago'],
  }),
  standardsChannel: channelField('standardsChannel', ['standards', 'standards go']),
  questionsChannel: channelField('questionsChannel', ['questions', 'questions go']),
  noticesChannel: channelField('noticesChannel', ['notices', 'notices go']),
  fourEyes: said<boolean>({
    name: 'fourEyes',
    read: () => null,
    closed: true,
    values: [
      ...['two people', 'four eyes', 'four eyes yes', 'four eyes on'].map(
        (phrase) => [phrase, true] as const,
      ),
      ...['one person', 'four eyes no', 'four eyes off'].map((phrase) => [phrase, false] as const),
    ],
    examples: ['four eyes yes', 'four eyes no'],
  }),
  reviewMonths,
  questionHours: said<number>({
    name: 'questionHours',
    read: numberOfKind('questionHours', [0.25, 336], null, '1'),
    keywords: ['question waits', 'questions wait', 'wait'],
    examples: ['questions wait 4'],
  }),
  quietHours: said<Quiet>({
    name: 'quietHours',
    read: quietHours,
    keywords: ['quiet', 'quiet hours', 'quiet from'],
    text: true,
    examples: ['quiet 22:00-06:00', 'quiet none'],
  }),
};
const records = recordsOf(fields);
type Said = z.infer<z.ZodObject<typeof fields>>;

/** What this shop has set. */
const list = defineCommand({
  path: ['shop', 'settings', 'list'],
  examples: ['/shop settings'],
  parameters: z.object({}),
  allowed: 'operator',
  run: (context) =>
    visiting(context, ({ settings }) =>
      Promise.resolve(cardReply(settingsCard(context, settings))),
    ),
});

const settingsCard = (context: Context, settings: Settings) =>
  shopCard(context, {
    verb: 'settings',
    headline: line('settings', {}),
    rows: settingFacts(settings).map((fact) => row('fact', fact)),
    lists: { settings: [settings] },
  });

const channelOf = (context: Context, to: Target): string | null => {
  if (to === 'here') return context.place.channel;
  return to === 'nowhere' ? null : to.channel;
};

type Change = { [N in SettingName]: readonly [name: N, value: Settings[N]] }[SettingName];

/** What was said is to be set. */
const changesIn = (context: Context, given: Said): readonly Change[] => {
  const changes: Change[] = [];
  if (given.shopUnits !== undefined) changes.push(['units', given.shopUnits]);
  if (given.language !== undefined) changes.push(['language', given.language]);
  if (given.timeZone !== undefined) changes.push(['timeZone', given.timeZone]);
  for (const name of ['standardsChannel', 'questionsChannel', 'noticesChannel'] as const) {
    const to = given[name];
    if (to !== undefined) changes.push([name, channelOf(context, to)]);
  }
  if (given.fourEyes !== undefined) changes.push(['fourEyes', given.fourEyes]);
  if (given.reviewMonths !== undefined) changes.push(['reviewMonths', given.reviewMonths]);
  if (given.questionHours !== undefined) changes.push(['questionHours', given.questionHours]);
  const { quietHours: quiet } = given;
  if (quiet !== undefined) changes.push(['quietHours', quiet === 'never' ? null : quiet]);
  return changes;
};

/** Sets one or several of them. */
const change = defineCommand({
  path: ['shop', 'settings', 'change'],
  examples: ['/shop settings change units mm', '/shop settings change time zone Europe/Berlin'],
  parameters: z.object(fields),
  allowed: 'owner',
  run: (context, given) =>
    visiting(context, async ({ shop }): Promise<Reply> => {
      const changes = changesIn(context, given);
      if (changes.length === 0) {
        const examples = ['units mm', 'time zone Europe/Berlin', 'questions here'];
        return refused({ code: 'missing', parameter: 'setting', examples });
      }
      for (const [name, value] of changes) {
        const result = await changeSetting(shop, name, value);
        if (!result.ok) return refused(result.refusal);
      }
      const settings = await settingsOf(shop);
      return cardReply(settingsCard({ ...context, units: settings.units }, settings));
    }),
});

export const settings: readonly Command[] = [list, change];
