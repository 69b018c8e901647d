/**
 * Dragging by pointer (mouse, pen, finger): nodes from the shelf, steps within their band, links from port to port. Everything
 * that can be dragged can also be done by keyboard; see `picker.js` and `keys.js`.
 */
import {api} from './api.js';
import {getState, setState} from './store.js';
import {addStep, attempt, link, moveStep, notify, openDialog, say} from './actions.js';
import {nodeOf, stageTitle, stepWith, endWords, typeTitle, portAt} from './catalog.js';
import {bandOf, stepOf, portOf} from './layout.js';
import {article} from './words.js';

const SLACK = 5;
const EDGE = 40;

/**
 * Begins a drag when the pointer moves on; a press that does not move stays a click.
 *
 * @param {PointerEvent} event the press
 * @param {{kind: 'node', node: string}|{kind: 'step', step: string}|{kind: 'port', end: string, output: boolean}} what
 */
export function grab(event, what) {
  if (event.button !== 0 || getState().drag) {
    return;
  }
  const start = {x: event.clientX, y: event.clientY};
  const pointer = event.pointerId;
  let going = false;
  const move = (e) => {
    if (e.pointerId !== pointer) {
      return;
    }
    if (!going && Math.hypot(e.clientX - start.x, e.clientY - start.y) > SLACK) {
      going = true;
      begin(what, start);
    }
    if (going) {
      e.preventDefault();
      hover(e.clientX, e.clientY);
      scrollNear(e.clientY);
    }
  };
  const end = (e) => {
    if (e.pointerId !== pointer) {
      return;
    }
    stop();
    if (going) {
      swallowClick();
      drop(e.clientX, e.clientY);
    }
  };
  const give = (e) => {
    if (e.type !== 'keydown' || e.key === 'Escape') {
      stop();
      if (going) {
        e.preventDefault();
        setState({drag: null});
        say('Dragging given up.');
      }
    }
  };
  const stop = () => {
    window.removeEventListener('pointermove', move);
    window.removeEventListener('pointerup', end);
    window.removeEventListener('pointercancel', give);
    window.removeEventListener('keydown', give, true);
  };
  window.addEventListener('pointermove', move, {passive: false});
  window.addEventListener('pointerup', end);
  window.addEventListener('pointercancel', give);
  window.addEventListener('keydown', give, true);
}

/** The click that a browser makes of a drag's end means nothing. */
function swallowClick() {
  const swallow = (e) => {
    e.stopPropagation();
    e.preventDefault();
  };
  window.addEventListener('click', swallow, {capture: true, once: true});
  setTimeout(() => window.removeEventListener('click', swallow, true), 0);
}

function begin(what, start) {
  document.activeElement?.blur?.();
  setState({drag: {...what, start, over: {}, words: '', refused: false, fitting: null}});
  if (what.kind === 'port') {
    fittingOf(what).then((fitting) => {
      const {drag} = getState();
      if (drag?.end === what.end && drag.output === what.output) {
        setState({drag: {...drag, fitting}});
      }
    }).catch(() => {});
  }
}

/** Asks what fits an end. @param {{end: string, output: boolean}} what */
export function fittingOf({end, output}) {
  return api.get(`/api/links/fitting?end=${encodeURIComponent(end)}&side=${output ? 'output' : 'input'}`);
}

/** What lies under the pointer, told by the hooks of the page. */
function under(x, y) {
  const element = document.elementFromPoint(x, y);
  const port = element?.closest('[data-port]');
  const step = element?.closest('[data-step]');
  const band = element?.closest('[data-band]');
  return {
    port: port?.dataset.port ?? '',
    output: port?.dataset.side === 'output',
    step: step?.dataset.step ?? '',
    band: band?.dataset.band ?? '',
    bench: element?.closest('[data-part="bench"]') != null,
    element: step,
  };
}

function hover(x, y) {
  const {drag} = getState();
  const over = under(x, y);
  const told = judge(drag, over, x);
  const same = drag.over.port === over.port && drag.over.output === over.output && drag.over.step === over.step
    && drag.over.band === over.band && drag.over.bench === over.bench && drag.words === told.words && drag.before === told.before;
  if (!same) {
    setState({drag: {...drag, over, ...told}});
    if (told.words && told.words !== drag.words) {
      say(told.words);
    }
  }
}

/** @returns {{words: string, refused: boolean, act?: () => any, before?: string}} what a drop here would do, or why not */
function judge(drag, over, x) {
  if (!over.bench) {
    return {words: '', refused: false, before: ''};
  }
  if (drag.kind === 'node') {
    return judgeNode(drag, over);
  }
  return drag.kind === 'step' ? judgeStep(drag, over, x) : judgePort(drag, over);
}

