import type { DrawnStage } from '../routing/document.ts';
import type { GridPoint } from '../routing/grid.ts';

/**
 * The same document with every part placed. Parts that have a place are not touched, nor are joints that hang on
 * one; a document in which every part has a place comes back as it is.
 */
export const layOut = <Document extends DrawnStage>(document: Document): Document => {
  const open = Object.entries(document.parts).filter(([, part]) => part.place === undefined);
  if (open.length === 0) return document;
  const parts = { ...document.parts };
  open.forEach(([id, part], index) => {
    const place: GridPoint = [20 * (index % 8), 14 * Math.floor(index / 8)];
    parts[id] = { ...part, place };
  });
  return { ...document, parts };
};
