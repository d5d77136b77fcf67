import type { Notice } from '../../readings/readings.ts';
import { wrapped } from './wrap.ts';

/** Snags or cautions under their heading, each with its severity and the parts concerned. Empty where there is none. */
export const noticeLines = (heading: string, notices: readonly Notice[]): readonly string[] => {
  if (notices.length === 0) return [];
  return [
    heading,
    ...notices.flatMap((notice) =>
      wrapped(`${notice.parts.length === 0 ? '' : `${notice.parts.join(', ')}: `}${notice.message}`, 70).map(
        (line, index) => `  ${(index === 0 ? notice.severity : '').padEnd(6)}${line}`,
      ),
    ),
  ];
};
