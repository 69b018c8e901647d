/**
 * What else a new step needs, found along the line that it is put into: a checker that is fed with a spectrum also takes the
 * operator that the spectrum was made of, and the snapshots that the operator was fitted to. A report takes all there is, also what it
 * could do without. Pure computation.
 */
import {nodeOf, stepWith} from './catalog.js';
import {stepOf} from './layout.js';

/**
 * @param {object} catalog
 * @param {object} desk
 * @param {object} node declaration of the new step
 * @param {string} from the output that it is put behind
 * @returns {Array<{from: string, port: string}>} an output for each further input that is needed, where only one comes into question
 */
export function furtherFeeds(catalog, desk, node, from) {
  const given = outputType(catalog, desk, from);
  const taken = node.inputs.find((port) => port.type === given);
  const wanted = (port) => !port.optional || node.stage === 'report';
  const open = node.inputs.filter((port) => port !== taken && port.type !== given && port.type !== 'table' && wanted(port));
  return open.map((port) => ({port: port.id, from: nearest(catalog, desk, stepOf(from), port.type)})).filter((feed) => feed.from);
}

function outputType(catalog, desk, end) {
  return outputsOf(catalog, desk, stepOf(end)).find((output) => output.end === end)?.type;
}

function outputsOf(catalog, desk, id) {
  const step = stepWith(desk, id);
  const node = step && nodeOf(catalog, step.node);
  return node ? node.outputs.map((port) => ({end: `${id}.${port.id}`, type: port.type})) : [];
}

/** Goes up the links, level by level; empty where two of one level give it. */
function nearest(catalog, desk, start, type) {
  const seen = new Set([start]);
  let level = [start];
  while (level.length > 0) {
    const found = level.flatMap((id) => outputsOf(catalog, desk, id).filter((output) => output.type === type));
    if (found.length > 0) {
      return found.length === 1 ? found[0].end : '';
    }
    const above = level.flatMap((id) => desk.links.filter((link) => stepOf(link.to) === id).map((link) => stepOf(link.from)));
    level = [...new Set(above)].filter((id) => !seen.has(id));
    level.forEach((id) => seen.add(id));
  }
  return '';
}
