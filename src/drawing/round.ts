/**
 * The one place where coordinates lose digits: hundredths of a pixel, which no pen at 4× can tell apart, so that the
 * same drawing is always the same file.
 */
export const rounded = (value: number): number => {
  const near = Math.round(value * 100) / 100;
  return near === 0 ? 0 : near;
};
