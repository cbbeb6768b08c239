/**
 * What goes to Slack and what comes from it, as the platform's own packages describe it. JSON
 * schemas are made from these types: what Slack would not take, or could not have sent, is
 * refused here too.
 */
import type {
  BlockAction,
  BlockSuggestion,
  ButtonAction,
  EnvelopedEvent,
  GlobalShortcut,
  MessageShortcut,
  SlashCommand,
  StaticSelectAction,
  ViewSubmitAction,
} from '@slack/bolt';
import type {
  AppHomeOpenedEvent,
  AppMentionEvent,
  HomeView,
  KnownBlock,
  ModalView,
} from '@slack/types';

export type Bodies = {
  readonly message: { readonly text: string; readonly blocks?: KnownBlock[] };
  readonly modal: Omit<ModalView, 'blocks'> & { blocks: KnownBlock[] };
  readonly home: Omit<HomeView, 'blocks'> & { blocks: KnownBlock[] };
  readonly slash: SlashCommand;
  readonly button: BlockAction<ButtonAction>;
  readonly select: BlockAction<StaticSelectAction>;
  readonly suggestion: BlockSuggestion;
  readonly globalShortcut: GlobalShortcut;
  readonly messageShortcut: MessageShortcut;
  readonly submission: ViewSubmitAction;
  readonly mention: EnvelopedEvent<AppMentionEvent>;
  readonly homeOpened: EnvelopedEvent<AppHomeOpenedEvent>;
};
