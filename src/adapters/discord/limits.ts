/**
 * What Discord takes. Documented at discord.com/developers/docs (resources/message, components
 * reference, interactions/application-commands); checked 2026-12-01. Where the platform refuses
 * all the same, believe the platform.
 */
export const LIMITS = {
  /** Characters of all texts of a message of components together. */
  messageText: 4000,
  /** Components of a message, those inside others counted too. */
  components: 40,
  buttonsInRow: 5,
  buttonLabel: 80,
  customId: 100,
  galleryItems: 10,
  altText: 1024,
  /** Options of a command; choices of an option; suggestions. */
  options: 25,
  choices: 25,
  name: 32,
  description: 100,
  choiceName: 100,
  choiceValue: 100,
  /** Name, description, option names and choices of one command with all below it. */
  commandText: 8000,
  subcommands: 25,
  modalFields: 5,
  modalTitle: 45,
  modalLabel: 45,
  modalText: 4000,
  placeholder: 100,
  nonce: 25,
  threadName: 100,
  /** Pins a channel holds. */
  pins: 250,
  /** All files of a message together, in bytes, where nobody pays for more; and how many. */
  files: 10 * 1024 * 1024,
  filesInMessage: 10,
} as const;

/** Codes with which Discord refuses (topics/opcodes-and-status-codes), by what they mean here. */
export const REFUSALS = {
  /** The id of another application, or of none. */
  notThisApplication: [10002, 20012],
  unknownChannel: [10003],
  unknownGuild: [10004],
  unknownMember: [10007],
  unknownMessage: [10008],
  unknownPerson: [10013],
  unknownWebhook: [10015],
  /** The time to acknowledge is over. */
  unknownInteraction: [10062],
  pinsFull: [30003],
  alreadyAcknowledged: [40060],
  missingAccess: [50001],
  /** Their direct messages are closed, or no server is shared. */
  cannotSendToPerson: [50007, 50278],
  missingPermission: [50013],
  /** Not in a channel of this kind, such as a thread in a thread; or no more threads at once. */
  noThreadHere: [50024, 160006, 160007],
  /** The fifteen minutes of an interaction are over. */
  expiredToken: [50027],
  threadExists: [160004],
} as const satisfies Readonly<Record<string, readonly number[]>>;
