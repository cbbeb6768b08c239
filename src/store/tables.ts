/**
 * The records as they lie in the tables. Every value is text, a number or null, so that both
 * engines hand back the same: lengths in mm and angles in rad as double precision, moments as
 * milliseconds since 1970, flags as 0 and 1, structured content as JSON text.
 */
type Moment = number;
type Json = string;

/** What stands in every table that belongs to a shop. */
type OfShop = { shop: string };

export type ShopTable = {
  id: string;
  /** discord, slack, terminal …: where the shop talks. */
  platform: string;
  /** The shop's own id there. */
  outside: string;
  name: string;
  made_at: Moment;
};

export type SettingTable = OfShop & {
  name: string;
  value: Json;
  changed_at: Moment;
  changed_by: string;
};

export type PersonTable = OfShop & {
  id: string;
  /** The person's own id on the platform. */
  outside: string;
  name: string;
  name_key: string;
  role: string;
  version: number;
  met_at: Moment;
  removed_at: Moment | null;
};

/** A platform's role or group whose members have a role in the shop. */
export type GroupTable = OfShop & {
  id: string;
  outside: string;
  name: string;
  name_key: string;
  role: string;
  version: number;
  made_at: Moment;
  removed_at: Moment | null;
};

/** What everything has that a shop keeps a list of. */
export type RegisterColumns = OfShop & {
  id: string;
  name: string;
  /** The name as it is compared: two of one shop never share one, unless one was removed. */
  name_key: string;
  /** Counts changes; a change names the one it was made from. */
  version: number;
  made_at: Moment;
  made_by: string;
  changed_at: Moment;
  changed_by: string;
  removed_at: Moment | null;
  removed_by: string | null;
};

export type WheelTable = RegisterColumns & {
  kind: string;
  pitch_system: string | null;
  pitch_value: number | null;
  /** 1: the label's pitch is meant along the rim. */
  along_rim: number;
  /** Pitch round the rim that a diameter and its count have proven. */
  proven: number | null;
  teeth: number | null;
  diameter: number | null;
  face: number | null;
  bore: number | null;
  bevel: number | null;
  included: number | null;
  helix: number | null;
  tooth_depth: number | null;
  edge: string | null;
  pin_diameter: number | null;
  pin_material: string | null;
  place: string | null;
  parts_run: number;
  state: string;
};

export type MachineTable = RegisterColumns & {
  speeds: Json | null;
  feeds: Json | null;
  dial: string;
  units: string | null;
  largest_diameter: number | null;
  turning_spread: number | null;
  top_speed: number | null;
  power: number | null;
};

export type MaterialTable = RegisterColumns & {
  /** The id in the table of materials that this one is a case of. */
  base: string;
  hardness: number | null;
  elongation: number | null;
  note: string | null;
};

export type RuleTable = RegisterColumns & {
  text: string;
  machine: string | null;
  /** The shop's own material … */
  material: string | null;
  /** … or one of the table of materials. */
  base: string | null;
};

export type CardTable = OfShop & {
  id: string;
  code: string;
  /** What kind of card: setup, plan … */
  kind: string;
  made_at: Moment;
  made_by: string;
  /** Where it was asked for: an adapter's own address. */
  place: string;
  /** The person's own words. */
  words: string;
  request: Json;
  figures: Json;
  card: Json;
  program: string;
  wheel: string | null;
  machine: string | null;
  material: string | null;
};

export type ResultTable = OfShop & {
  id: string;
  /** Counts the results of a shop: what people call it by. */
  number: number;
  card: string;
  wheel: string | null;
  /** The row of the table of materials that the card was worked out for. */
  base: string | null;
  version: number;
  made_at: Moment;
  made_by: string;
  changed_at: Moment;
  changed_by: string;
  withdrawn_at: Moment | null;
  withdrawn_by: string | null;
  outcome: string;
  /** What was seen on the part, in the terms of a trouble. */
  symptom: string | null;
  teeth: number | null;
  blank: number | null;
  crest: number | null;
  tooth_height: number | null;
  flat: number | null;
  parts_run: number;
  cause: string | null;
  note: string | null;
  /** Pattern and material whose growth it speaks of, where it does. */
  family: string | null;
  /** Measured over static growth. */
  share: number | null;
  /** 1: the cards learn from it. */
  learned: number;
  confirmed_at: Moment | null;
  confirmed_by: string | null;
};

/** The learned results of one family, added up. */
export type GrowthTable = OfShop & {
  family: string;
  count: number;
  sum: number;
  /** The id of the oldest of them: families stand in the order in which they were first seen. */
  first: string;
};

/** What a shop keeps under a part number; its revisions say what that is. */
export type StandardTable = OfShop & {
  id: string;
  /** The number as the shop writes it, and as it is compared. */
  part: string;
  part_key: string;
  /** Counts changes; of two that are made at once the second is refused. */
  version: number;
  made_at: Moment;
  made_by: string;
  changed_at: Moment;
  changed_by: string;
};

/** A revision never changes but in its life: another card is another revision. */
export type StandardRevisionTable = OfShop & {
  id: string;
  standard: string;
  number: number;
  /** draft, proposed, approved, superseded, retired. */
  state: string;
  /** The card it was made from. */
  card: string;
  /** What it applies to; the first two once more for the index. */
  pattern: string;
  base: string;
  scope: Json;
  /** The wheel, machine, material and rules as they were when it was approved. */
  basis: Json | null;
  why: string | null;
  made_at: Moment;
  made_by: string;
  proposed_at: Moment | null;
  proposed_by: string | null;
  approved_at: Moment | null;
  approved_by: string | null;
  review_at: Moment | null;
  /** When it was superseded or retired. */
  ended_at: Moment | null;
  ended_by: string | null;
  ended_why: string | null;
};

