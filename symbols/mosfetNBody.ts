import { mosfetArt } from './mosfetArt.ts';

export const mosfetNBody = mosfetArt('n', 'body');
