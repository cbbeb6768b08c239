import { z } from 'zod';
import { type Line, label, line, type Row, row } from '../../src/card/index.ts';
import { cardReply, defineCommand, type Visit } from '../../src/desk/index.ts';
import {
  cardById,
  historyOf,
  type KeptResult,
  latestResults,
  lookAtResult,
  personById,
  resultName,
} from '../../src/shop/index.ts';
import { shopCard, visiting } from '../shop/visit.ts';
import * as words from './resultParameters.ts';
import { resultReply } from './resultReply.ts';
import { resultFor } from './resultWanted.ts';

/** Most of what is shown of a result's history, and of a list. Judgement: what is still read. */
const CHANGES_SHOWN = 5;
const LISTED = 10;

const nameOf = async ({ shop }: Visit, id: string): Promise<string> =>
  (await personById(shop, id))?.name ?? '';

const historyLines = async (visit: Visit, result: KeptResult): Promise<readonly Line[]> => {
  const zone = visit.settings.timeZone;
  const by = await nameOf(visit, result.madeBy);
  const lines: Line[] = [line('resultLogged', { by, at: result.madeAt, zone })];
  const all = await historyOf(visit.shop, 'result', { id: result.id, limit: CHANGES_SHOWN + 1 });
  for (const { at, by: who, verb } of all.slice(0, CHANGES_SHOWN).reverse()) {
    if (verb === 'added') continue;
    lines.push(line('resultChanged', { by: await nameOf(visit, who), verb, at, zone }));
  }
  return lines;
};

/** One result, as it stands today. */
export const showResult = defineCommand({
  path: ['knurl', 'result', 'show'],
  examples: ['/knurl result show R12'],
  parameters: z.object({ result: words.result }),
  lead: { name: 'result', read: words.resultFirst },
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const result = await resultFor(context, visit, said.result);
      if (!('id' in result)) return result;
      const history = await historyLines(visit, result);
      const logged = await lookAtResult(visit.shop, result);
      return await resultReply(context, visit, 'shown', logged, { history });
    }),
});

const listedRow = async (visit: Visit, result: KeptResult): Promise<Row> => {
  const { outcome, symptom, teeth, crest, share, standing, madeAt } = result;
  return row('resultListed', {
    result: resultName(result.number),
    code: (await cardById(visit.shop, result.card))?.code ?? '',
    outcome,
    symptom,
    teeth,
    crest,
    share,
    waits: standing === 'doubted',
    by: await nameOf(visit, result.madeBy),
    moment: { at: madeAt, zone: visit.settings.timeZone },
  });
};

/** The last results, or those that wait for somebody to stand by them. */
export const listResults = defineCommand({
  path: ['knurl', 'result', 'list'],
  examples: ['/knurl result list', '/knurl result list waiting'],
  parameters: z.object({ waiting: words.waiting }),
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const waiting = said.waiting === true;
      const wanted = { limit: LISTED, ...(waiting ? { doubted: true as const } : {}) };
      const results = await latestResults(visit.shop, wanted);
      if (results.length === 0) {
        const example = '/knurl result good 65 teeth';
        const headline = line('resultsNone', { waiting, line: example });
        return cardReply(shopCard(context, { verb: 'results', headline }));
      }
      const rows: Row[] = [];
      for (const result of results) rows.push(await listedRow(visit, result));
      const isAnyWaiting = results.some(({ standing }) => standing === 'doubted');
      return cardReply(
        shopCard(context, {
          verb: 'results',
          headline: line('resultsListed', { count: results.length, waiting }),
          rows,
          choices:
            isAnyWaiting && !waiting
              ? [{ label: label('resultsWaiting', {}), words: '/knurl result list waiting' }]
              : [],
          lists: { results },
        }),
      );
    }),
});
