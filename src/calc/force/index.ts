/** What it takes to press a knurl: pressure, force, torque, power. */
export * from './contact.ts';
export * from './limits.ts';
export * from './plunge.ts';
export * from './pressure.ts';
export * from './torque.ts';
export * from './traverse.ts';
export * from './wedge.ts';
