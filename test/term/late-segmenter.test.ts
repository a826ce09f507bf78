import { describe, expect, it } from 'vitest';
import { LateSegmenter } from '../../src/term/late-segmenter.ts';

const TEXTS = [
  '',
  'plain',
  'e\u0301a\u0308',
  '\u{1f469}\u200d\u{1f52c} at 633 nm',
  '\u0939\u093f\u0928\u094d\u0926\u0940',
  'a\r\nb',
];

describe('LateSegmenter', () => {
  it.each(TEXTS)('cuts %j as Intl.Segmenter does', (text) => {
    const options = { granularity: 'grapheme' } as const;
    const cut = (segmenter: { segment(text: string): Intl.Segments }) =>
      [...segmenter.segment(text)].map(({ segment, index }) => ({ segment, index }));
    const late = new LateSegmenter(undefined, options);
    expect(cut(late)).toEqual(cut(new Intl.Segmenter(undefined, options)));
    expect(cut(late)).toEqual(cut(late));
  });

  it('takes words apart where it is made for words', () => {
    const words = new LateSegmenter('en', { granularity: 'word' });
    expect([...words.segment('two words')].map((s) => s.segment)).toEqual(['two', ' ', 'words']);
  });
});
