import { unreachable } from '../../card/index.ts';
import type { SpokenCard, SpokenCheck, SpokenPart } from '../../phrases/index.ts';

/** What a picture shows, in bytes and in words. */
export type Drawn = {
  readonly name: string;
  readonly bytes: Uint8Array;
  /** For whoever cannot see it; never left out. */
  readonly alt: string;
};

/**
 * The smallest things a card says: each may move to another message and none is ever cut.
 * `block` tells which stand together.
 */
export type Piece = { readonly block: number } & (
  | { readonly piece: 'headline' | 'line' | 'caution' | 'own' | 'footing'; readonly text: string }
  | { readonly piece: 'row'; readonly label: string; readonly text: string }
  | { readonly piece: 'check'; readonly check: SpokenCheck }
  | { readonly piece: 'choices'; readonly title: string }
  | { readonly piece: 'choice'; readonly index: number; readonly label: string }
);

const partPieces = (part: SpokenPart, block: number): readonly Piece[] => {
  switch (part.part) {
    case 'lines':
      return part.texts.map((text) => ({ piece: 'line', text, block }));
    case 'rows':
      return part.rows.map(({ label, text }) => ({ piece: 'row', label, text, block }));
    case 'checks':
      return part.checks.map((check) => ({ piece: 'check', check, block }));
    case 'cautions':
      return [...part.shown, ...part.rest, part.standing].map((text) => ({
        piece: 'caution',
        text,
        block,
      }));
    case 'own':
      return part.texts.map((text) => ({ piece: 'own', text, block }));
    case 'footing':
      return [{ piece: 'footing', text: part.text, block }];
    default:
      return unreachable(part);
  }
};

/** A card in reading order, in pieces that can be dealt out to messages. */
export const piecesOf = (card: SpokenCard): readonly Piece[] => {
  const [first] = card.parts;
  // The lines under the headline belong to it; everything else stands in its own block.
  const shift = first?.part === 'lines' ? 0 : 1;
  const body = card.parts.flatMap((part, index) => partPieces(part, index + shift));
  const next = card.parts.length + shift;
  return [
    { piece: 'headline', text: card.headline, block: 0 },
    ...body.filter((piece) => !('text' in piece) || piece.text.trim() !== ''),
    ...(card.choices.length === 0
      ? []
      : [{ piece: 'choices', title: card.choicesTitle, block: next } as const]),
    ...card.choices.map(
      ({ label }, index) => ({ piece: 'choice', index, label, block: next }) as const,
    ),
  ];
};
