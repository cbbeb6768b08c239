import type { Figures } from '../../calc/index.ts';
import type { Book } from '../book.ts';
import { checkNames } from './checkNames.ts';

/** A check's number; its checks always carry the ones they speak of. */
const value = (figures: Figures, name: string): number => figures[name]?.value ?? 0;

export const checks: Book['checks'] = {
  tracking: {
    label: checkNames.tracking,
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
    label: checkNames.wheel,
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
    label: checkNames.runout,
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
    label: checkNames.finish,
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
    label: checkNames.fill,
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
    label: checkNames.feed,
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
    label: checkNames.edge,
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
          return 'one crossed wheel only plunges: a shorter knurl, or for a diamond a pair';
        case 'squareCut':
          return 'square, cuts';
        case 'notSquareCut':
          return 'cutting wants square edges';
      }
    },
  },
  material: {
    label: checkNames.material,
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
    label: checkNames.speed,
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
  pinHeat: {
    label: checkNames.pinHeat,
    say: (check) => {
      const index = value(check.figures, 'pinHeatIndex').toFixed(2);
      const warm = check.figures['wheelWarmUp'];
      const rise = warm ? `, wheel ${warm.value.toFixed(0)} K warmer` : '';
      switch (check.reason) {
        case 'cool':
          return `${index} of the trade's limit${rise}`;
        case 'warm':
          return `${index} of the trade's limit${rise}: oil well, let it cool`;
        case 'hotButShort':
          return `${index} of the trade's limit, but over quickly${rise}`;
        case 'hot':
          return `${index} of the trade's limit${rise}: the pin seizes; slow down`;
      }
    },
  },
  pinPressure: {
    label: checkNames.pinPressure,
    say: (check) => {
      const pressure = `${value(check.figures, 'pinPressure').toFixed(0)} MPa`;
      const limit = `${value(check.figures, 'pressureFineTo').toFixed(0)} MPa`;
      return check.reason === 'within' ? pressure : `${pressure}, over ${limit}: pin and bore wear`;
    },
  },
  bending: {
    label: checkNames.bending,
    say: (check, show) => {
      const stress = `${value(check.figures, 'bendingStress').toFixed(0)} MPa`;
      const fine = `${value(check.figures, 'stressFineTo').toFixed(0)} MPa`;
      const gives = show.length(value(check.figures, 'depthDifference'));
      switch (check.reason) {
        case 'opposed':
          return 'opposed wheels do not push the bar away';
        case 'holds':
          return `holds: about ${stress}, fine to ${fine}`;
        case 'pushedAway':
          return `pushed away: the depth changes by about ${gives} along the knurl, fine to ${show.length(value(check.figures, 'differenceFineTo'))}`;
        case 'staysBent':
          return `about ${stress}, fine to ${fine}: the bar may stay bent`;
      }
    },
  },
  ring: {
    label: checkNames.ring,
    say: (check, show) => {
      const stress = `${value(check.figures, 'ringStress').toFixed(0)} MPa`;
      const closes = show.length(value(check.figures, 'ringClosing'));
      const outside = check.figures['thinBelow']
        ? ' (wall thicker than the formula is good for)'
        : '';
      switch (check.reason) {
        case 'plugged':
          return 'carried by the plug';
        case 'holds':
          return `holds: about ${stress}, closes ${closes}`;
        case 'thickWall':
          return `holds: about ${stress}, closes ${closes}${outside}`;
        case 'outOfRound':
          return `closes by about ${closes}, fine to ${show.length(value(check.figures, 'closingFineTo'))}${outside}: out of round`;
        case 'crushed':
          return `about ${stress}, fine to ${value(check.figures, 'stressFineTo').toFixed(0)} MPa${outside}: the wheels crush it`;
      }
    },
  },
  stickout: {
    label: checkNames.stickout,
    say: (check) => {
      switch (check.reason) {
        case 'short':
          return 'at or under 3 diameters';
        case 'supported':
          return 'supported at the end';
        case 'opposed':
          return 'opposed wheels';
        case 'long':
          return 'over 3 diameters: bring up the tailstock';
      }
    },
  },
  width: {
    label: checkNames.width,
    say: (check, show) => {
      const width = show.length(value(check.figures, 'knurlWidth'));
      return check.reason === 'within'
        ? `${width}, no wider than the blank`
        : `${width} is wider than the blank's diameter`;
    },
  },
  capacity: {
    label: checkNames.capacity,
    say: (check) => {
      switch (check.reason) {
        case 'within':
          return 'within its torque and power';
        case 'overTorque':
          return 'more torque than it has';
        case 'overPower':
          return 'more power than it has';
      }
    },
  },
  fit: {
    label: checkNames.fit,
    say: (check, show) => {
      const each = show.length(value(check.figures, 'interference'));
      const share = show.percent(value(check.figures, 'interferenceShare'));
      switch (check.reason) {
        case 'grips':
          return `${each} a side, ${share} of the tooth: grips`;
        case 'tight':
          return `${each} a side, ${share} of the tooth: hard to press`;
        case 'over':
          return `${each} a side is more than the tooth is high: it will not go in`;
        case 'loose':
          return 'the crest is no larger than the bore: it will not grip';
      }
    },
  },
  seam: {
    label: checkNames.seam,
    say: (check, show) => {
      const chance = show.percent(value(check.figures, 'chanceTracks'));
      switch (check.reason) {
        case 'whole':
          return `whole as it is; tracks ${chance} of the time`;
        case 'centres':
          return `tracks as it is, this centres it; tracks ${chance} of the time`;
        case 'closes':
          return `closes the seam; tracks ${chance} of the time`;
      }
    },
  },
  count: {
    label: checkNames.count,
    say: (check, show) => {
      const counted = show.count(value(check.figures, 'countedTeeth'));
      const expected = show.count(value(check.figures, 'countExpected'));
      switch (check.reason) {
        case 'asExpected':
          return `${counted} counted, as worked out`;
        case 'wheelDiffers':
          return `${counted} counted, ${expected} worked out: the wheel's pitch differs from its label`;
        case 'notThisWheel':
          return `${counted} counted, ${expected} worked out: too far apart for this wheel; count again`;
        case 'doubled':
          return `${counted} counted, ${expected} worked out: the pattern doubled`;
      }
    },
  },
  filled: {
    label: checkNames.filled,
    say: (check, show) => {
      const measured = show.percent(value(check.figures, 'fillMeasured'));
      const planned = show.percent(value(check.figures, 'fillExpected'));
      switch (check.reason) {
        case 'asPlanned':
          return `${measured}, as planned`;
        case 'short':
          return `${measured}, planned ${planned}: feed in further`;
        case 'over':
          return `${measured}, planned ${planned}: feed in less`;
      }
    },
  },
  growth: {
    label: checkNames.growth,
    say: (check, show) => {
      const measured = show.percent(value(check.figures, 'growthFactor'));
      const expected = show.percent(value(check.figures, 'growthFactorExpected'));
      switch (check.reason) {
        case 'asExpected':
          return `${measured} of the static growth, as expected`;
        case 'less':
          return `${measured} of the static growth, expected ${expected}: grows less`;
        case 'more':
          return `${measured} of the static growth, expected ${expected}: grows more`;
      }
    },
  },
  taper: {
    label: checkNames.taper,
    say: (check, show) => {
      const taper = show.length(Math.abs(value(check.figures, 'taper')));
      switch (check.reason) {
        case 'even':
          return 'even along the length';
        case 'bends':
          return `the infeed falls off by ${taper}: the part bends away`;
        case 'outOfLine':
          return `the infeed falls off by ${taper}: the tool is out of line`;
        case 'uneven':
          return `the infeed falls off by ${taper} along the knurl`;
      }
    },
  },
};
