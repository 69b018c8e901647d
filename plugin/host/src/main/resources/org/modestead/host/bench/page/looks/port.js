import {html, useMemo} from '../lib.js';
import {Pictures} from './pictures.js';
import {fromServer} from './sources.js';
import {DataTable} from './table.js';

/** What an output of a step holds: a table, or a typed value told by its facts, pictures and matrices. */
export function Port({step, port, shown, told, resultId, selection, select}) {
  const base = `/api/steps/${encodeURIComponent(step)}`;
  const facts = told && port.type === 'verdict' ? [] : port.facts;
  const own = (port.figures ?? []).filter((figure) => !shown.has(figure.id));
  return html`<section class="lk-port" id=${`lk-port-${port.id}`} tabindex="-1" data-output=${port.id} aria-label=${`${port.title}, ${port.type}`}>
    <h3>${port.title} <span class="lk-type">${typeWords(port)}</span></h3>
    ${facts.length > 0 && html`<dl class="lk-facts">
      ${facts.map((fact) => html`<div key=${fact.item}><dt>${fact.item}</dt><dd>${fact.value}</dd></div>`)}</dl>`}
    ${port.table && html`<${ServerTable} base=${base} port=${port} resultId=${resultId} selection=${selection} select=${select} />`}
    ${(own.length > 0 || port.matrices.length > 0) && html`<${Pictures} figures=${own} base=${`${base}/ports/${port.id}/figures`}
      matrices=${port.matrices} matrixBase=${`${base}/matrices/${port.id}`} resultId=${resultId} selection=${selection} select=${select} />`}
    ${!port.table && html`<p><a class="lk-button" href=${`${base}/ports/${port.id}.zip`} download data-action="port-file">
      ${port.title} as a file in the open format</a></p>`}
  </section>`;
}

function typeWords(port) {
  const type = port.type.charAt(0).toUpperCase() + port.type.slice(1);
  return type === port.title ? '' : type;
}

function ServerTable({base, port, resultId, selection, select}) {
  const source = useMemo(() => fromServer(`${base}/tables/${port.id}`, port.table), [base, port.id, resultId]);
  return html`<${DataTable} key=${resultId} source=${source} id=${port.id} title=${port.title} selection=${selection} select=${select}
    csv=${`${base}/tables/${port.id}.csv`} />`;
}
