/** One step on the bench: what it takes, its name and state, what it gives. */
import {html} from '../../lib.js';
import {getState} from '../store.js';
import {choose, openDialog} from '../actions.js';
import {nodeOf, portWords, endWords, hasTwin, stepName, stepWith} from '../catalog.js';
import {stepOf} from '../layout.js';
import {grab} from '../drag.js';
import {Glyph} from '../glyphs.js';
import {counted, unparted} from '../words.js';

const MANY = 4;

/**
 * @param {object} props
 * @param {object} props.step as the desk tells it
 * @param {number} props.column from 0
 * @param {boolean} props.first whether the Tab key and F6 enter the bench here
 */
export function Card({step, column, first}) {
  const {catalog, desk, chosen, drag} = getState();
  const node = nodeOf(catalog, step.node);
  const isChosen = chosen.includes(step.id);
  const looked = chosen.at(-1) === step.id;
  const kind = stateKind(step.state);
  const classes = ['card', `state-${kind}`];
  if (isChosen) {
    classes.push('chosen');
  }
  if (drag?.kind === 'step' && drag.step === step.id) {
    classes.push('held');
  }
  if (drag?.before === `${step.id}-`) {
    classes.push('drop-before');
  }
  if (drag?.before === `${step.id}+`) {
    classes.push('drop-after');
  }
  const press = (event) => {
    if (!onTab(event)) {
      grab(event, {kind: 'step', step: step.id});
    }
  };
  const pick = (event) => {
    if (onTab(event)) {
      return;
    }
    const more = event.ctrlKey || event.metaKey || event.shiftKey;
    choose(more ? toggled(chosen, step.id) : [step.id]);
    if (getState().chosen.includes(step.id)) {
      event.currentTarget.querySelector('[data-card]').focus();
    }
  };
  /* The pointer's press gives no focus: it would choose before it is known whether others stay chosen. */
  const hold = (event) => {
    if (!onTab(event)) {
      event.preventDefault();
    }
  };
  return html`<li class=${classes.join(' ')} data-step=${step.id} data-node=${step.node} data-state=${kind}
      style=${{gridColumn: String(column + 1)}}
      onpointerdown=${press} onmousedown=${hold} onclick=${pick} ondblclick=${(e) => openByDoubleClick(e, step)}>
    <${Ports} step=${step} node=${node} output=${false} open=${looked} />
    <div class="card-middle">
      <button type="button" class="card-name" data-card=${step.id} tabindex=${first ? 0 : -1} data-first=${first ? '' : undefined}
          aria-current=${looked ? 'true' : undefined} aria-label=${cardWords(desk, step, node, isChosen)}
          onfocus=${() => focusChoose(step)} onkeydown=${(e) => cardKey(e, step)}>
        <span class="card-title">${step.title}</span>
      </button>
      ${step.named ? html`<span class="card-kind">${node.title}</span>`
        : hasTwin(desk, step) && html`<span class="card-kind">${step.id}</span>`}
      <p class="card-state"><${Glyph} name=${kind} /><span>${unparted(step.state.words)}</span></p>
      ${step.note && html`<p class="card-note">${step.note}</p>`}
    </div>
    ${kind === 'running' && html`<${Progress} state=${step.state} />`}
    <${Ports} step=${step} node=${node} output=${true} open=${looked} />
  </li>`;
}

/** The state that decides glyph and look; a result with doubts has one of its own. */
export function stateKind(state) {
  return state.kind === 'done' && state.doubts > 0 ? 'doubts' : state.kind;
}

/** Whether a press is meant for a tab of the card, not for the card. */
function onTab(event) {
  return event.target.closest('[data-port], [data-no-drag]') !== null;
}

function toggled(chosen, id) {
  return chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id];
}

/** Whoever comes to a step by keyboard chooses it. */
function focusChoose(step) {
  const {chosen, drag} = getState();
  if (!drag && !chosen.includes(step.id)) {
    choose([step.id]);
  }
}

function openByDoubleClick(event, step) {
  if (!onTab(event)) {
    openDialog({kind: 'settings', step: step.id});
  }
}

function cardKey(event, step) {
  if (event.ctrlKey || event.metaKey || event.altKey) {
    return;
  }
  if (event.key === 'Enter') {
    event.preventDefault();
    openDialog({kind: 'settings', step: step.id});
  } else if (event.key === ' ') {
    event.preventDefault();
    choose([step.id]);
  }
}

