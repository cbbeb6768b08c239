import { z } from 'zod';
import type { Refusal } from '../refusal.ts';
import { remember } from './history.ts';
import { LONGEST_QUIET, MINUTES_OF_DAY, minutesBetween } from './quiet.ts';
import { type Done, done, refused } from './result.ts';
import type { ShopChange, ShopView } from './view.ts';

const isTimeZone = (zone: string): boolean => {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
};

/** Every time zone a person may name, as the platform spells them. */
const timeZones = (): readonly string[] => [...Intl.supportedValuesOf('timeZone'), 'UTC'];

const hours = z.number().min(0.25).max(336);
const minute = z
  .number()
  .int()
  .min(0)
  .max(MINUTES_OF_DAY - 1);
const quiet = z
  .object({ from: minute, to: minute })
  .refine(({ from, to }) => from !== to && minutesBetween(from, to) <= LONGEST_QUIET)
  .nullable();
const channel = z.string().min(1).max(100).nullable();

/**
 * What a shop can set. Each is a row of its own, so that a new one needs no new form of the
 * records. Judgement: the values a shop has that has set nothing.
 */
export const SETTINGS = {
  /** What bare numbers are in, and what is shown first. */
  units: { shape: z.enum(['in', 'mm']), usual: 'in' },
  language: { shape: z.string().regex(/^[a-z]{2}(-[A-Z]{2})?$/u), usual: 'en' },
  timeZone: { shape: z.string().refine(isTimeZone), usual: 'UTC' },
  /** Where approved standards are posted and pinned. */
  standardsChannel: { shape: channel, usual: null },
  /** Where questions go to the engineers. */
  questionsChannel: { shape: channel, usual: null },
  /** Where the bot says what it could not deliver. */
  noticesChannel: { shape: channel, usual: null },
  /** Whoever proposes a standard may not approve it. Usually off: many a shop has one supervisor. */
  fourEyes: { shape: z.boolean(), usual: false },
  /** How long an approved standard holds before somebody looks at it again. */
  reviewMonths: { shape: z.number().int().min(1).max(120), usual: 12 },
  /** How long a question may stay open before it is put up again. */
  questionHours: { shape: hours, usual: 4 },
  /** When nobody is rung, in the shop's own time; null where there is no such time. */
  quietHours: { shape: quiet, usual: { from: 22 * 60, to: 6 * 60 } },
} as const;

export type SettingName = keyof typeof SETTINGS;
export type Settings = { readonly [N in SettingName]: z.infer<(typeof SETTINGS)[N]['shape']> };
export const SETTING_NAMES = Object.keys(SETTINGS) as readonly SettingName[];

/** Everything a shop has set, and the usual where it has not. */
export const settingsOf = async (view: Pick<ShopView, 'id' | 'db'>): Promise<Settings> => {
  const rows = await view.db
    .selectFrom('setting')
    .select(['name', 'value'])
    .where('shop', '=', view.id)
    .execute();
  const kept = new Map(rows.map(({ name, value }) => [name, value]));
  const entries = SETTING_NAMES.map((name) => {
    const { shape, usual } = SETTINGS[name];
    const value = kept.get(name);
    // What a later program no longer takes counts as not set.
    const read = value === undefined ? undefined : shape.safeParse(JSON.parse(value));
    return [name, read?.success === true ? read.data : usual];
  });
  return Object.fromEntries(entries) as Settings;
};

/** Sets one; what it was before is kept in the history. */
export const changeSetting = async <N extends SettingName>(
  change: ShopChange,
  name: N,
  value: Settings[N],
): Promise<Done<Settings>> => {
  const fault = settingFault(change, name, value);
  if (fault !== null) return refused(fault);
  const before = (await settingsOf(change))[name];
  const row = { value: JSON.stringify(value), changed_at: change.at, changed_by: change.by };
  await change.db
    .insertInto('setting')
    .values({ shop: change.id, name, ...row })
    .onConflict((oc) => oc.columns(['shop', 'name']).doUpdateSet(row))
    .execute();
  await remember(change, 'setting', [{ subjectId: name, verb: 'changed', before, after: value }]);
  return done(await settingsOf(change));
};

const settingFault = (view: ShopView, name: SettingName, value: unknown): Refusal | null => {
  if (SETTINGS[name].shape.safeParse(value).success) return null;
  if (name === 'questionHours') {
    const amount = Number(value);
    return { code: 'outOfRange', what: name, value: amount, min: 0.25, max: 336, unit: 'h' };
  }
  if (name === 'reviewMonths') {
    const amount = Number(value);
    return { code: 'outOfRange', what: name, value: amount, min: 1, max: 120, unit: 'months' };
  }
  if (name === 'quietHours') {
    const { from, to } = value as NonNullable<Settings['quietHours']>;
    const length = minutesBetween(from, to) / 60;
    return { code: 'outOfRange', what: name, value: length, min: 0, max: 20, unit: 'h' };
  }
  const said = view.words.plainText(String(value));
  const nearest = name === 'timeZone' ? view.words.nearestOf(said, timeZones()) : [];
  return { code: 'notFound', what: name, nearest };
};
