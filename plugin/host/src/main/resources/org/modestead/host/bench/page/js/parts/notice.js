/** A sentence above everything, and the region by which screen readers are told. */
import {html, useEffect} from '../../lib.js';
import {getState} from '../store.js';
import {closeNotice} from '../actions.js';
import {Glyph} from '../glyphs.js';

const STAYS = 12000;

export function Notice() {
  const {notice} = getState();
  useEffect(() => {
    if (!notice || notice.tone === 'stop') {
      return undefined;
    }
    const timer = setTimeout(closeNotice, STAYS);
    return () => clearTimeout(timer);
  }, [notice?.id]);
  return notice && html`<div class=${'notice ' + notice.tone} role="region" aria-label="Message" data-notice=${notice.tone}>
    <p>${notice.text}</p>
    <button type="button" class="button plain" aria-label="Close this message" data-action="close-notice"
      onclick=${closeNotice}><${Glyph} name="close" /></button>
  </div>`;
}

export function Told() {
  const {said} = getState();
  return html`<div class="unseen" role="status" aria-live="polite" data-said>${said}</div>`;
}
