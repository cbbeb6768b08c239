import { type Material, materialById } from '../../src/calc/index.ts';
import type { Amount, Fact } from '../../src/card/index.ts';
import type { Machine, Rule, Settings, ShopMaterial, Wheel } from '../../src/shop/index.ts';

/** What is known of a thing, in the order in which it is read. What nobody has said is left out. */
type Known = Fact | null;

const only = (facts: readonly Known[]): readonly Fact[] =>
  facts.filter((known): known is Fact => known !== null);

const fact = <T>(name: string, value: T | null, amount: (value: T) => Amount): Known =>
  value === null ? null : { name, amount: amount(value) };

const length = (name: string, value: Wheel['face']): Known =>
  fact(name, value, (mm) => ({ kind: 'length', value: mm }));
const angle = (name: string, value: Wheel['helix']): Known =>
  fact(name, value, (rad) => ({ kind: 'angle', value: rad }));
const word = (name: string, value: string | null): Known =>
  fact(name, value, (said) => ({ kind: 'word', value: said }));
const text = (name: string, value: string | null): Known =>
  fact(name, value, (said) => ({ kind: 'text', value: said }));
const count = (name: string, value: number | null): Known =>
  fact(name, value, (number) => ({ kind: 'count', value: number }));

/** All that is known of a wheel. */
export const wheelFacts = (wheel: Wheel): readonly Fact[] =>
  only([
    word('form', wheel.form),
    fact('pitch', wheel.pitch, (pitch) => ({ kind: 'pitch', value: pitch })),
    wheel.alongRim ? { name: 'alongRim', amount: { kind: 'word', value: 'yes' } } : null,
    count('teeth', wheel.teeth),
    length('wheelDiameter', wheel.diameter),
    length('proven', wheel.proven),
    length('wheelFace', wheel.face),
    length('wheelBore', wheel.bore),
    length('bevel', wheel.bevel),
    angle('included', wheel.included),
    angle('helix', wheel.helix),
    length('toothDepth', wheel.toothDepth),
    word('edge', wheel.edge),
    length('pinDiameter', wheel.pinDiameter),
    word('pinMaterial', wheel.pinMaterial),
    text('place', wheel.place),
    count('partsRun', wheel.partsRun),
    word('state', wheel.state),
  ]);

/** What tells one wheel from another in a list. */
export const wheelInShort = (wheel: Wheel): readonly Fact[] =>
  only([
    word('form', wheel.form),
    fact('pitch', wheel.pitch, (pitch) => ({ kind: 'pitch', value: pitch })),
    count('teeth', wheel.teeth),
    length('wheelDiameter', wheel.diameter),
    text('place', wheel.place),
    wheel.partsRun === 0 ? null : count('partsRun', wheel.partsRun),
    wheel.state === 'good' ? null : word('state', wheel.state),
  ]);

export const machineFacts = (machine: Machine): readonly Fact[] =>
  only([
    fact('speeds', machine.speeds, (steps) => ({ kind: 'speeds', value: steps })),
    fact('feeds', machine.feeds, (steps) => ({ kind: 'feeds', value: steps })),
    word('dial', machine.dial),
    word('machineUnits', machine.units),
    length('largestDiameter', machine.largestDiameter),
    length('turningSpread', machine.turningSpread),
    fact('topSpeed', machine.topSpeed, (speed) => ({ kind: 'rotation', value: speed })),
    fact('power', machine.power, (watt) => ({ kind: 'power', value: watt })),
  ]);

export const machineInShort = (machine: Machine): readonly Fact[] =>
  only([
    fact('speeds', machine.speeds, (steps) => ({ kind: 'speeds', value: steps })),
    word('dial', machine.dial),
  ]);

const baseName = (base: string): string => {
  const material: Material | undefined = materialById(base);
  return material === undefined ? base : `${material.name}, ${material.condition}`;
};

export const materialFacts = (material: ShopMaterial): readonly Fact[] =>
  only([
    text('base', baseName(material.base)),
    fact('hardness', material.hardness, (hb) => ({ kind: 'hardness', value: hb })),
    fact('elongation', material.elongation, (share) => ({ kind: 'percent', value: share })),
    text('note', material.note),
  ]);

/** A rule's sentence and where it belongs; the names of what it names are handed in. */
export const ruleFacts = (rule: Rule, names: ReadonlyMap<string, string>): readonly Fact[] =>
  only([
    text('rule', rule.text),
    text('onlyOn', rule.machine === null ? null : (names.get(rule.machine) ?? '')),
    text('onlyFor', rule.material === null ? null : (names.get(rule.material) ?? '')),
    text('onlyFor', rule.base === null ? null : baseName(rule.base)),
  ]);

const setTo = (value: string | null): Amount =>
  value === null ? { kind: 'nothing' } : { kind: 'text', value };

export const settingFacts = (settings: Settings): readonly Fact[] => [
  { name: 'shopUnits', amount: { kind: 'word', value: settings.units } },
  { name: 'language', amount: { kind: 'word', value: settings.language } },
  { name: 'timeZone', amount: { kind: 'text', value: settings.timeZone } },
  { name: 'standardsChannel', amount: setTo(settings.standardsChannel) },
  { name: 'questionsChannel', amount: setTo(settings.questionsChannel) },
  { name: 'noticesChannel', amount: setTo(settings.noticesChannel) },
  { name: 'fourEyes', amount: { kind: 'word', value: settings.fourEyes ? 'yes' : 'no' } },
  { name: 'reviewMonths', amount: { kind: 'months', value: settings.reviewMonths } },
  { name: 'questionHours', amount: { kind: 'hours', value: settings.questionHours } },
  {
    name: 'quietHours',
    amount:
      settings.quietHours === null
        ? { kind: 'nothing' }
        : { kind: 'ofDay', value: settings.quietHours },
  },
];
