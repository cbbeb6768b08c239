import type { Refusal } from '../refusal.ts';

/** Somewhere a thing is in use: shown before it is removed. */
export type Use = { readonly what: 'rule' | 'card' | 'wheel'; readonly name: string };

/** What a shop's own records add to the reasons for a refusal. */
export type ShopRefusal =
  | Refusal
  /** The name belongs to another of the same list. */
  | { readonly code: 'taken'; readonly what: string; readonly name: string }
  /** Removing it would leave these without it. More: there are further ones. */
  | {
      readonly code: 'inUse';
      readonly what: string;
      readonly name: string;
      readonly where: readonly Use[];
      readonly more: boolean;
    }
  /** Somebody must be left who can name owners. */
  | { readonly code: 'lastOwner'; readonly name: string };

export type Done<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly refusal: ShopRefusal };

export const done = <T>(value: T): Done<T> => ({ ok: true, value });
export const refused = (refusal: ShopRefusal): { ok: false; refusal: ShopRefusal } => ({
  ok: false,
  refusal,
});
