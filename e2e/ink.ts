/** What stands on the sheet's canvases, by their pixels. */
import type { Page } from '@playwright/test';

/** The canvas of wires, symbols and names; the second of three. */
const stillCanvas = '#sheet canvas >> nth=1';

interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Its commonest opaque colour, as `r,g,b`; empty where nothing is painted. */
export const inkOf = (page: Page): Promise<string> =>
  page.locator(stillCanvas).evaluate((canvas: HTMLCanvasElement) => {
    const data = canvas.getContext('2d')?.getImageData(0, 0, canvas.width, canvas.height).data ?? [];
    const counts = new Map<string, number>();
    for (let at = 0; at < data.length; at += 4) {
      if (data[at + 3] !== 255) continue;
      const colour = `${String(data[at])},${String(data[at + 1])},${String(data[at + 2])}`;
      counts.set(colour, (counts.get(colour) ?? 0) + 1);
    }
    const [commonest] = [...counts].sort((one, other) => other[1] - one[1]);
    return commonest?.[0] ?? '';
  });

export const isPainted = async (page: Page): Promise<boolean> => (await inkOf(page)) !== '';

/** The box of all that is painted on the layers of the stage and its readings, and the sheet's size; CSS pixels. */
export const inkBox = async (
  page: Page,
): Promise<{ readonly ink: Box; readonly sheet: { readonly width: number; readonly height: number } }> => {
  const boxes = await page.locator('#sheet canvas').evaluateAll((canvases) =>
    (canvases as HTMLCanvasElement[]).slice(1).map((canvas) => {
      const { width, height } = canvas;
      const data = canvas.getContext('2d')?.getImageData(0, 0, width, height).data ?? [];
      let [left, top, right, bottom] = [width, height, 0, 0];
      for (let at = 3; at < data.length; at += 4) {
        if (data[at] === 0) continue;
        const [x, y] = [((at - 3) / 4) % width, Math.floor((at - 3) / 4 / width)];
        left = Math.min(left, x);
        right = Math.max(right, x);
        top = Math.min(top, y);
        bottom = Math.max(bottom, y);
      }
      const scale = width / canvas.clientWidth;
      return { left: left / scale, top: top / scale, right: right / scale, bottom: bottom / scale };
    }),
  );
  const sheet = await page.locator('#sheet').boundingBox();
  if (sheet === null || boxes.length === 0) throw new Error('The sheet is not on the page.');
  const ink = {
    left: Math.min(...boxes.map(({ left }) => left)),
    top: Math.min(...boxes.map(({ top }) => top)),
    right: Math.max(...boxes.map(({ right }) => right)),
    bottom: Math.max(...boxes.map(({ bottom }) => bottom)),
  };
  return { ink, sheet };
};
