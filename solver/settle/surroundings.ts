/** What a circuit settles in: temperatures, and the leak that its junctions and channels are given. */
export interface Surroundings {
  /** Of every element, K. */
  readonly temperature: number;
  /** Of each element, K, in the order of the circuit's elements; in place of `temperature`. */
  readonly temperatures?: Float64Array;
  /** Of every junction and channel, S; the declared leak of 5e-13 S. */
  readonly leak?: number;
}
