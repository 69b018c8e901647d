/** The right part: what the chosen step is and shows; without one, the workflow as a whole. */
import {html} from '../../lib.js';
import {Draft} from './draft.js';
import {Later} from './later.js';
import {getState, setState} from '../store.js';
import {run, choose, openDialog, removeSteps, duplicate, mark, edit} from '../actions.js';
import {hasTwin, nodeOf, problemWords, stepName, stepWith} from '../catalog.js';
import {canShift, shift} from './bands.js';
import {stateKind} from './card.js';
import {Menu} from './menu.js';
import {Glyph} from '../glyphs.js';
import {counted} from '../words.js';
import {Path} from './path.js';

/** Notes are handed on when typing pauses so long, in milliseconds. */
const PAUSE = 1500;

const look = () => import('../../looks/look.js').then((module) => module.Look);

export function LookPane() {
  const {desk, chosen} = getState();
  const step = chosen.length ? stepWith(desk, chosen.at(-1)) : null;
  return html`<main class="look" data-part="look" id="look" tabindex="-1" aria-label=${step ? `Look at ${step.title}` : 'The workflow'}>
    ${step ? html`<${StepLook} key=${step.id} step=${step} />` : html`<${WorkflowLook} desk=${desk} />`}
  </main>`;
}

function StepLook({step}) {
  const {catalog, desk, selection, wide, chosen} = getState();
  const node = nodeOf(catalog, step.node);
  const kind = stateKind(step.state);
  const more = [
    {label: 'Rename…', action: 'rename-step', keys: 'F2', act: () => openDialog({kind: 'rename', step: step.id})},
    {label: step.note ? 'Change the note…' : 'Write a note…', action: 'note-step', act: () => openDialog({kind: 'note', step: step.id})},
    {label: 'Duplicate', action: 'duplicate-step', keys: 'Ctrl + D', act: () => duplicate(chosen)},
    {label: 'Move left', action: 'move-left', keys: 'Shift + \u2190', off: !canShift(desk, step, -1), act: () => shift(step.id, -1)},
    {label: 'Move right', action: 'move-right', keys: 'Shift + \u2192', off: !canShift(desk, step, 1), act: () => shift(step.id, 1)},
    {label: 'Run it again', action: 'run-again', act: () => run([step.id], true)},
    {label: `About ${node.title}…`, action: 'about-node', act: () => openDialog({kind: 'about', node: node.id})},
    null,
    {label: chosen.length > 1 ? `Remove ${counted(chosen.length, 'step')}` : 'Remove', action: 'remove-step', keys: 'Delete', act: () => removeSteps(chosen)},
  ];
  return html`<div class="look-head">
      <div class="grow">
        <h2 class="look-title" data-first tabindex="-1">${step.title}</h2>
        <p class=${'look-state state-' + kind}><${Glyph} name=${kind} /><span data-look-state>${step.state.words}</span>
          ${(step.named || hasTwin(desk, step)) && html`<span class="quiet"> · ${step.named ? node.title : step.id}</span>`}</p>
      </div>
      <button type="button" class="button" data-action="settings" onclick=${() => openDialog({kind: 'settings', step: step.id})}>Settings…</button>
      <button type="button" class="button" data-action="run-step" aria-disabled=${desk.run.running ? 'true' : undefined}
        onclick=${() => !desk.run.running && run([step.id])}>Run to here</button>
      <${Menu} label="More" action="step-menu" items=${more} />
      <button type="button" class="button plain" data-action="widen" aria-pressed=${String(wide)}
        title=${wide ? 'Show the bench again (Escape)' : 'Let this fill the page'}
        onclick=${() => setState({wide: !wide})}><${Glyph} name="widen" /><span>${wide ? 'Narrow' : 'Widen'}</span></button>
    </div>
    ${step.note && html`<p class="note" data-note><button type="button" class="note-text" onclick=${() => openDialog({kind: 'note', step: step.id})}
      title="Change the note">${step.note}</button></p>`}
    ${step.problems.length > 0 && html`<${StepProblems} step=${step} />`}
    ${step.state.sentence && step.problems.length === 0 && html`<p class=${'callout' + (kind === 'failed' ? ' stop' : '')}
      data-sentence>${ownWords(step)}</p>`}
    ${(step.look || !step.state.sentence) && html`<div class="look-body"><${Later} load=${look} step=${step} selection=${selection} select=${mark} /></div>`}`;
}

/** What is said of a step, below its own name. */
function ownWords({id, state: {sentence}}) {
  const own = sentence.startsWith(`step ${id}`) ? sentence.slice(`step ${id}`.length).replace(/^[,:] /, '') : sentence;
  return own.charAt(0).toUpperCase() + own.slice(1);
}

function StepProblems({step}) {
  return html`<div class="callout caution" data-problems><p><strong>${counted(step.problems.length, 'thing to set right', 'things to set right')}</strong></p>
    <ul class="problem-list">${step.problems.map((problem, i) => html`<li key=${i}>${problemWords(getState().catalog, getState().desk, problem, false)}
      ${problem.setting && html` <button type="button" class="link-button" data-action="fix" onclick=${() => openDialog({
        kind: 'settings', step: step.id, field: problem.setting})}>Set it</button>`}
      ${problem.port && html` <button type="button" class="link-button" data-action="fix" onclick=${() => openDialog({
        kind: 'picker', end: `${step.id}.${problem.port}`, output: false})}>Link it</button>`}</li>`)}</ul>
  </div>`;
}

function WorkflowLook({desk}) {
  const write = (notes) => edit([{do: 'notes', notes}]);
  return html`<div class="look-head"><div class="grow"><h2 class="look-title" data-first tabindex="-1">${desk.name}</h2>
      <p class="quiet small clip">${desk.file ? html`<${Path} path=${desk.file} />` : 'Not in a file yet; kept on this machine all the same.'}</p></div></div>
    <div class="look-body">
      <p class="quiet">${desk.steps.length ? 'Choose a step to see its settings and results here.' : 'The bench is empty. Begin with a step that brings a table in, from the top of the shelf.'}</p>
      <label class="notes-label" for="workflow-notes">Notes</label>
      <${Draft} key=${desk.desk} area=${true} id="workflow-notes" class="field-input" rows="5" data-action="workflow-notes" value=${desk.notes} put=${write} pause=${PAUSE}
        placeholder="What this work is about, for whoever opens it next" />
      ${desk.steps.length > 0 && html`<h3>Where it stands</h3>`}
      <ul class="overview">${desk.steps.map((step) => html`<li key=${step.id}><button type="button" class="overview-step" data-overview=${step.id}
        onclick=${() => choose([step.id])}><${Glyph} name=${stateKind(step.state)} /><span class="clip">${stepName(desk, step)}</span>
        <span class="quiet small clip">${step.state.words}</span></button></li>`)}</ul>
    </div>`;
}
