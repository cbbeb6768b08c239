import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { type FormulaName, figure, MARK_ORDER, type UnitName } from '../../src/calc/index.ts';
import { figureName, figureText } from '../../src/phrases/en/figureNames.ts';
import { formulaWords } from '../../src/phrases/en/whyFormulas.ts';
import { sourced, surenessOfAll } from '../../src/phrases/en/whyGiven.ts';
import { showIn } from '../../src/phrases/show.ts';
import { filesIn, functionsOf, programOf } from '../support/calcFunctions.ts';
import { readCard } from '../support/formulaCards.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const files = filesIn(path.join(root, 'src', 'calc'));
const cards = new Map(
  functionsOf(programOf(root, files), files).map(({ name, comment }) => [
    name,
    readCard(comment ?? ''),
  ]),
);

describe('what is said of a formula is what its card says', () => {
  it.each(Object.keys(formulaWords) as FormulaName[])('%s', (name) => {
    const card = cards.get(name);
    expect(formulaWords[name]).toEqual({ says: card?.sentence, assumes: card?.assumption });
  });
});

describe('a figure in words', () => {
  it.each<[Parameters<typeof figureName>[0], number, UnitName, string, string]>([
    // An inch is 25.4 mm exactly.
    ['blankDiameter', 25.4, 'mm', '1.0000 in [25.400 mm]', '25.400 mm [1.0000 in]'],
    ['fill', 0.9, '1', '90 %', '90 %'],
    ['toothCount', 65, '1', '65', '65'],
    ['toothError', -0.356, '1', '−0.36 of a tooth', '−0.36 of a tooth'],
    ['pinHeatIndex', 0.7842, '1', '0.7842', '0.7842'],
    // A foot is 0.3048 m exactly.
    ['surfaceSpeed', 30.48, 'm/min', '100 ft/min [30.5 m/min]', '30.5 m/min [100 ft/min]'],
    ['feed', 0.254, 'mm/rev', '0.0100 in/rev [0.254 mm/rev]', '0.254 mm/rev [0.0100 in/rev]'],
    ['swivelAngle', Math.PI / 180, 'rad', '1°', '1°'],
    ['radialForce', 3217.6, 'N', '3218 N', '3218 N'],
    ['bendingStress', 292.9, 'MPa', '292.9 MPa', '292.9 MPa'],
    ['time', 3.2, 's', '3 s', '3 s'],
  ])('%s', (name, value, unit, inch, metric) => {
    expect(figureText(name, figure(value, unit), showIn('in'))).toBe(inch);
    expect(figureText(name, figure(value, unit), showIn('mm'))).toBe(metric);
  });
});

describe('how sure a thing is', () => {
  it('has its own words for every mark', () => {
    const said = MARK_ORDER.flatMap((mark) => [surenessOfAll[mark], sourced[mark]('a text')]);
    expect(new Set(said).size).toBe(2 * MARK_ORDER.length);
    expect(sourced['from memory']('a text')).toContain('check before you rely on it');
  });
});
