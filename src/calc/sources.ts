/**
 * Where every formula and constant comes from and how sure it is. A mark is never raised: what a
 * handbook is remembered to say stays `from memory` until its page has been seen. Where one
 * standard was partly seen and partly not, the parts stand under ids of their own.
 */
export type Mark =
  /** The text itself was seen. */
  | 'read'
  /** A secondary text reports it. */
  | 'reported'
  /** Follows from marked ones. */
  | 'derived'
  /** Published, not seen. */
  | 'from memory'
  /** A rule of the trade, no source. */
  | 'common practice'
  /** Chosen here, in one named constant. */
  | 'judgement';

export interface Source {
  readonly title: string;
  readonly edition?: string;
  /** What was taken from it. */
  readonly taken: string;
  readonly mark: Mark;
}

const HANDBOOK = "ASME B94.6 as given in Machinery's Handbook";
const HANDBOOK_EDITION = '31st edition, pages 1059-1060';

const STANDARDS = {
  'asme-b94.6': {
    title: HANDBOOK,
    edition: HANDBOOK_EDITION,
    taken:
      'diametral pitches 64 96 128 160, N = P·D, N = D·P·cos ψ for a straight wheel set over, class I limits, class I blank tolerances, what the classes are for, a knurl no wider than the blank diameter, a knurl wider than the wheel starts from an end',
    mark: 'read',
  },
  'asme-b94.6-memory': {
    title: 'ASME B94.6, classes II and III, wheel sizes, tooth depths',
    taken: 'limits and blank tolerances of classes II and III, wheel sizes, tooth depths',
    mark: 'from memory',
  },
  'asme-b94.6-reported': {
    title: 'ASME B94.6, preferences',
    taken:
      '96 DP preferred, 64 DP to be avoided, blanks in steps of 1/64 in (64, 128 DP) and 1/32 in (96, 160 DP)',
    mark: 'reported',
  },
  'asme-b94.6-share': {
    title: 'Class I blank tolerance as a share of one tooth',
    taken: '9.6, 9.6, 9.0 and 8.0 % of one tooth at 64, 96, 128 and 160 DP',
    mark: 'derived',
  },
  'din-403': {
    title: 'DIN 403, knurling wheels',
    edition: 'January 1973',
    taken: 'wheel sizes, bores, teeth by size and pitch, designation',
    mark: 'read',
  },
  'din-403-normal': {
    title: 'What the pitch of DIN 403 measures',
    taken:
      'the printed counts are π·d/t for straight and π·d·cos 30°/t for helical wheels, so the pitch is square to the tooth and the helix is 30°',
    mark: 'derived',
  },
  'din-82': {
    title: 'DIN 82, knurls on work',
    edition: 'January 1973',
    taken:
      'forms, 90° and 105° profile, pitch series, 30° swivel, hand and mirror of the wheel, designation "RGE 08 DIN 82"; the blank factors stand apart',
    mark: 'read',
  },
  'din-82-blank': {
    title: 'DIN 82, diameter before knurling',
    taken: 'd2 = d1 − k·t with k = 0.5, 0.67 and 0.33 at 90°',
    mark: 'reported',
  },
  'din-82-105': {
    title: 'Blank factors of DIN 82 at 105°',
    taken: 'k = {1/2, 2/3, 1/3}·cot(α/2) from equal volume; not in the standard',
    mark: 'derived',
  },
  'din-82-spellings': {
    title: 'DIN 82, other spellings of the designation',
    taken: '"DIN 82-RAA 0,8" and "DIN 82 - RGE 0,8"',
    mark: 'from memory',
  },
  'callout-spellings': {
    title: 'Callouts of ANSI, JIS and GOST drawings',
    taken:
      'order of the words, "P96" for 96 DP, kinds and modules beside the number of the standard',
    mark: 'from memory',
  },
  'gost-21474': {
    title: 'GOST 21474-75, knurls (opening)',
    taken: 'pitches 0.5 0.6 0.8 1.0 1.2 1.6 mm, for diamonds also 2.0 mm',
    mark: 'read',
  },
  'iso-13444': {
    title: 'ISO 13444, knurls on drawings',
    taken: 'that it exists; no conformity is claimed',
    mark: 'from memory',
  },
  'jis-b-0951': {
    title: 'JIS B 0951, knurling',
    edition: '1962',
    taken: 'modules 0.2 0.3 0.5, t = π·m, blanks D = n·m and D = n·m/cos 30°',
    mark: 'read',
  },
  'tpi-practice': {
    title: 'Wheels counted in teeth per inch',
    taken: 'counted square to the teeth, round the rim TPI·cos ψ',
    mark: 'reported',
  },
  'tpi-set': {
    title: 'The common set of wheels in teeth per inch',
    taken: '14, 21 and 33: coarse, medium and fine',
    mark: 'from memory',
  },
} as const satisfies Record<string, Source>;

