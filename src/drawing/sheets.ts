/** Sheets that show all symbols and all badges at once: for looking at, in tests and in the documentation. */
import { asDrawn, type Stance } from '../../symbols/placement.ts';
import { symbolArt, symbolNames } from '../../symbols/index.ts';
import type { Verdict } from '../readings/readings.ts';
import { badgeShapes } from './badge/badge.ts';
import type { BadgeSign } from './badge/sign.ts';
import { badgeWords } from './badge/words.ts';
import { boundsOfAll } from './bounds.ts';
import type { Drawing, Primitive, Role } from './primitives.ts';
import { symbolShapes } from './symbolShapes.ts';

const caption = (id: string, text: string, x: number, y: number, role: Role = 'ink'): Primitive => ({
  kind: 'text',
  id,
  layer: 'still',
  thing: 'word',
  text,
  x,
  y,
  size: 12,
  weight: 400,
  align: 'centre',
  role,
});

const drawingOf = (primitives: readonly Primitive[]): Drawing => ({
  primitives,
  bounds: boundsOfAll(primitives),
  unplaced: [],
});

/** Every symbol of the store, `columns` to a row, each with all its pins wired. */
export const symbolSheet = (stance: Stance = asDrawn, columns = 8): Drawing =>
  drawingOf(
    symbolNames.flatMap((name, index) => {
      const [x, y] = [(index % columns) * 120, Math.floor(index / columns) * 120];
      const art = symbolArt(name);
      const wired = new Set(Object.keys(art.pins));
      return [
        ...symbolShapes(name, art, [x, y], stance, wired),
        caption(`${name}/caption`, name.replaceAll('-', ' '), x, y + 60),
      ];
    }),
  );

const verdicts: readonly Verdict[] = ['held', 'at-risk', 'missed', 'not-checked'];

const signs: readonly Omit<BadgeSign, 'verdict'>[] = [
  { family: 'mosfet', region: 'cutoff', reversed: false },
  { family: 'mosfet', region: 'triode', reversed: false },
  { family: 'mosfet', region: 'saturation', reversed: false },
  { family: 'mosfet', region: 'body-diode', reversed: false },
  { family: 'mosfet', region: 'triode', reversed: true },
  { family: 'mosfet', region: 'saturation', reversed: true },
  { family: 'mosfet', region: 'saturation', reversed: false, inversion: 'weak' },
  { family: 'mosfet', region: 'saturation', reversed: false, inversion: 'moderate' },
  { family: 'mosfet', region: 'triode', reversed: false, inversion: 'weak' },
  { family: 'mosfet', region: 'triode', reversed: false, inversion: 'moderate' },
  { family: 'mosfet', region: 'triode', reversed: true, inversion: 'moderate' },
  { family: 'bipolar', region: 'cutoff', reversed: false },
  { family: 'bipolar', region: 'active', reversed: false },
  { family: 'bipolar', region: 'saturated', reversed: false },
  { family: 'bipolar', region: 'active', reversed: true },
  { family: 'diode', region: 'conducting', reversed: false },
  { family: 'diode', region: 'blocking', reversed: false },
  { family: 'diode', region: 'breakdown', reversed: false },
];

/** Every badge in each verdict's frame, and stale. */
export const badgeSheet = (): Drawing =>
  drawingOf(
    signs.flatMap((sign, row) =>
      [...verdicts, 'stale' as const].flatMap((verdict, column) => {
        const [x, y] = [column * 170, row * 80];
        const id = `badge${row}/${verdict}`;
        const whole: BadgeSign =
          verdict === 'stale' ? { ...sign, verdict: 'held', stale: true } : { ...sign, verdict };
        return [
          ...badgeShapes(id, 'device', whole, [x, y]),
          caption(`${id}/caption`, badgeWords(sign), x + 30, y + 60),
        ];
      }),
    ),
  );
