import { mosfetArt } from './mosfetArt.ts';

export const mosfetPBody = mosfetArt('p', 'body');
