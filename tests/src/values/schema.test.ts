import { describe, expect, it } from 'vitest';
import { choice, fieldOf, plainQuantity, quantity, shortText, yesOrNo } from '../../../src/values/schema.ts';

describe('field schemas', () => {
  it('keep a value as it was typed', () => {
    const typed = { value: '4k7', tolerance: 0.05 };
    expect(quantity('resistance').parse(typed)).toBe(typed);
    expect(plainQuantity('power').parse('250 mW')).toBe('250 mW');
  });
  it('carry the fault, with the key inside the value as path', () => {
    const result = quantity('resistance').safeParse({ value: '4k7', tolerance: 2 });
    expect(result.error?.issues).toMatchObject([
      { path: ['tolerance'], params: { fault: { code: 'out-of-range' } } },
    ]);
  });
  it('refuse a spread where the quantity has none', () => {
    expect(plainQuantity('power').safeParse({ value: 1, tolerance: 0.1 }).success).toBe(false);
  });
  it('refuse nothing at all', () => {
    expect(quantity('resistance').safeParse(undefined).success).toBe(false);
    expect(choice('a', 'b').safeParse(undefined).success).toBe(false);
  });
  it('say what they hold, also where optional', () => {
    expect(fieldOf(quantity('resistance').optional())).toEqual({
      type: 'quantity',
      quantity: 'resistance',
      spread: true,
    });
    expect(fieldOf(choice('lamp', 'coil').exactOptional())).toEqual({
      type: 'choice',
      choices: ['lamp', 'coil'],
    });
    expect(fieldOf(yesOrNo())).toEqual({ type: 'boolean' });
    expect(fieldOf(shortText())).toEqual({ type: 'text' });
  });
});