const GEOMETRY = {
  'blunt-wheel': {
    title: 'Wheels with flat or rounded tips and roots',
    taken: 'tooth height left, rise and infeed with the tip recess and the lost area taken off',
    mark: 'derived',
  },
  'pitch-conversion': {
    title: 'One pitch in several systems',
    taken: 'compared square to the tooth, the error a share of the pitch asked for',
    mark: 'derived',
  },
  plating: {
    title: 'Plating on a diameter',
    taken: 'twice the thickness',
    mark: 'derived',
  },
  'press-fit': {
    title: 'Pressing a knurl into a bore',
    taken: 'interference on a side up to 0.6 of the tooth height fine, up to all of it watched',
    mark: 'judgement',
  },
  'fewest-teeth': {
    title: 'Fewest teeth that roll',
    taken: 'fewer than 12 teeth round the work do not roll, fewer than 3 make no knurl',
    mark: 'common practice',
  },
  'first-bite': {
    title: 'The first turn falls back into its own groove',
    taken: '|δ| < H1/(2 Hf), and the first infeed that makes a wanted window true',
    mark: 'derived',
  },
  'growth-learned': {
    title: "The shop's own growth from its results",
    taken:
      'posterior of shop and family effects, jointly normal; a result more than three standard deviations off waits until it is confirmed',
    mark: 'derived',
  },
  'growth-prior': {
    title: 'Growth over the static figure before any result',
    taken: 'mean 0.95, spread between shops 0.08, between families 0.04, between parts 0.05',
    mark: 'judgement',
  },
  'rolled-growth': {
    title: 'How far rolling falls short of a stamp',
    taken:
      'growth 7 to 20 % under the static figure near full form, full form 3 to 10 % earlier; numerical, no experiment',
    mark: 'derived',
  },
  'round-work': {
    title: 'Equal volume on round work',
    taken: 'root radius, infeed and crest diameter from two integrals of the solid share',
    mark: 'derived',
  },
  'runout-limits': {
    title: 'Runout against the first bite',
    taken: 'half the reading fine to half the first bite, watch to all of it',
    mark: 'judgement',
  },
  'seam-test': {
    title: 'The seam test',
    taken: 'the odd gap s after one turn: take off s·p_t/π, effective pitch π·D/(n − 1 + s)',
    mark: 'derived',
  },
  'tooth-geometry': {
    title: 'A tooth as a triangle',
    taken:
      'sharp height Hf = p/(2·tan a), flat left on a crest p·(1 − x), the lower tooth of a round wheel',
    mark: 'derived',
  },
  'volume-constancy': {
    title: 'The metal displaced rises',
    taken:
      'rise and infeed of straight, raised and sunk patterns with the old surface at mean height',
    mark: 'derived',
  },
  'wheel-truth': {
    title: 'How true a wheel is to its label',
    taken:
      'labels off by up to 2 % (printed counts of DIN 403 against π·d/t); half widths 2.5 %, 0.5 % and 0.1 tooth for a label, a counted wheel and a proven pair',
    mark: 'derived',
  },
  'whole-tooth': {
    title: 'A whole number of teeth round the work',
    taken: 'N = π·D/p_t and what follows: one tooth of diameter is p_t/π',
    mark: 'derived',
  },
  'window-thresholds': {
    title: 'How far from a whole tooth still tracks',
    taken: 'fine to 0.10, watch to 0.20 of a tooth; backed by the class I blank tolerances',
    mark: 'judgement',
  },
} as const satisfies Record<string, Source>;

