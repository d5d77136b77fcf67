import type { DrawnEnd, DrawnStage } from './document.ts';

/**
 * What hangs together by wires alone. Two tags of one label are one node to the solver and two nets here, since no
 * line joins them on the sheet.
 */
export interface Nets {
  /** Number of nets that have a wire, a joint or a wired pin. Nets are numbered from 0 in the order of the document. */
  readonly count: number;
  /** The net of each wire by its id. */
  readonly ofWire: ReadonlyMap<string, number>;
  /** The net of each joint and each wired pin by `endKey`. */
  readonly ofEnd: ReadonlyMap<string, number>;
}

/** One text for one end: `part.pin` or the joint's id. Ids hold no full stop. */
export const endKey = ([id, pin]: DrawnEnd): string => (pin === undefined ? id : `${id}.${pin}`);

/** The wired nets of a stage, by union of the two ends of every wire. */
export const netsOf = (document: DrawnStage): Nets => {
  const parent = new Map<string, string>();
  const root = (key: string): string => {
    let at = key;
    for (let above = parent.get(at); above !== undefined && above !== at; above = parent.get(at)) at = above;
    if (at !== key) parent.set(key, at);
    return at;
  };
  const enter = (key: string): void => {
    if (!parent.has(key)) parent.set(key, key);
  };
  for (const joint of Object.keys(document.joints)) enter(joint);
  for (const { ends } of Object.values(document.wires)) {
    const [a, b] = ends.map(endKey);
    if (a === undefined || b === undefined) continue;
    enter(a);
    enter(b);
    parent.set(root(b), root(a));
  }

  const numbers = new Map<string, number>();
  const ofEnd = new Map<string, number>();
  for (const key of parent.keys()) {
    const top = root(key);
    const number = numbers.get(top) ?? numbers.size;
    numbers.set(top, number);
    ofEnd.set(key, number);
  }
  const ofWire = new Map<string, number>();
  for (const [id, { ends }] of Object.entries(document.wires))
    ofWire.set(id, ofEnd.get(endKey(ends[0])) ?? 0);
  return { count: numbers.size, ofWire, ofEnd };
};
