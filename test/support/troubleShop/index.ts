import type { SetupRequest, SetupResult } from '../../../src/calc/setup/index.ts';
import type { CauseId, SymptomId, TroubleSeen } from '../../../src/calc/trouble/index.ts';
import { normalFrom } from '../random.ts';
import { CHANGES } from './changes.ts';
import { isSound, jobOf, type Random, worked } from './job.ts';
import { happens } from './mechanics.ts';
import { seenBy, symptomOf } from './people.ts';

/**
 * A small shop in which one thing goes wrong at a time. A cause changes the job as it is told or
 * what stands on no card; what happens to the part follows from mechanics, and what the person
 * calls it from what happened. Nothing here reads the tables the causes are ranked by.
 */
export type Trouble = {
  readonly symptom: SymptomId;
  readonly request: SetupRequest;
  readonly result: SetupResult;
  readonly seen: TroubleSeen;
};

/** A force known to a factor of two lies nearer nine times in ten. */
const FORCE_SPREAD = 0.42;
/** People say how far the bar sticks out, mostly. */
const STICKOUT_SAID = 0.85;
const TRIES = 5000;

const attempt = (random: Random, cause: CauseId): Trouble | null => {
  const sound = jobOf(random);
  const before = worked(sound.request);
  if (before === null || !isSound(before)) return null;
  const force = Math.exp(FORCE_SPREAD * normalFrom(random));
  const without = happens(sound, before, force);
  // Without the cause the part would have come out well.
  if (Object.values(without).some((severity) => severity >= 1)) return null;
  const job = CHANGES[cause](random, sound);
  const result = job === null ? null : worked(job.request);
  if (job === null || result === null) return null;
  const symptom = symptomOf(random, happens(job, result, force), without);
  if (symptom === null) return null;
  const said = random() < STICKOUT_SAID;
  const request = said ? job.request : { ...job.request, stickout: null };
  const shown = said ? result : worked(request);
  if (shown === null) return null;
  return { symptom, request, result: shown, seen: seenBy(random, job, shown, symptom) };
};

/** A job that would have gone well, with one cause planted in it, and what came of it. */
export const troubleWith = (random: Random, cause: CauseId): Trouble => {
  for (let tries = 0; tries < TRIES; tries += 1) {
    const trouble = attempt(random, cause);
    if (trouble !== null) return trouble;
  }
  throw new Error(`nothing came of ${cause}`);
};
