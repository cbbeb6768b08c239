import type { PictureNumbers } from '../../drawing/index.ts';
import type { PicturePhrases } from '../picturePhrases.ts';
import type { Show } from '../show.ts';
import { patternName } from './names.ts';

const teeth = (count: number): string => `${String(count)} ${count === 1 ? 'tooth' : 'teeth'}`;

const countAt = (diameter: number, transversePitch: number): string =>
  ((Math.PI * diameter) / transversePitch).toFixed(2);

const MARK_NAMES = { bar: 'Bar', blank: 'Blank', part: 'Part, over its crests' } as const;

const markLines = (n: PictureNumbers['trackingStrip'], show: Show): readonly string[] =>
  n.marks.map(({ what, diameter }) => {
    const said = `${MARK_NAMES[what]} ${show.length(diameter)}`;
    // Teeth stand on the blank; nobody has counted them where the label does not hold.
    return what === 'part' || n.wholeAt !== null
      ? said
      : `${said}: ${countAt(diameter, n.transversePitch)} teeth`;
  });

const expectedLine = (n: PictureNumbers['trackingStrip'], show: Show): string | null =>
  n.expected === null
    ? null
    : `Expected over the crests: ${show.span(n.expected.low, n.expected.high)} ${show.units}`;

const nextLine = (n: PictureNumbers['trackingStrip'], show: Show): string | null => {
  if (n.next === null) return null;
  const { to, off } = n.next;
  return `Next that tracks: ${show.length(to)}${off === null ? '' : `, ${show.length(off)} off`}`;
};

const window = (n: PictureNumbers['trackingStrip'], show: Show): string =>
  n.below === n.above
    ? `Tracks: ${show.length(n.below)} either side of a whole count`
    : `Tracks: ${show.length(n.below)} under a whole count, ${show.length(n.above)} over it`;

const offBy = (error: number, show: Show): string =>
  `${show.teeth(error)} of a tooth ${error < 0 ? 'under' : 'over'} a whole count`;

const SUPPORTS = {
  chuck: 'in the chuck',
  tailstock: 'in the chuck with the tailstock up',
  centres: 'between centres',
} as const;

const travelText = (n: PictureNumbers['setupSketch']): string =>
  n.travel === 'traverse'
    ? 'Starts half on the end and travels along the work.'
    : 'Goes straight in; no travel along the work.';

const wheelText = (n: PictureNumbers['setupSketch'], show: Show): string =>
  `Wheel ${show.length(n.wheelDiameter)}, ${n.opposed ? 'on both sides' : 'on one side'}`;

const FAMILIES = {
  straight: 'straight',
  left: 'left-hand',
  right: 'right-hand',
  crossed: 'crossed',
  square: 'square',
} as const;

const angleText = (n: PictureNumbers['developedPattern'], show: Show): string => {
  if (n.families === 'crossed') return `Grooves cross at ${show.angle(2 * n.helix)}`;
  if (n.families === 'square') return 'Grooves cross square, along and round the work';
  return n.helix === 0 ? 'Grooves run along the work' : `Grooves lean ${show.angle(n.helix)}`;
};

/** A crossed wheel goes straight in: its grooves round the work meet themselves whatever the count. */
const ringText = (n: PictureNumbers['developedPattern']): string | null =>
  n.families === 'square' && !n.tracks
    ? 'Grooves round the work fall into themselves all the same'
    : null;

const candidateLines = (n: PictureNumbers['planMap'], show: Show): readonly string[] =>
  n.candidates.map(
    (each) =>
      `${show.length(each.blankDiameter)}, ${teeth(each.toothCount)}, fill ${show.percent(each.fill)}, ${each.wheel}`,
  );

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Whole per cents: a share of growth is not known any better. */
const share = (value: number): string => `${String(Math.round(value * 100))} %`;
const shares = ({ mean, low, high }: Record<'mean' | 'low' | 'high', number>): string =>
  `${share(mean)}, ${String(Math.round(low * 100))} to ${share(high)}`;

const familyWords = (n: PictureNumbers['shopRecord']) =>
  n.families.map((family) => ({
    name: capital(`${patternName(family.pattern)}, ${family.material}`),
    value: `${family.parts === 1 ? '1 part' : `${String(family.parts)} parts`}; next ${shares(family)}`,
  }));

/** Kinds that are read out; a picture's words have to end somewhere. Judgement. */
const SAID_ALOUD = 6;

const doubtedParts = (n: PictureNumbers['shopRecord']): number =>
  n.families.flatMap(({ shares }) => shares.filter(({ isDoubted }) => isDoubted)).length;

