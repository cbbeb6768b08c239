/** Cards that parts were made by, and what such parts measure. No test runs it: programs use it too. */
import { formedRound, formOf, mm, setUp } from '../../src/calc/index.ts';
import {
  cardById,
  type KeptCard,
  keepCard,
  type ResultContent,
  type ShopChange,
} from '../../src/shop/index.ts';
import { CARD } from '../shop/contract/samples.ts';
import { requestOf } from './setupRequest.ts';

export const NOTHING_SAID: ResultContent = {
  outcome: 'good',
  symptom: null,
  teeth: null,
  blank: null,
  crest: null,
  toothHeight: null,
  flat: null,
  partsRun: 1,
  cause: null,
  note: null,
};

/** A card of the shop, as a set-up keeps it. */
export const keptFor = async (
  change: ShopChange,
  request = requestOf(),
  wheel: string | null = null,
  machine: string | null = null,
): Promise<KeptCard> => {
  const { id } = await keepCard(change, { ...CARD, request, wheel, machine });
  const card = await cardById(change, id);
  if (card === null) throw new Error('a card that was just kept is not there');
  return card;
};

/** What a part measures that grows by this share of the static growth. */
export const grown = (share: number, request = requestOf()): ResultContent => {
  const { blank, figures } = setUp(request);
  const sharpHeight = mm(figures.sharpHeight?.value ?? 0);
  const { growth } = formedRound({
    form: formOf(request.pattern),
    blankDiameter: blank.diameter,
    height: blank.tooth.height,
    sharpHeight,
  });
  return {
    ...NOTHING_SAID,
    crest: mm(blank.diameter + share * growth),
    toothHeight: blank.tooth.height,
  };
};
