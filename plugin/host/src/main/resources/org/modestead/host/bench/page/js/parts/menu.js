/** A button that opens a list of actions. Arrow keys go through it, Escape shuts it. */
import {html, useEffect, useRef, useState} from '../../lib.js';
import {Glyph} from '../glyphs.js';

/**
 * @param {object} props
 * @param {string} props.label
 * @param {string} props.action hook for tests
 * @param {Array<{label: string, action: string, keys?: string, off?: boolean, checked?: boolean, act: () => any}|null>} props.items null draws a line; `checked` makes it one of several of which one holds
 */
export function Menu({label, action, items}) {
  const [open, setOpen] = useState(false);
  const box = useRef(null);
  const button = useRef(null);
  useEffect(() => {
    if (!open) {
      return undefined;
    }
    box.current.querySelector('.menu-item')?.focus();
    const away = (event) => {
      if (!box.current.contains(event.target)) {
        setOpen(false);
      }
    };
    window.addEventListener('pointerdown', away, true);
    return () => window.removeEventListener('pointerdown', away, true);
  }, [open]);
  const shut = () => {
    setOpen(false);
    button.current.focus();
  };
  const key = (event) => {
    if (open && event.key === 'Escape') {
      event.preventDefault();
      event.stopPropagation();
      shut();
    } else if (open && event.key === 'Tab') {
      setOpen(false);
    } else if (['ArrowDown', 'ArrowUp', 'Home', 'End'].includes(event.key)) {
      event.preventDefault();
      event.stopPropagation();
      if (open) {
        walk(box.current, event.key);
      } else {
        setOpen(true);
      }
    }
  };
  return html`<div class="menu" ref=${box} onkeydown=${key}>
    <button type="button" class="button plain" ref=${button} data-action=${action} aria-haspopup="menu" aria-expanded=${String(open)}
      onclick=${() => setOpen(!open)}>${label}<${Glyph} name="open" /></button>
    ${open && html`<ul class="menu-list" role="menu" aria-label=${label}>
      ${items.map((item, i) => (item === null
        ? html`<li key=${i} role="separator" class="menu-line"></li>`
        : html`<li key=${item.label} role="none"><button type="button" role=${item.checked === undefined ? 'menuitem' : 'menuitemradio'}
            aria-checked=${item.checked === undefined ? undefined : String(item.checked)} class="menu-item" tabindex="-1" data-action=${item.action}
            aria-disabled=${item.off ? 'true' : undefined}
            onclick=${() => {
              if (!item.off) {
                shut();
                item.act();
              }
            }}>${item.checked !== undefined && html`<span class="menu-check">${item.checked && html`<${Glyph} name="done" />`}</span>`}<span class="grow">${item.label}</span>${item.keys && html`<span class="quiet small">${item.keys}</span>`}</button></li>`))}
    </ul>`}
  </div>`;
}

function walk(box, key) {
  const items = [...box.querySelectorAll('.menu-item')];
  const at = items.indexOf(document.activeElement);
  const next = {ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: items.length - 1}[key];
  items[(next + items.length) % items.length]?.focus();
}
