/** Questions about what the server declares: nodes, their ports, types and stages. */
import {stepOf, portOf} from './layout.js';

/** @returns {object|undefined} the declaration */
export function nodeOf(catalog, id) {
  return catalog.nodes.find((node) => node.id === id);
}

/** @returns {object|undefined} the step of the desk */
export function stepWith(desk, id) {
  return desk.steps.find((step) => step.id === id);
}

export function typeTitle(catalog, type) {
  return catalog.types.find((t) => t.id === type)?.title ?? type;
}

export function stageTitle(catalog, stage) {
  return catalog.stages.find((s) => s.id === stage)?.title ?? stage;
}

/**
 * What stands on the tab of a port: the name of its type, and its own name where the type alone would not tell it from others.
 *
 * @returns {{type: string, own: string}}
 */
export function portWords(catalog, port, siblings) {
  const type = typeTitle(catalog, port.type);
  const alike = siblings.filter((other) => other.type === port.type).length > 1;
  const own = port.title.toLowerCase().startsWith(type.toLowerCase()) ? port.title.slice(type.length).trim() : port.title;
  return {type, own: alike || port.type === 'table' ? own : ''};
}

/** @returns {{step: object, node: object, port: object, output: boolean}|undefined} what an end `step.port` names */
export function portAt(catalog, desk, end, output) {
  const step = stepWith(desk, stepOf(end));
  const node = step && nodeOf(catalog, step.node);
  const port = node && (output ? node.outputs : node.inputs).find((p) => p.id === portOf(end));
  return port && {step, node, port, output};
}

/** The name of a step, with its id where another step has the same name. */
export function stepName(desk, step) {
  return hasTwin(desk, step) ? `${step.title} (${step.id})` : step.title;
}

/** Whether another step has the same name. */
export function hasTwin(desk, step) {
  return desk.steps.some((other) => other.id !== step.id && other.title === step.title);
}

/** "Snapshots of Snapshot Builder" */
export function endWords(catalog, desk, end, output) {
  const found = portAt(catalog, desk, end, output);
  return found ? `${found.port.title} of ${stepName(desk, found.step)}` : end;
}

/** Words by which a node is found: its title, purpose, keywords and port types. */
export function matches(catalog, node, query) {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  const text = [node.title, node.id, node.purpose, ...node.keywords, stageTitle(catalog, node.stage)].join(' ').toLowerCase();
  return words.every((word) => text.includes(word));
}

/** What is wrong, in the names that the page shows. @param {boolean} withStep whether the step is named too */
export function problemWords(catalog, desk, problem, withStep) {
  const step = problem.step && stepWith(desk, problem.step);
  const node = step && nodeOf(catalog, step.node);
  if (!node || !problem.seen) {
    return problem.sentence;
  }
  const setting = node.settings.find((s) => s.key === problem.setting);
  const port = node.inputs.find((p) => p.id === problem.port);
  const where = [withStep ? stepName(desk, step) : '', setting?.label ?? port?.title ?? ''].filter(Boolean).join(', ');
  return `${where}${where ? ': ' : ''}${problem.seen}; ${problem.wanted}.`;
}
