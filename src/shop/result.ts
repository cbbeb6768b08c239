import type { Refusal } from '../refusal.ts';

export type Done<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly refusal: Refusal };

export const done = <T>(value: T): Done<T> => ({ ok: true, value });
export const refused = (refusal: Refusal): { ok: false; refusal: Refusal } => ({
  ok: false,
  refusal,
});
