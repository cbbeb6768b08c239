/** Characters by their advance in thousandths of the size, as the shipped fonts have them. */
type Advances = readonly (readonly [number, string])[];

const REGULAR: Advances = [
  [275, "'"],
  [278, 'ijl'],
  [295, 'IJ'],
  [318, ' ,.·'],
  [337, '/:;\\|'],
  [352, 'f'],
  [361, '-'],
  [390, '()[]'],
  [392, 't'],
  [401, '!'],
  [411, 'r'],
  [460, '"'],
  [500, '*_`°–'],
  [521, 's'],
  [525, 'z'],
  [531, '?'],
  [550, 'c'],
  [557, 'L'],
  [575, 'F'],
  [579, 'k'],
  [592, 'vxy'],
  [603, 'P'],
  [611, 'TY'],
  [612, 'oø'],
  [613, 'a'],
  [615, 'e'],
  [634, 'hnu'],
  [635, 'Sbdgpq'],
  [636, '$0123456789{}'],
  [656, 'K'],
  [684, 'AV'],
  [685, 'XZ'],
  [686, 'B'],
  [695, 'R'],
  [698, 'C'],
  [732, 'U'],
  [748, 'N'],
  [752, 'H'],
  [770, 'D'],
  [775, 'G'],
  [780, '&'],
  [787, 'OQ'],
  [818, 'w'],
  [838, '#+<=>^~±×'],
  [863, 'M'],
  [950, '%'],
  [974, 'm'],
  [989, 'W'],
];
const BOLD: Advances = [
  [306, "'"],
  [343, 'ijl'],
  [348, ' '],
  [365, '/\\|'],
  [372, 'IJ'],
  [380, ',.·'],
  [400, ':;'],
  [415, '-'],
  [435, 'f'],
  [456, '!'],
  [457, '()[]'],
  [478, 't'],
  [493, 'r'],
  [500, '_`°–'],
  [521, '"'],
  [523, '*'],
  [580, '?'],
  [582, 'z'],
  [593, 'c'],
  [595, 's'],
  [637, 'L'],
  [645, 'x'],
  [652, 'vy'],
  [665, 'k'],
  [675, 'a'],
  [678, 'e'],
  [682, 'T'],
  [683, 'EF'],
  [687, 'oø'],
  [696, '$0123456789'],
  [712, 'hnu{}'],
  [716, 'bdgpq'],
  [720, 'S'],
  [724, 'Y'],
  [725, 'Z'],
  [733, 'P'],
  [734, 'C'],
  [762, 'B'],
  [770, 'R'],
  [771, 'X'],
  [774, 'AV'],
  [775, 'K'],
  [812, 'U'],
  [821, 'G'],
  [830, 'D'],
  [837, 'HN'],
  [838, '#+<=>^~±×'],
  [850, 'OQ'],
  [872, '&'],
  [924, 'w'],
  [995, 'M'],
  [1002, '%'],
  [1042, 'm'],
  [1103, 'W'],
];

const tableOf = (advances: Advances): ReadonlyMap<string, number> =>
  new Map(
    advances.flatMap(([width, letters]) =>
      Array.from(letters, (letter) => [letter, width] as const),
    ),
  );
const TABLES = { regular: tableOf(REGULAR), bold: tableOf(BOLD) };

export type Weight = keyof typeof TABLES;

/** A letter that is not in the table is taken as wide as the widest. */
const WIDEST = 1105;

/** Width of a line of text, without kerning, which only ever narrows it. */
export const textWidth = (text: string, size: number, weight: Weight = 'regular'): number =>
  Array.from(text).reduce((sum, letter) => sum + (TABLES[weight].get(letter) ?? WIDEST), 0) *
  (size / 1000);

/** A word in pieces no wider than asked: one that a line holds stays whole. */
const piecesOf = (word: string, width: number, size: number, weight: Weight): readonly string[] => {
  const pieces: string[] = [''];
  for (const letter of Array.from(word)) {
    const longer = `${pieces.at(-1) ?? ''}${letter}`;
    if (longer !== letter && textWidth(longer, size, weight) > width) pieces.push(letter);
    else pieces[pieces.length - 1] = longer;
  }
  return pieces;
};

/** Broken at spaces into lines no wider than asked; a longer word is broken where it has to be. */
export const linesOf = (
  text: string,
  width: number,
  size: number,
  weight: Weight = 'regular',
): readonly string[] => {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ').flatMap((each) => piecesOf(each, width, size, weight))) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && textWidth(longer, size, weight) > width) {
      lines.push(line);
      line = word;
    } else line = longer;
  }
  return [...lines, line];
};
