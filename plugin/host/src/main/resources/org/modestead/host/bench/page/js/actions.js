/** Everything a person can do that the server must know of, and how the page takes its answers. */
import {api, ApiFault} from './api.js';
import {getState, setState} from './store.js';
import {nodeOf, stepWith} from './catalog.js';
import {furtherFeeds} from './feeding.js';
import {stepOf} from './layout.js';

let notices = 0;

/** Tells a screen reader; the same words again are told again. @param {string} text */
export function say(text) {
  setState({said: getState().said === text ? text + '\u00a0' : text});
}

/** Shows a sentence above the page and tells it. @param {string} text @param {'note'|'stop'} [tone] */
export function notify(text, tone = 'note') {
  notices += 1;
  const sentence = text.charAt(0).toUpperCase() + text.slice(1);
  setState({notice: {tone, text: sentence, id: notices}});
  say(sentence);
}

export function closeNotice() {
  setState({notice: null});
}

/** Takes up a state of the desk unless a newer one is known. @param {object} desk */
export function takeDesk(desk) {
  const {desk: known, chosen, link, dialog} = getState();
  if (known && desk.revision < known.revision) {
    return;
  }
  if (!desk.open) {
    setState({desk, chosen: [], link: '', dialog: null, wide: false, selection: ''});
    return;
  }
  const ids = new Set(desk.steps.map((step) => step.id));
  const links = new Set(desk.links.map(linkKey));
  const another = known?.open && known.desk !== desk.desk;
  setState({
    desk,
    chosen: another ? [] : chosen.filter((id) => ids.has(id)),
    link: links.has(link) ? link : '',
    selection: another ? '' : getState().selection,
    dialog: dialog?.step && !ids.has(dialog.step) ? null : dialog,
  });
  tellRun(known, desk);
  if (desk.recovered && known?.desk !== desk.desk) {
    notify(desk.recovered);
  }
}

/** Says that a run began or how it ended. */
function tellRun(before, after) {
  const ran = before?.open && before.run.running;
  if (!ran && after.run.running && before?.open) {
    say('Running.');
  } else if (ran && !after.run.running) {
    say(after.run.last || 'The run has ended.');
  }
}

/** Takes up the progress of running steps. */
export function takeProgress({revision, run, states}) {
  const {desk} = getState();
  if (!desk?.open || revision < desk.revision) {
    return;
  }
  const steps = desk.steps.map((step) => (states[step.id] ? {...step, state: states[step.id]} : step));
  const now = {...desk, revision, run, steps};
  setState({desk: now});
  tellRun(desk, now);
}

/** @param {{from: string, to: string}} link */
export function linkKey(link) {
  return `${link.from}>${link.to}`;
}

/** Does what needs the server; a refusal is shown. @returns {Promise<object|null>} the answer, null when refused */
export async function attempt(work) {
  try {
    const answer = await work();
    if (getState().notice?.tone === 'stop') {
      closeNotice();
    }
    return answer;
  } catch (fault) {
    if (fault instanceof ApiFault) {
      notify(fault.message, 'stop');
      if (fault.status === 0) {
        setState({lost: true});
      }
      return null;
    }
    throw fault;
  }
}

async function change(path, body) {
  const answer = await attempt(() => api.post(path, body));
  if (answer) {
    takeDesk(answer);
  }
  return answer;
}

/**
 * @param {object[]} edits
 * @param {string} [label] words for undo
 */
export async function edit(edits, label) {
  return change('/api/edit', label ? {edits, label} : {edits});
}

export async function undo() {
  const {desk} = getState();
  if (desk?.undo) {
    const what = desk.undo;
    if (await change('/api/undo')) {
      say(`Undone: ${what}.`);
    }
  }
}

export async function redo() {
  const {desk} = getState();
  if (desk?.redo) {
    const what = desk.redo;
    if (await change('/api/redo')) {
      say(`Done again: ${what}.`);
    }
  }
}

/** Adds a step and chooses it; what it is put behind also feeds what else it needs. @param {object} add fields of the edit */
export async function addStep(add) {
  const {catalog, desk} = getState();
  const node = nodeOf(catalog, add.node);
  const feeds = add.from ? furtherFeeds(catalog, desk, node, add.from) : [];
  const id = freeId(desk, node.id);
  const answer = await edit([
    {do: 'add', id, ...add},
    ...feeds.map((feed) => ({do: 'link', from: feed.from, to: `${id}.${feed.port}`})),
  ], `Add ${node.title}`);
  if (answer) {
    choose([id]);
    const made = stepWith(answer, id);
    const also = feeds.map((feed) => endWords(answer, feed.from));
    say(`${made.title} added: ${made.state.words}.${also.length ? ` Also fed by ${[...new Set(also)].join(', ')}.` : ''}`);
  }
  return answer;
}

function freeId(desk, wanted) {
  const taken = new Set(desk.steps.map((step) => step.id));
  let id = wanted;
  for (let n = 2; taken.has(id); n += 1) {
    id = `${wanted}-${n}`;
  }
  return id;
}

export async function removeSteps(ids) {
  const {desk} = getState();
  const titles = desk.steps.filter((step) => ids.includes(step.id)).map((step) => step.title);
  if (titles.length && await edit([{do: 'remove', steps: ids}])) {
    say(`Removed: ${titles.join(', ')}. Undo brings it back.`);
    if (document.activeElement === document.body) {
      document.getElementById('bench')?.focus();
    }
  }
}

