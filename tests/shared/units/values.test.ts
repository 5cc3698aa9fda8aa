import fc from 'fast-check';
import { expect, test } from 'vitest';
import { formatExact, formatValue } from '#shared/units/format-value';
import { parseValue, type Quantity } from '#shared/units/parse-value';

const OHM: Quantity = { unit: 'Ω' };
const AMPERE: Quantity = { unit: 'A' };
const CHANNEL: Quantity = { unit: 'm', bareExponent: -6 };

// R47, 4R7, 470R, 4K7, 47K3 and 4M7 are the examples of IEC 60062; the others are spellings of the trade (common practice).
test.each<[string, Quantity, number]>([
  ['R47', OHM, 0.47],
  ['4R7', OHM, 4.7],
  ['470R', OHM, 470],
  ['4K7', OHM, 4700],
  ['47K3', OHM, 47300],
  ['4M7', OHM, 4.7e6],
  ['4k7', OHM, 4700],
  ['10k', OHM, 10e3],
  ['0R5', OHM, 0.5],
  ['2.2 MΩ', OHM, 2.2e6],
  ['2.2 Mohm', OHM, 2.2e6],
  ['1m', OHM, 1e-3],
  ['100u', AMPERE, 100e-6],
  ['100 µA', AMPERE, 100e-6],
  ['100 μA', AMPERE, 100e-6],
  ['−20u', AMPERE, -20e-6],
  ['0,5', AMPERE, 0.5],
  ['3V3', { unit: 'V' }, 3.3],
  ['1e-3', AMPERE, 1e-3],
  ['5', CHANNEL, 5e-6],
  ['0,18', CHANNEL, 0.18e-6],
  ['180 nm', CHANNEL, 180e-9],
  ['5u', CHANNEL, 5e-6],
  ['4n7', { unit: 'F' }, 4.7e-9],
  ['-40 °C', { unit: '°C' }, -40],
])('%s is read in SI units', (text, quantity, value) => {
  const parsed = parseValue(text, quantity);
  expect(parsed.ok && parsed.value).toBeCloseTo(value, 15);
  expect(parsed.ok && parsed.value / value).toBeCloseTo(1, 12);
});

test.each<[string, Quantity, RegExp]>([
  ['', OHM, /nothing is written/i],
  ['abc', OHM, /does not start with a number/],
  ['1,500', OHM, /1500 or 1.500/],
  ['10q', OHM, /neither an SI prefix nor Ω/],
  ['10kV', OHM, /neither/],
  ['10K', AMPERE, /neither/],
  ['5m', CHANNEL, /metres or milli/],
  ['1e999', OHM, /too large|longer|neither/],
  ['9'.repeat(41), OHM, /longer than 40/],
])('%s is refused with its reason', (text, quantity, reason) => {
  const parsed = parseValue(text, quantity);
  expect(parsed.ok ? 'read' : parsed.reason).toMatch(reason);
});

test('shown values have three figures, a prefix and a no-break space', () => {
  expect(formatValue(3.7749e-5, 'A')).toBe('37.7\u00a0µA');
  expect(formatValue(0.42512, 'V')).toBe('425\u00a0mV');
  expect(formatValue(999.96, 'Ω')).toBe('1.00\u00a0kΩ');
  expect(formatValue(0, 'A')).toBe('0\u00a0A');
  expect(formatValue(-1.37, 'V')).toBe('-1.37\u00a0V');
  expect(formatExact(4700, 'Ω')).toBe('4.7\u00a0kΩ');
  expect(formatExact(0.18e-6, 'm')).toBe('180\u00a0nm');
});

test('what a field shows is read back as the same value', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-12, max: 1e12, noNaN: true }),
      fc.constantFrom('Ω' as const, 'A' as const, 'm' as const),
      (value, unit) => {
        const rounded = Number(value.toPrecision(12));
        const parsed = parseValue(formatExact(rounded, unit), { unit });
        // Bare metres are refused on purpose: a channel is never that long.
        if (unit === 'm' && rounded >= 1 && rounded < 1000) return !parsed.ok;
        return parsed.ok && Math.abs(parsed.value - rounded) <= 1e-12 * rounded;
      },
    ),
  );
});
