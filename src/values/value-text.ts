import { engineering, formatPercent, formatQuantity, trimZeros, withTrueMinus } from './format.ts';
import { isArithmetic } from './parse.ts';
import { quantityOf } from './quantities.ts';
import type { QuantityName } from './quantities.ts';
import { resolveValue } from './value-spec.ts';
import type { PlainValue, ValueSpec } from './value-spec.ts';

/** The letter of the marking code that a drawing prints for a power of ten. */
const codeLetters: Readonly<Record<'resistance' | 'capacitance', Readonly<Record<number, string>>>> = {
  resistance: { 3: 'k', 6: 'M', 9: 'G', 12: 'T' },
  capacitance: { [-12]: 'p', [-9]: 'n', [-6]: 'µ', [-3]: 'm' },
};

/** The value itself, without its spread. */
export const plainOf = (spec: ValueSpec): PlainValue => (typeof spec === 'object' ? spec.value : spec);

/**
 * A stated value as it stands beside its part: as a person typed it where it was typed with a prefix, unit or
 * code (`4k7`, `3.3 kΩ`); a bare number with its unit (`240 Ω`); in the marking code where that is the custom
 * (`1M`, `100n`); arithmetic as what it comes to.
 */
export function formatStated(spec: ValueSpec, quantity: QuantityName): string {
  const stated = plainOf(spec);
  const unit = quantityOf(quantity).unit;
  if (typeof stated === 'string' && !isArithmetic(stated, quantity)) {
    const typed = stated.trim();
    const bareNumber = /^[+\-\u2212]?[\d.]+$/.test(typed);
    return bareNumber && unit !== '' ? withTrueMinus(`${typed} ${unit}`) : typed;
  }
  return formatCoded(resolveValue(spec, quantity).nominal, quantity);
}

/** A number in the marking code where the quantity has one for its size, else with prefix and unit. */
export function formatCoded(value: number, quantity: QuantityName): string {
  const { code, unit } = quantityOf(quantity);
  if (code !== undefined && unit !== 'H' && value > 0) {
    const { digits, exponent } = engineering(value, 4, true);
    const letter = codeLetters[code][exponent];
    if (letter !== undefined) {
      const [whole = '0', part = ''] = trimZeros(digits).split('.');
      return `${whole}${letter}${part}`;
    }
  }
  if (unit === '' && Math.abs(value) >= 1e-3 && Math.abs(value) < 1e6) {
    return withTrueMinus(String(Number(value.toPrecision(4))));
  }
  return formatQuantity(value, quantity, { trim: true });
}

/** A stated spread as it stands beside the value: `±5 %`, `10.5 V … 14.4 V`; undefined where there is none. */
export function formatSpread(spec: ValueSpec, quantity: QuantityName): string | undefined {
  if (typeof spec !== 'object') return undefined;
  const { low, high, tolerance } = resolveValue(spec, quantity);
  if (tolerance !== undefined) return tolerance === 0 ? undefined : `±${formatPercent(tolerance)}`;
  return low === high ? undefined : `${formatCoded(low, quantity)} … ${formatCoded(high, quantity)}`;
}
