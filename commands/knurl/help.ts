import { z } from 'zod';
import { type Card, line } from '../../src/card/index.ts';
import { type Command, type Context, cardReply, defineCommand } from '../../src/desk/index.ts';

/** Examples in the shop's own units, so that the first line a person copies works as it is. */
const EXAMPLES = {
  in: [
    '/knurl 1.000 straight 21tpi 1018',
    '/knurl 7/8 diamond 96dp brass long 1.5',
    '/knurl finish 0.995-1.005 straight 96dp 303',
  ],
  mm: [
    '/knurl 25 straight 1.0 pitch 1018',
    '/knurl 20 RGE 0.8 brass long 30',
    '/knurl finish 19.9-20.1 diamond 0.8 pitch 303',
  ],
} as const;

/** Of a list's commands the one that shows it is enough, of a group's the one that is usual. */
const isNamed = ({ path }: Command): boolean =>
  path.length <= 2 || path.at(-1) === 'log' || (path[0] === 'shop' && path.at(-1) === 'list');

const helpCard = ({ units, fleet }: Context): Card => ({
  verb: 'help',
  headline: line('helpIntro', {}),
  parts: [
    {
      part: 'lines',
      lines: EXAMPLES[units].map((example) => line('helpExample', { line: example })),
    },
    {
      part: 'lines',
      lines: fleet.filter(isNamed).map((command) =>
        line('helpVerb', {
          verb: command.path.join(' '),
          line: command.examples[0] ?? `/${command.path.join(' ')}`,
        }),
      ),
    },
    { part: 'footing' },
  ],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units,
});

/** What it can do, with examples in the shop's own units. */
export const help = defineCommand({
  path: ['knurl', 'help'],
  examples: ['/knurl help'],
  parameters: z.object({}),
  allowed: 'operator',
  run: (context) => cardReply(helpCard(context)),
});
