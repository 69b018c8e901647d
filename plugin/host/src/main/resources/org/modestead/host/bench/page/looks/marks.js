import {html} from '../lib.js';

/** The shapes of points: shape and filling carry meaning where colour alone must not. Open ones are filled with paper. */

/** @returns {{symbol: string, size: number, itemStyle: object}} as the chart library wants it */
export function symbolOf(mark, colour, theme, size = 10 * theme.unit, opacity = 1) {
  const stroke = Math.max(1.8, size / 5.5);
  switch (mark) {
    case 'SQUARE':
      return {symbol: 'rect', size: size * 0.9, itemStyle: {color: colour, opacity}};
    case 'RING':
      return {symbol: 'circle', size, itemStyle: {color: theme.paper, borderColor: colour, borderWidth: stroke, opacity}};
    case 'TRIANGLE':
      return {symbol: 'triangle', size: size * 1.1, itemStyle: {color: theme.paper, borderColor: colour, borderWidth: stroke, opacity}};
    case 'CROSS':
      return {symbol: 'path://M0,0L10,10M10,0L0,10', size: size * 0.85,
        itemStyle: {color: 'transparent', borderColor: colour, borderWidth: stroke + 0.3, opacity}};
    default:
      return {symbol: 'circle', size, itemStyle: {color: colour, opacity}};
  }
}

/** A mark as a small sign beside words; it says nothing by itself to a reader of screens. */
export function Mark({mark, colour = 'currentColor'}) {
  const open = {fill: 'var(--paper)', stroke: colour, 'stroke-width': 2};
  const shape = {
    DISC: () => html`<circle cx="8" cy="8" r="5" fill=${colour} />`,
    SQUARE: () => html`<rect x="3.5" y="3.5" width="9" height="9" fill=${colour} />`,
    RING: () => html`<circle cx="8" cy="8" r="4.5" ...${open} />`,
    TRIANGLE: () => html`<path d="M8 3 L13 12.5 L3 12.5 Z" ...${open} />`,
    CROSS: () => html`<path d="M4 4 L12 12 M12 4 L4 12" fill="none" stroke=${colour} stroke-width="2.2" />`,
  }[mark] ?? (() => null);
  return html`<svg class="lk-sign" viewBox="0 0 16 16" aria-hidden="true" focusable="false">${shape()}</svg>`;
}

/** What each grade looks like, as in the picture of the eigenvalues. */
export const GRADE_MARKS = {stands: 'DISC', settles: 'SQUARE', undecided: 'RING', drifts: 'TRIANGLE', absent: 'CROSS'};
