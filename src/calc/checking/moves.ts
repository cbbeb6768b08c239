import { SHALLOW_BELOW } from '../fill.ts';
import { heightFromCrest } from '../growth/index.ts';
import { wholeToothDiameter } from '../teeth.ts';
import { type Mm, mm } from '../units.ts';
import type { PartMove } from './figures.ts';
import type { Rescue } from './rescue.ts';
import { fillToReach, found, infeedAt, type Seen } from './seen.ts';

export type ThisPartMoveId =
  | 'keep'
  | 'feedFurther'
  | 'measureFlat'
  | 'countAgain'
  | 'turnDown'
  | 'scrap';
export type NextPartMoveId =
  | 'same'
  | 'useEffectivePitch'
  | 'turnBlank'
  | 'biteAtLeast'
  | 'feedMore'
  | 'feedLess'
  | 'logGrowth'
  | 'stopAtCrest'
  | 'swivel'
  | 'support';

const move = <Id extends string>(
  id: Id,
  number: number | null,
  unit: PartMove<Id>['unit'] = 'mm',
): PartMove<Id> => ({ id, number, unit });

export const thisPartMoves = (seen: Seen, rescue: Rescue | null): PartMove<ThisPartMoveId>[] => {
  const { judged, checks, off } = seen;
  const moves: PartMove<ThisPartMoveId>[] = [];
  if (found(checks, 'count')?.reason === 'notThisWheel')
    moves.push(move('countAgain', judged.countExpected, '1'));
  if (rescue !== null) {
    const good = rescue.blank !== null && rescue.meetsPrint !== false;
    moves.push(good ? move('turnDown', rescue.blank.diameter) : move('scrap', null));
    return moves;
  }
  // The flat that the part would have if its fill were as planned and only its growth were off.
  if (off.includes('fillOrGrowth'))
    moves.push(move('measureFlat', judged.plan.pitch.normal * (1 - judged.fillPlanned)));
  const reach = fillToReach(seen);
  const now = judged.fillMeasured ?? judged.fillFromCrest;
  if (reach !== null && now !== null)
    moves.push(move('feedFurther', infeedAt(seen, reach) - infeedAt(seen, now)));
  return moves.length === 0 ? [move('keep', null)] : moves;
};

/** Whole count and blank whose needed fill comes nearest to the planned one, inside the print. */
const blankForPrint = (seen: Seen): Mm | null => {
  const { request, judged, maker, pitch } = seen;
  if (request.finish === null) return null;
  const middle = (request.finish.low + request.finish.high) / 2;
  const most = Math.floor((Math.PI * middle) / pitch);
  let best: { readonly blank: Mm; readonly away: number } | null = null;
  for (let teeth = most; teeth > most - 12 && teeth > 0; teeth -= 1) {
    const blank = wholeToothDiameter(teeth, pitch);
    const growth = (middle - blank) / maker.growth.mean;
    const height = heightFromCrest({
      form: maker.form,
      blankDiameter: blank,
      crestDiameter: mm(blank + Math.max(0, growth)),
      sharpHeight: judged.sharp,
    });
    const fill = height === null ? 2 : height / judged.sharp;
    const away = Math.abs(fill - judged.fillPlanned);
    const fits = fill >= SHALLOW_BELOW && fill <= seen.deepest;
    if (fits && away < (best?.away ?? 2)) best = { blank, away };
  }
  return best?.blank ?? null;
};

const nextForCount = (seen: Seen): PartMove<NextPartMoveId>[] => {
  const { judged, checks, pitch } = seen;
  switch (found(checks, 'count')?.reason) {
    case 'wheelDiffers':
      return [
        move('useEffectivePitch', pitch),
        move('turnBlank', wholeToothDiameter(judged.countExpected, pitch)),
      ];
    case 'doubled':
      return [
        move('biteAtLeast', judged.plan.figures.firstBite?.value ?? null),
        move('turnBlank', wholeToothDiameter(judged.countExpected, pitch)),
      ];
    default:
      return [];
  }
};

/** What is formed beyond a whole tooth only packs the wheel; what is cut goes on getting deeper. */
const deepestMeant = ({ judged }: Seen, fill: number): number =>
  judged.plan.process === 'cut' ? fill : Math.min(1, fill);

const nextForFill = (seen: Seen): PartMove<NextPartMoveId>[] => {
  const { fillMeasured, fillPlanned } = seen.judged;
  if (fillMeasured === null || !seen.off.includes('fill')) return [];
  const more = infeedAt(seen, fillPlanned) - infeedAt(seen, deepestMeant(seen, fillMeasured));
  return [more > 0 ? move('feedMore', more) : move('feedLess', -more)];
};

/** A crest that is off with nothing else measured: the crest itself says when to stop. */
const nextForCrest = (seen: Seen): PartMove<NextPartMoveId>[] => {
  const { judged, checks, off } = seen;
  const finish = found(checks, 'finish');
  const missed = finish !== null && finish.state === 'stop' && off.length === 0;
  return missed || off.includes('fillOrGrowth')
    ? [move('stopAtCrest', judged.plan.blank.tooth.crest)]
    : [];
};

const nextForGrowth = (seen: Seen): PartMove<NextPartMoveId>[] => {
  if (!seen.off.includes('growth')) return [];
  const blank = blankForPrint(seen);
  const log = move<NextPartMoveId>('logGrowth', seen.judged.growthFactor, '1');
  return blank === null ? [log] : [log, move('turnBlank', blank)];
};

const nextForTaper = (seen: Seen): PartMove<NextPartMoveId>[] => {
  const { fade } = seen.judged;
  if (fade === null || fade.check.reason === 'even') return [];
  return fade.check.reason === 'bends'
    ? [move('support', Math.abs(fade.taper))]
    : [move('swivel', fade.swivelAngle, 'rad')];
};

export const nextPartMoves = (seen: Seen): PartMove<NextPartMoveId>[] => {
  const moves = [
    ...nextForCount(seen),
    ...nextForFill(seen),
    ...nextForGrowth(seen),
    ...nextForCrest(seen),
    ...nextForTaper(seen),
  ];
  // A count that cannot be right says nothing about the next part until it is counted again.
  const again = found(seen.checks, 'count')?.reason === 'notThisWheel';
  return moves.length === 0 && !again ? [move('same', null)] : moves;
};
