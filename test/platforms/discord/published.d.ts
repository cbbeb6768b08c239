/** The package ships its schemas without types: what is used of them. */
declare module 'discord-api-spec/zod' {
  import type { ZodMiniType } from 'zod/mini';

  export const ApplicationCommandCreateRequestSchema: ZodMiniType;
  export const ApplicationCommandAutocompleteCallbackRequestSchema: ZodMiniType;
  export const CreateMessageInteractionCallbackRequestSchema: ZodMiniType;
  export const CreateTextThreadWithMessageRequestSchema: ZodMiniType;
  export const IncomingWebhookInteractionRequestSchema: ZodMiniType;
  export const IncomingWebhookUpdateForInteractionCallbackRequestPartialSchema: ZodMiniType;
  export const MessageCreateRequestSchema: ZodMiniType;
  export const MessageEditRequestPartialSchema: ZodMiniType;
  export const ModalInteractionCallbackRequestSchema: ZodMiniType;
}