function judgeNode(drag, over) {
  const {catalog, desk} = getState();
  const node = nodeOf(catalog, drag.node);
  const found = over.port && portAt(catalog, desk, over.port, over.output);
  if (!found) {
    const stage = stageTitle(catalog, node.stage);
    return {words: `Adds ${article(node.title)} to ${stage}`, refused: false, act: () => addStep({node: node.id})};
  }
  const own = (over.output ? node.inputs : node.outputs).find((port) => port.type === found.port.type);
  const type = typeTitle(catalog, found.port.type);
  if (!own) {
    return {
      words: over.output
        ? `${found.step.title} gives ${type} here, and ${article(node.title)} takes none`
        : `${found.step.title} takes ${type} here, and ${article(node.title)} gives none`,
      refused: true,
    };
  }
  return {
    words: over.output ? `Adds ${article(node.title)} that takes this ${type}` : `Adds ${article(node.title)} that gives this ${type}`,
    refused: false,
    act: () => addStep({node: node.id, ...(over.output ? {from: over.port} : {to: over.port})}),
  };
}

function judgeStep(drag, over, x) {
  const {catalog, desk} = getState();
  const step = stepWith(desk, drag.step);
  if (over.band && over.band !== step.stage) {
    const own = stageTitle(catalog, step.stage);
    return {words: `${step.title} belongs to ${own}: a step stays in the band of its stage`, refused: true, before: ''};
  }
  if (!over.step || over.step === drag.step) {
    return {words: 'Drop it beside another step of its band', refused: false, before: ''};
  }
  const other = stepWith(desk, over.step);
  const box = over.element.getBoundingClientRect();
  const after = x > box.left + box.width / 2;
  const place = placeBeside(desk, step, other, after);
  return {
    words: `Moves it ${after ? 'behind' : 'before'} ${other.title}`,
    refused: false,
    before: `${other.id}${after ? '+' : '-'}`,
    act: () => moveStep(step.id, place),
  };
}

function placeBeside(desk, step, other, after) {
  const band = bandOf(desk.steps, step.stage).filter((s) => s.id !== step.id);
  return band.findIndex((s) => s.id === other.id) + (after ? 1 : 0);
}

function judgePort(drag, over) {
  const {catalog, desk} = getState();
  const source = portAt(catalog, desk, drag.end, drag.output);
  const type = typeTitle(catalog, source.port.type);
  if (!over.step) {
    return {words: `Lists steps that ${drag.output ? 'take' : 'give'} ${type}`, refused: false, act: () => pick(drag)};
  }
  if (over.port === drag.end && over.output === drag.output) {
    return {words: '', refused: false};
  }
  const ports = drag.fitting?.ports ?? [];
  if (over.port && over.output === drag.output) {
    return {
      words: drag.output ? 'An output cannot feed another output: end at an input' : 'An input cannot feed another input: end at an output',
      refused: true,
    };
  }
  if (!drag.fitting) {
    return {words: 'Looking for what fits', refused: false};
  }
  if (over.port) {
    return judgeTarget(drag, ports.find((port) => port.end === over.port));
  }
  const fits = ports.filter((port) => port.fits && port.end.startsWith(over.step + '.'));
  const target = stepWith(desk, over.step);
  if (fits.length === 1) {
    return judgeTarget(drag, fits[0]);
  }
  if (fits.length > 1) {
    return {words: `Asks which ${type} of ${target.title}`, refused: false, act: () => pick(drag, over.step)};
  }
  return {words: `${target.title} ${drag.output ? 'takes' : 'gives'} no ${type}`, refused: over.step !== source.step.id};
}

function judgeTarget(drag, port) {
  const {catalog, desk} = getState();
  if (!port) {
    return {words: '', refused: false};
  }
  if (!port.fits) {
    return {words: port.refusal, refused: true};
  }
  const from = drag.output ? drag.end : port.end;
  const to = drag.output ? port.end : drag.end;
  const fed = stepWith(desk, stepOf(to))?.inputs.find((input) => input.id === portOf(to))?.from;
  if (fed === from) {
    return {words: 'These two are linked already', refused: true};
  }
  return {
    words: fed ? `Links, in place of ${endWords(catalog, desk, fed, true)}` : 'Links the two',
    refused: false,
    act: () => link(from, to, Boolean(fed)),
  };
}

function pick(drag, step) {
  openDialog({kind: 'picker', end: drag.end, output: drag.output, step});
}

async function drop(x, y) {
  const {drag} = getState();
  if (!drag) {
    return;
  }
  const over = under(x, y);
  let told = judge(drag, over, x);
  if (drag.kind === 'port' && !drag.fitting && over.step) {
    const fitting = await attempt(() => fittingOf(drag));
    told = fitting ? judge({...drag, fitting}, over, x) : told;
  }
  setState({drag: null});
  if (told.refused) {
    notify(told.words + (told.words.endsWith('.') ? '' : '.'), 'stop');
  } else {
    told.act?.();
  }
}

/** Keeps the bench moving while something is held near its upper or lower edge. */
function scrollNear(y) {
  const bench = document.querySelector('[data-scroll="bench"]');
  const box = bench?.getBoundingClientRect();
  if (box && y > box.bottom - EDGE) {
    bench.scrollTop += 12;
  } else if (box && y < box.top + EDGE) {
    bench.scrollTop -= 12;
  }
}
