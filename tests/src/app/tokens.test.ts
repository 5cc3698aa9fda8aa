import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { contrast, deltaE2000, type Rgb, readHex, seenWith, toLab } from './colour-science';

const css = readFileSync(new URL('../../../src/app/styles.css', import.meta.url), 'utf8');

/** The tokens as styles.css has them, `--name: light-dark(#…, #…)`. */
function readTokens(): Record<'light' | 'dark', Map<string, Rgb>> {
  const tokens = { light: new Map<string, Rgb>(), dark: new Map<string, Rgb>() };
  for (const [, name = '', light = '', dark = ''] of css.matchAll(
    /--([a-z]+):\s*light-dark\(\s*(#[0-9a-f]{6}),\s*(#[0-9a-f]{6})\s*\)/gi,
  )) {
    tokens.light.set(name, readHex(light));
    tokens.dark.set(name, readHex(dark));
  }
  return tokens;
}

const tokens = readTokens();
const STATES = ['off', 'triode', 'saturated', 'missed'];
const TEXTS = ['ink', 'faint', 'focus', ...STATES];
const GROUNDS = ['paper', 'sheet'];

describe.each([
  ['light', 12],
  ['dark', 14],
] as const)('the %s theme', (theme, apart) => {
  const colour = (name: string): Rgb => {
    const found = tokens[theme].get(name);
    if (found === undefined) throw new Error(`styles.css has no token --${name}`);
    return found;
  };

  it.each(TEXTS.flatMap((text) => GROUNDS.map((ground) => [text, ground] as const)))(
    'has %s on %s at 4.5 : 1 or more',
    (text, ground) => {
      expect(contrast(colour(text), colour(ground))).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(['ink', 'faint', 'focus', 'missed'])('has text in the sheet colour on %s at 4.5 : 1 or more', (ground) => {
    expect(contrast(colour('sheet'), colour(ground))).toBeGreaterThanOrEqual(4.5);
  });

  it.each(GROUNDS)('has edges on %s at 3 : 1 or more', (ground) => {
    expect(contrast(colour('edge'), colour(ground))).toBeGreaterThanOrEqual(3);
  });

  it.each(['trichromat', 'protanopia', 'deuteranopia', 'tritanopia'] as const)(
    `keeps the four states more than ${apart} apart for %s`,
    (eye) => {
      const pairs = STATES.flatMap((a, index) => STATES.slice(index + 1).map((b) => [a, b] as const));
      expect(pairs).toHaveLength(6);
      for (const [a, b] of pairs) {
        const distance = deltaE2000(toLab(seenWith(eye, colour(a))), toLab(seenWith(eye, colour(b))));
        expect(distance, `${a} and ${b}`).toBeGreaterThan(apart);
      }
    },
  );
});

describe('the measures themselves', () => {
  it('give contrast 21 for black on white and 1 for a colour on itself', () => {
    expect(contrast(readHex('#000000'), readHex('#ffffff'))).toBeCloseTo(21, 6);
    expect(contrast(readHex('#777777'), readHex('#777777'))).toBe(1);
  });

  // G. Sharma, W. Wu, E. N. Dalal, "The CIEDE2000 color-difference formula: implementation notes, supplementary test
  // data, and mathematical observations", Color Res. Appl. 30(1), 2005, table 1; values from memory.
  it.each([
    [[50, 2.6772, -79.7751], [50, 0, -82.7485], 2.0425],
    [[50, 3.1571, -77.2803], [50, 0, -82.7485], 2.8615],
    [[50, -1.3802, -84.2814], [50, 0, -82.7485], 1.0],
    [[50, 0, 0], [50, -1, 2], 2.3669],
    [[50, 2.49, -0.001], [50, -2.49, 0.0009], 7.1792],
    [[50, 2.49, -0.001], [50, -2.49, 0.0011], 7.2195],
    [[50, 2.5, 0], [50, 0, -2.5], 4.3065],
    [[50, 2.5, 0], [73, 25, -18], 27.1492],
    [[50, 2.5, 0], [58, 24, 15], 19.4535],
    [[60.2574, -34.0099, 36.2677], [60.4626, -34.1751, 39.4387], 1.2644],
    [[22.7233, 20.0904, -46.694], [23.0331, 14.973, -42.5619], 2.0373],
    [[2.0776, 0.0795, -1.135], [0.9033, -0.0636, -0.5514], 0.9082],
  ] as const)('give ΔE2000 of %j and %j as published', (a, b, published) => {
    expect(deltaE2000(a, b)).toBeCloseTo(published, 4);
    expect(deltaE2000(b, a)).toBeCloseTo(published, 4);
  });

  it('leave greys grey in every dichromacy, as each row of the matrices adds up to one', () => {
    const grey = readHex('#808080');
    for (const eye of ['protanopia', 'deuteranopia', 'tritanopia'] as const) {
      for (const [index, channel] of seenWith(eye, grey).entries()) expect(channel).toBeCloseTo(grey[index] ?? 0, 5);
    }
  });
});
