/** From the print to the set-up. */
export {
  chanceOfLanding,
  chanceOfTracking,
  chanceOfTurning,
  TURNING_SPREAD,
  toothErrorSpread,
} from './chances.ts';
export { plan } from './plan.ts';
export {
  type Aid,
  type Candidate,
  type LimitedBy,
  PITCH_TOLERANCE,
  PLAN_LENGTH,
  type Plan,
  type PlanChange,
  type PlanJob,
  type PlanRequest,
} from './request.ts';
