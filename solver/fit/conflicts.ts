import type { Comparison, Conflict } from './fact.ts';
import { gradeWord, grades } from './fact.ts';

/** Misfit above which facts are said to be in conflict, percent. */
const CONFLICT = 1;

/** Where the fitted part of a grade misses figures, those figures cannot be had together. */
export const conflictsOf = (comparisons: readonly Comparison[]): readonly Conflict[] =>
  grades.flatMap((grade) => {
    const missed = comparisons.filter((entry) => entry.grade === grade && Math.abs(entry.misfit) > CONFLICT);
    if (missed.length === 0) return [];
    const worst = Math.max(...missed.map(({ misfit }) => Math.abs(misfit)));
    return [
      {
        facts: [...new Set(missed.map(({ fact }) => fact))],
        grade,
        reason: `no ${gradeWord(grade)} part of this law meets them all: the fitted one misses by up to ${worst.toPrecision(2)} %`,
      },
    ];
  });
