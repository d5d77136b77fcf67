import type { BadgeSign } from './badge.ts';
import { regionWord } from './curves.ts';

/** What stands beside the badge in full: the region, and what is said of it besides. */
export const badgeWords = ({
  region,
  reversed,
  inversion,
}: Pick<BadgeSign, 'region' | 'reversed' | 'inversion'>): string =>
  [
    regionWord(region),
    ...(reversed ? ['reversed'] : []),
    ...(inversion === undefined || inversion === 'strong' ? [] : [inversion]),
  ].join(', ');
