import { mosfetArt } from './mosfetArt.ts';

export const mosfetP = mosfetArt('p', 'discrete');
