/** The page: puts the parts together and keeps them in step with the server. */
import {html, render, useEffect, useErrorBoundary} from '../lib.js';
import {api} from './api.js';
import {setState, useStore} from './store.js';
import {notify, takeDesk} from './actions.js';
import {listen} from './events.js';
import {pageKey} from './keys.js';
import {Bar} from './parts/bar.js';
import {Bands} from './parts/bands.js';
import {DragLayer} from './parts/drag-layer.js';
import {DropZone} from './parts/drop-zone.js';
import {DroppedDialog, OpenDialog, SaveAsDialog} from './parts/file-dialogs.js';
import {LookPane} from './parts/look-pane.js';
import {Notice, Told} from './parts/notice.js';
import {Picker} from './parts/picker.js';
import {Shelf} from './parts/shelf.js';
import {
  AboutDialog, ConfirmDialog, KeysDialog, NameDialog, NoteDialog, NotesDialog, ProblemsDialog, RenameDialog,
} from './parts/small-dialogs.js';
import {Splitter} from './parts/splitter.js';
import {Start} from './parts/start.js';
import {StepDialog} from './parts/step-dialog.js';
import {Strip} from './parts/strip.js';

const DIALOGS = {
  settings: StepDialog,
  picker: Picker,
  rename: RenameDialog,
  name: NameDialog,
  note: NoteDialog,
  notes: NotesDialog,
  keys: KeysDialog,
  problems: ProblemsDialog,
  about: AboutDialog,
  confirm: ConfirmDialog,
  open: OpenDialog,
  'save-as': SaveAsDialog,
  dropped: DroppedDialog,
};

function Page() {
  const {catalog, desk, dialog, wide, drag, guess} = useStore();
  useEffect(() => {
    window.addEventListener('keydown', pageKey);
    return () => window.removeEventListener('keydown', pageKey);
  }, []);
  useEffect(() => {
    document.title = desk?.open ? `${desk.saved ? '' : '* '}${desk.name} · Modestead` : 'Modestead';
  }, [desk?.open, desk?.name, desk?.saved]);
  if (!desk || (!catalog && (desk.open || guess))) {
    return html`<p class="loading">Opening the bench.</p><${Notice} /><${Told} />`;
  }
  const Kind = dialog && DIALOGS[dialog.kind];
  return html`${desk.open ? html`<div class=${'page' + (wide ? ' wide' : '') + (drag ? ` dragging dragging-${drag.kind}` : '')}>
      <${Bar} />
      <div class="room">
        ${!wide && html`<${Shelf} />
          <section class="bench-frame" aria-label="Bench">
            <div class="bench" id="bench" tabindex="-1" data-part="bench" data-scroll="bench"><${Bands} /></div>
            <${Splitter} />
          </section>`}
        <${LookPane} />
      </div>
      <${Strip} />
      <${DropZone} take=${() => {}} />
    </div>` : html`<${Start} />`}
    <${DragLayer} /><${Notice} /><${Told} />
    ${Kind && html`<${Kind} key=${dialog.kind + (dialog.step ?? dialog.end ?? '')} ...${dialog} />`}`;
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

async function begin() {
  render(html`<${Guarded} />`, document.getElementById('page'));
  window.addEventListener('unhandledrejection', (event) => notify(`The page met a defect: ${event.reason?.message ?? event.reason}.`, 'stop'));
  try {
    // each is shown when it is there: the start page needs no nodes
    await Promise.all([api.get('/api/nodes').then((catalog) => setState({catalog})), api.get('/api/desk').then(takeDesk)]);
    listen();
  } catch (fault) {
    const page = document.getElementById('page');
    render(null, page);
    const words = document.createElement('p');
    words.className = 'loading tone-stop';
    words.setAttribute('role', 'alert');
    words.textContent = fault.message;
    page.replaceChildren(words);
  }
}

begin();
