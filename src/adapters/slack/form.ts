import type { InputBlock, KnownBlock, ModalView, PlainTextOption } from '@slack/types';
import { z } from 'zod';
import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import {
  byWeight,
  isSwitch,
  isWhole,
  type Parameter,
  phrasesOf,
  shortened,
} from '../common/fields.ts';
import { type ControlId, idOf, readId } from '../common/ids.ts';
import { parameterName, verbSummary } from '../common/spoken.ts';
import { LIMITS } from './limits.ts';
import { type Handle, ONLY_ME_FIELD, WORDS_FIELD } from './receive.ts';
import { plain } from './render.ts';

/** Fields shown of a command's own; everything else is said in the words. Judgement: two thumbs' scroll. */
const FIELDS_SHOWN = 16;

/** The element that offers names while somebody types. */
export const SUGGESTS = 'suggest';
const FIELD = 'field';

/** What a form is for: a command, or an answer it goes on from. */
export type Purpose = { readonly path: readonly string[] } | { readonly control: ControlId };

const VERB = 'verb ';
export const callbackOf = (purpose: Purpose): string =>
  'path' in purpose ? `${VERB}${purpose.path.join(' ')}` : idOf(purpose.control);

/** Null for a form that is none of ours. */
export const purposeOf = (callback: string): Purpose | null => {
  if (callback.startsWith(VERB)) return { path: callback.slice(VERB.length).split(' ') };
  const control = readId(callback);
  return control === null ? null : { control };
};

const memory = z.object({
  channel: z.string().nullable(),
  thread: z.string().nullable(),
  responseUrl: z.string().nullable(),
  isPrivate: z.boolean(),
});
type Memory = z.infer<typeof memory>;

/** Where the reply to a form goes: the form carries it, no process does. */
const remembered = ({ channel, thread, responseUrl }: Handle, isPrivate: boolean): string => {
  const kept: Memory = { channel, thread, responseUrl, isPrivate };
  const written = JSON.stringify(kept);
  // Without its response address rather than without the form.
  return written.length <= LIMITS.privateMetadata
    ? written
    : JSON.stringify({ ...kept, responseUrl: null });
};

export const readMemory = (metadata: string): Memory => memory.parse(JSON.parse(metadata));

const input = (
  name: string,
  label: string,
  element: InputBlock['element'],
  optional = true,
): InputBlock => ({
  type: 'input',
  block_id: name,
  optional,
  label: plain(shortened(label, LIMITS.inputLabel)),
  element,
});

export const optionOf = (label: string, value: string): PlainTextOption => ({
  text: plain(shortened(label, LIMITS.option)),
  value,
});

const exampleOf = (examples: readonly string[]) =>
  examples.length === 0
    ? {}
    : { placeholder: plain(shortened(examples.join(', '), LIMITS.placeholder)) };

const textElement = (examples: readonly string[], more: object = {}): InputBlock['element'] => ({
  type: 'plain_text_input',
  action_id: FIELD,
  max_length: LIMITS.inputText,
  ...exampleOf(examples),
  ...more,
});

const elementOf = (book: Book, parameter: Parameter): InputBlock['element'] => {
  const { examples, suggests, name } = parameter;
  if (isSwitch(parameter))
    return {
      type: 'checkboxes',
      action_id: FIELD,
      options: [optionOf(parameterName(book, name), 'yes')],
    };
  const phrases = phrasesOf(parameter);
  if (phrases !== null && phrases.length <= LIMITS.options)
    return {
      type: 'static_select',
      action_id: FIELD,
      options: phrases.map((phrase) => optionOf(phrase, phrase)),
    };
  if (isWhole(parameter))
    return {
      type: 'number_input',
      action_id: FIELD,
      is_decimal_allowed: false,
      min_value: '0',
      ...exampleOf(examples),
    };
  if (suggests !== undefined || phrases !== null)
    return {
      type: 'external_select',
      action_id: SUGGESTS,
      min_query_length: 0,
      ...exampleOf(examples),
    };
  return textElement(examples);
};

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const onlyMe = (book: Book, isPrivate: boolean): InputBlock => {
  const option = optionOf(book.chat.onlyMe, 'yes');
  return input(ONLY_ME_FIELD, book.slack.audience, {
    type: 'checkboxes',
    action_id: FIELD,
    options: [option],
    ...(isPrivate ? { initial_options: [option] } : {}),
  });
};

type Opening = {
  readonly book: Book;
  readonly handle: Handle;
  readonly isPrivate: boolean;
};

const view = (
  { book, handle, isPrivate }: Opening,
  purpose: Purpose,
  title: string,
  blocks: readonly KnownBlock[],
): ModalView => ({
  type: 'modal',
  callback_id: callbackOf(purpose),
  private_metadata: remembered(handle, isPrivate),
  title: plain(shortened(title, LIMITS.viewTitle)),
  submit: plain(book.slack.send),
  close: plain(book.slack.cancel),
  blocks: [...blocks],
});

/** Everything a command can be told, as a form. */
export const verbForm = (opening: Opening, command: Command): ModalView => {
  const { book } = opening;
  const fields = byWeight(command)
    .slice(0, FIELDS_SHOWN)
    .map((parameter) =>
      input(
        parameter.name,
        capital(parameterName(book, parameter.name)),
        elementOf(book, parameter),
      ),
    );
  return view(opening, { path: command.path }, `/${command.path.join(' ')}`, [
    { type: 'context', elements: [plain(verbSummary(book, command))] },
    ...fields,
    input(WORDS_FIELD, book.slack.moreWords, textElement(command.examples, { multiline: true })),
    // A reply that goes to the person alone has no audience to choose.
    ...(opening.handle.channel === null ? [] : [onlyMe(book, opening.isPrivate)]),
  ]);
};

/** The few things that the line of a choice still has to be told. */
export const askingForm = (
  opening: Opening,
  control: ControlId,
  command: Command,
  ask: readonly string[],
): ModalView => {
  const { book } = opening;
  const fields = ask.flatMap((name) => {
    const parameter = command.parameters.find((each) => each.name === name);
    const label = capital(parameterName(book, name));
    return parameter === undefined ? [] : [input(name, label, elementOf(book, parameter))];
  });
  return view(opening, { control }, book.chat.formTitle, fields);
};

/** What was typed, to be changed and sent again. */
export const correctionForm = (opening: Opening, control: ControlId, text: string): ModalView => {
  const { correctTitle, correctField } = opening.book.chat;
  const element = textElement([], { multiline: true, initial_value: text });
  return view(opening, { control }, correctTitle, [
    input(WORDS_FIELD, correctField, element, false),
  ]);
};
