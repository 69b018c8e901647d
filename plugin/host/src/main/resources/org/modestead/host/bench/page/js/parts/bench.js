/** The bench as a whole: shelf, steps and what the chosen one shows. */
import {html, useEffect} from '../../lib.js';
import {getState} from '../store.js';
import {pageKey} from '../keys.js';
import {Bar} from './bar.js';
import {Bands} from './bands.js';
import {DragLayer} from './drag-layer.js';
import {DropZone} from './drop-zone.js';
import {LookPane} from './look-pane.js';
import {Shelf} from './shelf.js';
import {Splitter} from './splitter.js';
import {Strip} from './strip.js';

export function Bench() {
  const {wide, drag} = getState();
  useEffect(() => {
    // the page that had the focus is gone
    if (document.activeElement === document.body) {
      document.getElementById('bench')?.focus({preventScroll: true});
    }
    window.addEventListener('keydown', pageKey);
    return () => window.removeEventListener('keydown', pageKey);
  }, []);
  return html`<div class=${'page' + (wide ? ' wide' : '') + (drag ? ` dragging dragging-${drag.kind}` : '')}>
      <${Bar} />
      <div class="room">
        ${!wide && html`<${Shelf} />
          <section class="bench-frame" aria-label="Bench">
            <div class="bench" id="bench" tabindex="-1" data-part="bench" data-scroll="bench"><${Bands} /></div>
            <${Splitter} />
          </section>`}
        <${LookPane} />
      </div>
      <${Strip} />
      <${DropZone} take=${() => {}} />
    </div>
    <${DragLayer} />`;
}
