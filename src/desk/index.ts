export { type Answer, choicesIn } from './answer.ts';
export type {
  Attached,
  Call,
  Directory,
  Named,
  Options,
  Person,
  Place,
  Pressed,
} from './call.ts';
export {
  type About,
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Lead,
  parameterOf,
  type Reply,
  refuse,
  said,
} from './command.ts';
export {
  type Desk,
  type FactsOf,
  openDesk,
  plainShop,
  type ShopFacts,
} from './desk.ts';
export type { Effect, MessageAddress, Ring, Target } from './effect.ts';
export { type KeptAnswers } from './kept.ts';
export type { PinnedStandard } from './pinned.ts';
export { queued } from './queued.ts';
export { openRecordsDesk, type RecordsDeskOptions, SHOP_WORDS } from './records.ts';
export { atLeast, ROLES, type Role } from './role.ts';
export { type Route, route } from './route.ts';
export { placeName } from './settle.ts';
export type { Visit } from './visit.ts';
