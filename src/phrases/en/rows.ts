import type { Book } from '../book.ts';
import { checkRows } from './checkLines.ts';
import { convertRows } from './convertLines.ts';
import { findRows } from './findLines.ts';
import { planRows } from './planLines.ts';
import { questionRows } from './questionLines.ts';
import { recordRows } from './recordLines.ts';
import { resultRows } from './resultLines.ts';
import { shopRows } from './shopLines.ts';
import { standardRows } from './standardLines.ts';
import { todayRows } from './todayLines.ts';
import { troubleRows } from './troubleLines.ts';
import { whyRows } from './whyLines.ts';

const parts = (batch: number): string => (batch === 1 ? '' : ` for ${String(batch)} parts`);

export const rows: Book['rows'] = {
  ...checkRows,
  ...convertRows,
  ...findRows,
  ...planRows,
  ...questionRows,
  ...recordRows,
  ...resultRows,
  ...shopRows,
  ...standardRows,
  ...todayRows,
  ...troubleRows,
  ...whyRows,
  material: ({ name, condition }) => ({ label: 'Material', text: `${name}, ${condition}` }),
  feedIn: ({ infeed, cut }, show) => ({
    label: 'Feed in',
    text: cut
      ? `${show.length(infeed)} past touch, the tooth height [${show.other(infeed)}]`
      : `${show.length(infeed)} past touch, to start [${show.other(infeed)}]`,
  }),
  firstTurn: ({ firstBite }, show) => ({
    label: 'First turn',
    text: `${show.length(firstBite, 'up')} or more [${show.other(firstBite, 'up')}]`,
  }),
  stopWhen: ({ crestFlat, crest, low, high, cut }, show) => ({
    label: 'Stop',
    text: cut
      ? `when the crests keep a flat of ${show.length(crestFlat)}; over them it stays ${show.both(crest)}`
      : `when the crests keep a flat of ${show.length(crestFlat)}, or measure ${show.both(crest)} over them (${show.span(low, high)})`,
  }),
  toothHeight: ({ height, fill, sharpHeight }, show) => ({
    label: 'Tooth',
    text: `${show.both(height)} high, ${show.percent(fill)} of ${show.length(sharpHeight)}`,
  }),
  run: ({ spindleSpeed, surfaceSpeed }, show) => ({
    label: 'Run',
    text: `${show.rotation(spindleSpeed)} (${show.speed(surfaceSpeed)}) [${show.otherSpeed(surfaceSpeed)}]`,
  }),
  plunge: ({ turns, dwell, time, batch }, show) => ({
    label: 'Plunge',
    text: `${show.count(turns)} turns, the last ${String(dwell)} no infeed${time === null ? '' : `, ${show.time(time)}${parts(batch)}`}`,
  }),
  traverse: ({ feed, low, high, turns, time, batch }, show) => {
    const range = low <= high ? ` (${show.feedSpan(low, high)})` : '';
    const spot = turns === null ? '' : `, ${show.count(turns)} turns on a spot`;
    const takes = time === null ? '' : `, ${show.time(time)}${parts(batch)}`;
    return {
      label: 'Travel',
      text: `${show.feed(feed)}${range} [${show.otherFeed(feed)}], one pass${spot}${takes}`,
    };
  },
};
