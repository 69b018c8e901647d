/**
 * Where steps stand: bands by stage, rows in a band so that what feeds another step of the same stage stands above it, and
 * columns so that a step stands below what feeds it. Pure computation, no page.
 */

/**
 * @param {Array<{id: string, stage: string, place: number}>} steps
 * @param {Array<{from: string, to: string}>} links ends are `step.port`
 * @param {string[]} stages in the order of the work
 * @param {number} columns how many cards fit side by side
 * @returns {Array<{stage: string, rows: Array<Array<{id: string, column: number}>>}>} one entry a stage, empty ones too
 */
export function arrange(steps, links, stages, columns) {
  const parents = parentsOf(steps, links);
  const column = new Map();
  return stages.map((stage) => {
    const rows = tiers(bandOf(steps, stage), parents).flatMap((tier) => cut(tier, columns));
    return {stage, rows: rows.map((row) => seat(row, parents, column, columns))};
  });
}

/** @returns {number} how many steps the fullest row has when there is room for all; as `arrange` */
export function widest(steps, links, stages) {
  const rows = arrange(steps, links, stages, Math.max(1, steps.length)).flatMap((band) => band.rows);
  return Math.max(1, ...rows.map((row) => row.length));
}

/** @returns {Array<object>} the steps of a band in their order */
export function bandOf(steps, stage) {
  return steps.filter((step) => step.stage === stage).sort((a, b) => a.place - b.place);
}

/** @param {string} end `step.port` */
export function stepOf(end) {
  return end.slice(0, end.lastIndexOf('.'));
}

/** @param {string} end `step.port` */
export function portOf(end) {
  return end.slice(end.lastIndexOf('.') + 1);
}

function parentsOf(steps, links) {
  const parents = new Map(steps.map((step) => [step.id, []]));
  for (const link of links) {
    const list = parents.get(stepOf(link.to));
    const from = stepOf(link.from);
    if (list && parents.has(from) && !list.includes(from)) {
      list.push(from);
    }
  }
  return parents;
}

/** Longest path among the steps of one stage decides the row; a ring of links ends where it closes. */
function tiers(own, parents) {
  const ids = new Set(own.map((step) => step.id));
  const depth = new Map();
  const walk = (id, seen) => {
    if (!depth.has(id)) {
      const above = parents.get(id).filter((parent) => ids.has(parent) && !seen.has(parent));
      depth.set(id, Math.max(0, ...above.map((parent) => walk(parent, new Set(seen).add(id)) + 1)));
    }
    return depth.get(id);
  };
  const rows = [];
  for (const step of own) {
    const row = walk(step.id, new Set([step.id]));
    (rows[row] ??= []).push(step.id);
  }
  return Array.from(rows, (row) => row ?? []).filter((row) => row.length > 0);
}

function cut(row, columns) {
  const parts = [];
  for (let i = 0; i < row.length; i += columns) {
    parts.push(row.slice(i, i + columns));
  }
  return parts;
}

/** Keeps the order of the row and puts each step as near below its parents as the others allow. */
function seat(row, parents, column, columns) {
  let free = 0;
  return row.map((id, place) => {
    const above = parents.get(id).filter((parent) => column.has(parent)).map((parent) => column.get(parent));
    const wanted = above.length ? Math.round(above.reduce((sum, c) => sum + c, 0) / above.length) : free;
    const last = columns - (row.length - place);
    const seat = Math.min(Math.max(free, wanted), last);
    free = seat + 1;
    column.set(id, seat);
    return {id, column: seat};
  });
}
