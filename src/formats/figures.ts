import { engineeringExponent, formatScaled, formatValue } from '#shared/units/format-value';
import { PREFIX_FOR_EXPONENT } from '#shared/units/si-prefix';

const NO_BREAK_SPACE = '\u00a0';

/** An operating point holds to 1 µV: less than half of that is no voltage. */
const NO_VOLTAGE = 0.5e-6;

/** Volts from 0.1 V up stay volts (`0.173 V`), so that the voltages of a sheet compare at a glance. */
export function formatVoltage(volts: number, digits = 3): string {
  const size = Math.abs(volts);
  if (size < NO_VOLTAGE) return `0${NO_BREAK_SPACE}V`;
  return size >= 0.1 && size < 1000
    ? `${formatScaled(volts, 0, digits)}${NO_BREAK_SPACE}V`
    : formatValue(volts, 'V', digits);
}

/** A column of figures under one SI prefix, padded so that they line up on the decimal mark in a fixed-width face. */
export type FigureColumn = { readonly unit: string; readonly texts: readonly string[] };

/** More decimals than this and a figure is written with a power of ten instead. */
const MOST_DECIMALS = 6;

/**
 * Figures of one column in one prefix of `unit`: that of the largest of them, or the power of ten in `exponent`.
 * Where there is no figure (undefined, or no finite one) stands a dash.
 */
export function figureColumn(values: readonly (number | undefined)[], unit: string, exponent?: number): FigureColumn {
  const largest = Math.max(0, ...values.flatMap((value) => (isFigure(value) ? [Math.abs(value)] : [])));
  const power = exponent ?? engineeringExponent(largest);
  const texts = values.map((value) => (isFigure(value) ? scaled(value, power) : ''));
  const [wholes, decimals] = [texts.map(lengthOfWhole), texts.map((text) => text.length - lengthOfWhole(text))];
  const [widestWhole, widestDecimals] = [Math.max(1, ...wholes), Math.max(0, ...decimals)];
  return {
    unit: `${PREFIX_FOR_EXPONENT.get(power) ?? ''}${unit}`,
    texts: texts.map((text, index) =>
      text === ''
        ? `${pad(widestWhole - 1)}–${pad(widestDecimals)}`
        : `${pad(widestWhole - (wholes[index] ?? 0))}${text}${pad(widestDecimals - (decimals[index] ?? 0))}`,
    ),
  };
}

function isFigure(value: number | undefined): value is number {
  return value !== undefined && Number.isFinite(value);
}

function scaled(value: number, exponent: number): string {
  const text = formatScaled(value, exponent);
  return text.length - lengthOfWhole(text) > MOST_DECIMALS + 1 || text.length > 12
    ? (value * 10 ** -exponent).toExponential(2)
    : text;
}

function lengthOfWhole(text: string): number {
  const mark = text.indexOf('.');
  return mark < 0 ? text.length : mark;
}

function pad(count: number): string {
  return NO_BREAK_SPACE.repeat(count);
}
