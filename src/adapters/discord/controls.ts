import type { ButtonInteraction, ModalSubmitInteraction } from 'discord.js';
import { type Answer, type Call, type Desk, route } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { type ControlId, readId } from '../common/ids.ts';
import { cautionsOf, parameterName, sentence } from '../common/spoken.ts';
import { within } from '../common/within.ts';
import type { Flow } from './flow.ts';
import { callOf, handleOf, WORDS_OPTION } from './receive.ts';
import { formOfFields } from './render.ts';
import type { Sender } from './send.ts';

type Controls = {
  readonly desk: Desk;
  readonly book: Book;
  readonly flow: Flow;
  readonly sender: Sender;
};

/** How long the records may take to say what a button was for. Judgement. */
const RECALL_MS = 900;

const NOTHING: Call['given'] = { words: '' };

/** What a choice still has to be told before its line can be sent. */
const askedBy = (answer: Answer | null, choice: number): readonly string[] =>
  answer?.kind === 'card' ? (answer.card.choices[choice]?.ask ?? []) : [];

/** The form of a choice that needs more words: fields from its command's own parameters. */
const choiceForm = (
  { desk, book }: Controls,
  control: Extract<ControlId, { control: 'press' }>,
  answer: Answer | null,
) => {
  const ask = askedBy(answer, control.choice);
  if (answer?.kind !== 'card' || ask.length === 0) return null;
  const way = route(answer.card.choices[control.choice]?.words ?? '', desk.fleet);
  const parameters = 'command' in way ? way.command.parameters : [];
  const fields = ask.map((name) => {
    const parameter = parameters.find((each) => each.name === name);
    const example = parameter?.examples.join(', ') ?? '';
    return { name, label: parameterName(book, name), example };
  });
  return formOfFields(control, book.chat.formTitle, fields);
};

const correctionForm = ({ book }: Controls, control: ControlId, answer: Answer | null) => {
  if (answer?.kind !== 'refusal') return null;
  const { correctTitle, correctField } = book.chat;
  return formOfFields(control, correctTitle, [
    { name: WORDS_OPTION, label: correctField, example: '', value: answer.text, long: true },
  ]);
};

/** A button: of the newest answer or of one from weeks ago. */
export const pressed = async (
  controls: Controls,
  interaction: ButtonInteraction,
): Promise<void> => {
  const { desk, book, flow, sender } = controls;
  const since = performance.now();
  const control = readId(interaction.customId);
  const handle = handleOf(interaction);
  const call = callOf(interaction, NOTHING, control?.isPrivate ?? true);
  const gone = () => flow.say(handle, call, sentence(book.chat.gone));
  if (control === null) {
    await gone();
    return;
  }
  const { of } = control;
  // A form cannot follow a deferral: records that are slow leave no time for one.
  const recalled = within(desk.recall(call, of), RECALL_MS, null);
  switch (control.control) {
    case 'cautions': {
      const card = cautionsOf(await recalled, book);
      await (card === null ? gone() : flow.say(handle, call, card));
      return;
    }
    case 'correct': {
      const form = correctionForm(controls, control, await recalled);
      await (form === null ? gone() : sender.form(handle, form));
      return;
    }
    case 'press': {
      const form = choiceForm(controls, control, await recalled);
      if (form !== null) {
        await sender.form(handle, form);
        return;
      }
      const given = { pressed: { of, choice: control.choice } };
      await flow.answer(handle, { ...call, given }, since);
    }
  }
};

/** The fields of a form that were filled in. */
const filledIn = (interaction: ModalSubmitInteraction): Readonly<Record<string, string>> =>
  Object.fromEntries(
    [...interaction.fields.fields.values()].flatMap((field) => {
      const typed = 'value' in field && typeof field.value === 'string' ? field.value.trim() : '';
      return typed === '' ? [] : [[field.customId, typed] as const];
    }),
  );

/** A form that was sent: the corrected line, or a choice with what it asked for. */
export const submitted = async (
  { book, flow }: Controls,
  interaction: ModalSubmitInteraction,
): Promise<void> => {
  const control = readId(interaction.customId);
  const handle = handleOf(interaction);
  const call = callOf(interaction, NOTHING, control?.isPrivate ?? true);
  const added = filledIn(interaction);
  if (control?.control === 'press') {
    const given = { pressed: { of: control.of, choice: control.choice, added } };
    await flow.answer(handle, { ...call, given });
    return;
  }
  const words = added[WORDS_OPTION];
  if (control?.control !== 'correct' || words === undefined) {
    await flow.say(handle, call, sentence(book.chat.nothingToRead));
    return;
  }
  await flow.answer(handle, { ...call, given: { words } });
};
