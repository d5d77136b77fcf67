import type { SymbolArt } from '../../../symbols/art.ts';
import { symbols } from '../../../symbols/index.ts';
import type { PartContext } from '../../parts/kind.ts';

const plain: Readonly<Record<string, SymbolArt>> = symbols;

/** The symbol of a kind that the catalogue does not list: the general form of the symbol of its name. */
export const standInArt = (kind: string, context: PartContext): SymbolArt | undefined => {
  const told = (key: string): unknown =>
    (context.device as Readonly<Record<string, unknown>> | undefined)?.[key];
  switch (kind) {
    case 'mosfet': {
      const channel = told('channel') === 'p' ? 'p' : 'n';
      if (context.wired.has('body')) return plain[`mosfet-${channel}-body`];
      return plain[told('build') === 'integrated' ? `mosfet-${channel}-plain` : `mosfet-${channel}`];
    }
    case 'bipolar':
      return told('polarity') === 'p-n-p' ? symbols['bipolar-pnp'] : symbols['bipolar-npn'];
    case 'diode':
      return told('type') === 'zener' ? symbols.zener : told('type') === 'led' ? symbols.led : symbols.diode;
    case 'switch':
      return symbols['switch-open'];
    default:
      return plain[kind];
  }
};
