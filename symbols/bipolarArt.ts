import type { SymbolArt } from './art.ts';
import { arrowhead, line, reach } from './pen.ts';

const nPins = { base: [-3, 0], collector: [0, -3], emitter: [0, 3] } as const;
const pPins = { base: [-3, 0], collector: [0, 3], emitter: [0, -3] } as const;

/** The slanted leads run from the plate at y ±6 to the axis at y ±18. */
const slope = [18, 12] as const;

/** n-p-n: the emitter is below, its arrow outward. p-n-p: above, inward. */
export const bipolarArt = (polarity: 'n-p-n' | 'p-n-p'): SymbolArt => ({
  pins: polarity === 'n-p-n' ? nPins : pPins,
  shapes: [
    line([-reach, 0], [-18, 0]),
    line([-18, -16], [-18, 16]),
    line([-18, -6], [0, -18], [0, -reach]),
    line([-18, 6], [0, 18], [0, reach]),
    polarity === 'n-p-n'
      ? arrowhead([-2, 6 + (16 * 12) / 18], slope)
      : arrowhead([-15, -8], [-slope[0], slope[1]]),
  ],
  body: { left: -18, top: -18, right: 0, bottom: 18 },
});
