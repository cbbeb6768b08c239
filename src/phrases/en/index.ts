import type { Book } from '../book.ts';
import { cautions, standing } from './cautions.ts';
import { chat, config } from './chat.ts';
import { checkLabels } from './checkLines.ts';
import { checks } from './checks.ts';
import { convertLabels } from './convertLines.ts';
import { discord } from './discord.ts';
import { findLabels } from './findLines.ts';
import { lines } from './lines.ts';
import { materialName, THINGS } from './names.ts';
import { pictures } from './pictures.ts';
import { planLabels } from './planLines.ts';
import { questionLabels } from './questionLines.ts';
import { records } from './records.ts';
import { contradictions, refusal } from './refusals.ts';
import { remedyLabel } from './remedies.ts';
import { resultLabels } from './resultLines.ts';
import { rows } from './rows.ts';
import { shopLabels } from './shopLines.ts';
import { slack } from './slack.ts';
import { standardLabels } from './standardLines.ts';
import { terminal } from './terminal.ts';
import { todayLabels } from './todayLines.ts';
import { troubleLabels } from './troubleLines.ts';
import { verbs } from './verbs.ts';
import { whyLabels } from './whyLines.ts';

export const en: Book = {
  language: 'en',
  lines,
  rows,
  checks,
  cautions,
  contradictions,
  refusal,
  states: { fine: 'fine', watch: 'watch', stop: 'stop' },
  labels: {
    ...checkLabels,
    ...convertLabels,
    ...findLabels,
    ...planLabels,
    ...questionLabels,
    ...resultLabels,
    ...todayLabels,
    ...troubleLabels,
    ...shopLabels,
    ...standardLabels,
    ...whyLabels,
    asIs: ({ stock }, show) => `Leave it at ${show.length(stock)}`,
    finishedSize: ({ size }, show) => `${show.length(size)} is the finished size`,
    otherBasis: ({ took }) =>
      took === 'normal' ? 'Pitch along the rim' : 'Pitch square to the teeth',
    material: ({ name, condition }) => materialName(name, condition),
    smaller: ({ toothCount, blankDiameter }, show) =>
      `Smaller: ${show.length(blankDiameter)}, ${String(toothCount)} teeth`,
    larger: ({ toothCount, blankDiameter }, show) =>
      `Larger: ${show.length(blankDiameter)}, ${String(toothCount)} teeth`,
    remedy: ({ kind, number }, show) => remedyLabel(kind, number, show),
    candidate: ({ place, wheel, toothCount }) =>
      `Set up ${String(place)}: ${String(toothCount)} teeth, ${wheel}`,
    ownSpeed: () => 'Run at the usual speed',
    cutInstead: () => 'Cut it instead',
    bevelled: () => 'Bevelled wheel',
    ownFill: () => 'The usual fill',
    otherUnits: ({ units }) => (units === 'mm' ? 'Show mm first' : 'Show inches first'),
    words: ({ words }) => words,
  },
  standing,
  footing: "The shop's rules, the machine's manual and licensed practice go before this card.",
  choices: 'Next',
  verbs,
  parameters: THINGS,
  chat,
  discord,
  slack,
  config,
  records,
  pictures,
  terminal,
};
