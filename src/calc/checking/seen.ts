import type { Check, CheckOf } from '../check.ts';
import { FULL_ENOUGH, OVER_FULL } from '../fill.ts';
import { formedRound, heightFromCrest } from '../growth/index.ts';
import { formOf } from '../pattern.ts';
import type { SetupRequest } from '../setup/index.ts';
import { type Mm, mm } from '../units.ts';
import { type Judged, judge, type MeasuredPart } from './judge.ts';
import { partChecks } from './partChecks.ts';
import { provenPitch } from './proven.ts';
import { type CrestMaker, type Rescue, rescueSpoiled } from './rescue.ts';

/** What is off on a part. Without a tooth height or a flat, fill and growth cannot be told apart. */
export type OffFigure = 'count' | 'fill' | 'growth' | 'fillOrGrowth' | 'taper';

/** A finished part as it has been judged. */
export type Seen = {
  readonly request: SetupRequest;
  readonly judged: Judged;
  readonly checks: readonly Check[];
  readonly off: readonly OffFigure[];
  /** Pitch round the rim as the count has it, where one was taken and belongs to this wheel. */
  readonly pitch: Mm;
  readonly maker: CrestMaker;
  readonly deepest: number;
};

/** One check of a part by its name; null where it was not measured for it. */
export const found = <N extends Check['name']>(
  checks: readonly Check[],
  name: N,
): CheckOf<N> | null =>
  (checks.find((check) => check.name === name) as CheckOf<N> | undefined) ?? null;

const notFine = (checks: readonly Check[], name: Check['name']): boolean => {
  const check = found(checks, name);
  return check !== null && check.state !== 'fine';
};

const whatIsOff = (judged: Judged, checks: readonly Check[]): readonly OffFigure[] => {
  const offs: { readonly figure: OffFigure; readonly by: number }[] = [];
  if (notFine(checks, 'count')) offs.push({ figure: 'count', by: Number.POSITIVE_INFINITY });
  const packed = found(checks, 'fill')?.state === 'stop';
  if (packed || notFine(checks, 'filled'))
    offs.push({ figure: 'fill', by: judged.filled?.by ?? 0 });
  if (notFine(checks, 'growth'))
    offs.push({
      figure: judged.fillMeasured === null ? 'fillOrGrowth' : 'growth',
      by: judged.growth?.by ?? 0,
    });
  if (notFine(checks, 'taper')) offs.push({ figure: 'taper', by: 0 });
  return offs.sort((a, b) => Math.abs(b.by) - Math.abs(a.by)).map(({ figure }) => figure);
};

export const look = (request: SetupRequest, part: MeasuredPart): Seen => {
  const judged = judge(request, part);
  const checks = partChecks(judged, request);
  const count = found(checks, 'count');
  const counted = count !== null && count.reason !== 'notThisWheel' && count.reason !== 'doubled';
  const { transverse } = judged.plan.pitch;
  const factor = judged.fillMeasured === null ? null : judged.growthFactor;
  return {
    request,
    judged,
    checks,
    off: whatIsOff(judged, checks),
    pitch: counted && part.teeth !== null ? provenPitch(part.blank, part.teeth) : transverse,
    maker: {
      form: formOf(request.pattern),
      sharpHeight: judged.sharp,
      // Of the next part the one that was measured says more than the shop's mean.
      growth: factor === null ? request.growth : { ...request.growth, mean: factor },
    },
    deepest: Math.min(FULL_ENOUGH, request.material.maxFill.value ?? FULL_ENOUGH),
  };
};

/** Infeed past touch that a fill of this pattern takes on this blank. */
export const infeedAt = ({ judged, maker }: Seen, fill: number): number =>
  judged.plan.process === 'cut'
    ? fill * judged.sharp
    : formedRound({
        form: maker.form,
        blankDiameter: judged.part.blank,
        height: mm(fill * judged.sharp),
        sharpHeight: judged.sharp,
      }).infeed;

/** Fill at which the crest of this blank reaches a diameter, growing as it was seen to grow. */
const fillForCrest = ({ judged, maker }: Seen, crest: Mm): number | null => {
  const growth = (crest - judged.part.blank) / maker.growth.mean;
  if (growth <= 0) return null;
  const height = heightFromCrest({
    form: maker.form,
    blankDiameter: judged.part.blank,
    crestDiameter: mm(judged.part.blank + growth),
    sharpHeight: judged.sharp,
  });
  return height === null ? null : height / judged.sharp;
};

/** Fill that this part still has to be brought to; null where it has enough or it cannot help. */
export const fillToReach = (seen: Seen): number | null => {
  const { request, judged, checks } = seen;
  const now = judged.fillMeasured ?? judged.fillFromCrest;
  if (now === null) return null;
  const finish = found(checks, 'finish');
  if (finish?.reason === 'under' && request.finish !== null) {
    const fill = fillForCrest(seen, mm((request.finish.low + request.finish.high) / 2));
    return fill !== null && fill > now && fill <= OVER_FULL ? fill : null;
  }
  const short = found(checks, 'filled')?.reason === 'short';
  return short && judged.fillPlanned > now ? judged.fillPlanned : null;
};

export const isSpoiled = (seen: Seen): boolean => {
  const { checks } = seen;
  if (found(checks, 'count')?.reason === 'doubled') return true;
  if (found(checks, 'fill')?.reason === 'overFull') return true;
  const finish = found(checks, 'finish')?.reason;
  return finish === 'over' || (finish === 'under' && fillToReach(seen) === null);
};

export const rescueOf = (seen: Seen): Rescue => {
  const { judged, request } = seen;
  const fill = judged.fillMeasured ?? judged.fillFromCrest ?? judged.fillPlanned;
  const still = judged.staticGrowth ?? 0;
  const crest = judged.part.crest ?? mm(judged.part.blank + seen.maker.growth.mean * still);
  return rescueSpoiled({
    crest,
    toothHeight: judged.part.toothHeight ?? mm(fill * judged.sharp),
    transversePitch: seen.pitch,
    maker: seen.maker,
    fill: Math.min(judged.fillPlanned, seen.deepest),
    deepest: seen.deepest,
    limits: request.finish,
  });
};
