import type { Command } from '../../../src/desk/index.ts';
import { answer } from './answer.ts';
import { ask } from './ask.ts';
import { questions as list } from './questions.ts';
import { reopen } from './reopen.ts';
import { solved } from './solved.ts';

export { askedAbout } from './about.ts';
export { reminderEffects } from './effects.ts';

/** What can be asked, answered and settled. */
export const questions: readonly Command[] = [ask, answer, solved, reopen, list];
