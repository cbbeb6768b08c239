/**
 * One day of an invented shop: Mara supervises, Ben is the engineer and somewhere else, Kit stands
 * at the lathe. Mara is first, so the shop is hers.
 */
export type Turn = {
  /** The shop's clock. */
  readonly at: string;
  readonly who: string;
  readonly where: string;
  /** What is typed; `{card}` and `{question}` are the codes that were said last. */
  readonly line: string;
};

const turn =
  (who: string, where: string) =>
  (at: string, line: string): Turn => ({ at, who, where, line });

const mara = turn('Mara', '#floor');
const kit = turn('Kit', '#floor');
const ben = turn('Ben', '#questions');
const maraDecides = turn('Mara', '#standards');

export const DAY: readonly Turn[] = [
  // Before the shift: what the shop is.
  mara('06:02', '/shop settings change standards #standards questions #questions notices #notices'),
  mara('06:03', '/shop people add Ben engineer'),
  mara(
    '06:05',
    '/shop wheels add Fern straight 21 tpi teeth 50 diameter 19.02 mm face 8 mm bore 6 mm bevel 1 mm place drawer 1',
  ),
  mara(
    '06:07',
    '/shop machines add Bench lathe speeds 70 115 180 280 430 700 dial reads diameter inch dials swing 10 in',
  ),
  mara('06:08', '/shop rules add Sleeves above the elbow at every lathe'),
  // The first set-up of the day.
  kit('06:31', '1.000 1018 straight wheel Fern on Bench lathe out 1.5'),
  // It goes wrong, and the likeliest cause is not it.
  kit('06:52', '/knurl trouble double'),
  kit('06:58', '/knurl result double 67 teeth'),
  kit('07:04', '/knurl ask it doubles on every second bar, the bars are from the new rack'),
  // The engineer answers with a number, from elsewhere.
  ben('07:21', '/knurl questions'),
  ben(
    '07:24',
    '/knurl answer {question} measure the bars first: under 1.000 turn to 0.9735 for 65 teeth',
  ),
  kit('07:26', '1.000 1018 straight wheel Fern on Bench lathe out 1.5 65 teeth'),
  kit('07:41', '/knurl result good 65 teeth crest 0.9925 flat 0.0048 12 parts'),
  kit('07:43', '/knurl solved {question} the new bars are two thou under'),
  // What worked becomes the shop's way.
  kit('09:10', '/knurl standard propose QH-114 card {card}'),
  maraDecides('09:32', '/knurl standard show QH-114'),
  maraDecides('09:33', '/knurl standard approve QH-114 review in 6 months'),
  // The next who asks for the same job sees it first.
  kit('10:15', '1.000 1018 straight wheel Fern on Bench lathe out 1.5'),
  // Found again by what was said.
  kit('13:20', '/knurl find new rack doubles'),
  // What the next shift should know.
  mara('14:05', '/knurl today'),
  mara('14:06', '/knurl record'),
];
