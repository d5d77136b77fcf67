import type { Role } from './primitives.ts';

export type ThemeName = 'light' | 'dark' | 'print' | 'high-contrast';

export type Theme = Readonly<Record<Role, string>>;

/**
 * What colour each role has. Light and dark are the screen's; print is for paper and stays legible in greyscale;
 * high contrast keeps every text at 7:1 or more.
 */
export const themes: Readonly<Record<ThemeName, Theme>> = {
  light: {
    paper: '#FAFBFC',
    panel: '#EEF2F4',
    ink: '#1F262D',
    soft: '#56606A',
    line: '#77818B',
    hair: '#D2DADF',
    tick: '#C9D2D8',
    read: '#0B5A74',
    held: '#226243',
    atRisk: '#875100',
    missed: '#A6261C',
    wash: '#FBE7A6',
    focus: '#2B4FA8',
  },
  dark: {
    paper: '#13171B',
    panel: '#1B2126',
    ink: '#E6EAED',
    soft: '#A3ABB2',
    line: '#7A848C',
    hair: '#333C43',
    tick: '#3A444B',
    read: '#86CBDD',
    held: '#8CCB9F',
    atRisk: '#E5B45C',
    missed: '#F29488',
    wash: '#4A3F1C',
    focus: '#9DB8FF',
  },
  print: {
    paper: '#FFFFFF',
    panel: '#F3F4F5',
    ink: '#000000',
    soft: '#444A50',
    line: '#6B737B',
    hair: '#B9C0C6',
    tick: '#B9C0C6',
    read: '#084A60',
    held: '#1B5236',
    atRisk: '#6B4000',
    missed: '#8E1D14',
    wash: '#F6E6AE',
    focus: '#2B4FA8',
  },
  'high-contrast': {
    paper: '#FFFFFF',
    panel: '#FFFFFF',
    ink: '#000000',
    soft: '#33383D',
    line: '#4A5158',
    hair: '#767D84',
    tick: '#767D84',
    read: '#003F57',
    held: '#00471F',
    atRisk: '#5C3400',
    missed: '#8A0A00',
    wash: '#FFE680',
    focus: '#0030A0',
  },
};
