export type { Call, Person, Place } from './call.ts';
export {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  said,
} from './command.ts';
export {
  type Answer,
  type Desk,
  type FactsOf,
  openDesk,
  plainShop,
  type ShopFacts,
} from './desk.ts';
export type { Effect, MessageAddress } from './effect.ts';
export { atLeast, ROLES, type Role } from './role.ts';
