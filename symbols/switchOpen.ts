import { switchArt } from './switchArt.ts';

export const switchOpen = switchArt(false);