export const pictures: PicturePhrases = {
  toothForm: {
    words: (n, show) => ({
      title: 'Tooth form, section across the work',
      crest: { name: 'Over the crests', value: show.length(n.crestDiameter) },
      blank: { name: 'Blank, dashed', value: show.length(n.blankDiameter) },
      rise:
        n.process === 'cut'
          ? null
          : { name: 'Rise', value: show.length((n.crestDiameter - n.blankDiameter) / 2) },
      infeed: {
        name: n.process === 'cut' ? 'Infeed' : 'Infeed, to start',
        value: show.length(n.infeed),
      },
      height: { name: 'Tooth height', value: show.length(n.toothHeight) },
      pitch: { name: 'Pitch round', value: show.length(n.transversePitch) },
      flat: { name: 'Flat on each crest:', value: show.length(n.crestFlat) },
      wheel: 'Over it the tooth of the wheel, in its groove.',
      shown: (drawn) => `${String(drawn)} of ${teeth(n.toothCount)}, to scale.`,
    }),
    alt: (n, show) =>
      `Tooth form to scale: blank ${show.length(n.blankDiameter)}, ${show.length(n.crestDiameter)} over the crests, tooth height ${show.length(n.toothHeight)}, infeed ${show.length(n.infeed)}, pitch round the work ${show.length(n.transversePitch)}, flat on the crests ${show.length(n.crestFlat)}, ${teeth(n.toothCount)}.`,
  },
  trackingStrip: {
    words: (n, show) => ({
      title: 'Where it tracks',
      count: teeth,
      diameter: (value) => show.bare(value),
      window: window(n, show),
      marks: markLines(n, show),
      expected: expectedLine(n, show),
      next: nextLine(n, show),
      broken: `Strip broken: the diameters are too far apart to show all between them.`,
    }),
    alt: (n, show) =>
      `Diameters that track: ${[...markLines(n, show), window(n, show), expectedLine(n, show) ?? '', nextLine(n, show) ?? ''].filter((each) => each !== '').join('. ')}.`,
  },
  setupSketch: {
    words: (n, show) => ({
      title: `Set-up, ${SUPPORTS[n.support]}`,
      length: `Knurl ${show.length(n.length)}`,
      stickout: n.stickout === null ? null : `Out ${show.length(n.stickout)}`,
      chamfer: `Chamfer on the end: ${show.length(n.chamfer)} or more`,
      travel: travelText(n),
      nip: 'Closing nip: work and wheel run together here. Keep hands and rags out.',
      wheel: wheelText(n, show),
      cutOut: 'Double wave: a length is cut out here.',
      notToScale: 'Scale broken: what is dashed is not drawn to scale.',
    }),
    alt: (n, show) =>
      `Set-up sketch, ${SUPPORTS[n.support]}: blank ${show.length(n.blankDiameter)}, knurl ${show.length(n.length)} long${n.stickout === null ? '' : `, ${show.length(n.stickout)} out`}. ${wheelText(n, show)}. ${travelText(n)} The closing nip is marked where work and wheel run together.`,
  },
  developedPattern: {
    words: (n, show) => ({
      title: n.tracks ? 'The knurl unrolled' : 'The knurl unrolled: it splits',
      first: 'Grooves of the first turn',
      second: n.tracks ? null : `Second turn, ${offBy(n.toothError, show)}`,
      rings: ringText(n),
      angle: angleText(n, show),
      pitch: `Pitch round the work ${show.length(n.transversePitch)}`,
      shown: (drawn) => `${String(drawn)} of ${teeth(n.toothCount)} round, to scale`,
    }),
    alt: (n, show) =>
      `The knurl unrolled, ${FAMILIES[n.families]}. ${angleText(n, show)}; pitch round the work ${show.length(n.transversePitch)}. ${n.tracks ? 'The second turn falls into the first.' : `The second turn falls beside the first: ${offBy(n.toothError, show)}.${ringText(n) === null ? '' : ` ${ringText(n) ?? ''}.`}`}`,
  },
  planMap: {
    words: (n, show) => ({
      title: 'What the print allows',
      diameter: (value) => show.bare(value),
      diameterAxis: `Across: blank diameter, ${show.units}`,
      fill: (value) => `${String(Math.round(value * 100))} %`,
      fillAxis: 'Up: fill of the tooth',
      band: `Finished ${show.span(n.limits.low, n.limits.high)} ${show.units}, for the wheel of 1`,
      states: 'Full dot: fine. Ring: watch. Cross: stop.',
      candidates: candidateLines(n, show),
    }),
    alt: (n, show) =>
      `Plan for a finished ${show.span(n.limits.low, n.limits.high)} ${show.units}: ${candidateLines(n, show).slice(0, 5).join('; ')}.`,
  },
  shopRecord: {
    words: (n) => ({
      title: 'Growth of your own parts',
      families: familyWords(n),
      share,
      measured: 'A part as it was measured',
      doubted: 'Doubted: not learned from until confirmed',
      beyond: 'At the edge: further out than drawn',
      expected: 'Expected of the next part, 8 in 10 within the line',
      prior: `Before any result: ${shares(n.prior)}`,
      axis: 'Across: growth as measured, as a share of what the volume alone gives',
      more: (families) =>
        families === 1
          ? 'One more kind is not drawn'
          : `${String(families)} more kinds are not drawn`,
    }),
    alt: (n) => {
      const doubted = doubtedParts(n);
      const lines = familyWords(n).map(({ name, value }) => `${name}: ${value}`);
      const more =
        lines.length > SAID_ALOUD ? ` And ${String(lines.length - SAID_ALOUD)} more.` : '';
      return `Measured growth as a share of what the volume alone gives. ${lines.slice(0, SAID_ALOUD).join('. ')}.${more} Before any result: ${shares(n.prior)}.${doubted === 0 ? '' : ` Doubted and not learned from: ${String(doubted)}.`}`;
    },
  },
};
