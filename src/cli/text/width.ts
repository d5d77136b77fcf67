const segmenter = new Intl.Segmenter('en', { granularity: 'grapheme' });

/** Columns a text takes on a terminal: characters as a person counts them. */
export const widthOf = (text: string): number => [...segmenter.segment(text)].length;
