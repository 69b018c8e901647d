import {html, useState} from '../lib.js';
import {inMemory} from './sources.js';
import {Pictures} from './pictures.js';
import {useRead} from './reading.js';
import {rowKeys} from './keys.js';
import {DataTable} from './table.js';

/** A report that a node made, with pictures that can be worked with. */
export function Report({address, file, resultId, selection, select}) {
  const [open, setOpen] = useState(true);
  const {value, fault} = useRead(open ? address : null, resultId);
  return html`<section class="lk-report" aria-label="Report">
    <div class="lk-bar">
      <button type="button" class="lk-button" data-action="report" aria-expanded=${String(open)} onClick=${() => setOpen(!open)}>
        ${open ? 'Close the report' : 'Read the report'}</button>
      <a class="lk-button" href=${file} target="_blank" rel="noopener" data-action="report-page">As a page of its own</a>
    </div>
    ${fault && html`<p class="lk-fault" role="alert">${fault}</p>`}
    ${open && value && html`<div class="lk-document">
      <h3>${value.title}</h3>
      ${value.subtitle && html`<p class="lk-quiet">${value.subtitle}</p>`}
      ${value.sections.map((section) => html`<section key=${section.id} aria-label=${section.heading}>
        <h4 class="lk-section">${section.heading}</h4>
        ${together(section.blocks).map((blocks, i) => (blocks[0].type === 'picture'
          ? html`<${Pictures} key=${i} figures=${blocks.map((block) => block.figure)} whole=${true} resultId=${resultId} selection=${selection} select=${select} />`
          : html`<${Block} key=${i} block=${blocks[0]} id=${`${section.id}-${i}`} selection=${selection} select=${select} />`))}
      </section>`)}
    </div>`}
  </section>`;
}

/** Pictures that follow each other stand side by side. */
function together(blocks) {
  const groups = [];
  for (const block of blocks) {
    if (block.type === 'picture' && groups.at(-1)?.[0].type === 'picture') {
      groups.at(-1).push(block);
    } else {
      groups.push([block]);
    }
  }
  return groups;
}

function Block({block, id, selection, select}) {
  switch (block.type) {
    case 'heading':
      return html`<h5>${block.text}</h5>`;
    case 'paragraph':
      return html`<p>${block.text}</p>`;
    case 'points':
      return html`<ul class="lk-points">${block.items.map((item, i) => html`<li key=${i}>${item}</li>`)}</ul>`;
    case 'callout':
      return html`<${Callout} tone=${block.tone} word=${block.word} title=${block.title} sentences=${block.sentences} />`;
    case 'values':
      return html`<h5>${block.caption}</h5><dl class="lk-facts">${block.entries.map((entry, i) => html`<div key=${i}><dt>${entry.name}</dt><dd>${entry.value}</dd></div>`)}</dl>`;
    case 'grid':
      return html`<${Grid} grid=${block} id=${id} selection=${selection} select=${select} />`;
    default:
      return null;
  }
}

/** Words that must not be overlooked; the tone is told by its word. */
export function Callout({tone, word, title, sentences}) {
  return html`<div role="note" class=${`lk-callout lk-${tone.toLowerCase()}`} aria-label=${`${word}: ${title}`}>
    <p><strong>${word}: ${title}</strong></p>
    ${sentences.map((sentence, i) => html`<p key=${i}>${sentence}</p>`)}
  </div>`;
}

/** Rows that name a mode stand for it. */
function sourceOf(grid) {
  const columns = grid.columns.map((head) => ({name: head.text, unit: '', cell: 'TEXT', kind: '', right: head.numeric}));
  const lower = columns.map((column) => ({name: column.name.toLowerCase()}));
  const keyOf = rowKeys(lower);
  const mode = lower.findIndex((column) => column.name === 'mode');
  return inMemory(columns, grid.rows, grid.rows.map((row) => (keyOf && /^\d+$/.test(row[mode] ?? '') ? keyOf(row) : '')));
}

function Grid({grid, id, selection, select}) {
  const [source] = useState(() => sourceOf(grid));
  return html`<h5>${grid.caption}</h5>
    <${DataTable} source=${source} id=${id} title=${grid.caption} selection=${selection} select=${select} />
    ${grid.note && html`<p class="lk-quiet">${grid.note}</p>`}`;
}