function cardWords(desk, step, node, chosen) {
  const kind = step.named ? `, ${node.title}` : '';
  const note = step.note ? `. Note: ${step.note}` : '';
  return `${stepName(desk, step)}${kind}: ${step.state.words}${chosen ? ', chosen' : ''}${note}`;
}

function Progress({state}) {
  const known = typeof state.fraction === 'number';
  return html`<progress class="card-progress" max="1" value=${known ? state.fraction : undefined}
    aria-label=${state.message || 'progress'}></progress>`;
}

/** The tabs of one side. What is neither linked nor needed is folded into one tab when there is much of it. */
function Ports({step, node, output, open}) {
  const {desk} = getState();
  const ports = output ? node.outputs : node.inputs;
  if (ports.length === 0) {
    return null;
  }
  const linked = (port) => linksAt(desk, `${step.id}.${port.id}`, output).length > 0;
  const needed = (port) => linked(port) || (output ? port.type !== 'table' || port === ports[0] : !port.optional);
  const spare = ports.filter((port) => !needed(port));
  const folds = !open && (output ? spare.length > 0 : spare.length > MANY);
  const folded = output ? counted(spare.length, 'table') : `${spare.length} optional`;
  const shown = folds ? ports.filter(needed) : ports;
  return html`<ul class=${'ports ' + (output ? 'gives' : 'takes')} aria-label=${`${step.title} ${output ? 'gives' : 'takes'}`}>
    ${shown.map((port) => html`<${Tab} key=${port.id} step=${step} port=${port} siblings=${ports} output=${output} reach=${open} />`)}
    ${folds && html`<li key="more"><button type="button" class="tab more" tabindex="-1" data-no-drag data-action="more-ports"
      aria-label=${`${folded} more of ${step.title}`}
      onclick=${() => choose([step.id])}>${folded}</button></li>`}
  </ul>`;
}

function linksAt(desk, end, output) {
  return desk.links.filter((link) => (output ? link.from : link.to) === end);
}

function Tab({step, port, siblings, output, reach}) {
  const {catalog, desk, drag} = getState();
  const end = `${step.id}.${port.id}`;
  const links = linksAt(desk, end, output);
  const words = portWords(catalog, port, siblings);
  const classes = ['tab'];
  classes.push(links.length ? 'linked' : !output && !port.optional ? 'needed' : 'spare');
  const fits = fitting(drag, end, output);
  if (fits !== null) {
    classes.push(fits ? 'fits' : 'unfit');
  }
  if (drag?.over?.port === end && drag.over.output === output && !(drag.end === end && drag.output === output)) {
    classes.push(drag.refused ? 'over-refused' : 'over');
  }
  return html`<li>
    <button type="button" class=${classes.join(' ')} data-port=${end} data-side=${output ? 'output' : 'input'} data-type=${port.type}
        tabindex=${reach ? 0 : -1} aria-label=${tabWords(catalog, desk, port, words, links, output)} title=${port.description}
        onpointerdown=${(e) => grab(e, {kind: 'port', end, output})}
        onclick=${() => openDialog({kind: 'picker', end, output})}>
      <span class="tab-type">${words.type}</span>${words.own && html` <span class="tab-own">${words.own.toLowerCase()}</span>`}
    </button>
  </li>`;
}

/** Whether a port can take what is held: true, false, or null while nothing is held that could go to a port. */
function fitting(drag, end, output) {
  if (drag?.kind !== 'port' || !drag.fitting || drag.output === output) {
    return null;
  }
  return drag.fitting.ports.find((port) => port.end === end)?.fits ?? false;
}

function tabWords(catalog, desk, port, words, links, output) {
  const name = words.own ? `${words.type} ${words.own.toLowerCase()}` : words.type;
  if (output) {
    const to = links.map((link) => stepName(desk, stepWith(desk, stepOf(link.to))));
    return `Gives ${name}${to.length ? ` to ${to.join(', ')}` : ', not linked'}`;
  }
  if (links.length) {
    return `Takes ${name} from ${endWords(catalog, desk, links[0].from, true)}`;
  }
  return `Takes ${name}, ${port.optional ? 'optional, not linked' : 'needed, not linked'}`;
}
