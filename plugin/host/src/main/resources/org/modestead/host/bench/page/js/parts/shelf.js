/** The shelf: every node, grouped by stage, to be dragged onto the bench or added with Enter. */
import {html, useState, useRef} from '../../lib.js';
import {getState} from '../store.js';
import {addStep, openDialog} from '../actions.js';
import {matches, nodeOf, typeTitle} from '../catalog.js';
import {grab} from '../drag.js';
import {Glyph} from '../glyphs.js';
import {walkList} from './list-walk.js';

export function Shelf() {
  const {catalog} = getState();
  const [query, setQuery] = useState('');
  const [shut, setShut] = useState(new Set());
  const [shown, setShown] = useState('');
  const list = useRef(null);
  const groups = catalog.stages.map((stage) => ({
    stage, nodes: catalog.nodes.filter((node) => node.stage === stage.id && matches(catalog, node, query)),
  })).filter((group) => group.nodes.length > 0);
  const about = nodeOf(catalog, shown);
  const flip = (id) => setShut((before) => {
    const after = new Set(before);
    after[after.has(id) ? 'delete' : 'add'](id);
    return after;
  });
  return html`<nav class="shelf" data-part="shelf" aria-label="Shelf of steps">
    <div class="shelf-head">
      <label class="unseen" for="shelf-query">Search the shelf</label>
      <input id="shelf-query" class="field-input" type="search" placeholder="Search steps" value=${query} data-first data-action="search-shelf"
        oninput=${(e) => setQuery(e.target.value)} onkeydown=${(e) => intoList(e, list)} />
    </div>
    <div class="shelf-list" ref=${list} onkeydown=${(e) => walk(e, list)}>
      ${groups.map(({stage, nodes}) => {
        const isOpen = query !== '' || !shut.has(stage.id);
        return html`<section key=${stage.id}>
          <h2 class="shelf-stage"><button type="button" aria-expanded=${String(isOpen)} onclick=${() => flip(stage.id)}>
            <${Glyph} name=${isOpen ? 'open' : 'shut'} />${stage.title}</button></h2>
          ${isOpen && html`<ul>${nodes.map((node) => html`<li key=${node.id}><${Item} node=${node} show=${setShown} current=${shown === node.id} /></li>`)}</ul>`}
        </section>`;
      })}
      ${groups.length === 0 && html`<p class="quiet small shelf-none">No step is called that. Try a word of what it does, such as “damping”.</p>`}
    </div>
    <div class="shelf-about" aria-live="off">
      ${about ? html`<${About} node=${about} catalog=${catalog} />`
        : html`<p class="quiet small">Drag a step onto the bench, or press Enter on it.</p>`}
    </div>
  </nav>`;
}

function Item({node, show, current}) {
  return html`<button type="button" class=${'shelf-item' + (current ? ' current' : '')} data-node=${node.id} data-action="add-node"
    aria-description=${node.purpose}
    onpointerdown=${(e) => grab(e, {kind: 'node', node: node.id})} onpointerenter=${() => show(node.id)} onfocus=${() => show(node.id)}
    onclick=${(e) => (e.detail === 0 ? addStep({node: node.id}) : show(node.id))} ondblclick=${() => addStep({node: node.id})}>
    ${node.title}</button>`;
}

function About({node, catalog}) {
  const names = (ports) => ports.map((port) => typeTitle(catalog, port.type));
  const takes = [...new Set(names(node.inputs))].join(', ');
  const gives = [...new Set(names(node.outputs))].join(', ');
  return html`<h3>${node.title}</h3>
    <div class="row">
      <button type="button" class="button" data-action="add-shown" onclick=${() => addStep({node: node.id})}>Add</button>
      <button type="button" class="button plain" data-action="about-node"
        onclick=${() => openDialog({kind: 'about', node: node.id})}>More about it</button>
    </div>
    <p class="small">${node.purpose}</p>
    <p class="small quiet">${takes ? `Takes ${takes}. ` : ''}${gives ? `Gives ${gives}.` : ''}</p>`;
}

function intoList(event, list) {
  if (event.key === 'ArrowDown') {
    event.preventDefault();
    list.current.querySelector('.shelf-item')?.focus();
  }
}

/** Arrow keys go through all that can be pressed on the shelf. */
function walk(event, list) {
  const by = {ArrowDown: 1, ArrowUp: -1}[event.key];
  if (by && !event.ctrlKey && !event.altKey) {
    event.preventDefault();
    walkList(list.current, by, 'shelf-query');
  }
}
