import type { StageDocument } from './schema/stage.ts';

/** What fits in this many characters stands on one line. */
const width = 110;

/**
 * A document as the text of its file: JSON with values as typed and keys in their order, indented by two, short
 * lists and objects on one line. The same document always gives the same text.
 */
export const writeStage = (document: StageDocument): string => `${write(document, 0, 0, 0)}\n`;

/**
 * @param depth how many levels deep the value stands
 * @param before characters on its line before it, the indent apart
 */
function write(value: unknown, depth: number, before: number, after: number): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const line = onOneLine(value);
  // Records of things stand a thing a line, however few: a change of one thing changes one line.
  if (depth >= 2 && 2 * depth + before + line.length + after <= width) return line;
  const indent = '  '.repeat(depth + 1);
  const close = '  '.repeat(depth);
  if (Array.isArray(value)) {
    if (value.length === 0) return '[]';
    const items = value.map((item) => `${indent}${write(item, depth + 1, 0, 1)}`);
    return `[\n${items.join(',\n')}\n${close}]`;
  }
  const entries = definedEntries(value).map(([key, item]) => {
    const name = `${JSON.stringify(key)}: `;
    return `${indent}${name}${write(item, depth + 1, name.length, 1)}`;
  });
  return entries.length === 0 ? '{}' : `{\n${entries.join(',\n')}\n${close}}`;
}

const definedEntries = (value: object) => Object.entries(value).filter(([, item]) => item !== undefined);

function onOneLine(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(onOneLine).join(', ')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const entries = definedEntries(value).map(([key, item]) => `${JSON.stringify(key)}: ${onOneLine(item)}`);
  return entries.length === 0 ? '{}' : `{ ${entries.join(', ')} }`;
}
