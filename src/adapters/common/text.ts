import type { SpokenCard, SpokenPart } from '../../phrases/index.ts';

/** Characters a terminal shows, control characters made visible as a space. */
export const printable = (text: string): string => text.replaceAll(/\p{Cc}/gu, ' ');

/** Breaks a text at spaces; a word longer than the line is broken where it has to be. */
export const wrapped = (text: string, width: number, indent = ''): readonly string[] => {
  const lines: string[] = [];
  let current = '';
  const room = Math.max(8, width - indent.length);
  const push = (): void => {
    if (current !== '') lines.push(current);
    current = '';
  };
  for (const word of printable(text).split(/ +/u)) {
    let rest = word;
    if (current !== '' && current.length + 1 + rest.length > room) push();
    while (rest.length > room) {
      lines.push(rest.slice(0, room));
      rest = rest.slice(room);
    }
    current = current === '' ? rest : `${current} ${rest}`;
  }
  push();
  return lines.map((line) => indent + line);
};

/** Label, then text beside it, going on under itself. */
const labelled = (
  label: string,
  text: string,
  column: number,
  width: number,
): readonly string[] => {
  const pad = ' '.repeat(column);
  const lines = wrapped(text, width - column);
  return lines.map((line, index) => (index === 0 ? label.padEnd(column) : pad) + line);
};

const columnOf = (labels: readonly string[], least: number): number =>
  Math.max(least, ...labels.map((label) => label.length + 2));

const LABEL_COLUMN = 12;
const STATE_COLUMN = 7;

const partLines = (part: SpokenPart, width: number): readonly string[] => {
  switch (part.part) {
    case 'lines':
      return part.texts.flatMap((text) => wrapped(text, width));
    case 'rows': {
      const column = columnOf(
        part.rows.map((row) => row.label),
        LABEL_COLUMN,
      );
      return part.rows.flatMap((row) => labelled(row.label, row.text, column, width));
    }
    case 'checks': {
      const column = columnOf(
        part.checks.map((check) => check.label),
        LABEL_COLUMN,
      );
      return part.checks.flatMap((check) =>
        labelled(
          check.label.padEnd(column) + check.stateWord,
          check.text,
          column + Math.max(STATE_COLUMN, check.stateWord.length + 2),
          width,
        ),
      );
    }
    case 'cautions':
      return [...part.shown, ...part.rest, part.standing].flatMap((text) => wrapped(text, width));
    case 'own':
      return part.texts.flatMap((text) => wrapped(text, width));
    case 'footing':
      return wrapped(part.text, width);
  }
};

/** A card as plain text no wider than asked: the floor every other form stands on. */
export const cardText = (card: SpokenCard, width: number): string => {
  const blocks = card.parts
    .map((part) => partLines(part, width))
    .filter((lines) => lines.length > 0);
  const choices = card.choices.flatMap((choice) => [
    ...wrapped(choice.label, width, '  '),
    ...wrapped(choice.words, width, '    '),
  ]);
  const next = choices.length === 0 ? [] : [[card.choicesTitle, ...choices]];
  // The lines under the headline belong to it; everything else stands in its own block.
  const [first = [], ...others] = blocks;
  const head = [
    ...wrapped(card.headline, width),
    ...(card.parts[0]?.part === 'lines' ? first : []),
  ];
  const rest = card.parts[0]?.part === 'lines' ? others : blocks;
  return [head, ...rest, ...next].map((lines) => lines.join('\n')).join('\n\n');
};
