import {
  type Card,
  type Choice,
  label,
  line,
  type Part,
  type Row,
  row,
} from '../../../src/card/index.ts';
import {
  answersTo,
  type GivenAnswer,
  isWaiting,
  type KeptCard,
  personById,
  type Question,
  type Settings,
  type ShopView,
  settingsOf,
} from '../../../src/shop/index.ts';

/** The card a question is about, as it was kept. */
export type Attached = Pick<KeptCard, 'code'> & { readonly card: Card };

export const attachedFrom = (kept: KeptCard): Attached => ({
  code: kept.code,
  // What was kept is what was handed in: a card of this program or an older one.
  card: kept.card as Card,
});

export const nameOf = async (view: ShopView, person: string): Promise<string> =>
  (await personById(view, person))?.name ?? '';

/** Signs of a text that stand in a headline. Judgement: what a phone shows of a message it tells of. */
const IN_HEADLINE = 120;

/** A text for a headline, so that it can be acted on alone, and the whole where that is longer. */
const told = (text: string): { readonly text: string; readonly whole: readonly Part[] } => {
  const signs = Array.from(text.replaceAll('\n', ' '));
  if (signs.length <= IN_HEADLINE && !text.includes('\n')) return { text, whole: [] };
  const short = signs.slice(0, IN_HEADLINE - 1).join('');
  return { text: `${short}…`, whole: [{ part: 'own', texts: [text] }] };
};

const bare = (units: Card['units'], told: Pick<Card, 'headline' | 'parts' | 'choices'>): Card => ({
  verb: 'question',
  ...told,
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units,
});

const answerChoice = ({ code }: Question): Choice => ({
  label: label('answerIt', {}),
  words: `/knurl answer ${code}`,
  ask: ['answer'],
});
const reopenChoice = ({ code }: Question): Choice => ({
  label: label('reopenIt', {}),
  words: `/knurl reopen ${code}`,
});
const solvedChoice = ({ code }: Question, number: number, isOnly: boolean): Choice => ({
  label: isOnly ? label('solvedIt', {}) : label('solvedBy', { number }),
  words: `/knurl solved ${code} answer ${String(number)}`,
});

/** The newest answers are those that may still have to be accepted. Judgement. */
const ANSWERS_OFFERED = 3;

/** What can be done with a question as it stands. */
const choicesFor = (question: Question, answers: readonly GivenAnswer[]): readonly Choice[] => {
  if (question.state === 'solved') return [reopenChoice(question)];
  const solved = answers
    .slice(-ANSWERS_OFFERED)
    .map(({ number }) => solvedChoice(question, number, answers.length === 1));
  return [
    answerChoice(question),
    ...solved,
    ...(isWaiting(question) ? [] : [reopenChoice(question)]),
  ];
};

/** The numbers that go with a question: the whole card, its cautions and all, under its code. */
const attachedParts = (attached: Attached | null): readonly Part[] =>
  attached === null
    ? [{ part: 'lines', lines: [line('questionAlone', {})] }]
    : [
        {
          part: 'lines',
          lines: [line('questionAbout', { card: attached.code }), attached.card.headline],
        },
        ...attached.card.parts,
      ];

/** The question as it is put up: who asks what, where it stands, and the numbers it is about. */
export const questionCard = async (
  view: ShopView,
  question: Question,
  attached: Attached | null,
): Promise<Card> => {
  const { code, state, accepted } = question;
  const { text, whole } = told(question.text);
  const answers = await answersTo(view, question.id);
  const solvedBy = answers.find(({ number }) => number === accepted);
  const about = attached?.card;
  return {
    ...bare(about?.units ?? (await settingsOf(view)).units, {
      headline: line('questionFrom', { code, by: await nameOf(view, question.askedBy), text }),
      parts: [
        ...whole,
        {
          part: 'lines',
          lines: [
            line('questionStands', {
              state,
              answers: answers.length,
              accepted:
                solvedBy === undefined
                  ? null
                  : { number: solvedBy.number, by: await nameOf(view, solvedBy.givenBy) },
            }),
          ],
        },
        ...attachedParts(attached),
      ],
      choices: choicesFor(question, answers),
    }),
    ...(about === undefined
      ? {}
      : { figures: about.figures, checks: about.checks, cautions: about.cautions }),
  };
};

/** An answer as it is told to whoever asked. */
export const answerCard = async (
  view: ShopView,
  question: Question,
  { number, text: words, givenBy }: GivenAnswer,
): Promise<Card> => {
  const by = await nameOf(view, givenBy);
  const { text, whole } = told(words);
  return bare((await settingsOf(view)).units, {
    headline: line('answerFrom', { code: question.code, number, by, text }),
    parts: whole,
    choices: [solvedChoice(question, number, true), reopenChoice(question)],
  });
};

/** A question that waits again, and why. */
export const reopenedCard = async (
  view: ShopView,
  question: Question,
  words: string,
  by: string,
): Promise<Card> => {
  const { text: why, whole } = told(words);
  const { code, text } = question;
  return bare((await settingsOf(view)).units, {
    headline: line('questionReopened', { code, by: await nameOf(view, by), why }),
    parts: [...whole, { part: 'own', texts: [text] }],
    choices: [answerChoice(question)],
  });
};

/** A question that comes up again: short, its numbers stand where it was put up first. */
export const reminderCard = async (
  view: ShopView,
  question: Question,
  { units, timeZone: zone }: Settings,
  { number: again, isLast }: { readonly number: number; readonly isLast: boolean },
): Promise<Card> => {
  const { code, waitsSince: at } = question;
  const { text, whole } = told(question.text);
  const by = await nameOf(view, question.askedBy);
  return bare(units, {
    headline: line('questionWaits', { code, by, text, since: { at, zone }, again, isLast }),
    parts: whole,
    choices: [
      answerChoice(question),
      { label: label('questionShown', { code }), words: `/knurl questions ${code}` },
    ],
  });
};

/** The answers to a question, the accepted one marked. */
export const answerRows = async (view: ShopView, question: Question): Promise<readonly Row[]> => {
  const { timeZone: zone } = await settingsOf(view);
  const rows: Row[] = [];
  for (const { number, text, givenBy, givenAt: at } of await answersTo(view, question.id)) {
    const isAccepted = number === question.accepted;
    const by = await nameOf(view, givenBy);
    rows.push(row('answerItem', { number, text, by, given: { at, zone }, isAccepted }));
  }
  return rows;
};

/** The answer that solved a question. */
export const acceptedRows = async (view: ShopView, question: Question): Promise<readonly Row[]> =>
  (await answerRows(view, question)).filter(
    (each) => each.row === 'answerItem' && each.values.isAccepted,
  );
