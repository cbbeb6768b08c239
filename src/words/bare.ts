import type { Suggestion } from '../refusal.ts';
import { postfixed } from './announced.ts';
import { type Cursor, isAfterComma, moved, plainOf, spanOf, tokenAt } from './cursor.ts';
import { type Ear, isFound, isUnreadable, type Step, stepOf } from './ear.ts';
import { partOf, readAs } from './edit.ts';
import { quantityAt } from './quantity.ts';
import { ask } from './range.ts';
import type { Quantity } from './unit.ts';
import type { AnyParameter } from './vocabulary.ts';
import { type Sizes, timesAt } from './wheel.ts';

/** 30° may be a helix, a swivel or a tooth angle: whichever it can be is offered. */
const unclearAngle = (cursor: Cursor, quantity: Quantity, ear: Ear): Step | null => {
  const span = spanOf(cursor, quantity.used);
  const typed = partOf(cursor.text, span);
  const readings = ear.vocabulary.parameters
    .filter((parameter) => ['helix', 'tilt', 'angle'].includes(parameter.name))
    .filter((parameter) => {
      const reading = parameter.read(cursor, ear.names);
      return reading !== null && 'value' in reading;
    })
    .map((parameter) => `${parameter.keywords?.[0] ?? ''} ${typed}`);
  if (readings.length === 0) return null;
  const asked = ask(cursor, 'angle', 'whichAngle', span, readings);
  return 'refusal' in asked ? asked : null;
};

/** Units in which a number without one may also have been meant. */
const otherUnits = (number: string, ear: Ear): readonly string[] =>
  ear.vocabulary.parameters.flatMap((parameter) => parameter.mayBe?.(number) ?? []);

/** What else a number without a unit may have been meant for, beside the sizes it could be. */
const otherMeanings = (cursor: Cursor, { number }: Quantity, ear: Ear): readonly Suggestion[] => {
  const typed = partOf(cursor.text, number);
  return otherUnits(partOf(plainOf(cursor), number), ear).map((unit) =>
    readAs(cursor.text, number, `${typed} ${unit}`),
  );
};

/** What two or three sizes with an x between them may be of. */
const sizeReadings = (cursor: Cursor, { sizes, used }: Sizes, ear: Ear): readonly string[] => {
  const typed = partOf(cursor.text, spanOf(cursor, used));
  const wheel = `wheel ${typed}`;
  if (sizes.length > 2) return [wheel];
  const [first = '', other = ''] = typed.split(/[x×✕]/iu).map((part) => part.trim());
  const long = ['length', 'stockLength']
    .map((name) => ear.vocabulary.parameters.find((each) => each.name === name)?.keywords?.[0])
    .filter((keyword) => keyword !== undefined)
    .map((keyword) => `${first} ${keyword} ${other}`);
  const pitches = otherUnits(other, ear).map((unit) => `${first}, ${other} ${unit}`);
  return [...pitches, ...long, wheel];
};

/** `1.0 x 1.5`, `20x8x6`: sizes of the bar, of the knurl or of a wheel. */
const unclearSizes = (cursor: Cursor, ear: Ear): Step | null => {
  const times = timesAt(cursor);
  if (times === null) return null;
  const second = ear.step(moved(cursor, (times.sizes[0]?.used ?? 1) + 1));
  // In `1.0 x 21tpi` and `1.0 x 1.5 long` what follows says itself what it is.
  if (isFound(second) && second.found.parameter.bare !== true) return null;
  const span = spanOf(cursor, times.used);
  const asked = ask(cursor, 'size', 'sizeByWhat', span, sizeReadings(cursor, times, ear));
  return 'refusal' in asked ? asked : null;
};

/** A bare number that is no likely size: perhaps its unit is misspelt, perhaps it is something else. */
const unlikely = (cursor: Cursor, quantity: Quantity, refused: Step, ear: Ear): Step => {
  const next = moved(cursor, quantity.used);
  const behind = tokenAt(next) === undefined || isAfterComma(next) ? null : ear.step(next);
  if (behind !== null && isUnreadable(behind)) return behind;
  if (!('refusal' in refused)) return refused;
  const { refusal } = refused;
  const more = otherMeanings(cursor, quantity, ear);
  if (refusal.code === 'unclear' && refusal.because === 'noUnit')
    return { refusal: { ...refusal, readings: [...refusal.readings, ...more] } };
  if (refusal.code !== 'outOfRange' || more.length === 0) return refused;
  const { what, word, start, end } = refusal;
  const place = { word: word ?? '', start: start ?? 0, end: end ?? 0 };
  return { refusal: { code: 'unclear', what, because: 'noUnit', readings: more, ...place } };
};

/** Numbers of four figures and no decimals are grades of steel; nobody knurls a bar that size. */
const LEAST_GRADE = 1000;

const unknownGrade = (cursor: Cursor, quantity: Quantity): Step | null => {
  const word = partOf(cursor.text, quantity.number);
  const isGrade = /^\d+$/u.test(word) && quantity.value >= LEAST_GRADE;
  return isGrade
    ? { refusal: { code: 'notFound', what: 'material', nearest: [], word, ...quantity.number } }
    : null;
};

/** A number that says nothing about itself. */
const bareStep = (cursor: Cursor, quantity: Quantity, ear: Ear): Step | null => {
  const parameter = ear.vocabulary.bare;
  const sizes = unclearSizes(cursor, ear);
  if (sizes !== null) return sizes;
  const reading = parameter?.read(cursor, ear.names) ?? null;
  if (parameter === null || reading === null) return null;
  const step = stepOf(cursor, parameter, reading);
  if (isFound(step)) return step;
  return unlikely(cursor, quantity, unknownGrade(cursor, quantity) ?? step, ear);
};

const claims = (parameter: AnyParameter, quantity: Quantity): boolean =>
  (parameter.measures ?? []).some((own) => own === quantity.unit?.measure);

/** A number with nothing in front that announces it. */
export const byQuantity = (cursor: Cursor, ear: Ear): Step | null => {
  const quantity = quantityAt(cursor);
  if (quantity === null) return null;
  const late = postfixed(cursor, quantity, ear);
  if (late !== null) return late;
  if (quantity.unit === null) return bareStep(cursor, quantity, ear);
  if (quantity.unit.measure === 'length') {
    const sizes = unclearSizes(cursor, ear);
    if (sizes !== null) return sizes;
  }
  const parameter = ear.vocabulary.parameters.find((each) => claims(each, quantity));
  const reading = parameter?.read(cursor, ear.names) ?? null;
  if (parameter !== undefined && reading !== null) return stepOf(cursor, parameter, reading);
  if (quantity.unit.measure === 'angle') return unclearAngle(cursor, quantity, ear);
  return null;
};
