/** Open a workflow, save it under another name, say what a dropped file is for. */
import {html, useRef, useState} from '../../lib.js';
import {getState, setState} from '../store.js';
import {addStep, closeDesk, closeDialog, openDesk, openFile, save, upload} from '../actions.js';
import {Dialog, cancelButton} from './dialog.js';
import {FileBox} from './file-box.js';
import {bytes} from '../words.js';

export function OpenDialog() {
  const input = useRef(null);
  const open = async (path) => {
    if (await openDesk({open: path})) {
      closeDialog();
    }
  };
  const bring = async (file) => {
    if (file && await openFile(file)) {
      closeDialog();
    }
  };
  return html`<${Dialog} title="Open a workflow" kind="open" light foot=${cancelButton}>
    <${FileBox} extensions=${['json']} label="Workflow files" pick=${(entry) => open(entry.path)} />
    <p class="help">Only folders that the bench was started with, and its own, are shown. A file from elsewhere is copied here, without its data:</p>
    <input ref=${input} class="unseen" type="file" accept=".json" tabindex="-1" aria-hidden="true" onchange=${(e) => bring(e.target.files[0])} />
    <button type="button" class="button" data-action="open-elsewhere" onclick=${() => input.current.click()}>From elsewhere…</button>
  <//>`;
}

export function SaveAsDialog() {
  const {desk} = getState();
  const [folder, setFolder] = useState('');
  const [name, setName] = useState(desk.file ? desk.file.split(/[\\/]/).pop() : 'workflow.json');
  const path = folder ? `${folder}/${name.trim()}` : '';
  const done = async () => {
    if (path && name.trim() && await save(path)) {
      closeDialog();
    }
  };
  return html`<${Dialog} title="Save the workflow as" kind="save-as" onsubmit=${done}
      foot=${[cancelButton, html`<button type="submit" class="button main" data-action="apply" aria-disabled=${path ? undefined : 'true'}>Save</button>`]}>
    <label for="save-name">File name</label>
    <input id="save-name" class="field-input" data-focus value=${name} oninput=${(e) => setName(e.target.value)} />
    <p class="help">${path ? html`Goes to <code>${path}</code>` : 'Choose a folder below.'}</p>
    <${FileBox} extensions=${['json']} label="Folders" folder=${desk.folder ?? ''} pick=${(entry) => setName(entry.name)} moved=${setFolder} />
    <p class="help">Files that steps read stay where they are.</p>
  <//>`;
}

/** A file was dropped on the bench. */
export function DroppedDialog({file}) {
  const {desk} = getState();
  const [busy, setBusy] = useState(false);
  const workflow = file.name.toLowerCase().endsWith('.json');
  const run = (work) => async () => {
    setBusy(true);
    await work();
    setBusy(false);
  };
  const add = run(async () => {
    const answer = await upload(file);
    if (answer) {
      closeDialog();
      await addStep({node: 'table-source', title: file.name, settings: {path: answer.path}});
    }
  });
  const anew = run(async () => {
    const answer = await upload(file);
    if (answer) {
      closeDialog();
      if (await closeDesk()) {
        setState({guess: answer});
      }
    }
  });
  const open = run(async () => {
    if (await openFile(file)) {
      closeDialog();
    }
  });
  return html`<${Dialog} title=${file.name} kind="dropped" foot=${cancelButton}>
    <p class="quiet">${bytes(file.size)}. What is it for?</p>
    <div class="dropped-ways" aria-busy=${String(busy)}>
      <button type="button" class="button" data-focus data-action="drop-add" onclick=${add}>Add it as a step to “${desk.name}”</button>
      <button type="button" class="button" data-action="drop-new" onclick=${anew}>Begin another workflow with this recording</button>
      ${workflow && html`<button type="button" class="button" data-action="drop-open" onclick=${open}>Open it as a workflow</button>`}
    </div>
  <//>`;
}
