import { type MachineLimits, type Mm, mm } from '../calc/index.ts';
import type { Machine } from './machines.ts';

/** What a machine can do, as a set-up asks for it. */
export const limitsOf = ({ speeds, feeds, topSpeed, power }: Machine): MachineLimits => ({
  speeds,
  feeds,
  topSpeed,
  torque: null,
  power,
});

/** What the cross-slide's dial goes through when the tool goes in by so much. */
export const onDial = ({ dial }: Pick<Machine, 'dial'>, infeed: Mm): Mm =>
  dial === 'diameter' ? mm(2 * infeed) : infeed;
