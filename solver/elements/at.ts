/** Reads of typed arrays at places that are in range by construction; for code outside the folders where `!` may stand. */

/** Value of `array` at `index`, which the caller knows to be in range. */
export const at = (array: Float64Array, index: number): number => array[index]!;

/** Likewise, for indices. */
export const indexAt = (array: Int32Array, index: number): number => array[index]!;

/** Likewise, for small codes. */
export const codeAt = (array: Uint8Array, index: number): number => array[index]!;
