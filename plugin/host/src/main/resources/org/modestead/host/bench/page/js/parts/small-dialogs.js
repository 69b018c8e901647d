/** Dialogs with one field or none: names, notes, keys, what is to be set right, what a node is. */
import {html, useState} from '../../lib.js';
import {getState} from '../store.js';
import {choose, closeDialog, edit, openDialog, say, addStep} from '../actions.js';
import {nodeOf, problemWords, stepWith, typeTitle} from '../catalog.js';
import {KEYS} from '../keys.js';
import {Dialog, cancelButton} from './dialog.js';
import {counted} from '../words.js';

function mainButton(label) {
  return html`<button type="submit" class="button main" data-action="apply">${label}</button>`;
}

export function RenameDialog({step: id}) {
  const step = stepWith(getState().desk, id);
  const node = nodeOf(getState().catalog, step.node);
  const [title, setTitle] = useState(step.title);
  const done = async () => {
    closeDialog();
    await edit([{do: 'title', step: id, title: title.trim() === node.title ? '' : title.trim()}]);
    say(`Named ${title.trim() || node.title}.`);
  };
  return html`<${Dialog} title="Rename the step" kind="rename" onsubmit=${done} foot=${[cancelButton, mainButton('Rename')]}>
    <label for="rename-field">Name</label>
    <input id="rename-field" class="field-input" data-focus maxlength="120" value=${title} oninput=${(e) => setTitle(e.target.value)}
      aria-describedby="rename-help" />
    <p id="rename-help" class="help">Empty for its own name, ${node.title}. In files and messages the step is called <code>${id}</code>.</p>
  <//>`;
}

export function NameDialog() {
  const [name, setName] = useState(getState().desk.name);
  const done = () => {
    closeDialog();
    edit([{do: 'name', name: name.trim()}]);
  };
  return html`<${Dialog} title="Rename the workflow" kind="name" onsubmit=${done} foot=${[cancelButton, mainButton('Rename')]}>
    <label for="name-field">Name</label>
    <input id="name-field" class="field-input" data-focus maxlength="200" value=${name} oninput=${(e) => setName(e.target.value)} />
  <//>`;
}

export function NoteDialog({step: id}) {
  const step = stepWith(getState().desk, id);
  const [note, setNote] = useState(step.note);
  const done = () => {
    closeDialog();
    edit([{do: 'note', step: id, note: note.trim()}]);
  };
  return html`<${Dialog} title=${`Note on ${step.title}`} kind="note-dialog" onsubmit=${done} foot=${[cancelButton, mainButton('Keep')]}>
    <label for="note-field">Note</label>
    <textarea id="note-field" class="field-input" data-focus rows="6" value=${note} oninput=${(e) => setNote(e.target.value)}></textarea>
    <p class="help">Kept with the workflow; empty takes the note away.</p>
  <//>`;
}

export function NotesDialog() {
  const [notes, setNotes] = useState(getState().desk.notes);
  const done = () => {
    closeDialog();
    edit([{do: 'notes', notes}]);
  };
  return html`<${Dialog} title="Notes on the workflow" kind="notes-dialog" onsubmit=${done} foot=${[cancelButton, mainButton('Keep')]}>
    <label for="notes-field">Notes</label>
    <textarea id="notes-field" class="field-input" data-focus rows="12" value=${notes} oninput=${(e) => setNotes(e.target.value)}></textarea>
  <//>`;
}

export function KeysDialog() {
  return html`<${Dialog} title="Keys" kind="keys" light text>
    <div class="keys-groups">${KEYS.map((group) => html`<section key=${group.group}><h3>${group.group}</h3>
      <dl class="keys-list">${group.keys.map(([key, does]) => html`<div key=${key}><dt>${key.split(', ').map((part, i) => html`${i ? ', ' : ''}<kbd>${part}</kbd>`)}</dt>
        <dd>${does}</dd></div>`)}</dl></section>`)}</div>
    <p class="help">By pointer: drag a step from the shelf, drag from port to port, drag a step within its band. While something is dragged, the page says
      what a drop would do and why a place does not fit.</p>
  <//>`;
}

export function ProblemsDialog() {
  const {catalog, desk} = getState();
  const go = (problem) => {
    if (problem.step) {
      choose([problem.step]);
    }
    openDialog(problem.setting ? {kind: 'settings', step: problem.step, field: problem.setting}
      : problem.port ? {kind: 'picker', end: `${problem.step}.${problem.port}`, output: false} : null);
  };
  return html`<${Dialog} title="What is to be set right" kind="problems" light text>
    ${desk.problems.length === 0 ? html`<p>Nothing: every step is set up as far as can be told before running.</p>`
      : html`<p class="quiet">${counted(desk.problems.length, 'thing')}, in the order of the work.</p>
        <ul class="problem-list">${desk.problems.map((problem, i) => html`<li key=${i}><span>${problemWords(catalog, desk, problem, true)}</span>
          ${problem.step && html`<button type="button" class="button" data-action="go-to" onclick=${() => go(problem)}>${
            problem.setting ? 'Set it' : problem.port ? 'Link it' : 'Show the step'}</button>`}</li>`)}</ul>`}
  <//>`;
}

export function AboutDialog({node: id}) {
  const {catalog, desk} = getState();
  const node = nodeOf(catalog, id);
  const add = () => {
    closeDialog();
    addStep({node: id});
  };
  const ports = (title, list) => list.length > 0 && html`<h3>${title}</h3><dl class="about-ports">${list.map((port) => html`<div key=${port.id}>
    <dt>${typeTitle(catalog, port.type)}${port.title.toLowerCase() === typeTitle(catalog, port.type).toLowerCase() ? '' : `: ${port.title}`}${port.optional ? ' (optional)' : ''}</dt>
    <dd>${port.description}</dd></div>`)}</dl>`;
  return html`<${Dialog} title=${node.title} kind="about" light text onsubmit=${add}
      foot=${desk?.open ? [html`<button type="button" class="button" data-action="cancel-dialog"
        onclick=${closeDialog}>Close</button>`, mainButton('Add to the bench')] : null}>
    <p><strong>${node.purpose}</strong></p>
    ${node.description.split(/\n\s*\n/).map((part, i) => html`<p key=${i}>${part}</p>`)}
    ${ports('Takes', node.inputs)}${ports('Gives', node.outputs)}
    ${node.references.length > 0 && html`<h3>Sources</h3><ul class="about-sources">${node.references.map((text) => html`<li key=${text}>${text}</li>`)}</ul>`}
  <//>`;
}

/** Asks before something that undo cannot bring back. */
export function ConfirmDialog({title, words, label, act}) {
  const done = () => {
    closeDialog();
    act();
  };
  return html`<${Dialog} title=${title} kind="confirm" onsubmit=${done} foot=${[cancelButton, mainButton(label)]}><p>${words}</p><//>`;
}
