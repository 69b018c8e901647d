/**
 * How links run: down out of a card, along the gap below its row, through a gutter between columns past the rows between,
 * along the gap above the row of the target, and down into it. Links of one output share a track. Pure geometry in pixels.
 */

const ROUND = 5;
const TRACK = 4;
const TRACKS = 4;

/**
 * @param {Array<{key: string, from: {x: number, y: number, row: number}, to: {x: number, y: number, row: number}, track: number}>} links
 * @param {Array<{top: number, bottom: number}>} rows upper and lower edge of each row of cards, from top to bottom
 * @param {number[]} gutters x of the middle of each gutter
 * @returns {Map<string, string>} the path of each link, as SVG path data
 */
export function routes(links, rows, gutters) {
  return new Map(links.map((link) => [link.key, path(corners(link, rows, gutters))]));
}

/** Distance of a track from the middle of a gap or gutter. */
function offset(track) {
  return ((track % TRACKS) - (TRACKS - 1) / 2) * TRACK;
}

function corners({from, to, track}, rows, gutters) {
  const shift = offset(track);
  const below = gapBelow(rows, from.row) + shift;
  const above = gapAbove(rows, to.row) + shift;
  if (to.row === from.row + 1) {
    return [from, {x: from.x, y: above}, {x: to.x, y: above}, to];
  }
  const gutter = nearest(gutters, from.x, to.x) + shift;
  return [from, {x: from.x, y: below}, {x: gutter, y: below}, {x: gutter, y: above}, {x: to.x, y: above}, to];
}

/** Long ways run near the cards they leave and reach, so that a wide gap between bands does not fill with crossings. */
const NEAR = 11;

function gapBelow(rows, row) {
  const next = rows[row + 1];
  return rows[row].bottom + (next ? Math.min(NEAR, (next.top - rows[row].bottom) / 2) : NEAR);
}

function gapAbove(rows, row) {
  const before = rows[row - 1];
  return rows[row].top - (before ? Math.min(NEAR, (rows[row].top - before.bottom) / 2) : NEAR);
}

function nearest(gutters, a, b) {
  const way = (g) => Math.abs(g - a) + Math.abs(g - b);
  return gutters.reduce((best, g) => (way(g) < way(best) ? g : best), gutters[0] ?? a);
}

/** A line through the corners, each rounded as far as its two sides allow. */
function path(points) {
  const p = points.filter((point, i) => i === 0 || point.x !== points[i - 1].x || point.y !== points[i - 1].y);
  let d = `M${at(p[0])}`;
  for (let i = 1; i < p.length - 1; i += 1) {
    const r = Math.min(ROUND, distance(p[i - 1], p[i]) / 2, distance(p[i], p[i + 1]) / 2);
    d += `L${at(towards(p[i], p[i - 1], r))}Q${at(p[i])} ${at(towards(p[i], p[i + 1], r))}`;
  }
  return d + `L${at(p.at(-1))}`;
}

function distance(a, b) {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

function towards(from, to, length) {
  const whole = distance(from, to) || 1;
  return {x: from.x + ((to.x - from.x) * length) / whole, y: from.y + ((to.y - from.y) * length) / whole};
}

function at({x, y}) {
  return `${x.toFixed(1)} ${y.toFixed(1)}`;
}
