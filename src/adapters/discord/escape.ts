/** What Discord reads as markup, a mention or a link wherever it stands. */
const ANYWHERE = /[\\*_~`|<>@[\]]|(?<=:)\/(?=\/)/gu;
/** What is markup only where a line begins: headings, small print, lists. */
const LINE_START = /^(\s*)(#{1,3}|-#|[-+]|\d+(?=\.\s))(?=[\s.])/gmu;
/** An invitation is shown as a card wherever it stands. */
const INVITATION = /(discord(?:app)?\.(?:gg|com))\//giu;

/** Text as it was typed: nothing in it becomes markup or a link, and it rings nobody. */
export const escaped = (text: string): string =>
  text
    .replaceAll(ANYWHERE, '\\$&')
    .replaceAll(INVITATION, '$1\\/')
    .replaceAll(LINE_START, (_all, space: string, mark: string) =>
      /^\d/u.test(mark) ? `${space}${mark}\\` : `${space}\\${mark}`,
    );
