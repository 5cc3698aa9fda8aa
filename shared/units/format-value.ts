import { PREFIX_FOR_EXPONENT } from './si-prefix';

const NO_BREAK_SPACE = '\u00a0';

/** Thousands step of the SI prefix that shows `value` with one to three digits before the decimal mark. */
export function engineeringExponent(value: number, digits = 3): number {
  if (value === 0) return 0;
  // Rounded first: 999.96 at three digits is 1.00 k, not 1000.
  const [, exponent = '0'] = Math.abs(value)
    .toExponential(digits - 1)
    .split('e');
  const step = 3 * Math.floor(Number(exponent) / 3);
  return Math.min(12, Math.max(-15, step));
}

/** Digits of `value` scaled by 10^−exponent to `digits` significant figures, without an exponent part. */
export function formatScaled(value: number, exponent: number, digits = 3): string {
  if (value === 0) return '0';
  const scaled = exponent < 0 ? value * 10 ** -exponent : value / 10 ** exponent;
  const decimals = digits - 1 - Number(scaled.toExponential(digits - 1).split('e')[1]);
  const text = scaled.toFixed(Math.min(20, Math.max(0, decimals)));
  return Number(text) === 0 ? '0' : text;
}

/** `value` in `unit` for a person: significant figures, SI prefix, no-break space. 3.77e-5 A reads `37.7 µA`. */
export function formatValue(value: number, unit: string, digits = 3): string {
  const exponent = engineeringExponent(value, digits);
  const prefix = PREFIX_FOR_EXPONENT.get(exponent) ?? '';
  const suffix = `${prefix}${unit}`;
  return `${formatScaled(value, exponent, digits)}${suffix === '' ? '' : NO_BREAK_SPACE}${suffix}`;
}

/** A value as it stands in a field: every digit that was typed, with its SI prefix (4700 Ω reads `4.7 kΩ`). */
export function formatExact(value: number, unit: string): string {
  const exponent = engineeringExponent(value, 15);
  const digits = formatScaled(value, exponent, 15);
  const trimmed = digits.includes('.') ? digits.replace(/\.?0+$/, '') : digits;
  const suffix = `${PREFIX_FOR_EXPONENT.get(exponent) ?? ''}${unit}`;
  return `${trimmed}${suffix === '' ? '' : NO_BREAK_SPACE}${suffix}`;
}
