import type { Inversion } from '../../readings/readings.ts';
import type { BadgeSign } from './sign.ts';
import { regionWord } from './curves.ts';

/** The inversion that is marked: only of a channel that conducts, and strong is not. */
export const markedInversion = ({
  region,
  inversion,
}: Pick<BadgeSign, 'region' | 'inversion'>): Exclude<Inversion, 'strong'> | undefined =>
  (region === 'triode' || region === 'saturation') && inversion !== 'strong' ? inversion : undefined;

/** What stands beside the badge in full: the region, and what is said of it besides. */
export const badgeWords = (sign: Pick<BadgeSign, 'region' | 'reversed' | 'inversion'>): string => {
  const inversion = markedInversion(sign);
  return [
    regionWord(sign.region),
    ...(sign.reversed ? ['reversed'] : []),
    ...(inversion === undefined ? [] : [inversion]),
  ].join(', ');
};
