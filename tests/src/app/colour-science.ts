/** Linear-light sRGB, each channel 0 to 1. */
export type Rgb = readonly [number, number, number];
/** CIE L*a*b* under D65. */
export type Lab = readonly [number, number, number];
export type Eye = 'trichromat' | 'protanopia' | 'deuteranopia' | 'tritanopia';

/** `#rrggbb`, decoded by the transfer curve of IEC 61966-2-1. */
export function readHex(hex: string): Rgb {
  const channel = (at: number) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

/** WCAG 2.2, "contrast ratio" of "relative luminance". */
export function contrast(a: Rgb, b: Rgb): number {
  const luminance = ([red, green, blue]: Rgb) => 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((first, second) => first - second);
  return (light + 0.05) / (dark + 0.05);
}

type Matrix = readonly [Rgb, Rgb, Rgb];

// G. M. Machado, M. M. Oliveira, L. A. F. Fernandes, "A physiologically-based model for simulation of color vision
// deficiency", IEEE Trans. Vis. Comput. Graph. 15(6), 2009, severity 1.0; values from memory.
const MACHADO: Record<Exclude<Eye, 'trichromat'>, Matrix> = {
  protanopia: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
  deuteranopia: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  tritanopia: [
    [1.255528, -0.076749, -0.178779],
    [-0.078411, 0.930809, 0.147602],
    [0.004733, 0.691367, 0.3039],
  ],
};

/** The colour as this eye sees it; applied to linear light, what leaves the gamut is clipped. */
export function seenWith(eye: Eye, rgb: Rgb): Rgb {
  if (eye === 'trichromat') return rgb;
  const row = (weights: Rgb) => Math.min(1, Math.max(0, dot(weights, rgb)));
  const [red, green, blue] = MACHADO[eye];
  return [row(red), row(green), row(blue)];
}

function dot(a: Rgb, b: Rgb): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

/** sRGB primaries to XYZ (IEC 61966-2-1), then to L*a*b* against D65 white. */
export function toLab(rgb: Rgb): Lab {
  const f = (t: number) => (t > (6 / 29) ** 3 ? Math.cbrt(t) : t / (3 * (6 / 29) ** 2) + 4 / 29);
  const x = f(dot([0.4124564, 0.3575761, 0.1804375], rgb) / 0.95047);
  const y = f(dot([0.2126729, 0.7151522, 0.072175], rgb));
  const z = f(dot([0.0193339, 0.119192, 0.9503041], rgb) / 1.08883);
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)];
}

const DEGREE = Math.PI / 180;
const SEVENTH_OF_25 = 25 ** 7;

/** CIEDE2000 with unit weights, after Sharma, Wu and Dalal (2005). */
export function deltaE2000([l1, a1, b1]: Lab, [l2, a2, b2]: Lab): number {
  const chromaWeight = (chroma: number) => Math.sqrt(chroma ** 7 / (chroma ** 7 + SEVENTH_OF_25));
  const stretch = 1.5 - 0.5 * chromaWeight((Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2);
  const [c1, c2] = [Math.hypot(stretch * a1, b1), Math.hypot(stretch * a2, b2)];
  const hue = (a: number, b: number) => (a === 0 && b === 0 ? 0 : (Math.atan2(b, stretch * a) / DEGREE + 360) % 360);
  const [h1, h2] = [hue(a1, b1), hue(a2, b2)];
  const grey = c1 * c2 === 0;

  // The shorter way round the hue circle, and the middle of that way.
  const turn = h2 - h1;
  const hueStep = grey ? 0 : turn > 180 ? turn - 360 : turn < -180 ? turn + 360 : turn;
  const sum = h1 + h2;
  const meanHue = grey ? sum : Math.abs(turn) <= 180 ? sum / 2 : sum < 360 ? sum / 2 + 180 : sum / 2 - 180;

  const meanLightness = (l1 + l2) / 2;
  const meanChroma = (c1 + c2) / 2;
  const t =
    1 -
    0.17 * Math.cos((meanHue - 30) * DEGREE) +
    0.24 * Math.cos(2 * meanHue * DEGREE) +
    0.32 * Math.cos((3 * meanHue + 6) * DEGREE) -
    0.2 * Math.cos((4 * meanHue - 63) * DEGREE);
  const lightness = (l2 - l1) / (1 + (0.015 * (meanLightness - 50) ** 2) / Math.sqrt(20 + (meanLightness - 50) ** 2));
  const chroma = (c2 - c1) / (1 + 0.045 * meanChroma);
  const hueDistance = (2 * Math.sqrt(c1 * c2) * Math.sin((hueStep / 2) * DEGREE)) / (1 + 0.015 * meanChroma * t);
  const rotation = -2 * chromaWeight(meanChroma) * Math.sin(60 * Math.exp(-(((meanHue - 275) / 25) ** 2)) * DEGREE);
  return Math.sqrt(lightness ** 2 + chroma ** 2 + hueDistance ** 2 + rotation * chroma * hueDistance);
}
