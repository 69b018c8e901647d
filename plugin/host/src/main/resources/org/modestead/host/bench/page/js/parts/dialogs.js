/** The dialog that is open. */
import {html} from '../../lib.js';
import {getState} from '../store.js';
import {DroppedDialog, OpenDialog, SaveAsDialog} from './file-dialogs.js';
import {Picker} from './picker.js';
import {
  AboutDialog, ConfirmDialog, KeysDialog, NameDialog, NoteDialog, NotesDialog, ProblemsDialog, RenameDialog,
} from './small-dialogs.js';
import {StepDialog} from './step-dialog.js';

const KINDS = {
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

export function Dialogs() {
  const {dialog} = getState();
  const Kind = dialog && KINDS[dialog.kind];
  return Kind ? html`<${Kind} key=${dialog.kind + (dialog.step ?? dialog.end ?? '')} ...${dialog} />` : null;
}
