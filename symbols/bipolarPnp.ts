import { bipolarArt } from './bipolarArt.ts';

export const bipolarPnp = bipolarArt('p-n-p');
