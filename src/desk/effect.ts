import type { Card } from '../card/index.ts';

/** Where a message is: an adapter's own address of it, opaque to everything else. */
export type MessageAddress = { readonly place: string; readonly message: string };

/** Who is rung by a message: nobody else ever is. Ids as the platform knows them. */
export type Ring = {
  readonly people: readonly string[];
  /** Roles of a Discord server, user groups of a Slack workspace. */
  readonly groups: readonly string[];
};

/** A message that stands, or the one that the effect of this key leaves behind. */
export type Target =
  | { readonly message: MessageAddress; readonly of?: never }
  | { readonly of: string; readonly message?: never };

/**
 * What must happen besides the reply. Written with the change that caused it, delivered after,
 * and delivered once: the key tells a second copy from a new effect.
 */
export type Effect =
  | ({
      readonly effect: 'post';
      readonly key: string;
      readonly ring?: Ring;
      readonly card: Card;
    } & (
      | { readonly place: string; readonly of?: never }
      /** Where the effect of this key took place: in the thread it opened. */
      | { readonly of: string; readonly place?: never }
    ))
  | { readonly effect: 'pin'; readonly key: string; readonly of: string }
  | ({ readonly effect: 'unpin'; readonly key: string } & Target)
  | { readonly effect: 'thread'; readonly key: string; readonly of: string; readonly title: string }
  /** To each of them alone. Ids as the platform knows them. */
  | {
      readonly effect: 'notify';
      readonly key: string;
      readonly people: readonly string[];
      readonly card: Card;
    }
  | ({ readonly effect: 'edit'; readonly key: string; readonly card: Card } & Target);
