/** What part of each axis a picture shows at first: the same as the picture of the report. */

const MARGIN = 0.05;
const LABELLED_DECADES = 2.5;
const LITTLE = 0.03;
const NARROWEST = 0.02;

/** Whether a value can be drawn on an axis. */
export function drawable(value, axis) {
  return value !== null && Number.isFinite(value) && (!axis.logarithmic || value > 0);
}

/** @returns {{low: number, high: number}} of the horizontal axis */
export function rangeX(figure) {
  const values = figure.layers.flatMap((layer) => (layer.type === 'rule' ? (layer.vertical ? [layer.at] : []) : layer.x ?? []));
  return covering(values, figure.x, figure.kind === 'TIME_SERIES' ? 0.01 : MARGIN, narrowest(figure));
}

/** @returns {{low: number, high: number}} of the vertical axis */
export function rangeY(figure) {
  const values = figure.layers.flatMap((layer) => {
    switch (layer.type) {
      case 'line':
      case 'points':
        return layer.y;
      case 'band':
        return [...layer.low, ...layer.high];
      case 'bars':
        return [0, ...layer.heights];
      case 'rule':
        return layer.vertical ? [] : [layer.at];
      default:
        return [];
    }
  });
  return covering(values, figure.y, MARGIN, narrowest(figure));
}

/** @returns {{low: number, high: number}} of the right axis */
export function rangeRight(figure) {
  return covering(figure.layers.filter((layer) => layer.type === 'backdrop').flatMap((layer) => layer.y), figure.right, MARGIN, 0);
}

/** A frequency that stays to the sixth digit is to look level: no picture of rates or curves shows less than this share of them. */
function narrowest(figure) {
  return figure.kind === 'CURVES' || figure.kind === 'COMPLEX_PLANE' ? NARROWEST : 0;
}

function covering(values, axis, margin, least) {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (drawable(value, axis)) {
      low = Math.min(low, value);
      high = Math.max(high, value);
    }
  }
  if (low > high) {
    return axis.logarithmic ? {low: 0.1, high: 10} : {low: 0, high: 1};
  }
  return axis.logarithmic ? logarithmic(low, high) : linear(low, high, margin, least);
}

function linear(low, high, margin, least) {
  const lacking = least * Math.max(Math.abs(low), Math.abs(high)) - (high - low);
  if (lacking > 0) {
    return linear(low - lacking / 2, high + lacking / 2, margin, 0);
  }
  const spread = high > low ? high - low : low === 0 ? 1 : Math.abs(low) * 0.2;
  return {low: low - margin * spread, high: high + margin * spread};
}

/** A narrow range is widened to whole decades, for only they carry labels. */
function logarithmic(low, high) {
  const from = Math.log10(low);
  const to = Math.log10(high);
  if (to - from > LABELLED_DECADES) {
    const pad = MARGIN * (to - from);
    return {low: 10 ** (from - pad), high: 10 ** (to + pad)};
  }
  const below = Math.floor(from - LITTLE);
  return {low: 0.9 * 10 ** below, high: 1.1 * 10 ** Math.max(below + 1, Math.ceil(to + LITTLE))};
}
