/**
 * A device entered by facts is fitted three times: the typical part and the part at each end of its principal fact. Its
 * figure `grade` says where between them a part lies: −1 at the minimum, 0 typical, 1 at the maximum. The other
 * parameters follow it together, since a maximum on-resistance already contains the maximum threshold.
 */
import type { Draw } from '../kind.ts';

export const gradeKey = 'grade';

/** The draw of the grade; without a spread where the three parts are alike. */
export const gradeDraw = (hasSpread: boolean): Draw => ({
  key: gradeKey,
  quantity: 'gain',
  value: 0,
  low: hasSpread ? -1 : 0,
  high: hasSpread ? 1 : 0,
  stated: true,
});

interface Three {
  readonly low: number;
  readonly typical: number;
  readonly high: number;
}

/** Straight between typical and the nearer end, and beyond it. */
export const linear = ({ low, typical, high }: Three, grade: number): number =>
  typical + (grade < 0 ? typical - low : high - typical) * grade;

/** The same for what spans decades: straight in the logarithm. */
export const geometric = ({ low, typical, high }: Three, grade: number): number =>
  Math.exp(linear({ low: Math.log(low), typical: Math.log(typical), high: Math.log(high) }, grade));

/** A figure that the grade sets, as moved by the figure at hand away from the typical one: by its ratio. */
export const scaledBy = (atGrade: number, atHand: number, typical: number): number =>
  typical === 0 ? atGrade + atHand : atGrade * (atHand / typical);
