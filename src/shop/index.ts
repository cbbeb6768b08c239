/** What a shop remembers: asked of one shop, changed whole or not at all. */
export { type Store, StoreUnavailable } from '../store/index.ts';
export {
  type CardDraft,
  type CardsWanted,
  cardById,
  findCard,
  type KeptCard,
  keepCard,
  latestCards,
  latestCodes,
} from './cards.ts';
export { type Carried, type Claimed, claimEffects, type NoteOf } from './claims.ts';
export { CODE_SIGNS, readCode } from './codes.ts';
export { canLeave, cribFor, leaves, sizeOf } from './crib.ts';
export {
  type Imported,
  type ImportOptions,
  type ImportReport,
  importSheet,
  type RowReport,
} from './csv/import.ts';
export { MACHINE_SHEET } from './csv/machineSheet.ts';
export { WHEEL_SHEET } from './csv/wheelSheet.ts';
export { startOfYesterday } from './dayStart.ts';
export { limitsOf, onDial } from './dial.ts';
export {
  effectOf,
  type GivenUp,
  givenUp,
  givenUpSeen,
  isUnderWay,
  type QueuedEffect,
  queueEffects,
} from './effects.ts';
export {
  type Entered,
  enterShop,
  type PersonOutside,
  type ShopOutside,
  shopOf,
} from './enter.ts';
export {
  type ExportFile,
  exportCsv,
  exportFiles,
  exportJson,
  machinesCsv,
  wheelsCsv,
} from './export.ts';
export {
  dropFromFind,
  type Findable,
  type FindOptions,
  type ForFind,
  type Found,
  findEntries,
  hasWords,
  nearestWords,
  putForFind,
} from './find/index.ts';
export {
  listGroups,
  nameGroupRole,
  type RoleGroup,
  removeGroup,
  rolesOfGroups,
} from './groups.ts';
export { type HistoryLine, historyOf, type Subject, type Verb } from './history.ts';
export { type Acted, answerTo, forgetAnswers, once } from './interactions.ts';
export { BARE_MACHINE, type Dial, MACHINES, type Machine } from './machines.ts';
export { MATERIALS_OF_SHOP, type ShopMaterial } from './materials.ts';
export {
  type Attempt,
  type Deliver,
  type Outbox,
  type OutboxOptions,
  openOutbox,
} from './outbox.ts';
export {
  findPerson,
  listPeople,
  meetPerson,
  nameRole,
  personById,
  removePerson,
  type ShopPerson,
  whoMay,
} from './people.ts';
export {
  type Answered,
  type Asking,
  answerQuestion,
  askQuestion,
  type Reopening,
  reopenQuestion,
  type Solving,
  solveQuestion,
} from './questions/act.ts';
export {
  answerKey,
  postKey,
  reminderKey,
  reopenKey,
  shownKey,
  threadKey,
} from './questions/keys.ts';
export {
  answersTo,
  findQuestion,
  questionInThread,
  questionsOnCard,
  unsolvedQuestions,
} from './questions/look.ts';
export {
  type GivenAnswer,
  isWaiting,
  type Question,
  type QuestionState,
} from './questions/question.ts';
export { openReminders, type ReminderOptions, type Reminders } from './questions/reminders.ts';
export { type PutUp } from './questions/waiting.ts';
export { MINUTES_OF_DAY, type QuietHours } from './quiet.ts';
export * from './record/index.ts';
export {
  addTo,
  changeIn,
  findIn,
  type Kept,
  listOf,
  type Register,
  removeFrom,
} from './register.ts';
export type { Done } from './result.ts';
export {
  type Compared,
  causeCounts,
  confirmResult,
  correctResult,
  findResult,
  growthIn,
  growthTallies,
  type KeptResult,
  type Logged,
  latestResults,
  logResult,
  lookAtResult,
  type NoGrowth,
  OUTCOMES,
  type Outcome,
  type ResultContent,
  type ResultsWanted,
  type ResultWanted,
  resultById,
  resultName,
  type Standing,
  symptomOf,
  withdrawResult,
} from './results/index.ts';
export { atLeast, ROLES, type Role } from './roles.ts';
export { addRule, RULES, type Rule, type RuleScope, rulesOnCard } from './rules.ts';
export {
  changeSetting,
  type SettingName,
  type Settings,
  settingsOf,
} from './settings.ts';
export { type SpokenNames, spokenNames } from './spoken.ts';
export * from './standards/index.ts';
export { type Tellable, toTell } from './telling.ts';
export {
  type SetUp,
  type Some,
  setUpSince,
  standardsToDecide,
  standardsToReview,
  wrongSince,
} from './today.ts';
export { type ShopChange, type ShopView, type ShopWords, viewShop } from './view.ts';
export {
  BARE_WHEEL,
  EDGES,
  PIN_MATERIALS,
  WHEEL_FORMS,
  WHEEL_STATES,
  WHEELS,
  type Wheel,
  type WheelForm,
  type WheelState,
} from './wheels.ts';
