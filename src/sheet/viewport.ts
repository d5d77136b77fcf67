/**
 * Where the sheet stands on the screen, as a small immutable value: screen = sheet · scale + (x, y).
 * Sheet coordinates are the drawing's pixels at 100 %, screen coordinates those of the sheet's own box.
 */
export interface Viewport {
  readonly scale: number;
  readonly x: number;
  readonly y: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Bounds {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export type Point = readonly [number, number];

export const smallestScale = 0.1;
export const largestScale = 8;

export const identity: Viewport = { scale: 1, x: 0, y: 0 };

const withinLimits = (scale: number): number => Math.min(largestScale, Math.max(smallestScale, scale));

/** Sheet to screen. The inverse of `invert`. */
export const apply = ({ scale, x, y }: Viewport, [sheetX, sheetY]: Point): Point => [
  sheetX * scale + x,
  sheetY * scale + y,
];

/** Screen to sheet. The inverse of `apply`. */
export const invert = ({ scale, x, y }: Viewport, [screenX, screenY]: Point): Point => [
  (screenX - x) / scale,
  (screenY - y) / scale,
];

export const panned = (viewport: Viewport, [dx, dy]: Point): Viewport => ({
  ...viewport,
  x: viewport.x + dx,
  y: viewport.y + dy,
});

/** Zoomed by `factor` so that what lies under the screen point `at` stays there. */
export const zoomedAt = (viewport: Viewport, at: Point, factor: number): Viewport => {
  const scale = withinLimits(viewport.scale * factor);
  const [sheetX, sheetY] = invert(viewport, at);
  return { scale, x: at[0] - sheetX * scale, y: at[1] - sheetY * scale };
};

/**
 * The viewport that shows `bounds` whole, in the middle of a box of `size`, at most at 100 %: a stage with one
 * transistor is not blown up to fill the screen.
 */
export const fitted = (bounds: Bounds, size: Size, margin = 32): Viewport => {
  const width = Math.max(1, bounds.right - bounds.left);
  const height = Math.max(1, bounds.bottom - bounds.top);
  const scale = withinLimits(
    Math.min(1, (size.width - 2 * margin) / width, (size.height - 2 * margin) / height),
  );
  return {
    scale,
    x: Math.round(size.width / 2 - ((bounds.left + bounds.right) / 2) * scale),
    y: Math.round(size.height / 2 - ((bounds.top + bounds.bottom) / 2) * scale),
  };
};
