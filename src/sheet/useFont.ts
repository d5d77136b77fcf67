import { useEffect, useState } from 'react';
import { fontFamily } from '../drawing/fontMetrics.ts';

/** Whether the family that text is measured in is there: before it nothing is painted, since it would be another. */
export const useFont = (): boolean => {
  const [loaded, setLoaded] = useState(false);
  useEffect(() => {
    let gone = false;
    const weights = [400, 600].map((weight) => document.fonts.load(`${weight} 13px '${fontFamily}'`));
    // A font that does not come is no reason to show nothing.
    void Promise.allSettled(weights).then(() => {
      if (!gone) setLoaded(true);
    });
    return () => {
      gone = true;
    };
  }, []);
  return loaded;
};
