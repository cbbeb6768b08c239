import type { Figure, FigureName } from '../../calc/index.ts';
import type {
  ChangedSince,
  StandardLabels,
  StandardLines,
  StandardRows,
  StandardStateSaid,
} from '../../card/standardLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { checks } from './checks.ts';
import { figureName, figureText } from './figureNames.ts';
import { thing } from './names.ts';
import { amountText, dateText, factName, factText, momentText } from './shopNames.ts';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const list = (items: readonly string[]): string => items.join(', ');
const teeth = (count: number): string => `${String(count)} ${count === 1 ? 'tooth' : 'teeth'}`;

const rev = ({ part, revision }: { readonly part: string; readonly revision: number }): string =>
  `${part} rev ${String(revision)}`;

const STATES: { readonly [S in StandardStateSaid]: string } = {
  draft: 'draft',
  proposed: 'proposed, not approved yet',
  approved: 'approved',
  superseded: 'superseded',
  retired: 'retired',
};

/** What was done when it came to be so. */
const DONE: { readonly [S in StandardStateSaid]: string } = {
  draft: 'Saved',
  proposed: 'Proposed',
  approved: 'Approved',
  superseded: 'Superseded',
  retired: 'Retired',
};

const changedText = ({ what, name, how, facts }: ChangedSince): string => {
  const of = `${capital(what)} ${name}`;
  switch (how) {
    case 'added':
      return `${of} came after it was approved`;
    case 'removed':
      return `${of} is no longer on the list`;
    case 'changed':
      return `${of} has changed since (${list(facts.map(factName))})`;
  }
};

const valueText = (name: FigureName, figure: Figure | null, show: Show): string =>
  figure === null ? 'none' : figureText(name, figure, show);

const differenceText = (
  name: FigureName,
  a: Figure | null,
  b: Figure | null,
  show: Show,
): string => {
  if (a === null || b === null || a.unit !== b.unit) return '';
  const value = Math.abs(b.value - a.value);
  const more = b.value > a.value ? 'more' : 'less';
  return ` (${figureText(name, { value, unit: a.unit }, show)} ${more})`;
};

const ITEM_DUE = ', review due';

export const standardLines: {
  readonly [K in keyof StandardLines]: (values: StandardLines[K], show: Show) => string;
} = {
  standardIs: ({ state, ...of }) => `Standard ${rev(of)}: ${STATES[state]}`,
  standardDone: ({ did, ...of }) => `Standard ${rev(of)} ${did}.`,
  standardTurnTo: ({ blankDiameter, toothCount, left, ...of }, show) =>
    `Standard ${rev(of)}: ${left ? 'leave it at' : 'turn to'} ${show.length(blankDiameter)}, ${teeth(toothCount)}   [${show.other(blankDiameter)}]`,
  standardSigned: ({ did, by, why, ...moment }) =>
    `${DONE[did]}${by === '' ? '' : ` by ${by}`}, ${dateText(moment)}${why === null ? '' : `: ${why}`}.`,
  standardWhy: ({ why }) => `Why: ${why}`,
  standardFromCard: ({ code }) => `From card ${code}.`,
  standardCovers: ({ facts }, show) =>
    `Covers this: ${list(facts.map((fact) => factText(fact, show)))}.`,
  standardPicked: ({ outside }) =>
    outside.length === 0
      ? 'Picked by its part number.'
      : `Picked by its part number, but your line is outside it: ${list(outside.map(thing))}. Ask before you run it.`,
  standardAlso: ({ parts }) => `Covered by ${list(parts)} too.`,
  standardChanged: (change) =>
    `${changedText(change)}: review this standard before the next batch.`,
  standardReviewDue: (moment) => `Its review was due on ${dateText(moment)}.`,
  standardReviewAt: (moment) => `To be reviewed by ${dateText(moment)}.`,
  standardSame: () => 'Second opinion: worked out now, every figure is the same.',
  standardDiffers: ({ count }) =>
    `Second opinion: worked out now, ${count === 1 ? 'one figure differs' : `${String(count)} figures differ`}:`,
  standardButStops: ({ check, ...of }) =>
    `The standard ${rev(of)} covers this, but worked out for what you said it stops at ${checks[check.name].label.toLowerCase()}. The stop goes first.`,
  standardBefore: ({ revision, pinned }) =>
    `Revision ${String(revision)} is superseded${pinned ? '; its pin comes off' : ''}.`,
  standardPosted: ({ where, line }) => {
    switch (where) {
      case 'channel':
        return 'It is posted and pinned in the standards channel.';
      case 'here':
        return `No standards channel is set: it is posted and pinned here. Set one: ${line}`;
      case 'nowhere':
        return `No standards channel is set and this is private: it is not posted anywhere. Set one: ${line}`;
    }
  },
  standardsListed: ({ count, state }) =>
    `${String(count)} ${count === 1 ? 'standard' : 'standards'}${state === null ? '' : `, ${STATES[state]}`}:`,
  standardsMore: () => 'and more; find looks through all of them, export has them.',
  standardsNone: ({ line }) => `No such standards yet. Work out a set-up, then: ${line}`,
  standardHistory: ({ part, revisions }) =>
    `History of ${part}: ${String(revisions)} ${revisions === 1 ? 'revision' : 'revisions'}`,
  standardCompared: ({ part, from, to, count }) =>
    count === 0
      ? `${part}: rev ${String(from)} and rev ${String(to)} have the same figures.`
      : `${part}, rev ${String(from)} to rev ${String(to)}: ${count === 1 ? 'one thing differs' : `${String(count)} things differ`}`,
  standardOnlyOne: (of) => `There is only ${rev(of)}: nothing to compare it with yet.`,
  oldestPins: ({ pins }) =>
    pins.length === 0
      ? 'None of its pins are standards of this shop. If the channel is full, take one off, then pin this one by hand.'
      : `Pinned longest: ${list(pins.map((pin) => `${rev(pin)} (${dateText(pin)})`))}. None was taken off. If the channel is full, take one off yourself, then pin this one by hand.`,
};

