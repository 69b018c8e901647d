/** The bar above the bench: the workflow and its file, undo and redo, running, problems. */
import {html} from '../../lib.js';
import {getState} from '../store.js';
import {undo, redo, run, cancel, save, openDialog, closeDesk} from '../actions.js';
import {Menu} from './menu.js';
import {ViewMenu} from './view-menu.js';
import {counted} from '../words.js';

export function Bar() {
  const {desk, wide} = getState();
  const running = desk.run.running;
  const results = desk.steps.some((step) => step.look);
  const file = [
    {label: 'New or other workflow…', action: 'close-desk', act: closeDesk},
    {label: 'Open…', action: 'open', keys: 'Ctrl + O', act: () => openDialog({kind: 'open'})},
    null,
    {label: 'Save', action: 'save', keys: 'Ctrl + S', act: () => (desk.file ? save() : openDialog({kind: 'save-as'}))},
    {label: 'Save as…', action: 'save-as', keys: 'Ctrl + Shift + S', act: () => openDialog({kind: 'save-as'})},
    {label: 'Download workflow.json', action: 'download', act: () => window.open('/api/workflow.json?download=1', '_self')},
    null,
    {label: 'Rename the workflow…', action: 'name', act: () => openDialog({kind: 'name'})},
    {label: 'Notes…', action: 'notes', act: () => openDialog({kind: 'notes'})},
    {label: 'Report of all results', action: 'report', off: !results, act: () => window.open('/api/report.html', '_blank', 'noopener')},
  ];
  return html`<header class="bar" data-part="bar">
    <a class="skip" href=${wide ? '#look' : '#bench'} onclick=${skip}>${wide ? 'Go to the step' : 'Go to the bench'}</a>
    <img class="bar-mark" src="/mark.svg" alt="" width="24" height="24" />
    <h1 class="bar-name"><span class="unseen">Modestead: </span><button type="button" class="bar-title" data-action="rename-workflow"
      title="Rename the workflow"
      onclick=${() => openDialog({kind: 'name'})}>${desk.name}</button></h1>
    <span class="bar-saved quiet small clip" title=${desk.savedWords} data-saved=${String(desk.saved)}>${desk.savedWords}</span>
    <${Menu} label="Workflow" action="workflow-menu" items=${file} />
    <span class="bar-rule" role="separator"></span>
    <button type="button" class="button plain" data-first data-action="undo" aria-disabled=${desk.undo ? undefined : 'true'}
      title=${desk.undo ? `Undo: ${desk.undo} (Ctrl + Z)` : 'Nothing to undo'} onclick=${undo}>Undo</button>
    <button type="button" class="button plain" data-action="redo" aria-disabled=${desk.redo ? undefined : 'true'}
      title=${desk.redo ? `Redo: ${desk.redo} (Ctrl + Y)` : 'Nothing to redo'} onclick=${redo}>Redo</button>
    <span class="grow"></span>
    <${Problems} desk=${desk} />
    ${running
      ? html`<button type="button" class="button danger" data-action="cancel" aria-disabled=${desk.run.stopping ? 'true' : undefined}
          title="Ctrl + ." onclick=${cancel}>${desk.run.stopping ? 'Stopping' : 'Stop'}</button>`
      : html`<button type="button" class="button main" data-action="run-all" title="Ctrl + Shift + Enter" onclick=${() => run()}>Run all</button>`}
    <${ViewMenu} />
  </header>`;
}

function skip(event) {
  event.preventDefault();
  (document.querySelector('.bench [tabindex="0"]') ?? document.getElementById('bench') ?? document.getElementById('look'))?.focus();
}

function Problems({desk}) {
  const count = desk.problems.length;
  return html`<button type="button" class=${'button plain' + (count ? ' tone-caution' : ' quiet')} data-action="problems"
    aria-haspopup="dialog"
      onclick=${() => openDialog({kind: 'problems'})}>${count ? counted(count, 'thing to set right', 'things to set right') : 'Nothing to set right'}</button>`;
}
