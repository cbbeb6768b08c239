import type { Card } from '../card/index.ts';

/** Where a message is: an adapter's own address of it, opaque to everything else. */
export type MessageAddress = { readonly place: string; readonly message: string };

/**
 * What must happen besides the reply. Written with the change that caused it, delivered after,
 * and delivered once: the key tells a second copy from a new effect.
 */
export type Effect =
  | { readonly effect: 'post'; readonly key: string; readonly place: string; readonly card: Card }
  | { readonly effect: 'pin'; readonly key: string; readonly of: string }
  | { readonly effect: 'unpin'; readonly key: string; readonly message: MessageAddress }
  | { readonly effect: 'thread'; readonly key: string; readonly of: string; readonly title: string }
  | {
      readonly effect: 'notify';
      readonly key: string;
      readonly people: readonly string[];
      readonly card: Card;
    }
  | {
      readonly effect: 'edit';
      readonly key: string;
      readonly message: MessageAddress;
      readonly card: Card;
    };
