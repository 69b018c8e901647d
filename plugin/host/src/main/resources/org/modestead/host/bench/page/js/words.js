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
  const [mantissa, exponent] = rounded.toExponential().split('e');
  const text = rounded >= 1e6 || rounded < 1e-4 ? power(mantissa, Number(exponent)) : String(rounded);
  return (value < 0 ? MINUS : '') + text;
}

/**
 * A time of a recording as it is written: numbers as they are, dates of days since 1970, moments of seconds since then.
 *
 * @param {number|null} value
 * @param {string} kind `date`, `date-time`, or empty for numbers
 */
export function moment(value, kind) {
  if (typeof value !== 'number' || !kind) {
    return number(value);
  }
  const text = new Date(value * (kind === 'date' ? 86400000 : 1000)).toISOString();
  return kind === 'date' ? text.slice(0, 10) : text.slice(0, 19).replace('T', ' ').replace(/:00$/, '');
}

const RAISED = '\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079';

/**
 * A number by a power of ten, the one way in which the page writes it: 2 × 10⁻⁵.
 *
 * @param {string} mantissa as it is to be shown
 * @param {number} exponent
 */
export function power(mantissa, exponent) {
  const raised = [...String(exponent)].map((digit) => (digit === '-' ? '\u207b' : RAISED[Number(digit)])).join('');
  return `${mantissa} \u00d7 10${raised}`;
}

const PROGRAM = /(?<![\w.])([-\u2212]?)(\d+(?:\.\d+)?)[eE]([+-]?\d+)(?![\w.]*\w)/g;

/** A sentence with its numbers as the page writes them: 1.04e-05 becomes 1.04 × 10⁻⁵. @param {string} sentence */
export function prose(sentence) {
  return sentence.replace(PROGRAM, (whole, sign, mantissa, exponent) => (sign ? MINUS : '') + power(mantissa, Number(exponent)));
}

/** Words in which a number is not parted from its unit at the end of a line. @param {string} text */
export function unparted(text) {
  return text.replace(/([\d\u2070-\u2079\u00b9\u00b2\u00b3]) (?=%|(?:s|min|h|d|Hz)\b)/g, '$1\u00a0').replace(/ \u00d7 (?=10)/g, '\u00a0\u00d7\u00a0');
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

/** A path in two parts, of which the first may be shortened: the last two names are what tells one from another. @param {string} path */
export function pathParts(path) {
  const separator = path.includes('\\') ? '\\' : '/';
  const cut = path.lastIndexOf(separator, path.lastIndexOf(separator) - 1);
  return cut > 0 ? {start: path.slice(0, cut), end: path.slice(cut)} : {start: '', end: path};
}