export const standardRows: {
  readonly [K in keyof StandardRows]: (values: StandardRows[K], show: Show) => LabelledText;
} = {
  standardItem: ({ part, revision, state, facts, blankDiameter, toothCount, due, open }, show) => ({
    label: part,
    text: [
      `rev ${String(revision)} ${STATES[state]}${due ? ITEM_DUE : ''}`,
      ...(open === null ? [] : [`rev ${String(open.revision)} ${STATES[open.state]}`]),
      `${show.length(blankDiameter)}, ${teeth(toothCount)}`,
      list(facts.map((fact) => factText(fact, show))),
    ].join('; '),
  }),
  standardStep: ({ revision, state, by, why, card, ...moment }) => ({
    label: `Rev ${String(revision)}`,
    text: `${DONE[state].toLowerCase()} by ${by}, ${momentText(moment)}${card === null ? '' : `, card ${card}`}${why === null ? '' : `: ${why}`}`,
  }),
  figureBeside: ({ name, standard, now }, show) => ({
    label: capital(figureName(name)),
    text: `standard ${valueText(name, standard, show)}, now ${valueText(name, now, show)}${differenceText(name, standard, now, show)}`,
  }),
  figureRevised: ({ name, before, after }, show) => ({
    label: capital(figureName(name)),
    text: `${valueText(name, before, show)} to ${valueText(name, after, show)}${differenceText(name, before, after, show)}`,
  }),
  factRevised: ({ name, before, after }, show) => ({
    label: capital(factName(name)),
    text: `${amountText(before, show)} to ${amountText(after, show)}`,
  }),
};

export const standardLabels: {
  readonly [K in keyof StandardLabels]: (values: StandardLabels[K], show: Show) => string;
} = {
  proposeStandard: () => 'Propose as standard',
  proposeRevision: ({ part }) => `Propose for ${part}`,
  proposeDraft: () => 'Propose it',
  approveStandard: (of) => `Approve ${rev(of)}`,
  retireStandard: (of) => `Retire ${rev(of)}`,
  showStandard: ({ part }) => `Show standard ${part}`,
  compareStandard: () => 'Compare with the one before',
  standardHistory: () => 'Its history',
};
