/**
 * Numbers for people, written as the report writes them: as many significant digits as the purpose bears, U+2212 for the minus,
 * plain decimals from 0.001 to below 100000, powers of ten outside.
 */

import {power} from '../js/words.js';

const MINUS = '\u2212';
const UNKNOWN = '\u2013';

/**
 * @param {number|null} value null or NaN: not known
 * @param {number} digits at least 1
 * @returns {string} for example 1.52, −0.0430, 2.1 × 10⁻⁷
 */
function significant(value, digits) {
  if (value === null || value === undefined || Number.isNaN(value)) {
    return UNKNOWN;
  }
  if (!Number.isFinite(value)) {
    return value < 0 ? `${MINUS}\u221e` : '\u221e';
  }
  if (value === 0) {
    return '0';
  }
  const sign = value < 0 ? MINUS : '';
  const [mantissa, exponentText] = Math.abs(value).toExponential(digits - 1).split('e');
  const exponent = Number(exponentText);
  if (exponent < -3 || exponent > 4) {
    return sign + power(mantissa, exponent);
  }
  return sign + Number(`${mantissa}e${exponent}`).toFixed(Math.max(0, digits - 1 - exponent));
}

/** Five digits without zeros at the end, for tables. */
export function cell(value) {
  return trimmed(significant(value, 5));
}

/** A share of 1 as per cent without the sign, for a column that says per cent: 0.018 gives 1.8. */
export function hundredths(value) {
  return value === null ? UNKNOWN : trimmed(significant(100 * value, 4));
}

function trimmed(text) {
  return text.includes('.') && !text.includes('\u00d7') ? text.replace(/0+$/, '').replace(/\.$/, '') : text;
}

/** A tick of an axis: as few characters as say it. */
export function tick(value) {
  if (value === 0 || !Number.isFinite(value)) {
    return '0';
  }
  const [mantissa, exponentText] = Math.abs(value).toExponential(6).replace(/\.?0+e/, 'e').split('e');
  const exponent = Number(exponentText);
  const text = exponent >= -5 && exponent <= 5 ? String(Number(Math.abs(value).toPrecision(7))) : power(mantissa, exponent);
  return (value < 0 ? MINUS : '') + text.replace('-', MINUS);
}

const DAY = 86400000;

/** Whether an axis carries dates. */
export function isDated(axis) {
  return axis.time === 'date' || axis.time === 'date-time';
}

/** Milliseconds since 1970 of a figure's time; the number itself where the axis is plain. */
export function milliseconds(value, time) {
  return time === 'date' ? value * DAY : time === 'date-time' ? value * 1000 : value;
}

/** A value of an axis in words: a number, a date or a date and time. */
export function onAxis(value, axis) {
  if (axis.categories.length > 0) {
    return axis.categories[Math.round(value)] ?? cell(value);
  }
  if (isDated(axis)) {
    const moment = new Date(milliseconds(value, axis.time));
    if (Number.isNaN(moment.getTime())) {
      return UNKNOWN;
    }
    return axis.time === 'date' ? moment.toISOString().slice(0, 10) : moment.toISOString().slice(0, 19).replace('T', ' ');
  }
  return cell(value);
}

/** Splits "growth rate [1/s]" into what and unit. */
export function labelled(label) {
  const found = /^(.*?)\s*\[([^\]]*)\]$/.exec(label);
  return found ? {what: found[1], unit: found[2]} : {what: label, unit: ''};
}

/** A value with what it is and its unit: "frequency 0.62 Hz". */
export function told(value, axis) {
  const {what, unit} = labelled(axis.label);
  return [what, onAxis(value, axis), axis.categories.length > 0 ? '' : unit].filter(Boolean).join(' ');
}
