import { mosfetArt } from './mosfetArt.ts';

export const mosfetN = mosfetArt('n', 'discrete');
