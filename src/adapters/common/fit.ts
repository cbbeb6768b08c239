import type { Piece } from './pieces.ts';

/** How a platform writes a message, and whether it would take it. */
export type Form<M> = {
  readonly encode: (pieces: readonly Piece[]) => M;
  /** Measured on the message as it would be sent, not piece by piece. */
  readonly fits: (message: M) => boolean;
};

/** Where a text may be parted: at the space nearest its middle, or in the middle of a long word. */
const middle = (text: string): number => {
  const half = Math.floor(text.length / 2);
  const before = text.lastIndexOf(' ', half);
  const after = text.indexOf(' ', half);
  const near = [before, after].filter((at) => at > 0 && at < text.length - 1);
  const [best] = near.sort((a, b) => Math.abs(a - half) - Math.abs(b - half));
  if (best !== undefined) return best;
  // A character of two halves stays whole.
  const low = text.charCodeAt(half);
  return low >= 0xdc00 && low <= 0xdfff ? half - 1 : half;
};

const parted = (text: string): readonly [string, string] | null => {
  const at = middle(text);
  return at <= 0 ? null : [text.slice(0, at).trimEnd(), text.slice(at).trimStart()];
};

/** A piece too long for a message of its own, in two; its label says again what it belongs to. */
const halves = (piece: Piece): readonly Piece[] => {
  const text = piece.piece === 'check' ? piece.check.text : 'text' in piece ? piece.text : '';
  const two = parted(text);
  if (two === null) return [];
  return two.map((half): Piece => {
    if (piece.piece === 'check') return { ...piece, check: { ...piece.check, text: half } };
    return 'text' in piece ? { ...piece, text: half } : piece;
  });
};

/** Pieces of which each fits a message by itself. */
const small = <M>(piece: Piece, form: Form<M>): readonly Piece[] => {
  if (form.fits(form.encode([piece]))) return [piece];
  const two = halves(piece);
  if (two.length === 0) throw new Error(`a ${piece.piece} that no message can hold`);
  return two.flatMap((half) => small(half, form));
};

/** A title that would end a message goes with what it is the title of. */
const deal = <M>(pieces: readonly Piece[], form: Form<M>): readonly (readonly Piece[])[] => {
  const messages: Piece[][] = [];
  let current: Piece[] = [];
  for (const piece of pieces) {
    if (current.length > 0 && !form.fits(form.encode([...current, piece]))) {
      const last = current.at(-1);
      const title = last?.piece === 'choices' && current.length > 1 ? [last] : [];
      messages.push(title.length > 0 ? current.slice(0, -1) : current);
      current = [...title];
    }
    current.push(piece);
  }
  if (current.length > 0) messages.push(current);
  return messages;
};

/**
 * The one policy for length: a card that is too long becomes several messages, in reading order.
 * Nothing is cut: every figure, check, caution and choice is in one of them.
 */
export const fit = <M>(pieces: readonly Piece[], form: Form<M>): readonly M[] => {
  const whole = form.encode(pieces);
  if (form.fits(whole)) return [whole];
  const each = pieces.flatMap((piece) => small(piece, form));
  return deal(each, form).map(form.encode);
};
