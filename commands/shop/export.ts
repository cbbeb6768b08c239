import { z } from 'zod';
import { line } from '../../src/card/index.ts';
import { defineCommand } from '../../src/desk/index.ts';
import { exportFiles } from '../../src/shop/index.ts';
import { shopCard, visiting } from './visit.ts';

/** Everything this shop has kept, as files; whoever shows the card hands them over. */
export const exportAll = defineCommand({
  path: ['shop', 'export'],
  examples: ['/shop export'],
  parameters: z.object({}),
  allowed: 'owner',
  run: (context) =>
    visiting(context, ({ shop }) => {
      const files = exportFiles(shop).map(({ name }) => name);
      const headline = line('exported', { files });
      const card = shopCard(context, { verb: 'export', headline, lists: { files } });
      return Promise.resolve({ card, effects: [], files });
    }),
});
