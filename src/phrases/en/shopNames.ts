import type { Amount, Fact, Moment, ShopThing } from '../../card/index.ts';
import type { Show } from '../show.ts';
import { patternName, pitchName, THINGS } from './names.ts';

/** What the things of a shop are called. */
export const SHOP_THINGS: { readonly [T in ShopThing]: { one: string; many: string } } = {
  wheel: { one: 'wheel', many: 'wheels' },
  machine: { one: 'machine', many: 'machines' },
  material: { one: 'material', many: 'materials' },
  rule: { one: 'rule', many: 'rules' },
  person: { one: 'person', many: 'people' },
  group: { one: 'group', many: 'groups' },
};

export const counted = (what: ShopThing, count: number): string =>
  `${String(count)} ${count === 1 ? SHOP_THINGS[what].one : SHOP_THINGS[what].many}`;

/** What a fact of the records is called in front of its value. */
export const SHOP_FACTS: Readonly<Record<string, string>> = {
  name: 'name',
  form: 'form',
  alongRim: 'label along the rim',
  diameter: 'diameter',
  included: 'tooth angle',
  helix: 'helix',
  toothDepth: 'tooth depth',
  pinDiameter: 'pin',
  pinMaterial: 'pin material',
  place: 'place',
  partsRun: 'parts run',
  state: 'state',
  speeds: 'speeds',
  feeds: 'feeds',
  dial: 'dial reads',
  machineUnits: 'dials in',
  largestDiameter: 'largest diameter',
  turningSpread: 'turning spread',
  topSpeed: 'top speed',
  power: 'power',
  base: 'taken as',
  elongation: 'elongation',
  note: 'note',
  rule: 'rule',
  onlyOn: 'only on',
  onlyFor: 'only for',
  role: 'role',
  outside: 'known as',
  metAt: 'first met',
  setting: 'setting',
  change: 'change',
  shopUnits: 'units',
  language: 'language',
  timeZone: 'time zone',
  standardsChannel: 'standards go to',
  questionsChannel: 'questions go to',
  noticesChannel: 'notices go to',
  fourEyes: 'standards need two people',
  reviewMonths: 'a standard is reviewed after',
  bars: 'bars',
  questionHours: 'a question waits',
  quietHours: 'quiet',
};

export const factName = (name: string): string => SHOP_FACTS[name] ?? THINGS[name] ?? name;

/** The program's own words for what a thing is. */
const WORDS: Readonly<Record<string, string>> = {
  straight: 'straight',
  leftHelical: 'left-hand helical',
  rightHelical: 'right-hand helical',
  onePieceRaised: 'one crossed wheel, points raised',
  onePieceSunk: 'one crossed wheel, points sunk',
  good: 'good',
  worn: 'worn',
  damaged: 'damaged',
  away: 'away',
  bevelled: 'bevelled edges',
  square: 'square edges',
  convex: 'convex edges',
  hardened: 'hardened',
  carbide: 'carbide',
  diameter: 'diameter',
  radius: 'radius',
  in: 'inch',
  mm: 'mm',
  en: 'English',
  yes: 'yes',
  no: 'no',
  operator: 'operator',
  engineer: 'engineer',
  supervisor: 'supervisor',
  owner: 'owner',
};
export const shopWord = (word: string): string => WORDS[word] ?? word;

const rpm = (value: number): string => String(Number(value.toFixed(1)));

const steps = (
  of: Extract<Amount, { kind: 'speeds' | 'feeds' }>['value'],
  say: (value: number) => string,
): string =>
  'list' in of ? of.list.map(say).join(', ') : `${say(of.slowest)} to ${say(of.fastest)}`;

const watts = (value: number): string =>
  value < 1000 ? `${value.toFixed(0)} W` : `${String(Number((value / 1000).toFixed(2)))} kW`;

const clock = (minute: number): string =>
  [Math.floor(minute / 60), minute % 60].map((part) => String(part).padStart(2, '0')).join(':');

/** A value of the records, in the shop's unit. */
export const amountText = (amount: Amount, show: Show): string => {
  switch (amount.kind) {
    case 'length':
      return show.length(amount.value);
    case 'angle':
      return show.angle(amount.value);
    case 'pitch':
      return pitchName(amount.value);
    case 'speeds':
      return `${steps(amount.value, rpm)} rev/min`;
    case 'feeds':
      return `${steps(amount.value, (value) => show.feed(value).split(' ')[0] ?? '')} ${show.units}/rev`;
    case 'rotation':
      return show.rotation(amount.value);
    case 'power':
      return watts(amount.value);
    case 'hardness':
      return `HB ${String(Number(amount.value.toFixed(0)))}`;
    case 'percent':
      return `${String(Number(amount.value.toFixed(1)))} %`;
    case 'hours':
      return `${String(Number(amount.value.toFixed(2)))} h`;
    case 'months':
      return `${String(amount.value)} ${amount.value === 1 ? 'month' : 'months'}`;
    case 'count':
      return String(amount.value);
    case 'ofDay':
      return `${clock(amount.value.from)} to ${clock(amount.value.to)}`;
    case 'span':
      return `${show.span(amount.value.low, amount.value.high)} ${show.units}`;
    case 'pattern':
      return patternName(amount.value);
    case 'text':
      return amount.value;
    case 'word':
      return shopWord(amount.value);
    case 'moment':
      return momentText(amount.value);
    case 'nothing':
      return 'not set';
  }
};

/** Facts that say what they are by themselves. */
const PLAIN = new Set([
  'pattern',
  'form',
  'pitch',
  'place',
  'edge',
  'rule',
  'role',
  'base',
  'material',
]);

/** A fact in a list, where there is no room for a label. */
export const factText = ({ name, amount }: Fact, show: Show): string => {
  const text = amountText(amount, show);
  if (PLAIN.has(name) || amount.kind === 'speeds' || amount.kind === 'feeds') return text;
  if (name === 'teeth') return `${text} teeth`;
  if (name === 'partsRun') return `${text} ${text === '1' ? 'part' : 'parts'} run`;
  return `${factName(name)} ${text}`;
};

/** The day in the shop's own zone. */
export const dateText = ({ at, zone }: Moment): string => {
  const format = (timeZone: string): string =>
    new Intl.DateTimeFormat('en-GB', { timeZone, dateStyle: 'medium' }).format(at);
  try {
    return format(zone);
  } catch {
    return format('UTC');
  }
};

/** Day and time in the shop's own zone; a zone nobody knows any more reads as UTC. */
export const momentText = ({ at, zone }: Moment): string => {
  const format = (timeZone: string): string =>
    new Intl.DateTimeFormat('en-GB', {
      timeZone,
      dateStyle: 'medium',
      timeStyle: 'short',
      hourCycle: 'h23',
    }).format(at);
  try {
    return zone === 'UTC' ? `${format('UTC')} UTC` : format(zone);
  } catch {
    return `${format('UTC')} UTC`;
  }
};
