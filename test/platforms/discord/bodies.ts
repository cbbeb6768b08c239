/**
 * What comes from Discord, as the platform's own package describes it. JSON schemas are made from
 * these types: what Discord could not have sent, the counterpart does not send either.
 */
import type {
  APIApplicationCommand,
  APIApplicationCommandAutocompleteGuildInteraction,
  APIChatInputApplicationCommandGuildInteraction,
  APIDMChannel,
  APIDMInteractionWrapper,
  APIGuildInteractionWrapper,
  APIMessage,
  APIMessageApplicationCommandGuildInteraction,
  APIMessageComponentButtonInteraction,
  APIModalSubmitGuildInteraction,
  APIPublicThreadChannel,
  GatewayGuildCreateDispatchData,
  GatewayGuildDeleteDispatchData,
  GatewayMessageCreateDispatchData,
  GatewayReadyDispatchData,
  RESTGetAPIGatewayBotResult,
} from 'discord-api-types/v10';

export type Bodies = {
  readonly gateway: RESTGetAPIGatewayBotResult;
  readonly ready: GatewayReadyDispatchData;
  readonly guildCreate: GatewayGuildCreateDispatchData;
  readonly guildDelete: GatewayGuildDeleteDispatchData;
  readonly slash: APIChatInputApplicationCommandGuildInteraction;
  readonly suggestion: APIApplicationCommandAutocompleteGuildInteraction;
  readonly messageCommand: APIMessageApplicationCommandGuildInteraction;
  readonly button: APIGuildInteractionWrapper<APIMessageComponentButtonInteraction>;
  /** In a direct message: there is no server, and no member of one. */
  readonly directButton: APIDMInteractionWrapper<APIMessageComponentButtonInteraction>;
  readonly submission: APIModalSubmitGuildInteraction;
  readonly mention: GatewayMessageCreateDispatchData;
  readonly posted: APIMessage;
  readonly thread: APIPublicThreadChannel;
  readonly direct: APIDMChannel;
  readonly command: APIApplicationCommand;
};
