const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;' };

/** Nothing in it is read as a link, a channel or a person. */
export const escaped = (text: string): string =>
  text.replaceAll(/[&<>]/gu, (character) => ENTITIES[character] ?? character);

/**
 * Slack's markup has no escape for its own marks. The fallback of a date that is none is shown
 * letter for letter, so a mark inside one stays a mark on paper.
 */
const literal = (mark: string): string => `<!date^00000000^{_}|${mark}>`;

/** Text as it was typed, where Slack reads markup. */
export const literally = (text: string): string => escaped(text).replaceAll(/[*_~`]/gu, literal);

const ENTITY: Readonly<Record<string, string>> = { '&amp;': '&', '&lt;': '<', '&gt;': '>' };

/** A person or a user group as Slack writes it in a text: what is kept of them is told by `keeps`. */
const shown =
  (keeps: (target: string) => boolean) =>
  (_all: string, inside: string): string => {
    const [target = '', label] = inside.split('|');
    if (/^[@!]/u.test(target)) return keeps(target) ? `<${inside}>` : ' ';
    if (label !== undefined) return target.startsWith('#') ? `#${label}` : label;
    return target;
  };

/** What a person typed, from what Slack made of it; links and channels keep their words. */
export const typedText = (text: string, keeps: (target: string) => boolean = () => false): string =>
  text
    .replaceAll(/<([^<>]*)>/gu, shown(keeps))
    .replaceAll(/&(?:amp|lt|gt);/gu, (entity) => ENTITY[entity] ?? entity)
    .replaceAll(/\s+/gu, ' ')
    .trim();
