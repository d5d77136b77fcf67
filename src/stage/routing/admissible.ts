import type { Field } from './field.ts';
import { headingBetween, type Polyline } from './grid.ts';

/**
 * Whether a line may stand on a field as it is: right angles only, clear of bodies, leads and other nets' pins, never
 * along another net's line, and crossing one only where both run straight on.
 */
export const isAdmissible = (field: Field, line: Polyline, net: number): boolean => {
  const own = net + 1;
  const { across, down, width } = field;
  const isForeign = (mark: number | undefined): boolean => mark !== undefined && mark !== 0 && mark !== own;
  for (let index = 1; index < line.length; index++) {
    const from = line[index - 1];
    const to = line[index];
    if (from === undefined || to === undefined) return false;
    const heading = headingBetween(from, to);
    if (heading === null) {
      // A wire between pins that lie on one another has no length and nothing to cross.
      if (line.length === 2 && from[0] === to[0] && from[1] === to[1]) return true;
      return false;
    }
    const level = heading === 0 || heading === 2;
    const step = [1, width, -1, -width][heading] ?? 0;
    const end = field.at(to[0], to[1]);
    let point = field.at(from[0], from[1]);
    if (point < 0 || end < 0) return false;
    const lines = level ? across : down;
    const others = level ? down : across;
    const behind = level ? width : 1;
    for (; point !== end; point += step) {
      if (isForeign(lines[heading < 2 ? point : point + step])) return false;
      const next = point + step;
      if (next === end && index === line.length - 1) continue;
      if (field.solid[next] === 1) return false;
      const pin = field.pin[next] ?? 0;
      if (pin !== 0 && pin !== own) return false;
      const after = others[next];
      const ahead = others[next - behind];
      if (!isForeign(after) && !isForeign(ahead)) continue;
      if (next === end || after !== ahead) return false;
    }
  }
  return true;
};
