import type { ButtonInteraction, ModalSubmitInteraction } from 'discord.js';
import { unreachable } from '../../card/index.ts';
import { type Answer, type Call, type Desk, route } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { type ControlId, readId } from '../common/ids.ts';
import { cautionsOf, sentence } from '../common/spoken.ts';
import { within } from '../common/within.ts';
import type { Flow } from './flow.ts';
import { askingForm, correctionForm, filledIn, type ModalForm } from './form.ts';
import { withMentions } from './mentions.ts';
import { callOf, handleOf, WORDS_OPTION } from './receive.ts';
import type { Handle, Sender } from './send.ts';

export type Controls = {
  readonly desk: Desk;
  readonly book: Book;
  readonly flow: Flow;
  readonly sender: Sender;
};

/** How long the records may take to say what a button was for. Judgement. */
const RECALL_MS = 900;

const NOTHING: Call['given'] = { words: '' };

type At = {
  readonly handle: Handle;
  readonly call: Call;
  readonly since: number;
};

/** The form of a choice that needs more words: fields from its command's own parameters. */
const choiceForm = (
  { desk, book }: Controls,
  control: Extract<ControlId, { control: 'press' }>,
  answer: Answer | null,
): ModalForm | null => {
  if (answer?.kind !== 'card') return null;
  const { ask = [], words = '' } = answer.card.choices[control.choice] ?? {};
  const way = route(words, desk.fleet);
  return ask.length === 0 || !('command' in way)
    ? null
    : askingForm(book, control, way.command, ask);
};

/** In a direct message the button says whose it is; they have to be a member still. */
const inItsShop = async (
  { sender }: Controls,
  call: Call,
  control: ControlId | null,
): Promise<Call | null> => {
  const { shop } = control ?? {};
  if (shop === undefined || call.shop !== '') return call;
  const member = await within(sender.member(shop, call.person.id), RECALL_MS, null);
  if (member === null) return null;
  const person = { id: call.person.id, name: member.name, groups: member.roles };
  return { ...call, shop, person };
};

const openForm = async ({ sender, flow }: Controls, { handle, call }: At, form: ModalForm) => {
  const taken = await sender.form(handle, form);
  if (taken === 'tooLate') await flow.formLate(handle, call);
};

/** What a button does that still has something behind it; false where it has not. */
const act = async (controls: Controls, at: At, control: ControlId): Promise<boolean> => {
  const { desk, book, flow } = controls;
  const { handle, call, since } = at;
  // A form cannot follow a deferral: records that are slow leave no time for one.
  const recalled = await within(desk.recall(call, control.of), RECALL_MS, null);
  switch (control.control) {
    case 'cautions': {
      const card = cautionsOf(recalled, book);
      if (card === null) return false;
      await flow.say(handle, call, card);
      return true;
    }
    case 'correct': {
      if (recalled?.kind !== 'refusal') return false;
      await openForm(controls, at, correctionForm(book, control, recalled.text));
      return true;
    }
    case 'show': {
      if (recalled === null) return false;
      await (control.person === call.person.id
        ? flow.show(handle, call, recalled, control.of)
        : flow.say(handle, call, sentence(book.discord.notYours)));
      return true;
    }
    case 'press': {
      const form = choiceForm(controls, control, recalled);
      if (form !== null) {
        await openForm(controls, at, form);
        return true;
      }
      const given = { pressed: { of: control.of, choice: control.choice } };
      await flow.answer(handle, { ...call, given }, { since });
      return true;
    }
    default:
      return unreachable(control);
  }
};

/** A button: of the newest answer or of one from weeks ago. */
export const pressed = async (
  controls: Controls,
  interaction: ButtonInteraction,
): Promise<void> => {
  const since = performance.now();
  const control = readId(interaction.customId);
  const handle = handleOf(interaction);
  const asked = callOf(interaction, NOTHING, control?.isPrivate ?? true);
  const call = await inItsShop(controls, asked, control);
  const isDone =
    control !== null && call !== null && (await act(controls, { handle, call, since }, control));
  if (!isDone) await controls.flow.say(handle, asked, sentence(controls.book.chat.gone));
};

const givenBy = (
  control: ControlId,
  added: Readonly<Record<string, string>>,
): Call['given'] | null => {
  if (control.control === 'press')
    return { pressed: { of: control.of, choice: control.choice, added } };
  const words = added[WORDS_OPTION];
  return control.control === 'correct' && words !== undefined ? { words } : null;
};

/** A form that was sent: the corrected line, or a choice with what it asked for. */
export const submitted = async (
  controls: Controls,
  interaction: ModalSubmitInteraction,
): Promise<void> => {
  const { book, flow } = controls;
  const since = performance.now();
  const control = readId(interaction.customId);
  const handle = handleOf(interaction);
  const asked = callOf(interaction, NOTHING, control?.isPrivate ?? true);
  const call = await inItsShop(controls, asked, control);
  const given = control === null ? null : givenBy(control, filledIn(interaction));
  if (given === null || call === null) {
    await flow.say(handle, asked, sentence(book.chat.nothingToRead));
    return;
  }
  await flow.answer(
    handle,
    { ...call, given },
    { since, prepare: (plain) => withMentions(plain, interaction.guild) },
  );
};
