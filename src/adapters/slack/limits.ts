/**
 * What Slack takes. Documented at docs.slack.dev (reference/block-kit, reference/methods,
 * apis/events-api, messaging); checked 2026-12-01. Where the platform refuses all the same,
 * believe the platform.
 */
export const LIMITS = {
  /** Blocks of a message, and of a form or a home. */
  blocks: 50,
  viewBlocks: 100,
  /** Characters of a text in a section. */
  sectionText: 3000,
  /** Characters of a message's own text, which notifications and screen readers use. */
  messageText: 4000,
  /** Characters of a message with its blocks, as encoded; the page on messages names 40 000. */
  encoded: 40_000,
  buttons: 25,
  buttonLabel: 75,
  buttonValue: 2000,
  actionId: 255,
  option: 75,
  /** A value of an option (composition objects, option object). */
  optionValue: 75,
  options: 100,
  placeholder: 150,
  inputLabel: 2000,
  inputText: 3000,
  viewTitle: 24,
  shortcutName: 24,
  privateMetadata: 3000,
  fieldError: 2000,
  /** A response address takes this many posts in half an hour. */
  responses: 5,
  altText: 1000,
  /** Slack takes a gigabyte; as much as is held in memory for one file. Judgement. */
  fileBytes: 50 * 1024 * 1024,
  summary: 2000,
} as const;

/** Errors with which Slack refuses (reference/methods), by what they mean here. */
export const REFUSALS = {
  /** The bot may not write there by itself. */
  notThere: [
    'not_in_channel',
    'channel_not_found',
    'restricted_action',
    'restricted_action_thread_locked',
    'restricted_action_non_threadable_channel',
    'is_archived',
    'user_not_in_channel',
    'cannot_reply_to_message',
    'missing_scope',
  ],
  /** The three seconds in which a form may be opened are over, or it was opened before. */
  triggerOver: [
    'expired_trigger_id',
    'trigger_expired',
    'exchanged_trigger_id',
    'trigger_exchanged',
    'invalid_trigger_id',
  ],
  tokenWrong: [
    'invalid_auth',
    'not_authed',
    'account_inactive',
    'token_revoked',
    'token_expired',
    'not_allowed_token_type',
  ],
  pinned: ['already_pinned'],
  notPinned: ['no_pin', 'not_pinned', 'message_not_found'],
  /** What was asked for can never be done. */
  refused: [
    'too_many_pins',
    'cannot_pin',
    'not_pinnable',
    'permission_denied',
    'cant_update_message',
    'edit_window_closed',
  ],
  gone: [
    'message_not_found',
    'channel_not_found',
    'is_archived',
    'user_not_found',
    'users_not_found',
  ],
} as const;
