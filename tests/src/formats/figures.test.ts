import { expect, test } from 'vitest';
import { figureColumn, formatVoltage } from '../../../src/formats/figures';

/** No-break spaces as plain ones, to be read here. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

test('a column has one prefix, that of its largest figure, and its figures line up on the decimal mark', () => {
  const { unit, texts } = figureColumn([73.5e-6, 5.37e-6, -120e-6, undefined], 'A');
  expect(unit).toBe('µA');
  expect(texts.map(plain)).toEqual(['  73.5 ', '   5.37', '-120   ', '   –   ']);
});

test('a prefix can be given, as millivolts are for margins', () => {
  const { unit, texts } = figureColumn([1.08, -0.0636], 'V', -3);
  expect(unit).toBe('mV');
  expect(texts.map(plain)).toEqual(['1080  ', ' -63.6']);
});

test('an unlimited resistance has no figure, and one far smaller than the others keeps its digits', () => {
  const { texts } = figureColumn([Number.POSITIVE_INFINITY, 1e3, 1.23e-9], 'Ω');
  expect(texts.map((text) => plain(text).trim())).toEqual(['–', '1.00', '1.23e-12']);
});

test('voltages of the usual size stay in volts, and rounding noise is no voltage', () => {
  expect([0.173, 1.8, -0.748, 0.0123, 2e-17].map((volts) => plain(formatVoltage(volts)))).toEqual([
    '0.173 V',
    '1.80 V',
    '-0.748 V',
    '12.3 mV',
    '0 V',
  ]);
});
