import { describe, expect, it } from 'vitest';
import { type Mark, SOURCES } from '../../src/calc/sources.ts';

const marked = (mark: Mark): string[] =>
  Object.entries(SOURCES)
    .filter(([, source]) => source.mark === mark)
    .map(([id]) => id)
    .sort();

describe('the source register', () => {
  it('calls read only what was seen', () => {
    expect(marked('read')).toEqual([
      'asme-b94.6',
      'cfr-1910.212',
      'din-403',
      'din-82',
      'gost-21474',
      'jis-b-0951',
      'navy-lathe',
      'nsw-gloves',
      'osha-1979',
      'uk-regulator',
    ]);
  });

  it('keeps what a standard is remembered or reported to say apart from what was seen', () => {
    expect(SOURCES['asme-b94.6-memory'].mark).toBe('from memory');
    expect(SOURCES['asme-b94.6-reported'].mark).toBe('reported');
    expect(SOURCES['din-82-blank'].mark).toBe('reported');
    expect(SOURCES['din-82-spellings'].mark).toBe('from memory');
  });

  it.each(Object.entries(SOURCES))('%s says what it is and what was taken', (id, source) => {
    expect(id).toMatch(/^[a-z][a-zS\d.-]+$/);
    expect(source.title.length).toBeGreaterThan(4);
    expect(source.taken.length).toBeGreaterThan(4);
  });
});