const PRACTICE = {
  'cut-practice': {
    title: 'Cut knurling in the trade',
    taken:
      'far lower force, suits thin walls and hard-to-form material, the diameter does not grow',
    mark: 'reported',
  },
  'edge-rule': {
    title: 'Edges of the wheel',
    taken:
      'square edges plunge only, bevelled edges may travel, convex edges are for axial forming, a lead chamfer at least the tooth height, a shoulder one face away',
    mark: 'common practice',
  },
  'feed-cap': {
    title: 'Feed against pitch',
    taken: 'cap 0.76·min(1, 1/p) mm/rev: coarser pitch, less feed',
    mark: 'judgement',
  },
  'feed-published': {
    title: 'Feeds as published',
    taken: '0.02 to 0.15 mm/rev on production machines, 1 to 2 mm/rev in one teaching text',
    mark: 'reported',
  },
  'feed-window': {
    title: 'Feed and turns on the same spot',
    taken: '0.005 to 0.030 in per revolution; 10 to 20 turns, fewer where the metal work-hardens',
    mark: 'common practice',
  },
  'fill-default': {
    title: 'Tooth height aimed at',
    taken: '90 % of the sharp height',
    mark: 'common practice',
  },
  'fill-limits': {
    title: 'Limits of fill',
    taken: 'fine from 0.70 to 0.92, watch below or up to 0.97, stop above',
    mark: 'judgement',
  },
  'form-or-cut': {
    title: 'Which metals form',
    taken: 'elongation 12 % and more with 250 HB and less forms; 5 % or 300 HB is the end of it',
    mark: 'common practice',
  },
  'forming-envelope': {
    title: 'Forming speeds as published',
    taken: '10 to 50 m/min on production machines',
    mark: 'reported',
  },
  'one-piece-crossed': {
    title: 'One-piece crossed wheels',
    taken: 'plunge only',
    mark: 'from memory',
  },
  'speed-band': {
    title: 'Speed by material',
    taken: 'a quarter of the way up the band of material and process',
    mark: 'judgement',
  },
  'speed-carbide': {
    title: 'Speed on carbide pins',
    taken: '1.5 times the limit of hardened pins',
    mark: 'judgement',
  },
  'speed-limit': {
    title: 'Speed on hardened pins',
    taken: 'at or under 100 ft/min',
    mark: 'common practice',
  },
} as const satisfies Record<string, Source>;

const STRENGTH = {
  beam: {
    title: 'Handbook formulas for beams',
    taken: 'deflection and moment held at one end, at one end and propped, and between centres',
    mark: 'from memory',
  },
  'cut-force': {
    title: 'Force of cut knurling',
    taken: 'cutting stiffness by material, radial force half the tangential',
    mark: 'judgement',
  },
  'force-model': {
    title: 'Force of forming',
    taken: 'pressure on the wedge share of the contact arc; known to a factor of 2',
    mark: 'derived',
  },
  'give-limits': {
    title: 'Limits of what gives way',
    taken: 'stress to yield/1.5, deflection and ring closing 10 and 30 %, overhang of 3 diameters',
    mark: 'judgement',
  },
  'hardness-conversion': {
    title: 'Rockwell C against Brinell for non-austenitic steel, ASTM A370 and E140',
    taken: 'pairs from HRC 20 to 64, as two steel houses reproduce the tables',
    mark: 'reported',
  },
  'hardness-as-yield': {
    title: 'Brinell hardness as yield pressure',
    taken: '9.80665·HB MPa',
    mark: 'from memory',
  },
  hertz: {
    title: 'Line contact after Hertz',
    taken: "half width of the contact, Poisson's ratios",
    mark: 'from memory',
  },
  'pin-heat': {
    title: 'Rubbing and warm-up of the wheel pin',
    taken: 'v = π·d·n_w, P = F/(d·w), Q = μ·F·v, ΔT = Q·t/(m·c)',
    mark: 'derived',
  },
  'pin-index': {
    title: 'How much a pin stands',
    taken:
      'an ordinary plunge at 100 ft/min is 1; carbide divides by 1.5; pressure above 100 MPa is watched',
    mark: 'judgement',
  },
  'plastic-pressure': {
    title: 'Pressure on plastics',
    taken: 'three times yield',
    mark: 'judgement',
  },
  ring: {
    title: 'Handbook formulas for thin rings, constants derived again',
    taken: 'closing and moments of a ring pinched between two wheels, t/R under 0.2',
    mark: 'derived',
  },
  'work-hardening': {
    title: 'Hardening under a rolled tooth',
    taken: '2.5ⁿ: the tooth strains the metal about 2.5 times as far as a Brinell ball does',
    mark: 'from memory',
  },
  'ring-width': {
    title: 'Length of tube that shares the load',
    taken: 'w + 3·√(R·t)',
    mark: 'judgement',
  },
} as const satisfies Record<string, Source>;

