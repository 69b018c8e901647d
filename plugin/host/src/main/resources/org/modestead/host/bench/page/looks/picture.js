import {html, useId, useRef, useState} from '../lib.js';
import {counted} from '../js/words.js';
import {useColours} from './colours.js';
import {numbersOf} from './figure-numbers.js';
import {isSelected, words} from './keys.js';
import {Legend} from './legend.js';
import {labelled} from './numbers.js';
import {Plot} from './plot.js';
import {useRead} from './reading.js';
import {useSeen} from './seen.js';
import {DataTable} from './table.js';

/**
 * A picture with its caption, its legend, what is under the pointer, its numbers and its files. Drawn when it is first looked at.
 *
 * @param {object} given
 * @param {{id: string, kind: string, title: string, caption: string}} given.head what the list of pictures says
 * @param {string} given.address of the figure's data; `.svg`, `.png` and `.csv` appended give files
 * @param {any} [given.data] the figure itself, where it is here already
 * @param {string} given.resultId
 * @param {string} given.selection
 * @param {(key: string) => void} given.select
 */
export function Picture({head, address = '', data = null, resultId, selection, select}) {
  const frame = useRef(null);
  const seen = useSeen(frame);
  const {value, fault} = useRead(seen && !data ? address : null, resultId);
  const figure = data ?? value;
  const chosen = figure?.layers.some((layer) => isSelected(layer.selection, selection)) ? selection : '';
  return html`<${Frame} frame=${frame} id=${head.id} kind=${head.kind} title=${head.title} caption=${head.caption} files=${address}
      fault=${fault} chosen=${chosen && words(chosen)} numbers=${figure ? () => numbersOf(figure) : null} selection=${selection} select=${select}>
    ${(tools) => (figure && seen ? html`<${Drawn} figure=${figure} selection=${chosen} select=${select} ...${tools} />`
      : html`<div class="lk-plot lk-empty"></div>`)}
  </${Frame}>`;
}

/** Told only a selection that it shows something of: a picture without it is not drawn anew when another mode is marked. */
function Drawn({figure, selection, select, handle, captionId, title, say}) {
  const theme = useColours();
  const [hidden, setHidden] = useState(new Set());
  const left = figure.y.logarithmic ? undrawn(figure) : 0;
  const right = figure.right ? labelled(figure.right.label) : null;
  return html`
    <p class="lk-axes" aria-hidden="true"><span>${axisWords(figure.y)}</span>${right && html`<span>${axisWords(figure.right)}</span>`}</p>
    <${Plot} figure=${figure} theme=${theme} selection=${selection} select=${select} hidden=${hidden} handle=${handle} say=${say}
      label=${`${title}. Arrow keys go from mark to mark, Enter selects, plus and minus zoom, 0 shows all.`} describedBy=${captionId} />
    <p class="lk-axes lk-axis-x" aria-hidden="true"><span>${axisWords(figure.x)}</span></p>
    <${Legend} figure=${figure} theme=${theme} hidden=${hidden} setHidden=${setHidden} />
    ${left > 0 && html`<p class="lk-quiet lk-left">${counted(left, 'value')} of 0 or below ${left === 1 ? 'is' : 'are'} not drawn: the axis is logarithmic.</p>`}`;
}

/** Values that a logarithmic axis has no place for. */
function undrawn(figure) {
  return figure.layers.flatMap((layer) => layer.y ?? layer.heights ?? []).filter((value) => value !== null && value <= 0).length;
}

function axisWords(axis) {
  return axis.logarithmic ? `${axis.label}, logarithmic` : axis.label;
}

/**
 * What stands around every picture and map: heading, tools, caption, the line that tells what is pointed at, the numbers.
 * The child is a function of {handle, captionId, title, say}.
 */
export function Frame({frame, id, kind, title, caption, files, fault, chosen, numbers, selection, select, children}) {
  const own = useId();
  const handle = useRef(null);
  const [large, setLarge] = useState(false);
  const [open, setOpen] = useState(false);
  const [told, setTold] = useState('');
  const captionId = `${own}-caption`;
  const button = (action, label, sign, act, pressed = null) => html`<button type="button" class="lk-button" data-action=${action}
    aria-label=${`${label}: ${title}`} title=${label} aria-pressed=${pressed} onClick=${act}>${sign}</button>`;
  return html`<figure class=${`lk-picture lk-${kind.toLowerCase().replace('_', '-')}${large ? ' lk-large' : ''}${chosen ? ' lk-chosen' : ''}`}
      ref=${frame} data-figure=${id} aria-label=${title}>
    <div class="lk-head">
      <h4>${title}${chosen && html` <span class="lk-tag">${chosen}</span>`}</h4>
      <div class="lk-tools" role="group" aria-label=${`Tools of the picture ${title}`}>
        ${button('zoom-in', 'Zoom in (or Ctrl and wheel)', '+', () => handle.current?.zoom(0.7))}
        ${button('zoom-out', 'Zoom out', '\u2212', () => handle.current?.zoom(1 / 0.7))}
        ${button('reset', 'Show all', 'all', () => handle.current?.reset())}
        ${button('larger', large ? 'Smaller' : 'Larger', large ? 'smaller' : 'larger', () => setLarge(!large), String(large))}
        ${numbers && button('numbers', 'Show the numbers', 'numbers', () => setOpen(!open), String(open))}
        ${files && html`<a class="lk-button" href=${`${files}.svg?download=1`} download=${`${id}.svg`} data-action="svg" aria-label=${`${title} as an SVG file`}>SVG</a>
          <a class="lk-button" href=${`${files}.png?scale=2&download=1`} download=${`${id}.png`} data-action="png" aria-label=${`${title} as a PNG file`}>PNG</a>
          <a class="lk-button" href=${`${files}.csv?download=1`} download=${`${id}.csv`} data-action="numbers-csv" aria-label=${`CSV: the numbers of ${title} as a file`}>CSV</a>`}
      </div>
    </div>
    ${fault ? html`<p class="lk-fault" role="alert">${fault}</p>` : children({handle, captionId, title, say: setTold})}
    <p class="lk-told" role="status"><span>${told}</span></p>
    <figcaption id=${captionId}>${caption}</figcaption>
    ${open && numbers && html`<${Numbers} make=${numbers} id=${`${id}-numbers`} title=${`Numbers of ${title}`} selection=${selection} select=${select} />`}
  </figure>`;
}

function Numbers({make, id, title, selection, select}) {
  const [source] = useState(make);
  return html`<${DataTable} source=${source} id=${id} title=${title} selection=${selection} select=${select} rows=${10} />`;
}
