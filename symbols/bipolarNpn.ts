import { bipolarArt } from './bipolarArt.ts';

export const bipolarNpn = bipolarArt('n-p-n');
