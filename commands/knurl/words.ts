import type { Context } from '../../src/desk/index.ts';
import type { Refusal, Suggestion } from '../../src/refusal.ts';
import { partOf, replaced, type Span, withMore } from '../../src/words/index.ts';

/** The line without what was said of some parameters, and with more words at its end. */
export const reworded = (context: Context, without: readonly string[], more: string): string => {
  const spans = without
    .flatMap((name) => context.read.spans.get(name) ?? [])
    .sort((a, b) => b.start - a.start);
  const left = spans.reduce((text, span) => replaced(text, span, ' '), context.text);
  return withMore(left, more);
};

/** Ways out of a contradiction: each drops or changes one side of it. */
export const contradiction = (
  what: string,
  because: NonNullable<Extract<Refusal, { code: 'unclear' }>['because']>,
  readings: readonly Suggestion[],
): Refusal => ({ code: 'unclear', what, because, readings });

/** What was typed for a parameter. */
export const typed = (context: Context, name: string): string =>
  (context.read.spans.get(name) ?? []).map((span: Span) => partOf(context.text, span)).join(' ');

/** One reading that keeps this and drops that. */
export const keeping = (context: Context, keep: string, drop: readonly string[]): Suggestion => {
  const words = reworded(context, drop, '');
  const said = typed(context, keep);
  // What a callout or another word implied was not typed itself: the whole line then says it.
  return { label: said === '' ? words : said, words };
};
