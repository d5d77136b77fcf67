import { widthOf } from './width.ts';

/** Breaks a text at its spaces into lines of at most `width` characters; a longer word stands alone. At least one line. */
export const wrapped = (text: string, width: number): readonly string[] => {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ').filter((part) => part !== '')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (widthOf(longer) <= width || line === '') line = longer;
    else {
      lines.push(line);
      line = word;
    }
  }
  lines.push(line);
  return lines;
};
