import {useEffect, useState} from '../lib.js';

const TOKENS = ['ground', 'paper', 'ink', 'quiet', 'accent', 'hair', 'edge', 'data-context', 'data-grid', 'data-1', 'data-2', 'data-3',
  'data-4', 'data-5', 'data-6', 'sequence-low', 'sequence-middle', 'sequence-high', 'apart-low', 'apart-middle', 'apart-high'];

/** The page's colours, type and sizes as a picture needs them, read from the tokens of the style sheet. */
export function colours() {
  const style = getComputedStyle(document.documentElement);
  const token = (name) => style.getPropertyValue(`--${name}`).trim();
  const found = Object.fromEntries(TOKENS.map((name) => [name, token(name)]));
  const size = parseFloat(style.fontSize) || 14;
  return {
    ...found,
    lines: [1, 2, 3, 4, 5, 6].map((number) => found[`data-${number}`]),
    band: parseFloat(token('data-band')) / 100 || 0.2,
    font: token('sans') || 'sans-serif',
    size,
    small: Math.round(size * 0.857),
    unit: size / 14,
  };
}

/** The colours, anew when the theme changes or the type grows with the window. */
export function useColours() {
  const [found, setFound] = useState(colours);
  useEffect(() => {
    const again = () => setFound((before) => {
      const now = colours();
      return JSON.stringify(now) === JSON.stringify(before) ? before : now;
    });
    window.addEventListener('themechange', again);
    window.addEventListener('resize', again);
    again();
    return () => {
      window.removeEventListener('themechange', again);
      window.removeEventListener('resize', again);
    };
  }, []);
  return found;
}

/** A colour with a share of its ink. */
export function faded(colour, share) {
  const [red, green, blue] = rgb(colour);
  return `rgba(${red}, ${green}, ${blue}, ${share})`;
}

function rgb(colour) {
  const hex = colour.replace('#', '');
  const whole = hex.length === 3 ? [...hex].map((digit) => digit + digit).join('') : hex;
  return [0, 2, 4].map((at) => parseInt(whole.slice(at, at + 2), 16));
}

/*
 * A scale of colours whose steps look alike: mixed in Oklab (B. Ottosson, "A perceptual color space for image processing", 2020),
 * where equal distances are equal to the eye.
 */
const STEPS = 33;

/** @returns {string[]} from the first colour over those between to the last */
export function scale(...stops) {
  const points = stops.map(oklab);
  return Array.from({length: STEPS}, (_, step) => {
    const place = (step / (STEPS - 1)) * (points.length - 1);
    const from = Math.min(points.length - 2, Math.floor(place));
    const share = place - from;
    return hex(points[from].map((value, i) => value + share * (points[from + 1][i] - value)));
  });
}

function oklab(colour) {
  const [r, g, b] = rgb(colour).map((value) => {
    const c = value / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  });
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s, 1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s];
}

function hex([lightness, a, b]) {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  const linear = [4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s, -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s];
  return `#${linear.map((c) => {
    const value = c <= 0.0031308 ? 12.92 * c : 1.055 * Math.max(0, c) ** (1 / 2.4) - 0.055;
    return Math.round(255 * Math.min(1, Math.max(0, value))).toString(16).padStart(2, '0');
  }).join('')}`;
}
