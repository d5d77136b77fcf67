import { mosfetArt } from './mosfetArt.ts';

export const mosfetPPlain = mosfetArt('p', 'plain');
