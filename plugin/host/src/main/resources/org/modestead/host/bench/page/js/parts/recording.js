/** A recording that was brought: what was guessed of its columns, to be corrected, and the steps that come of it. */
import {html, useRef, useState} from '../../lib.js';
import {getState, setState} from '../store.js';
import {attempt, openDesk, run, say} from '../actions.js';
import {nodeOf} from '../catalog.js';
import {api} from '../api.js';
import {counted, moment} from '../words.js';
import {Draft} from './draft.js';
import {Preview} from './preview.js';

/** How the numbers of a column of times are to be read, by the type of its cells. */
const KINDS = {DATE: 'date', DATE_TIME: 'date-time', ZONED_DATE_TIME: 'date-time'};
const ROLES = [['time', 'Time'], ['run', 'Run'], ['channel', 'Channel'], ['input', 'Known input'], ['none', 'Leave out']];

/** @param {{guess: object, back: () => any}} props the server's guess */
export function Recording({guess: first, back}) {
  const [guess, setGuess] = useState(first);
  const [busy, setBusy] = useState(false);
  const asked = useRef(0);
  const ask = async (reading, columns) => {
    const turn = ++asked.current;
    setBusy(true);
    const answer = await attempt(() => api.post('/api/recording', {upload: guess.upload, reading, ...(columns ? {columns} : {})}));
    if (turn === asked.current) {
      setBusy(false);
      if (answer) {
        setGuess(answer);
        say(answer.problems[0] ?? answer.sentences.join(' '));
      }
    }
  };
  const role = (name, to) => ask(guess.reading, withRole(guess, name, to));
  const go = async (runs) => {
    const desk = await openDesk({recording: {upload: guess.upload, reading: guess.reading, columns: guess.columns, name: guess.name}});
    if (!desk) {
      return;
    }
    setState({guess: null});
    if (runs) {
      await run();
    }
  };
  const ready = guess.problems.length === 0;
  return html`<main class="recording" aria-busy=${String(busy)}>
    <div class="recording-head"><div class="grow"><h2 data-recording>${guess.name}</h2>
        ${guess.sentences.map((sentence, i) => html`<p key=${i}>${sentence}</p>`)}</div>
      <button type="button" class="button" data-action="another-file" onclick=${back}>Another file</button>
      <button type="button" class="button" data-action="lay-out" aria-disabled=${ready ? undefined : 'true'}
        onclick=${() => ready && go(false)}>Lay out the steps</button>
      <button type="button" class="button main" data-action="lay-out-run" aria-disabled=${ready ? undefined : 'true'}
        onclick=${() => ready && go(true)}>Lay out the steps and run</button></div>
    ${guess.problems.length > 0 && html`<div class="callout caution"
      role="alert"><ul>${guess.problems.map((problem, i) => html`<li key=${i}>${problem}</li>`)}</ul></div>`}
    <div class="recording-room">
      <section aria-labelledby="columns-title"><h3 id="columns-title">What the columns are</h3>
        <div class="recording-table" tabindex="0" role="region" aria-label="Columns of the file"><table><thead><tr><th scope="col">Column</th><th scope="col">Taken as</th><th scope="col">Unit</th>
          <th scope="col" class="number">From</th><th scope="col" class="number">To</th><th scope="col" class="number">Missing</th></tr></thead>
          <tbody>${guess.all.map((column) => html`<tr key=${column.name} data-column=${column.name}><th scope="row"><span class="clip"
            title=${column.name}>${column.title}</span></th>
            <td><select class="field-input" aria-label=${`${column.title} is taken as`} title=${column.why} data-role=${column.name}
              onchange=${(e) => role(column.name, e.target.value)}>
              ${ROLES.map(([id, label]) => html`<option key=${id} value=${id} selected=${column.role === id}>${label}</option>`)}</select></td>
            <td>${column.role === 'time' ? html`<${TimeUnit} guess=${guess} ask=${ask} />` : column.unit}</td>
            <td class="number">${moment(column.low, KINDS[column.cell])}</td><td class="number">${moment(column.high, KINDS[column.cell])}</td><td
              class="number">${column.missing || ''}</td></tr>`)}</tbody></table></div>
        ${guess.all.length > 12 && html`<p class="help">${counted(guess.all.length, 'column')}.</p>`}
        <${Reading} guess=${guess} ask=${ask} />
      </section>
      <section aria-labelledby="preview-title"><h3 id="preview-title">The recording${guess.rows > 2000 ? ', thinned' : ''}</h3>
        ${guess.figure ? html`<${Preview} figure=${guess.figure} />` : html`<p class="quiet">Nothing to draw until a channel is taken.</p>`}</section>
    </div>
  </main>`;
}

function withRole(guess, name, to) {
  const roles = new Map(guess.all.map((column) => [column.name, column.role]));
  for (const [other, role] of roles) {
    if (other !== name && role === to && (to === 'time' || to === 'run')) {
      roles.set(other, 'none');
    }
  }
  roles.set(name, to);
  const all = (role) => guess.all.map((column) => column.name).filter((column) => roles.get(column) === role);
  return {
    time: all('time')[0] ?? '', timeUnit: guess.columns.timeUnit, run: all('run')[0] ?? '',
    channels: all('channel'), inputs: all('input'), ignored: all('none'),
  };
}

function TimeUnit({guess, ask}) {
  return html`<${Draft} class="field-input unit-input" aria-label="Unit of time" data-action="time-unit" size="5" placeholder="such as s"
    value=${guess.columns.timeUnit} put=${(text) => ask(guess.reading, {...guess.columns, timeUnit: text.trim()})} />`;
}

function typed(kind, text) {
  return kind === 'whole' ? Number(text) : kind === 'texts' ? text.split(',').map((one) => one.trim()).filter(Boolean) : text;
}

/** How the text of the file is read; the choices are those of the step that will read it. */
function Reading({guess, ask}) {
  const source = nodeOf(getState().catalog, 'table-source');
  const settings = source?.settings.filter((setting) => Object.hasOwn(guess.reading, setting.key)
    && ['choice', 'flag', 'whole', 'text', 'texts'].includes(setting.kind)) ?? [];
  if (settings.length === 0) {
    return null;
  }
  const put = (key, value) => ask({...guess.reading, [key]: value});
  return html`<details class="reading"><summary>How the file is read</summary><div class="reading-fields">
    ${settings.map((setting) => html`<label key=${setting.key} class=${setting.kind === 'flag' ? 'check' : ''}><span>${setting.label}</span>
      ${setting.kind === 'choice' ? html`<select class="field-input" data-reading=${setting.key} onchange=${(e) => put(setting.key, e.target.value)}>
          ${setting.options.map((option) => html`<option key=${option.id} value=${option.id}
            selected=${option.id === guess.reading[setting.key]}>${option.label}</option>`)}</select>`
        : setting.kind === 'flag' ? html`<input type="checkbox" data-reading=${setting.key} checked=${guess.reading[setting.key]}
          onchange=${(e) => put(setting.key, e.target.checked)} />`
          : html`<${Draft} class="field-input" data-reading=${setting.key} value=${[guess.reading[setting.key] ?? ''].flat().join(', ')}
              put=${(text) => put(setting.key, typed(setting.kind, text))} />`}</label>`)}
  </div></details>`;
}
