/** Small marks drawn for this page. A mark never stands alone: words beside it say the same. */
import {html} from '../lib.js';

const OUTLINES = {
  /* states of a step: each has another outline */
  unset: 'M2 2h3M8 2h4v3M12 8v4H8M5 12H2V8M2 5V2',
  ready: 'M7 1.5 12.5 7 7 12.5 1.5 7Z',
  waiting: 'M2 4h10M2 10h10',
  running: 'M1.5 4h11v6h-11ZM3.5 6v2M5.5 6v2',
  done: 'M2 7.5 5.5 11 12 3',
  doubts: 'M2 6 5.5 9.5 12 1.5M2 13c2-2 3 0 5-1s3-1 5 0',
  failed: 'M3 3l8 8M11 3l-8 8',
  stopped: 'M3 3h8v8h-8Z',
  stale: 'M2 7.5 5.5 11 8 7.5M9.5 5.5 12 2M12 8v4',
  /* actions */
  plus: 'M7 2v10M2 7h10',
  open: 'M3 5l4 4 4-4',
  shut: 'M5 3l4 4-4 4',
  close: 'M3 3l8 8M11 3l-8 8',
  widen: 'M2 5V2h3M9 2h3v3M12 9v3H9M5 12H2V9',
  file: 'M3 1.5h5l3 3v8H3ZM8 1.5v3h3',
  folder: 'M1.5 3.5h4l1.5 2h5.5v6h-11Z',
};

/** @param {{name: keyof OUTLINES}} props */
export function Glyph({name}) {
  return html`<svg class="glyph" viewBox="0 0 14 14" aria-hidden="true" focusable="false">
    <path d=${OUTLINES[name]} fill="none" stroke="currentColor" stroke-width="1.6" stroke-linecap="round" stroke-linejoin="round" />
  </svg>`;
}