const ADVICE = {
  'check-limits': {
    title: 'When a measured part is called off',
    taken:
      'reading errors of crest, height and flat, the fill a person stops within, 2.5 standard deviations',
    mark: 'judgement',
  },
  'check-after': {
    title: 'What a finished part says',
    taken:
      'growth factor from crest and fill, effective pitch from the count, what is left to feed, cleaned-up diameter = crest less twice the tooth height',
    mark: 'derived',
  },
  'fade-along': {
    title: 'A pattern that fades along its length',
    taken: 'x = 1 − w/p at two places gives z1 and z2; (z2 − z1)/l is the angle to swivel',
    mark: 'derived',
  },
  'normal-spread': {
    title: 'The normal distribution',
    taken: 'its series, its tail as a continued fraction, its integral by parts',
    mark: 'from memory',
  },
  'plan-chances': {
    title: 'Chances of a plan',
    taken: "normal spread of the tooth error, growth from the shop's own results",
    mark: 'derived',
  },
  'seam-reading': {
    title: 'How well the gap of a seam is read',
    taken: 'standard deviation 0.05 of a pitch; labels off by up to 2 %',
    mark: 'judgement',
  },
  'trouble-numbers': {
    title: 'What a number of the set-up says about a cause',
    taken: 'how much likelier a cause becomes as its number passes its limit',
    mark: 'judgement',
  },
  'trouble-priors': {
    title: 'Causes of trouble',
    taken: 'how likely each cause is for a symptom, and what each check of the set-up says',
    mark: 'judgement',
  },
  'turning-spread': {
    title: 'Spread of turned diameters',
    taken: '0.006 mm where the machine has none of its own',
    mark: 'judgement',
  },
} as const satisfies Record<string, Source>;

const SAFETY = {
  'cfr-1910.212': {
    title: '29 CFR 1910.212(a)(1), machine guarding',
    taken: 'applies to lathes',
    mark: 'read',
  },
  'chuck-and-bar': {
    title: 'Chuck key and projecting bar',
    taken: 'key out of the chuck; bar projecting from the spindle sleeved',
    mark: 'reported',
  },
  'fire-chips': {
    title: 'Chips that burn',
    taken: 'fine chips of titanium and magnesium',
    mark: 'reported',
  },
  'navy-lathe': {
    title: 'Navy engineman training manual, lathe chapter',
    taken:
      'close sleeves, no watch or rings, eye protection, chips by brush with the machine stopped, power off to measure',
    mark: 'read',
  },
  'nip-practice': {
    title: 'The closing nip',
    taken: 'oil from the outgoing side, no brush or rag where wheel and work close',
    mark: 'common practice',
  },
  'nsw-gloves': {
    title: 'New South Wales safety alert, manual lathes',
    taken: 'no gloves or loose clothing',
    mark: 'read',
  },
  'osha-1979': {
    title: 'OSHA interpretation',
    edition: '26 January 1979',
    taken: 'an awareness barrier alone is not accepted',
    mark: 'read',
  },
  'uk-regulator': {
    title: 'Health and safety regulator of the United Kingdom, manual lathes',
    taken: 'no gloves or loose clothing, emery never by hand on turning work',
    mark: 'read',
  },
} as const satisfies Record<string, Source>;

