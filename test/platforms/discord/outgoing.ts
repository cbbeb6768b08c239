/** What goes to Discord, held against the platform's own published description of its routes. */
import {
  ApplicationCommandAutocompleteCallbackRequestSchema,
  ApplicationCommandCreateRequestSchema,
  CreateMessageInteractionCallbackRequestSchema,
  CreateTextThreadWithMessageRequestSchema,
  IncomingWebhookInteractionRequestSchema,
  IncomingWebhookUpdateForInteractionCallbackRequestPartialSchema,
  MessageCreateRequestSchema,
  MessageEditRequestPartialSchema,
  ModalInteractionCallbackRequestSchema,
} from 'discord-api-spec/zod';
import { prettifyError } from 'zod';
import { type Body, commandFaults, formFaults, type MessageRoute, messageFaults } from './rules.ts';

const SCHEMAS = {
  reply: CreateMessageInteractionCallbackRequestSchema,
  form: ModalInteractionCallbackRequestSchema,
  suggestions: ApplicationCommandAutocompleteCallbackRequestSchema,
  editOriginal: IncomingWebhookUpdateForInteractionCallbackRequestPartialSchema,
  followUp: IncomingWebhookInteractionRequestSchema,
  post: MessageCreateRequestSchema,
  edit: MessageEditRequestPartialSchema,
  thread: CreateTextThreadWithMessageRequestSchema,
  command: ApplicationCommandCreateRequestSchema,
} as const;
export type Outgoing = keyof typeof SCHEMAS;

/** Paths of what the schema did not know and therefore left out. */
const leftOut = (sent: unknown, known: unknown, path: string): readonly string[] => {
  if (typeof sent !== 'object' || sent === null) return [];
  if (typeof known !== 'object' || known === null) return [path];
  return Object.entries(sent).flatMap(([key, each]: [string, unknown]) => {
    if (each === undefined) return [];
    const below = `${path}.${key}`;
    return key in known ? leftOut(each, (known as Body)[key], below) : [below];
  });
};

const schemaFaults = (kind: Outgoing, body: unknown): readonly string[] => {
  const read = SCHEMAS[kind].safeParse(body);
  if (!read.success) return [`${kind}: ${prettifyError(read.error)}`];
  return leftOut(body, read.data, kind).map((path) => `an unknown property: ${path}`);
};

const ruleFaults = (kind: Outgoing, body: Body, files: readonly string[]): readonly string[] => {
  switch (kind) {
    case 'reply':
      return body['type'] === 4 ? messageFaults(kind, (body['data'] ?? {}) as Body, files) : [];
    case 'form':
      return formFaults((body['data'] ?? {}) as Body);
    case 'command':
      return commandFaults(body);
    case 'thread':
    case 'suggestions':
      return [];
    default:
      return messageFaults(kind satisfies MessageRoute, body, files);
  }
};

/** Everything for which Discord would refuse a body. */
export const outgoingFaults = (
  kind: Outgoing,
  body: unknown,
  files: readonly string[] = [],
): readonly string[] => [
  ...schemaFaults(kind, body),
  ...ruleFaults(kind, (body ?? {}) as Body, files),
];
