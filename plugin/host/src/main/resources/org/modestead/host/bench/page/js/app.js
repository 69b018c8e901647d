/** The page: puts the parts together and keeps them in step with the server. */
import {html, render, useEffect, useErrorBoundary} from '../lib.js';
import {api} from './api.js';
import {getState, setState, useStore} from './store.js';
import {notify, takeDesk} from './actions.js';
import {listen} from './events.js';
import {Later} from './parts/later.js';
import {Notice, Told} from './parts/notice.js';
import {Start} from './parts/start.js';

// what the start page does not show is fetched behind it
const bench = () => import('./parts/bench.js').then((module) => module.Bench);
const dialogs = () => import('./parts/dialogs.js').then((module) => module.Dialogs);

function Page() {
  const {catalog, desk, dialog, guess} = useStore();
  useEffect(() => {
    document.title = desk?.open ? `${desk.saved ? '' : '* '}${desk.name} · Modestead` : 'Modestead';
  }, [desk?.open, desk?.name, desk?.saved]);
  const opening = html`<p class="loading">Opening the bench.</p>`;
  if (!desk || (!catalog && (desk.open || guess))) {
    return html`${opening}<${Notice} /><${Told} />`;
  }
  return html`${desk.open ? html`<${Later} load=${bench} meanwhile=${opening} />` : html`<${Start} />`}
    <${Notice} /><${Told} />
    ${dialog && html`<${Later} load=${dialogs} />`}`;
}

/** A defect of the page is told instead of leaving it blank; the work itself is safe with the server. */
function Guarded() {
  const [fault, again] = useErrorBoundary();
  if (fault) {
    return html`<div class="loading" role="alert"><p><strong>The page met a defect and stopped drawing.</strong> Your work is kept.</p>
      <p>${String(fault.message ?? fault)}</p>
      <button type="button" class="button main" data-action="draw-anew" onclick=${() => {
        setState({dialog: null, drag: null, chosen: [], wide: false});
        again();
      }}>Draw it anew</button></div>`;
  }
  return html`<${Page} />`;
}

/** What the server put into the document; all that is to be asked for where it put nothing. */
function takeFirst() {
  const first = JSON.parse(document.getElementById('first').textContent || '{}');
  if (first.desk) {
    setState({start: first.start});
    takeDesk(first.desk);
  }
}

async function begin() {
  takeFirst();
  const place = document.getElementById('page');
  place.replaceChildren();
  render(html`<${Guarded} />`, place);
  window.addEventListener('unhandledrejection', (event) => notify(`The page met a defect: ${event.reason?.message ?? event.reason}.`, 'stop'));
  try {
    // each is shown when it is there: the start page needs no nodes
    await Promise.all([
      api.get('/api/nodes').then((catalog) => setState({catalog})),
      getState().desk ? null : api.get('/api/desk').then(takeDesk),
    ]);
    listen();
  } catch (fault) {
    render(null, place);
    const words = document.createElement('p');
    words.className = 'loading tone-stop';
    words.setAttribute('role', 'alert');
    words.textContent = fault.message;
    place.replaceChildren(words);
  }
}

begin();
