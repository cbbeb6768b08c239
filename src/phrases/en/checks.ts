import type { Figures } from '../../calc/index.ts';
import type { Book } from '../book.ts';

/** A check's number; its checks always carry the ones they speak of. */
const value = (figures: Figures, name: string): number => figures[name]?.value ?? 0;

export const checks: Book['checks'] = {
  tracking: {
    label: 'Tracking',
    say: (check, show) => {
      const off = `${show.teeth(value(check.figures, 'toothError'))} of a tooth off`;
      switch (check.reason) {
        case 'whole':
          return 'whole count';
        case 'inWindow':
          return `${off}, tracks`;
        case 'nearEdge':
          return `${off}: may double, seam test?`;
        case 'offWhole':
          return `${off}: the pattern will double`;
        case 'fewTeeth':
          return `too few teeth to roll; ${show.both(value(check.figures, 'smallestDiameter'), 'up')} is the smallest that makes sense with this pitch`;
      }
    },
  },
  wheel: {
    label: 'Wheel',
    say: (check, show) => {
      const doubt = value(check.figures, 'countDoubt');
      const out = `could be ${doubt >= 0.95 ? show.count(doubt) : doubt.toFixed(2)} teeth out`;
      switch (check.reason) {
        case 'ownBlank':
          return 'made for this blank';
        case 'proven':
          return 'proven on a part';
        case 'counted':
          return check.state === 'fine' ? 'counted' : `counted; ${out}; seam test?`;
        case 'label':
          return check.state === 'fine'
            ? 'label is close enough'
            : `label not proven: ${out}; seam test?`;
      }
    },
  },
  runout: {
    label: 'Run-out',
    say: (check, show) => {
      const off = show.length(value(check.figures, 'eccentricity'));
      const bite = show.length(value(check.figures, 'firstBite'));
      switch (check.reason) {
        case 'within':
          return `${off} off centre, well under the first turn's ${bite}`;
        case 'close':
          return `${off} off centre against a first turn of ${bite}: may start one-sided`;
        case 'over':
          return `${off} off centre is more than the first turn's ${bite}: true the bar first`;
      }
    },
  },
  finish: {
    label: 'Print',
    say: (check, show) => {
      const by = show.length(value(check.figures, 'outsideBy'));
      switch (check.reason) {
        case 'inside':
          return 'crest inside the limits';
        case 'spread':
          return 'crest inside, but its spread is wider than the limits: measure the first part';
        case 'over':
          return `crest ${by} over the limits`;
        case 'under':
          return `crest ${by} under the limits`;
      }
    },
  },
  fill: {
    label: 'Fill',
    say: (check, show) => {
      const fill = show.percent(value(check.figures, 'fill'));
      const most = show.percent(value(check.figures, 'fillHigh'));
      switch (check.reason) {
        case 'within':
          return fill;
        case 'shallow':
          return `${fill}: shallow, crests stay wide`;
        case 'deep':
          return `${fill}: close to packing the wheel`;
        case 'overMaterial':
          return `${fill}: this material is best kept to ${most}`;
        case 'overFull':
          return `${fill}: over-fills, packs the wheel and flakes`;
      }
    },
  },
  feed: {
    label: 'Feed',
    say: (check, show) => {
      const low = value(check.figures, 'feedLow');
      const high = value(check.figures, 'feedHigh');
      const width = check.figures['openingWidth'];
      switch (check.reason) {
        case 'within':
          return 'each spot gets its turns';
        case 'cut':
          return 'in the range for cutting';
        case 'asked':
          return `outside ${show.feedSpan(low, high)} ${show.units}/rev`;
        case 'noWindow': {
          const remedy = width
            ? `; an effective face of ${show.length(width.value)} would do: more bevel or 1 to 2° of tilt`
            : '';
          return low > high ? `no feed gives this wheel its turns${remedy}` : 'outside the window';
        }
      }
    },
  },
  edge: {
    label: 'Edge',
    say: (check) => {
      switch (check.reason) {
        case 'bevelledPlunge':
          return 'bevelled, plunge';
        case 'bevelledTravel':
          return 'bevelled, may travel';
        case 'squarePlunge':
          return 'square, plunge';
        case 'squareTravel':
          return 'square edges only plunge: take a bevelled wheel or a shorter knurl';
        case 'convexTravel':
          return 'convex, travels';
        case 'convexPlunge':
          return 'convex edges are for travelling: a plunge leaves the ends shallow';
        case 'onePieceTravel':
          return 'one crossed wheel only plunges: take a pair or a shorter knurl';
        case 'squareCut':
          return 'square, cuts';
        case 'notSquareCut':
          return 'cutting wants square edges';
      }
    },
  },
  material: {
    label: 'Material',
    say: (check) => {
      switch (check.reason) {
        case 'forms':
          return 'forms';
        case 'marginal':
          return 'forms poorly: shallow, or cut it';
        case 'doesNotForm':
          return 'does not form: cut it instead';
        case 'cuts':
          return 'cuts';
      }
    },
  },
  speed: {
    label: 'Speed',
    say: (check, show) => {
      const limit = show.speed(value(check.figures, 'speedLimit'));
      switch (check.reason) {
        case 'within':
          return `at or under ${limit}`;
        case 'overLimit':
          return `over ${limit}: pins wear`;
        case 'farOverLimit':
          return `far over ${limit}: pins seize`;
      }
    },
  },
};
