import type { Command } from '../src/desk/index.ts';
import { check } from './knurl/check.ts';
import { convert } from './knurl/convert.ts';
import { help } from './knurl/help.ts';
import { plan } from './knurl/plan.ts';
import { setup } from './knurl/setup.ts';
import { trouble } from './knurl/trouble.ts';
import { why } from './knurl/why.ts';

/** Everything a person can ask for. A new command is one new file and one line here. */
export const FLEET: readonly Command[] = [setup, check, plan, trouble, convert, why, help];
