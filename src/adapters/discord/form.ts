import {
  type APIComponentInLabel,
  type APILabelComponent,
  type APIModalInteractionResponseCallbackData,
  ComponentType,
  type ModalSubmitInteraction,
  TextInputStyle,
} from 'discord.js';
import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { type Parameter, phrasesOf, shortened } from '../common/fields.ts';
import { type ControlId, idOf } from '../common/ids.ts';
import { parameterName } from '../common/spoken.ts';
import { LIMITS } from './limits.ts';
import { WORDS_OPTION } from './receive.ts';

export type ModalForm = APIModalInteractionResponseCallbackData;

const labelled = (label: string, component: APIComponentInLabel): APILabelComponent => ({
  type: ComponentType.Label,
  label: shortened(label, LIMITS.modalLabel),
  component,
});

const textInput = (
  name: string,
  { examples = [], required }: { examples?: readonly string[]; required: boolean },
): APIComponentInLabel => ({
  type: ComponentType.TextInput,
  custom_id: name,
  style: TextInputStyle.Short,
  max_length: LIMITS.modalText,
  required,
  ...(examples.length === 0
    ? {}
    : { placeholder: shortened(examples.join(', '), LIMITS.placeholder) }),
});

/** A list where only what is on it can be said, a line of text for everything else. */
const inputOf = (parameter: Parameter, required: boolean): APIComponentInLabel => {
  const { name, examples } = parameter;
  const phrases = phrasesOf(parameter);
  if (phrases === null || phrases.length === 0 || phrases.length > LIMITS.choices)
    return textInput(name, { examples, required });
  return {
    type: ComponentType.StringSelect,
    custom_id: name,
    required,
    min_values: required ? 1 : 0,
    max_values: 1,
    options: phrases.map((phrase) => ({
      label: shortened(phrase, LIMITS.choiceName),
      value: phrase,
    })),
  };
};

const formOf = (
  control: ControlId,
  title: string,
  components: readonly APILabelComponent[],
): ModalForm => ({
  custom_id: idOf(control),
  title: shortened(title, LIMITS.modalTitle),
  components: [...components],
});

/**
 * What the line of a choice still has to be told. Of more than a form holds the last field takes
 * the rest in words.
 */
export const askingForm = (
  book: Book,
  control: ControlId,
  command: Command,
  ask: readonly string[],
): ModalForm => {
  const asked = ask.flatMap((name) => command.parameters.filter((each) => each.name === name));
  const fits = asked.length <= LIMITS.modalFields;
  const shown = fits ? asked : asked.slice(0, LIMITS.modalFields - 1);
  const [first] = asked;
  // Sent without its one field it would say nothing.
  const required = asked.length === 1 && first !== undefined;
  const fields = shown.map((each) =>
    labelled(parameterName(book, each.name), inputOf(each, required)),
  );
  const rest = labelled(book.discord.moreWords, textInput(WORDS_OPTION, { required: false }));
  return formOf(control, book.chat.formTitle, fits ? fields : [...fields, rest]);
};

/** What was typed, to be changed and sent again. */
export const correctionForm = (book: Book, control: ControlId, text: string): ModalForm => {
  const { correctTitle, correctField } = book.chat;
  return formOf(control, correctTitle, [
    labelled(correctField, {
      type: ComponentType.TextInput,
      custom_id: WORDS_OPTION,
      style: TextInputStyle.Paragraph,
      max_length: LIMITS.modalText,
      required: true,
      value: text.slice(0, LIMITS.modalText),
    }),
  ]);
};

/** The fields of a form that were filled in, under the names of the command's own parameters. */
export const filledIn = (interaction: ModalSubmitInteraction): Readonly<Record<string, string>> =>
  Object.fromEntries(
    [...interaction.fields.fields.values()].flatMap((field) => {
      const values: readonly unknown[] =
        'values' in field && Array.isArray(field.values) ? field.values : [];
      const said: unknown = 'value' in field ? field.value : values[0];
      const typed = typeof said === 'string' ? said.trim() : '';
      return typed === '' ? [] : [[field.customId, typed] as const];
    }),
  );
