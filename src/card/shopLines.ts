import type {
  Figure,
  FigureName,
  Mm,
  MmPerRev,
  Pattern,
  Pitch,
  Rad,
  RevPerMin,
  Steps,
  Watt,
  Window,
} from '../calc/index.ts';
import type { CellFault, FileFault } from './fileFaults.ts';
import type { Nothing } from './nothing.ts';

/** What a shop keeps lists of. */
export type ShopThing = 'wheel' | 'machine' | 'material' | 'rule' | 'person' | 'group';

/** A value of the shop's own records, still without a unit system or a language. */
export type Amount =
  | { readonly kind: 'length'; readonly value: Mm }
  | { readonly kind: 'angle'; readonly value: Rad }
  | { readonly kind: 'pitch'; readonly value: Pitch }
  | { readonly kind: 'speeds'; readonly value: Steps<RevPerMin> }
  | { readonly kind: 'feeds'; readonly value: Steps<MmPerRev> }
  | { readonly kind: 'rotation'; readonly value: RevPerMin }
  | { readonly kind: 'power'; readonly value: Watt }
  | { readonly kind: 'hardness'; readonly value: number }
  | { readonly kind: 'percent'; readonly value: number }
  | { readonly kind: 'hours'; readonly value: number }
  | { readonly kind: 'months'; readonly value: number }
  | { readonly kind: 'count'; readonly value: number }
  /** From one minute of the day to another. */
  | { readonly kind: 'ofDay'; readonly value: { readonly from: number; readonly to: number } }
  | { readonly kind: 'span'; readonly value: Window }
  | { readonly kind: 'pattern'; readonly value: Pattern }
  /** As a person typed it. */
  | { readonly kind: 'text'; readonly value: string }
  /** One of the program's own words; the phrase book says it. */
  | { readonly kind: 'word'; readonly value: string }
  | { readonly kind: 'moment'; readonly value: Moment }
  | { readonly kind: 'nothing' };

/** What a fact of the records is about, by the name its parameter has. */
export type Fact = { readonly name: string; readonly amount: Amount };

/** When something happened, and in which time zone the shop reads its clock. */
export type Moment = { readonly at: number; readonly zone: string };

export type ShopLines = {
  listed: { readonly what: ShopThing; readonly count: number };
  listedNone: { readonly what: ShopThing; readonly line: string };
  listedMore: { readonly more: number };
  shown: { readonly what: ShopThing; readonly name: string };
  done: {
    readonly did: 'added' | 'changed' | 'removed';
    readonly what: ShopThing;
    readonly name: string;
  };
  lastChanged: Moment & { readonly by: string };
  roleNamed: { readonly name: string; readonly role: string };
  imported: {
    readonly what: ShopThing;
    readonly added: number;
    readonly replaced: number;
    readonly same: number;
    readonly refused: number;
  };
  importedRow: {
    readonly line: number;
    readonly name: string;
    readonly faults: readonly CellFault[];
  };
  importedIgnored: { readonly heading: string; readonly nearest: readonly string[] };
  importRefused: { readonly fault: FileFault };
  settings: Nothing;
  settingChanged: { readonly fact: Fact };
  exported: { readonly files: readonly string[] };
  cardCode: { readonly code: string };
  cardAgain: Moment & { readonly code: string; readonly by: string; readonly program: string };
  cardSame: Nothing;
  cardDiffers: { readonly count: number };
  cardNotToday: Nothing;
  machineTaken: { readonly machine: string };
  wheelTakenFrom: { readonly wheel: string; readonly place: string | null };
  wheelInState: { readonly wheel: string; readonly state: string };
  shopMaterialTaken: { readonly material: string; readonly hardness: number | null };
  undelivered: { readonly count: number; readonly fault: string };
  givenUp: {
    readonly what: 'post' | 'pin' | 'unpin' | 'thread' | 'notify' | 'edit';
    readonly attempts: number;
    readonly fault: string;
  };
  planCribOfShop: { readonly wheels: number };
  invented: Nothing;
};

export type ShopRows = {
  fact: Fact;
  listItem: { readonly name: string; readonly facts: readonly Fact[] };
  onDial: {
    readonly dial: 'diameter' | 'radius';
    readonly units: 'in' | 'mm';
    readonly infeed: Mm;
    readonly firstBite: Mm;
  };
  figureChanged: {
    readonly name: FigureName;
    readonly before: Figure | null;
    readonly after: Figure | null;
  };
};

export type ShopLabels = {
  removeAnyway: { readonly name: string };
  today: Nothing;
};
