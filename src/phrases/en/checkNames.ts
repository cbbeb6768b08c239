import type { CheckName } from '../../calc/index.ts';

/** What each check is called in front of its verdict. */
export const checkNames: { readonly [N in CheckName]: string } = {
  tracking: 'Tracking',
  wheel: 'Wheel',
  runout: 'Run-out',
  finish: 'Print',
  fill: 'Fill',
  feed: 'Feed',
  edge: 'Edge',
  material: 'Material',
  speed: 'Speed',
  pinHeat: 'Pin heat',
  pinPressure: 'Pin load',
  bending: 'Bending',
  ring: 'Wall',
  stickout: 'Stickout',
  width: 'Width',
  capacity: 'Machine',
  fit: 'Fit',
  seam: 'Seam',
  count: 'Count',
  filled: 'Depth',
  growth: 'Growth',
  taper: 'Taper',
};
