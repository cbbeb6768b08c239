import type { Call } from '../../src/desk/index.ts';

/** A line as somebody would say it. */
export const called = (words: string): Call => ({
  shop: 'shop',
  person: { id: 'someone', name: 'someone' },
  place: { channel: 'floor', thread: null, isPrivate: false },
  interactionId: words,
  given: { words },
});
