/** Where one begins: a recording, a workflow, an example, or what was left. */
import {html, useEffect, useRef, useState} from '../../lib.js';
import {getState, setState} from '../store.js';
import {attempt, openDesk, openDialog, openFile, say, upload} from '../actions.js';
import {api} from '../api.js';
import {bytes, counted} from '../words.js';
import {DropZone} from './drop-zone.js';
import {TABLES} from '../tables.js';
import {Recording} from './recording.js';
import {ViewMenu} from './view-menu.js';
import {Path} from './path.js';

export function Start() {
  const {guess, start: first} = getState();
  const [start, setStart] = useState(first);
  const [busy, setBusy] = useState('');
  const input = useRef(null);
  const load = () => attempt(() => api.get('/api/start')).then((answer) => answer && setStart(answer));
  useEffect(() => {
    if (!first) {
      load();
    }
    // once a desk was open there is more to go on with
    setState({start: null});
  }, []);
  const take = async (file) => {
    if (!file) {
      return;
    }
    if (file.name.toLowerCase() === 'workflow.json') {
      await openFile(file);
      return;
    }
    setBusy(`Reading ${file.name}.`);
    say(`Reading ${file.name}.`);
    const answer = await upload(file);
    setBusy('');
    if (answer) {
      setState({guess: answer});
    }
  };
  const begin = async (what, words) => {
    setBusy(words);
    await openDesk(what);
    setBusy('');
  };
  const forget = (desk) => openDialog({
    kind: 'confirm', title: 'Forget this work?', label: 'Forget it',
    words: `“${desk.name}” and its results are removed from the bench's own folder. Files that were saved elsewhere stay.`,
    act: async () => {
      await attempt(() => api.post('/api/desk/forget', {desk: desk.desk}));
      load();
    },
  });
  return html`<div class="start" data-part="start">
    <header class="start-head"><img src="/mark.svg" alt="" width="40" height="40" /><div class="grow"><h1>Modestead</h1>
      <p class="quiet">Takes a recording of something that moves, finds its modes, and tells which of them exist.</p></div><${ViewMenu} /></header>
    ${busy && html`<p class="callout" aria-busy="true">${busy}</p>`}
    ${guess ? html`<${Recording} guess=${guess} back=${() => setState({guess: null})} />` : html`<main class="start-ways"><div class="start-column">
      <section class="start-way first" aria-labelledby="way-recording">
        <h2 id="way-recording">Take a recording</h2>
        <p>One row a sample, one column a channel; a time column and a run column if there are any. CSV, Parquet or JSON.
          Drop it anywhere on this page, or</p>
        <input ref=${input} id="recording-file" class="unseen" type="file" accept=${TABLES.map((end) => '.' + end).join(',')} tabindex="-1" aria-hidden="true"
          data-action="recording-file" onchange=${(e) => take(e.target.files[0])} />
        <button type="button" class="button main" data-first data-action="choose-recording" onclick=${() => input.current.click()}>Choose a file…</button>
        <p class="help">It stays on this machine${start ? `; up to ${bytes(start.uploadLimit)}` : ''}.</p>
      </section>
      ${start && start.recent.length > 0 && html`<section class="start-way" aria-labelledby="way-recent"><h2 id="way-recent">Go on with</h2>
        <ul class="start-list">${start.recent.map((desk) => html`<li key=${desk.desk} class="start-row"><button type="button" class="start-item"
          data-resume=${desk.desk}
          onclick=${() => begin({resume: desk.desk}, 'Opening it.')}><strong>${desk.name}</strong>
          <span class="quiet small">${desk.words}; ${counted(desk.steps, 'step')}${desk.file ? html`<br /><${Path} path=${desk.file} />` : ''}</span></button>
          <button type="button" class="button plain" data-forget=${desk.desk} aria-label=${`Forget ${desk.name}`}
            onclick=${() => forget(desk)}>Forget</button></li>`)}</ul></section>`}
      <section class="start-way" aria-labelledby="way-open"><h2 id="way-open">Open a workflow, or begin with none</h2>
        <div class="row"><button type="button" class="button" data-action="open" onclick=${() => openDialog({kind: 'open'})}>Open a workflow…</button>
          <button type="button" class="button" data-action="new-empty"
            onclick=${() => begin({empty: true, name: 'New workflow'}, 'Making room.')}>Empty bench</button></div></section>
      </div><div class="start-column">
      <section class="start-way" aria-labelledby="way-example"><h2 id="way-example">Start from an example</h2>
        ${!start && html`<p class="quiet" aria-busy="true">Reading what is there.</p>`}
        <ul class="start-list">${start?.examples.map((example) => html`<li key=${example.id}><button type="button" class="start-item" data-example=${example.id}
          onclick=${() => begin({example: example.id}, 'Opening the example.')}><strong>${example.title}</strong><span
            class="quiet small">${example.words}</span></button></li>`)}</ul></section>
    </div></main>`}
    <${DropZone} take=${take} />
  </div>`;
}
