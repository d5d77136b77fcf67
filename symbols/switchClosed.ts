import { switchArt } from './switchArt.ts';

export const switchClosed = switchArt(true);
