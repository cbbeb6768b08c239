import type { Evidence } from '../../calc/index.ts';
import type {
  CauseSaid,
  TroubleLabels,
  TroubleLines,
  TroubleRows,
} from '../../card/troubleLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { checkNames } from './checkNames.ts';
import { moveText } from './troubleMoves.ts';
import { causeNames, needNames, numberNames, symptomNames } from './troubleNames.ts';

/** Evidence spelled out on a row; the rest is for programs. */
const SPELLED = 2;

const percent = (share: number): string => `${String(Math.max(1, Math.round(share * 100)))} %`;

const STATES = { fine: 'fine', watch: 'watch', stop: 'stop' } as const;

const evidenceText = (evidence: Evidence, show: Show): string => {
  const side = evidence.factor >= 1 ? 'for' : 'against';
  switch (evidence.kind) {
    case 'number':
      return `${side}: ${show.number(Number(evidence.value.toFixed(2)))} ${numberNames[evidence.number]}`;
    case 'check':
      return `${side}: ${checkNames[evidence.check].toLowerCase()} ${STATES[evidence.state]}`;
    case 'need':
      return evidence.there
        ? `for: there is ${needNames[evidence.need]}`
        : `against: there is not ${needNames[evidence.need]}`;
  }
};

const because = ({ evidence }: CauseSaid, show: Show): string => {
  const spelled = evidence.slice(0, SPELLED).map((each) => evidenceText(each, show));
  return spelled.length === 0 ? '' : ` (${spelled.join('; ')})`;
};

export const troubleLines: {
  readonly [K in keyof TroubleLines]: (values: TroubleLines[K], show: Show) => string;
} = {
  troubleLikeliest: (said, show) =>
    `Most likely ${causeNames[said.cause]}: ${moveText(said.move, show)}`,
  troubleSeen: ({ symptom }) => `Seen: ${symptomNames[symptom]}.`,
  troubleOfCard: ({ code }) => `For your last set-up here, card ${code}.`,
  troubleByNumbers: () => "Ranked by this set-up's numbers.",
  troubleByWords: () =>
    'Ranked by words alone: say the bar, the pattern and the pitch too, and the numbers speak.',
};

export const troubleLabels: {
  readonly [K in keyof TroubleLabels]: (values: TroubleLabels[K], show: Show) => string;
} = {
  setUpCard: () => 'Set-up card',
  troubleSeen: () => 'Trouble',
  checkCard: () => 'Check this blank',
};

export const troubleRows: {
  readonly [K in keyof TroubleRows]: (values: TroubleRows[K], show: Show) => LabelledText;
} = {
  cause: (said, show) => ({
    label: `${String(said.place)}. ${percent(said.chance)}`,
    text: `${causeNames[said.cause]}: ${moveText(said.move, show)}${because(said, show)}`,
  }),
};
