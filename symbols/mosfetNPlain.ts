import { mosfetArt } from './mosfetArt.ts';

export const mosfetNPlain = mosfetArt('n', 'plain');