const MATERIAL_TABLES = {
  'materials-S1': {
    title: 'SAE J1397, estimated minimum values of hot-rolled and cold-drawn carbon bar',
    taken: 'strength, hardness and elongation, as reproduced in two public tables',
    mark: 'reported',
  },
  'materials-S2': {
    title: 'Average properties of standard steels, 1 in rounds',
    taken: 'ranges of a public reference table',
    mark: 'reported',
  },
  'materials-S3': {
    title: 'ASTM A276, condition A',
    taken: 'mechanical requirements, as reproduced in a public table',
    mark: 'reported',
  },
  'materials-S4': {
    title: 'Mechanical properties of steel: condition, strength, hardness, machinability',
    taken: 'annealed stainless bars and 17-4, from a public one-page table',
    mark: 'reported',
  },
  'materials-S5': {
    title: 'Nominal properties of martensitic stainless steel',
    taken: '416 annealed bar, from a public table',
    mark: 'reported',
  },
  'materials-S6': {
    title: 'ASM Metals Handbook Desk Edition, p. 6-34, and typical properties of wrought aluminium',
    edition: '1995',
    taken: '2xxx as reproduced on a course page; 6061, 2011 and 7075 from typical-property tables',
    mark: 'reported',
  },
  'materials-S7': {
    title: 'Copper-alloy data table, C36000 1 in rod half hard, ASTM B16',
    taken: 'strength, modulus, elongation',
    mark: 'reported',
  },
  'materials-S8': {
    title: 'Data sheet of C26000 to ASTM B36',
    taken: 'nominal values by temper',
    mark: 'reported',
  },
  'materials-S9': {
    title: 'ASTM A536 grade minima',
    taken: 'as reproduced in a public table; hardness range of ductile iron bar from another',
    mark: 'reported',
  },
  'materials-S10': {
    title: 'Typical properties of Ti-6Al-4V',
    taken: 'strength, modulus, elongation from a public table',
    mark: 'reported',
  },
  'materials-S11': {
    title: 'Engineering Plastics Handbook, table 5.5',
    taken: 'acetal homopolymer and copolymer',
    mark: 'reported',
  },
  'materials-S12': {
    title: 'Encyclopedia of Physical Science and Technology, polymers, table I',
    edition: '3rd edition',
    taken: 'short-term properties of engineering plastics',
    mark: 'reported',
  },
  'materials-S13': {
    title: 'Tables of strain-hardening exponents (Callister and an encyclopedia page)',
    taken: 'n of 304, 6061, 2024 and AZ31',
    mark: 'reported',
  },
  'materials-S14': {
    title: 'Comparative cast-iron table (ASTM A48 grey iron)',
    taken: 'elongation of grey iron',
    mark: 'reported',
  },
  'materials-S15': {
    title: 'Titanium data table (grade 1)',
    taken: 'modulus of commercially pure titanium',
    mark: 'reported',
  },
  'materials-memory': {
    title: 'Handbook values as remembered',
    taken: 'properties not looked up',
    mark: 'from memory',
  },
  'materials-practice': {
    title: 'How materials behave under the wheel',
    taken: 'hardening class, what forms and cuts, speed bands, deepest fill, everyday names',
    mark: 'common practice',
  },
} as const satisfies Record<string, Source>;

/** For a figure that has no better source than its own mark. */
const PLAIN = {
  'common-practice': {
    title: 'Common practice',
    taken: 'a rule of the trade without a source',
    mark: 'common practice',
  },
  judgement: {
    title: 'Judgement',
    taken: 'a figure chosen here',
    mark: 'judgement',
  },
} as const satisfies Record<string, Source>;

const REGISTER = {
  ...STANDARDS,
  ...GEOMETRY,
  ...PRACTICE,
  ...STRENGTH,
  ...ADVICE,
  ...SAFETY,
  ...MATERIAL_TABLES,
  ...PLAIN,
};

export type SourceId = keyof typeof REGISTER;

export const SOURCES: Readonly<Record<SourceId, Source>> = REGISTER;
