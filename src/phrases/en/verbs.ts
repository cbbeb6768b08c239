/** What each verb does, in the few words a platform has room for. */
export const verbs: Readonly<Record<string, string>> = {
  'knurl setup': 'Diameter to turn, infeed, speed, feed, checks and cautions for a knurl',
  'knurl check': 'Check a blank before, a seam on a trial turn, or a finished part',
  'knurl plan': 'From the limits of the print to the wheels and blanks that meet them',
  'knurl trouble': 'From what is seen on the part to its likeliest causes and what to do',
  'knurl convert': 'A pitch in every system, and which wheels come near it',
  'knurl why': 'Formula, inputs, sources and how sure: any figure or check of a card',
  'knurl help': 'What can be asked, with examples',
};
