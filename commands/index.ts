import type { Command } from '../src/desk/index.ts';
import { card } from './knurl/card.ts';
import { check } from './knurl/check.ts';
import { convert } from './knurl/convert.ts';
import { find } from './knurl/find.ts';
import { help } from './knurl/help.ts';
import { plan } from './knurl/plan.ts';
import { questions } from './knurl/questions/index.ts';
import { record } from './knurl/record.ts';
import { results } from './knurl/result.ts';
import { setup } from './knurl/setup.ts';
import { standard } from './knurl/standard.ts';
import { today } from './knurl/today.ts';
import { trouble } from './knurl/trouble.ts';
import { why } from './knurl/why.ts';
import { exportAll } from './shop/export.ts';
import { machines } from './shop/machines.ts';
import { materials } from './shop/materials.ts';
import { people } from './shop/people.ts';
import { rules } from './shop/rules.ts';
import { settings } from './shop/settings.ts';
import { wheels } from './shop/wheels.ts';

/** Everything a person can ask for. A new command is one new file and one line here. */
export const FLEET: readonly Command[] = [
  setup,
  check,
  plan,
  trouble,
  ...results,
  convert,
  find,
  today,
  record,
  card,
  ...questions,
  why,
  ...standard,
  help,
  ...wheels,
  ...machines,
  ...materials,
  ...rules,
  ...people,
  ...settings,
  exportAll,
];
