/** The keyboard: what each key does, in one list that the page also shows. */
import {getState, setState} from './store.js';
import {
  undo, redo, run, cancel, save, copySteps, paste, duplicate, removeSteps, unlink, openDialog, choose, mark, say, closeNotice,
} from './actions.js';

/** What the list of keys shows, in groups. */
export const KEYS = [
  {group: 'Find your way', keys: [
    ['F6', 'go to the next part of the page: shelf, bench, look'],
    ['Arrow keys', 'on the bench, go from step to step'],
    ['Tab', 'from a step go to its ports'],
    ['Escape', 'give up what is going on: a link, a list, a marked mode'],
    ['F1', 'this list'],
  ]},
  {group: 'Run and keep', keys: [
    ['Ctrl + Enter', 'run up to the chosen step'],
    ['Ctrl + Shift + Enter', 'run everything'],
    ['Ctrl + .', 'stop the run'],
    ['Ctrl + S', 'save the workflow'],
    ['Ctrl + Shift + S', 'save it under another name'],
    ['Ctrl + O', 'open a workflow'],
  ]},
  {group: 'Build', keys: [
    ['Enter', 'on the shelf, add the step; on a port, list what fits; on a step, open its settings'],
    ['F2', 'rename the step'],
    ['Shift + \u2190 or \u2192', 'move the step within its band'],
    ['Delete', 'remove the chosen steps or the chosen link'],
    ['Ctrl + C, Ctrl + V', 'copy the chosen steps, put them in'],
    ['Ctrl + D', 'duplicate the chosen steps'],
    ['Ctrl + A', 'choose all steps'],
    ['Ctrl + Z, Ctrl + Y', 'undo, redo'],
  ]},
];

/** @param {KeyboardEvent} event of the whole page */
export function pageKey(event) {
  const {desk, dialog} = getState();
  if (dialog || !desk?.open || event.defaultPrevented) {
    return;
  }
  const act = wordKey(event) ?? (inField(event.target) ? null : plainKey(event));
  if (act) {
    event.preventDefault();
    act();
  }
}

function inField(target) {
  return target.closest?.('input, textarea, select, [contenteditable]') !== null;
}

function pickedText() {
  return String(window.getSelection()) !== '';
}

/** Keys with Ctrl (or the command key) and function keys: they hold everywhere except that fields keep their own. */
function wordKey(event) {
  const {chosen} = getState();
  const ctrl = event.ctrlKey || event.metaKey;
  const field = inField(event.target);
  const key = event.key.length === 1 ? event.key.toLowerCase() : event.key;
  if (key === 'F1') {
    return () => openDialog({kind: 'keys'});
  }
  if (key === 'F6') {
    return () => nextPart(event.shiftKey);
  }
  if (!ctrl || event.altKey) {
    return null;
  }
  switch (key) {
    case 's': return () => (event.shiftKey || !getState().desk.file ? openDialog({kind: 'save-as'}) : save());
    case 'o': return () => openDialog({kind: 'open'});
    case '.': return () => cancel();
    case 'Enter': return event.shiftKey ? () => run() : chosen.length ? () => run(chosen) : null;
    case 'z': return field ? null : () => (event.shiftKey ? redo() : undo());
    case 'y': return field ? null : () => redo();
    case 'c': return field || pickedText() || !chosen.length ? null : () => copySteps(chosen);
    case 'v': return field ? null : () => paste();
    case 'd': return field || !chosen.length ? null : () => duplicate(chosen);
    case 'a': return field || !event.target.closest('[data-part="bench"]') ? null : () => choose(getState().desk.steps.map((s) => s.id));
    default: return null;
  }
}

function plainKey(event) {
  const {chosen, link, selection, notice, wide} = getState();
  if (event.key === 'Delete' && event.target.closest('[data-part="bench"], body')) {
    if (link) {
      const [from, to] = link.split('>');
      return () => unlink(from, to);
    }
    return chosen.length ? () => removeSteps(chosen) : null;
  }
  if (event.key === 'F2' && chosen.length === 1) {
    return () => openDialog({kind: 'rename', step: chosen[0]});
  }
  if (event.key === 'Escape') {
    if (selection) {
      return () => {
        mark('');
        say('No mode is marked any more.');
      };
    }
    if (notice) {
      return closeNotice;
    }
    return wide ? () => setState({wide: false}) : null;
  }
  return null;
}

/** Parts of the page in the order in which F6 goes through them. */
function nextPart(back) {
  const parts = [...document.querySelectorAll('[data-part]')].filter((part) => part.offsetParent !== null);
  const now = parts.findIndex((part) => part.contains(document.activeElement));
  const next = parts[(now + (back ? parts.length - 1 : 1) + parts.length) % parts.length];
  const target = next?.querySelector('[data-first]') ?? next?.querySelector('button, input, [tabindex="0"]') ?? next;
  target?.focus();
}
