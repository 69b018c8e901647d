/** How the frame of the page says numbers, sizes and counts; measured values are written as the report writes them, in looks/numbers.js. */

const MINUS = '\u2212';

/**
 * A number with so many significant digits, without needless zeros.
 *
 * @param {number|string|null|undefined} value what is to be said; texts such as "NaN" say that there is none
 * @param {number} [digits] significant digits
 * @returns {string} an en dash where there is no number
 */
export function number(value, digits = 4) {
  if (typeof value !== 'number' || Number.isNaN(value)) {
    return '\u2013';
  }
  if (!Number.isFinite(value)) {
    return value > 0 ? '\u221e' : MINUS + '\u221e';
  }
  if (value === 0) {
    return '0';
  }
  const size = Math.abs(value);
  const rounded = Number(size.toPrecision(digits));
  const text = rounded >= 1e6 || rounded < 1e-4
    ? rounded.toExponential().replace('e+', 'e').replace('e-', 'e' + MINUS)
    : String(rounded);
  return (value < 0 ? MINUS : '') + text;
}

/** A whole number with narrow blanks between thousands: 12 345. @param {number} value */
export function count(value) {
  return String(value).replace(/\B(?=(\d{3})+(?!\d))/g, '\u202f');
}

/** "1 row", "3 rows". @param {number} value @param {string} one @param {string} [many] */
export function counted(value, one, many = one + 's') {
  return `${count(value)} ${value === 1 ? one : many}`;
}

/** @param {string} word */
export function article(word) {
  return (/^[aeiou]/i.test(word) ? 'an ' : 'a ') + word;
}

/** @param {number} bytes */
export function bytes(bytes) {
  const units = ['bytes', 'kB', 'MB', 'GB'];
  let size = bytes;
  let unit = 0;
  while (size >= 1000 && unit < units.length - 1) {
    size /= 1000;
    unit += 1;
  }
  return `${number(size, 3)}\u00a0${units[unit]}`;
}