export async function link(from, to, replace) {
  const answer = await edit([{do: 'link', from, to, ...(replace ? {replace: true} : {})}]);
  if (answer) {
    say(`Linked ${endWords(answer, from)} to ${endWords(answer, to)}.`);
  }
  return answer;
}

export async function unlink(from, to) {
  const answer = await edit([{do: 'unlink', from, to}]);
  if (answer) {
    say(`Link from ${endWords(answer, from)} to ${endWords(answer, to)} removed.`);
  }
  return answer;
}

function endWords(desk, end) {
  return stepWith(desk, stepOf(end))?.title ?? end;
}

/** Moves a step within its band. @param {string} id @param {number} place */
export async function moveStep(id, place) {
  const answer = await edit([{do: 'move', step: id, place}]);
  if (answer) {
    const step = stepWith(answer, id);
    const band = answer.steps.filter((s) => s.stage === step.stage);
    say(`${step.title} is now ${step.place + 1} of ${band.length} in its band.`);
  }
  return answer;
}

/** @param {string[]} ids */
export function choose(ids) {
  setState({chosen: ids, link: ''});
}

/** @param {string} key */
export function chooseLink(key) {
  setState({link: key});
}

/** @param {string} selection */
export function mark(selection) {
  setState({selection});
}

export function openDialog(dialog) {
  setState({dialog});
}

export function closeDialog() {
  setState({dialog: null});
}

/** Remembers the chosen steps so that they can be put in again, here or on another desk. */
export function copySteps(ids) {
  const {desk} = getState();
  const steps = desk.steps.filter((step) => ids.includes(step.id));
  if (steps.length) {
    const links = desk.links.filter((l) => ids.includes(stepOf(l.to)));
    setState({clip: {steps, links, desk: desk.desk}});
    say(`Copied: ${steps.map((step) => step.title).join(', ')}.`);
  }
}

export async function duplicate(ids) {
  if (ids.length) {
    takeMade(await edit([{do: 'copy', steps: ids}]));
  }
}

export async function paste() {
  const {desk, clip} = getState();
  if (!clip) {
    return;
  }
  const known = new Set(desk.steps.map((step) => step.id));
  if (clip.desk === desk.desk && clip.steps.every((step) => known.has(step.id))) {
    await duplicate(clip.steps.map((step) => step.id));
    return;
  }
  takeMade(await edit(pasteEdits(clip, known, clip.desk === desk.desk), 'Paste'));
}

function pasteEdits(clip, known, sameDesk) {
  const taken = [...known].map((id) => ({id}));
  const names = new Map();
  for (const step of clip.steps) {
    const id = freeId({steps: taken}, step.id);
    taken.push({id});
    names.set(step.id, id);
  }
  const end = (text) => (names.get(stepOf(text)) ?? stepOf(text)) + text.slice(stepOf(text).length);
  const links = clip.links.filter((l) => names.has(stepOf(l.from)) || (sameDesk && known.has(stepOf(l.from))));
  return [
    ...clip.steps.map((step) => ({
      do: 'add', node: step.node, id: names.get(step.id), settings: step.settings, ...(step.named ? {title: step.title} : {}),
    })),
    ...clip.steps.filter((step) => step.note).map((step) => ({do: 'note', step: names.get(step.id), note: step.note})),
    ...links.map((l) => ({do: 'link', from: end(l.from), to: end(l.to)})),
  ];
}

function takeMade(answer) {
  if (answer?.made?.length) {
    choose(answer.made);
    say(`Added: ${answer.steps.filter((s) => answer.made.includes(s.id)).map((s) => s.title).join(', ')}.`);
  }
}

/** @param {string[]} [steps] none for everything @param {boolean} [again] */
export async function run(steps, again = false) {
  const answer = await change('/api/run', steps ? {steps, again} : {});
  if (answer && !steps && getState().chosen.length === 0) {
    const {catalog} = getState();
    const judge = answer.steps.find((step) => nodeOf(catalog, step.node).outputs.some((port) => port.type === 'verdict'));
    choose(judge ? [judge.id] : []);
  }
  return answer;
}

export async function cancel() {
  if (getState().desk?.run?.running) {
    say('Stopping.');
    await change('/api/cancel');
  }
}

/** @param {string} [path] where to, none for the file it has */
export async function save(path) {
  const answer = await change('/api/save', path ? {path} : {});
  if (answer) {
    const words = `Saved to ${answer.file}.`;
    if (answer.told) {
      notify(`${words} ${answer.told}`);
    } else {
      say(words);
    }
  }
  return answer;
}

/** Opens or makes a desk. @param {object} what as the server's `POST /api/desk` takes it */
export async function openDesk(what) {
  return change('/api/desk', what);
}

/** Opens a workflow from anywhere on this machine. @param {File} file */
export async function openFile(file) {
  return openDesk({workflow: await file.text(), name: file.name});
}

/** Brings a file to the bench's own folder. @param {File} file @returns {Promise<object|null>} what it is, null when refused */
export async function upload(file) {
  return attempt(() => api.upload(file));
}

export async function closeDesk() {
  return change('/api/desk/close');
}
