import type { Command } from '../../src/desk/index.ts';
import { compare } from './standardCompare.ts';
import { approve, retire } from './standardDecide.ts';
import { history, list, show } from './standardLook.ts';
import { propose, revise, save } from './standardSave.ts';

/** What the shop has decided on, from the first draft to the day it is taken out of use. */
export const standard: readonly Command[] = [
  list,
  show,
  save,
  propose,
  approve,
  revise,
  compare,
  history,
  retire,
];
