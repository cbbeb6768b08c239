import type { SymptomId } from '../../src/calc/index.ts';
import { said } from '../../src/desk/index.ts';
import {
  countOf,
  type Reader,
  readAs,
  refused,
  smallLengthOf,
  spanOf,
  tokenAt,
} from '../../src/words/index.ts';

/** What people say they see. `size wrong` alone says too little and is asked. */
export const SPOKEN: { readonly [S in SymptomId]: readonly string[] } = {
  doublePattern: [
    'double',
    'doubled',
    'doubling',
    'double pattern',
    'split',
    'split pattern',
    'double tracking',
  ],
  shallowOneSide: [
    'shallow one side',
    'shallow on one side',
    'deeper on one side',
    'heavy one side',
    'one-sided pattern',
  ],
  shallowAllRound: ['shallow', 'shallow all round', 'shallow pattern', 'too shallow'],
  tapered: ['tapered', 'taper'],
  fadesAlong: ['fades', 'fading', 'fades along', 'pattern fades', 'fades along the length', 'fade'],
  flaking: ['flaking', 'flakes', 'slivers', 'flakes off'],
  tornCrests: ['torn', 'torn crests', 'crests torn', 'tearing', 'ragged crests', 'ragged'],
  wheelStopped: [
    'wheel stopped',
    'wheel stopped turning',
    'wheel stops',
    'wheel stuck',
    'stopped turning',
  ],
  pinSeized: ['pin seized', 'seized', 'pin picked up', 'picked up', 'pin seizes'],
  chippedTeeth: [
    'chipped',
    'chipped teeth',
    'teeth chipped',
    'wheel chipped',
    'wheel teeth chipped',
    'broken teeth',
  ],
  bentPart: ['bent', 'part bent', 'bent part', 'bends', 'bent bar'],
  tubeOutOfRound: ['out of round', 'tube out of round', 'oval', 'tube oval'],
  unevenDiamonds: ['uneven diamonds', 'uneven', 'lopsided diamonds', 'uneven pattern'],
  oversize: ['oversize', 'too big', 'too large', 'over size'],
  undersize: ['undersize', 'too small', 'under size'],
  ridgeAtEnd: [
    'ridge',
    'ridge at end',
    'ridge at start',
    'ridge at the end',
    'ridge at the start',
    'step at end',
  ],
  chatterMarks: ['chatter', 'chatter marks', 'chatters', 'rings'],
  slippedInChuck: ['slips', 'slipped', 'slipped in the chuck', 'slips in the chuck', 'slipping'],
  repeatingMark: ['repeating mark', 'same mark', 'mark repeats', 'mark every turn'],
};

const symptomOf = (name: string): SymptomId => name as SymptomId;

/** Words for a size that is off without saying which way. */
const WRONG_SIZE = ['size wrong', 'wrong size', 'size is wrong', 'size off', 'off size'].map(
  (phrase) => phrase.split(' '),
);

/** Too large and too small have other causes: which one is asked. */
const sizeWrong: Reader<SymptomId> = (cursor) => {
  const said = WRONG_SIZE.find((words) =>
    words.every((word, index) => tokenAt(cursor, index)?.text === word),
  );
  if (said === undefined) return null;
  const span = spanOf(cursor, said.length);
  const readings = ['oversize', 'undersize'].map((by) => readAs(cursor.text, span, by));
  return refused({ code: 'unclear', what: 'symptom', readings });
};

export const symptom = said<SymptomId>({
  name: 'symptom',
  read: () => null,
  values: Object.entries(SPOKEN).flatMap(([name, phrases]) =>
    phrases.map((phrase) => [phrase, symptomOf(name)] as const),
  ),
  free: sizeWrong,
  examples: ['double', 'flaking', 'shallow', 'pin seized'],
});

export const partsOnWheel = said<number>({
  name: 'partsOnWheel',
  read: countOf('partsOnWheel', [0, 10_000_000], 'pieces'),
  keywords: ['wheel made', 'on the wheel', 'wheel has made'],
  postfix: true,
  examples: ['wheel made 3000'],
});

export const biteTaken = said<number>({
  name: 'bite',
  read: smallLengthOf('firstBite', [0, 5]),
  keywords: ['bite', 'first bite', 'first turn'],
  examples: ['bite 0.003'],
});
