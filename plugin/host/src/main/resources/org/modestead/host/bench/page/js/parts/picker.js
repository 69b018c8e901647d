/** What fits a port: links that are there, open ends on the bench, steps that could be added. For pointer and keyboard alike. */
import {html, useEffect, useRef, useState} from '../../lib.js';
import {getState} from '../store.js';
import {addStep, attempt, closeDialog, link, unlink} from '../actions.js';
import {endWords, matches, nodeOf, portAt, stageTitle, stepName, stepWith, typeTitle} from '../catalog.js';
import {stepOf} from '../layout.js';
import {fittingOf} from '../drag.js';
import {focusCard} from './bands.js';
import {Dialog} from './dialog.js';
import {walkList} from './list-walk.js';
import {article, counted} from '../words.js';

/**
 * @param {object} props
 * @param {string} props.end `step.port`
 * @param {boolean} props.output which side the port is on
 * @param {string} [props.step] only ports of this step
 */
export function Picker({end, output, step}) {
  const {catalog, desk} = getState();
  const [fitting, setFitting] = useState(null);
  const [query, setQuery] = useState('');
  const list = useRef(null);
  useEffect(() => {
    attempt(() => fittingOf({end, output})).then((answer) => (answer ? setFitting(answer) : closeDialog()));
  }, [end, output]);
  const found = portAt(catalog, desk, end, output);
  if (!found) {
    return null;
  }
  const type = typeTitle(catalog, found.port.type);
  const options = fitting ? optionsOf({catalog, desk, fitting, end, output, step, query}) : null;
  const key = (event) => {
    const by = {ArrowDown: 1, ArrowUp: -1}[event.key];
    if (by) {
      event.preventDefault();
      walkList(list.current, by, 'picker-query');
    }
  };
  const first = () => options?.flatMap((group) => group.items)[0]?.act();
  const title = `${found.port.title} of ${stepName(desk, found.step)} ${output ? 'feeds' : 'comes from'}`;
  return html`<${Dialog} title=${title} kind="picker" light onsubmit=${first}>
    <div onkeydown=${key}>
      <p class="help">${found.port.description}${found.port.optional ? ' It may stay unlinked.' : ''}</p>
      <label class="unseen" for="picker-query">Search what fits ${article(type)}</label>
      <input id="picker-query" class="field-input" type="search" data-focus placeholder=${`Search what ${output ? 'takes' : 'gives'} ${type}`} value=${query}
        autocomplete="off" oninput=${(e) => setQuery(e.target.value)} />
      <div class="picker-list" ref=${list} aria-busy=${String(!fitting)}>
        ${options === null ? html`<p class="quiet">Looking for what fits.</p>` : options.map((group) => html`<section key=${group.title}>
          <h3>${group.title}</h3>
          <ul>${group.items.map((item) => html`<li key=${item.key}><button type="button" class="picker-item" data-action=${item.action} data-pick=${item.key}
            onclick=${item.act}><span>${item.label}</span>${item.more && html`<span class="quiet small">${item.more}</span>`}</button></li>`)}</ul>
        </section>`)}
        ${options?.length === 0 && html`<p
          class="quiet">${query ? 'Nothing that fits is called that.' : `Nothing fits: no step ${output ? 'takes' : 'gives'} ${type}.`}</p>`}
      </div>
      ${fitting && !query && html`<${Unfit} fitting=${fitting} catalog=${catalog} desk=${desk} output=${output} />`}
    </div>
  <//>`;
}

function optionsOf({catalog, desk, fitting, end, output, step, query}) {
  const then = (act) => () => {
    closeDialog();
    act();
  };
  const wanted = (text) => query.toLowerCase().split(/\s+/).every((word) => text.toLowerCase().includes(word));
  const links = desk.links.filter((l) => (output ? l.from : l.to) === end);
  const linkedTo = new Set(links.map((l) => (output ? l.to : l.from)));
  const alone = (other) => fitting.ports.filter((port) => port.fits && stepOf(port.end) === stepOf(other)).length === 1;
  const name = (other) => {
    const found = portAt(catalog, desk, other, !output);
    return found && alone(other) ? stepName(desk, found.step) : endWords(catalog, desk, other, !output);
  };
  const remove = links.filter((l) => !step || stepOf(output ? l.to : l.from) === step).map((l) => {
    const other = output ? l.to : l.from;
    return {key: other, action: 'unlink', label: `Remove the link ${output ? 'to' : 'from'} ${name(other)}`, act: then(() => unlink(l.from, l.to))};
  });
  const ends = fitting.ports.filter((port) => port.fits && !linkedTo.has(port.end) && (!step || stepOf(port.end) === step)).map((port) => ({
    key: port.end,
    action: 'link',
    label: name(port.end),
    more: output && port.fed ? `replaces the link from ${fedBy(desk, port.fed)}`
      : !output && links.length ? `replaces the link from ${fedBy(desk, links[0].from)}` : '',
    act: then(() => (output ? link(end, port.end, Boolean(port.fed)) : link(port.end, end, links.length > 0))),
  }));
  const free = ends.filter((item) => !item.more);
  const nodes = step ? [] : fitting.nodes.map(({node}) => nodeOf(catalog, node)).filter((node, i, all) => all.indexOf(node) === i)
    .filter((node) => !query || matches(catalog, node, query)).map((node) => ({
      key: node.id,
      action: 'add-fitting',
      label: node.title,
      more: stageTitle(catalog, node.stage),
      act: then(async () => {
        const answer = await addStep({node: node.id, ...(output ? {from: end} : {to: end})});
        if (answer) {
          focusCard(getState().chosen[0]);
        }
      }),
    }));
  return [
    {title: 'On the bench', items: [...free, ...ends.filter((item) => item.more)].filter((item) => wanted(item.label))},
    {title: output || links.length === 0 ? 'Add a step' : 'Add a step in its place', items: output || links.length === 0 ? nodes : []},
    {title: 'Linked now', items: remove.filter((item) => wanted(item.label))},
  ].filter((group) => group.items.length > 0);
}

function fedBy(desk, end) {
  const step = stepWith(desk, stepOf(end));
  return step ? stepName(desk, step) : end;
}

/** Ports of the other side that cannot take it, each with the reason. */
function Unfit({fitting, catalog, desk, output}) {
  const others = fitting.ports.filter((port) => !port.fits);
  if (others.length === 0) {
    return null;
  }
  return html`<details class="unfit"><summary>${counted(others.length, 'port')} on the bench that ${others.length === 1 ? 'does' : 'do'} not fit, and why</summary>
    <ul>${others.map((port) => html`<li key=${port.end}><strong>${endWords(catalog, desk, port.end, !output)}</strong> ${port.refusal}</li>`)}</ul></details>`;
}
