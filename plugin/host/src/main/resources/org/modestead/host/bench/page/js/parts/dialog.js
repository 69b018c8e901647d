/** A dialog: modal, named by its heading, shut by Escape; the focus goes back where it came from. */
import {html, useEffect, useId, useRef} from '../../lib.js';
import {closeDialog} from '../actions.js';
import {Notice, Told} from './notice.js';
import {Glyph} from '../glyphs.js';

/**
 * @param {object} props
 * @param {string} props.title
 * @param {string} props.kind hook for tests and styles
 * @param {any} [props.children] the content
 * @param {any} [props.foot] what stands at the foot
 * @param {() => any} [props.onsubmit] what Enter in a field and the main button do
 * @param {boolean} [props.light] whether a press beside it shuts it; not where something could be lost
 * @param {boolean} [props.text] whether it is there to be read: then its content can have the focus, to be scrolled by keys
 * @param {() => any} [props.onclose] instead of only shutting it
 */
export function Dialog({title, kind, children, foot, onsubmit, light, text, onclose = closeDialog}) {
  const box = useRef(null);
  const heading = 'dialog' + useId();
  useEffect(() => {
    const before = document.activeElement;
    const card = before?.dataset?.card;
    const port = before?.dataset?.port;
    const side = before?.dataset?.side;
    box.current.showModal();
    const first = box.current.querySelector('[data-focus]');
    first?.focus();
    first?.select?.();
    return () => giveBack(before, card, port, side);
  }, []);
  const submit = (event) => {
    event.preventDefault();
    onsubmit?.();
  };
  const press = (event) => {
    if (light && event.target === box.current) {
      onclose();
    }
  };
  return html`<dialog class=${'dialog ' + kind} ref=${box} data-dialog=${kind} aria-labelledby=${heading}
      oncancel=${(e) => {
        e.preventDefault();
        onclose();
      }} onpointerdown=${press}>
    <form class="dialog-form" method="dialog" novalidate onsubmit=${submit}>
      <div class="dialog-head"><h2 id=${heading}>${title}</h2>
        <button type="button" class="button plain dialog-close" data-action="close-dialog" aria-label="Close"
          onclick=${() => onclose()}><${Glyph} name="close" /></button></div>
      <${Notice} /><${Told} />
      <div class="dialog-body" tabindex=${text ? 0 : undefined} role=${text ? 'group' : undefined} aria-labelledby=${text ? heading : undefined}>${children}</div>
      ${foot && html`<div class="dialog-foot">${foot}</div>`}
    </form>
  </dialog>`;
}

export const cancelButton = html`<button type="button" class="button" data-action="cancel-dialog" onclick=${closeDialog}>Cancel</button>`;

/** The element may have been drawn anew meanwhile: then its successor takes the focus. */
function giveBack(before, card, port, side) {
  setTimeout(() => {
    if (document.querySelector('dialog[open]')) {
      return;
    }
    const target = before?.isConnected ? before
      : card ? document.querySelector(`[data-card="${CSS.escape(card)}"]`)
        : port ? document.querySelector(`[data-port="${CSS.escape(port)}"][data-side="${side}"]`) : null;
    if (target && document.activeElement === document.body) {
      target.focus();
    }
  }, 0);
}
