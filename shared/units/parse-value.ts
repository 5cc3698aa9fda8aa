import { SI_PREFIX_EXPONENT } from './si-prefix';

export type ParsedValue = { ok: true; value: number } | { ok: false; reason: string };

/** What a field measures: the unit that may follow, and the power of ten that a bare number means. */
export type Quantity = {
  readonly unit: 'Ω' | 'V' | 'A' | 'F' | 'H' | 'm' | 'A/V²' | '°C' | '1/V';
  readonly bareExponent?: number;
};

/** Other ways in which people write a unit. */
const UNIT_SPELLINGS: Readonly<Record<Quantity['unit'], readonly string[]>> = {
  Ω: ['Ω', 'Ω', 'ohm', 'ohms', 'Ohm'],
  V: ['V'],
  A: ['A'],
  F: ['F'],
  H: ['H'],
  m: ['m'],
  'A/V²': ['A/V²', 'A/V2', 'A/V^2'],
  '°C': ['°C', 'C', 'degC'],
  '1/V': ['1/V', '/V'],
};

const MAX_LENGTH = 40;
const MINUS = /^[−–]/;

/**
 * Reads a value as people write it: `10k`, `4k7`, `0R5` (IEC 60062), `2.2 MΩ`, `100u`, `0,5`.
 * The result is in the SI base unit. `K` is kilo on resistors only, as IEC 60062 writes it.
 */
export function parseValue(text: string, quantity: Quantity): ParsedValue {
  const compact = text.replace(/[\s\u00a0\u202f]+/g, '').replace(MINUS, '-');
  if (compact === '') return refuse('Nothing is written here: type a number, such as 10k or 4.7 µ.');
  if (compact.length > MAX_LENGTH)
    return refuse(`This is longer than ${MAX_LENGTH} characters: type a number and a unit.`);
  const head = /^([+-]?)(\d*)([.,]?)(\d*)(e[+-]?\d{1,3})?/.exec(compact);
  const [whole = '', sign = '', integer = '', mark = '', fraction = '', power = ''] = head ?? [];
  if (integer === '' && fraction === '') {
    const fractionOnly = /^([+-]?)([A-Za-zµμΩ])(\d+)$/.exec(compact);
    const exponent = letterExponent(fractionOnly?.[2] ?? '', quantity);
    if (fractionOnly && exponent !== undefined) {
      return { ok: true, value: Number(`${fractionOnly[1]}0.${fractionOnly[3]}e${exponent}`) };
    }
    return refuse(`“${text.trim()}” does not start with a number: write, for example, ${exampleFor(quantity)}.`);
  }
  if (mark === ',' && fraction.length === 3 && power === '') {
    return refuse(
      `“${integer},${fraction}” can mean ${integer}${fraction} or ${integer}.${fraction}: write it with a point, or without the comma.`,
    );
  }
  const rest = compact.slice(whole.length);
  const number = (digits: string, exponent: number): ParsedValue => {
    const value = Number(`${sign}${digits}e${exponent + Number(power.slice(1) || 0)}`);
    return Number.isFinite(value) ? { ok: true, value } : refuse('This number is too large to be a value.');
  };
  const plain = `${integer || '0'}.${fraction || '0'}`;

  if (mark === '' && power === '') {
    const letterCode = /^([A-Za-zµμΩ])(\d+)(.*)$/.exec(rest);
    if (letterCode) {
      const [, letter = '', decimals = '', tail = ''] = letterCode;
      const exponent = letterExponent(letter, quantity);
      if (exponent !== undefined && isUnit(tail, quantity)) return number(`${integer}.${decimals}`, exponent);
    }
  }
  if (rest === '') return number(plain, quantity.bareExponent ?? 0);
  if (rest === 'm' && quantity.unit === 'm') {
    return refuse('“m” alone could be metres or milli: write the prefix too, as in 5 µm or 0.18 µm.');
  }
  if (isUnit(rest, quantity)) return number(plain, 0);
  const exponent = letterExponent(rest.slice(0, 1), quantity);
  if (exponent !== undefined && isUnit(rest.slice(1), quantity)) return number(plain, exponent);
  return refuse(`“${rest}” is neither an SI prefix nor ${quantity.unit}: write, for example, ${exampleFor(quantity)}.`);
}

function isUnit(text: string, quantity: Quantity): boolean {
  return text === '' || UNIT_SPELLINGS[quantity.unit].includes(text);
}

function letterExponent(letter: string, quantity: Quantity): number | undefined {
  if (letter === '') return undefined;
  if (quantity.unit === 'Ω') {
    if (letter === 'R') return 0;
    if (letter === 'K') return 3;
  }
  if (letter === quantity.unit && letter !== 'm') return 0;
  return SI_PREFIX_EXPONENT.get(letter);
}

function exampleFor(quantity: Quantity): string {
  switch (quantity.unit) {
    case 'Ω':
      return '10k, 4k7 or 2.2 MΩ';
    case 'V':
      return '1.8 V or 500m';
    case 'A':
      return '100 µA or 2m';
    case 'F':
      return '10p or 100 nF';
    case 'H':
      return '10u or 1 mH';
    case 'm':
      return '5 (meaning 5 µm) or 180 nm';
    case 'A/V²':
      return '0.5 or 200 mA/V²';
    case '°C':
      return '27 or -40 °C';
    case '1/V':
      return '0.05';
  }
}

function refuse(reason: string): ParsedValue {
  return { ok: false, reason };
}