export type InteractionTable = OfShop & {
  id: string;
  at: Moment;
  answer: Json | null;
};

export type EffectTable = OfShop & {
  id: string;
  key: string;
  effect: Json;
  /** held: waits for the one before it; waiting; delivered; givenUp. */
  state: string;
  /** The key of the effect that must have taken place before. */
  after: string | null;
  made_at: Moment;
  /** Not before then. While a process is at it: when its lease ends. */
  due_at: Moment;
  attempts: number;
  /** When it was first tried: after a day of trying it is given up. */
  first_at: Moment | null;
  worker: string | null;
  delivered_at: Moment | null;
  given_up_at: Moment | null;
  /** When a person was shown that it was given up. */
  seen_at: Moment | null;
  last_fault: string | null;
  /** What the platform gave back: the id of the message, say. */
  outcome: Json | null;
  /** Where it took place, as the outcome says. */
  place: string | null;
};

export type QuestionTable = OfShop & {
  id: string;
  code: string;
  text: string;
  /** The id of the card it is about. */
  card: string | null;
  /** open, answered, solved, reopened. */
  state: string;
  version: number;
  asked_at: Moment;
  asked_by: string;
  /** Where it is put up: an adapter's own address. */
  place: string;
  /** When it was asked, or reopened last. */
  waits_since: Moment;
  /** How often it was reopened. */
  round: number;
  /** How often it was put up again since then. */
  reminders: number;
  /** When it is put up again next. */
  remind_at: Moment | null;
  /** The number of the answer that was accepted. */
  accepted: number | null;
  solved_at: Moment | null;
  solved_by: string | null;
};

export type AnswerTable = OfShop & {
  id: string;
  /** The question's id. */
  question: string;
  /** Counts the answers to one question, from 1. */
  number: number;
  text: string;
  given_at: Moment;
  given_by: string;
};

export type HistoryTable = OfShop & {
  id: string;
  at: Moment;
  by: string;
  /** wheel, machine …: the table. */
  subject: string;
  subject_id: string;
  verb: string;
  before: Json | null;
  after: Json | null;
};

/** Something that can be found by words: a card, a standard … */
export type FindEntryTable = OfShop & {
  /** Its kind and its own id together. */
  id: string;
  kind: string;
  subject_id: string;
  code: string | null;
  at: Moment;
  /** 1: the shop stands by it. */
  approved: number;
  /** Greater is shown first: approved before the others, the newest before older ones. */
  place: number;
  /** What it is found by, parted by spaces. */
  terms: string;
};

/** The places of everything that is found by a term. Made from the entries. */
export type FindTermTable = OfShop & { term: string; place: number };

/** A term as it is, and with each of its letters left out. Made from the entries. */
export type FindSpellingTable = OfShop & { spelling: string; term: string };

export type Tables = {
  shop: ShopTable;
  setting: SettingTable;
  person: PersonTable;
  person_group: GroupTable;
  wheel: WheelTable;
  machine: MachineTable;
  material: MaterialTable;
  rule: RuleTable;
  card: CardTable;
  result: ResultTable;
  growth: GrowthTable;
  standard: StandardTable;
  standard_revision: StandardRevisionTable;
  interaction: InteractionTable;
  effect: EffectTable;
  question: QuestionTable;
  answer: AnswerTable;
  history: HistoryTable;
  find_entry: FindEntryTable;
  find_term: FindTermTable;
  find_spelling: FindSpellingTable;
};

export type TableName = keyof Tables;
export type RegisterName = 'wheel' | 'machine' | 'material' | 'rule';

export type TableFacts = {
  readonly name: TableName;
  /** The column that says whose row it is. */
  readonly shop: 'id' | 'shop';
  /** What tells two rows of one shop apart. */
  readonly key: string;
  /** Columns that hold JSON. */
  readonly json: readonly string[];
};

/** Every table, each after the ones it refers to: the order in which a backup is read back. */
export const TABLES: readonly TableFacts[] = [
  { name: 'shop', shop: 'id', key: 'id', json: [] },
  { name: 'setting', shop: 'shop', key: 'name', json: ['value'] },
  { name: 'person', shop: 'shop', key: 'id', json: [] },
  { name: 'person_group', shop: 'shop', key: 'id', json: [] },
  { name: 'wheel', shop: 'shop', key: 'id', json: [] },
  { name: 'machine', shop: 'shop', key: 'id', json: ['speeds', 'feeds'] },
  { name: 'material', shop: 'shop', key: 'id', json: [] },
  { name: 'rule', shop: 'shop', key: 'id', json: [] },
  { name: 'card', shop: 'shop', key: 'id', json: ['request', 'figures', 'card'] },
  { name: 'result', shop: 'shop', key: 'id', json: [] },
  { name: 'growth', shop: 'shop', key: 'family', json: [] },
  { name: 'standard', shop: 'shop', key: 'id', json: [] },
  { name: 'standard_revision', shop: 'shop', key: 'id', json: ['scope', 'basis'] },
  { name: 'interaction', shop: 'shop', key: 'id', json: ['answer'] },
  { name: 'effect', shop: 'shop', key: 'id', json: ['effect', 'outcome'] },
  { name: 'question', shop: 'shop', key: 'id', json: [] },
  { name: 'answer', shop: 'shop', key: 'id', json: [] },
  { name: 'history', shop: 'shop', key: 'id', json: ['before', 'after'] },
  { name: 'find_entry', shop: 'shop', key: 'id', json: [] },
];

/** Made from the rows of others: in no backup of lines and in no export, made again instead. */
export const MADE_TABLES: readonly TableName[] = ['find_term', 'find_spelling'];
