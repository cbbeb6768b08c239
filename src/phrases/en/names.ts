import type { Pattern, Pitch, WheelKind } from '../../calc/index.ts';

/** A pitch as its label prints it. */
export const pitchName = (pitch: Pitch): string => {
  const value = String(pitch.value);
  switch (pitch.system) {
    case 'metric':
      return `${value} mm pitch`;
    case 'tpi':
      return `${value} TPI`;
    case 'dp':
      return `${value} DP`;
    case 'module':
      return `module ${value}`;
  }
};

/** Name and condition of a material on one line. */
export const materialName = (name: string, condition: string): string => `${name}, ${condition}`;

export const patternName = (pattern: Pattern): string => {
  switch (pattern.kind) {
    case 'straight':
      return 'straight knurl';
    case 'diagonal':
      return pattern.hand === null ? 'diagonal knurl' : `${pattern.hand}-hand knurl`;
    case 'diamond':
      return `diamond, points ${pattern.points}`;
    case 'square':
      return `square pattern, points ${pattern.points}`;
  }
};

export const wheelName: { readonly [K in WheelKind]: string } = {
  straight: 'a straight wheel',
  leftHelical: 'a left-hand wheel',
  rightHelical: 'a right-hand wheel',
  helical: 'a helical wheel of the other hand',
  helicalPair: 'a left-hand and a right-hand wheel',
  onePieceRaised: 'one crossed wheel with raised points',
  onePieceSunk: 'one crossed wheel with sunk points',
  straightSetOver: 'a straight wheel set over',
  straightPairSetOver: 'a pair of straight wheels set over',
};

/** What a parameter or a limit is called in a sentence. */
export const THINGS: Readonly<Record<string, string>> = {
  diameter: 'diameter',
  pattern: 'pattern',
  points: 'kind of points',
  hand: 'hand of the knurl',
  pitch: 'pitch',
  tpi: 'teeth per inch',
  dp: 'diametral pitch',
  module: 'module',
  material: 'material',
  finish: 'finished size',
  length: 'length of the knurl',
  stickout: 'stickout',
  stockLength: 'length of the bar',
  helix: 'helix angle',
  tilt: 'angle the wheel is set over',
  angle: 'tooth angle',
  teeth: 'tooth count',
  fill: 'fill',
  feed: 'feed',
  speed: 'surface speed',
  rotation: 'spindle speed',
  turns: 'turns',
  batch: 'number of parts',
  bevel: 'bevel',
  edge: 'edge of the wheel',
  wheel: 'wheel',
  wheelDiameter: 'diameter of the wheel',
  wheelFace: 'face of the wheel',
  wheelBore: 'bore of the wheel',
  wheelTeeth: 'teeth on the wheel',
  face: 'face of the wheel',
  pin: 'pin',
  pinDiameter: 'diameter of the pin',
  hardness: 'hardness',
  class: 'class',
  runout: 'run-out',
  bore: 'bore',
  plate: 'plating',
  fit: 'bore of the fit',
  process: 'process',
  support: 'support',
  layout: 'wheels',
  machine: 'machine',
  textLength: 'length of the line',
  symptom: 'symptom',
  outcome: 'outcome',
  cause: 'cause',
  parts: 'parts run',
  height: 'tooth height',
  crest: 'diameter over the crests',
  blank: 'blank as measured',
  result: 'result',
  version: 'version seen',
  setupCard: 'set-up or check card',
  partsOnWheel: 'parts on the wheel',
  firstBite: 'first bite',
  tolerance: 'pitch tolerance',
  toothHeight: 'tooth height',
  crestDiameter: 'diameter over the crests',
  count: 'count of teeth',
  counted: 'count of teeth',
  flat: 'flat on the crests',
  seam: 'gap at the seam',
  wall: 'wall under the teeth',
  width: 'contact width of the wheel',
  proven: 'proven pair',
  units: 'units shown',
  name: 'name',
  part: 'part number',
  standard: 'standard',
  revision: 'revision',
  revisions: 'revisions',
  why: 'reason',
  bars: 'bars',
  setUpCard: 'set-up card',
  fourEyes: 'two people for a standard',
  reviewMonths: 'months until a review',
  asIs: 'bar left as it is',
  rule: 'rule',
  person: 'person',
  group: 'group',
  card: 'card',
  records: 'record of the shop',
  role: 'role',
  place: 'place',
  note: 'note',
  form: 'form of the wheel',
  included: 'tooth angle',
  toothDepth: 'tooth depth',
  partsRun: 'parts run',
  speeds: 'spindle speeds',
  feeds: 'feeds',
  largestDiameter: 'largest diameter of the machine',
  turningSpread: 'spread of turned diameters',
  topSpeed: 'top speed of the machine',
  power: 'power of the machine',
  elongation: 'elongation',
  timeZone: 'time zone',
  language: 'language',
  questionHours: 'time a question waits',
  dial: 'dial',
  state: 'state',
  setting: 'setting',
  wanted: 'word to look for',
  change: 'change',
  file: 'file',
  figure: 'figure or check',
  question: 'question',
  noCard: 'without a card',
  asked: 'code of the question',
  answer: 'answer',
  accepted: 'number of the answer',
  solution: 'words that say what solved it',
  reason: 'reason',
  code: 'code of the card',
  quietHours: 'quiet time',
  questionsChannel: 'channel for questions',
  explained: 'set-up or check to explain',
};

export const thing = (what: string): string => THINGS[what] ?? what;
