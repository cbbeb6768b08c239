import { z } from 'zod';
import { type Card, line } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  said,
} from '../../src/desk/index.ts';
import {
  type ImportReport,
  importSheet,
  MACHINE_SHEET,
  MACHINES,
  WHEEL_SHEET,
  WHEELS,
} from '../../src/shop/index.ts';
import { refused, shopCard, visiting } from './visit.ts';

/** Most lines of a file that one card names. Judgement; a program gets them all. */
const MOST_SHOWN = 20;

const replace = said<true>({
  name: 'replace',
  read: () => null,
  closed: true,
  values: [['replace', true]],
  examples: ['replace'],
});

const LISTS = {
  wheel: {
    verb: 'wheels',
    run: (...args: Parameters<Take>) => importSheet(args[0], WHEELS, WHEEL_SHEET, args[1], args[2]),
  },
  machine: {
    verb: 'machines',
    run: (...args: Parameters<Take>) =>
      importSheet(args[0], MACHINES, MACHINE_SHEET, args[1], args[2]),
  },
} as const;
type Take = (
  change: Parameters<typeof importSheet>[0],
  text: string,
  how: { readonly units: 'in' | 'mm'; readonly replace: boolean },
) => ReturnType<typeof importSheet>;

/** `/shop wheels import` with a file: line by line, what became of it. */
export const importCommand = (what: keyof typeof LISTS): Command => {
  const { verb } = LISTS[what];
  return defineCommand({
    path: ['shop', verb, 'import'],
    examples: [`/shop ${verb} import`, `/shop ${verb} import replace`],
    parameters: z.object({ replace }),
    takesFile: true,
    allowed: 'supervisor',
    run: (context, given) => taken(context, what, given.replace === true),
  });
};

const taken = (context: Context, what: keyof typeof LISTS, replacing: boolean): Promise<Reply> =>
  visiting(context, async ({ shop, settings }) => {
    const [file] = context.attached;
    const { verb, run } = LISTS[what];
    if (file === undefined) {
      return refused({ code: 'missing', parameter: 'file', examples: [`${verb}.csv`] });
    }
    const how = { units: settings.units, replace: replacing };
    const imported = await run(shop, file.text, how);
    if (!imported.ok) {
      const { fault } = imported;
      return cardReply(shopCard(context, { verb, headline: line('importRefused', { fault }) }));
    }
    return cardReply(reportCard(context, what, imported.report));
  });

const reportCard = (context: Context, what: keyof typeof LISTS, report: ImportReport): Card => {
  const { added, replaced, same, refused: not, rows, ignored } = report;
  const wrong = rows.filter(({ outcome }) => outcome === 'refused');
  const more = wrong.length - MOST_SHOWN;
  return shopCard(context, {
    verb: LISTS[what].verb,
    headline: line('imported', { what, added, replaced, same, refused: not }),
    lines: ignored.map((heading) => line('importedIgnored', heading)),
    after: [
      ...wrong.slice(0, MOST_SHOWN).map((each) => line('importedRow', each)),
      ...(more > 0 ? [line('listedMore', { more })] : []),
    ],
    lists: { rows },
  });
};
