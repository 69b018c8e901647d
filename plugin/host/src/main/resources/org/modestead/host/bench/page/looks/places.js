import {cell, milliseconds, onAxis, told} from './numbers.js';
import {modeOf, words} from './keys.js';
import {drawable} from './ranges.js';

/** Where the things of a picture are on the screen, what is nearest to a place, and what is to be said of it. */

const POINT_REACH = 18;
const LINE_REACH = 36;

/**
 * Everything of a figure that can be pointed at, series by series.
 * @returns {{name: string, kind: string, items: {x: number, y: number, key: string, label: string, low?: number, high?: number}[]}[]}
 */
export function targets(figure, hidden) {
  const series = new Map();
  const add = (kind, layer, item) => {
    const id = `${kind} ${layer.name} ${kind === 'points' ? '' : layer.selection}`;
    if (!series.has(id)) {
      series.set(id, {name: layer.name, kind, items: []});
    }
    series.get(id).items.push({key: layer.selection, label: '', ...item});
  };
  for (const layer of figure.layers) {
    if (hidden.has(layer.name) || layer.name === 'interval') {
      continue;
    }
    if (layer.type === 'bars') {
      layer.heights.forEach((y, x) => drawable(y, figure.y) && add('bars', layer, {x, y}));
    } else if (layer.type === 'points' || layer.type === 'line') {
      layer.x.forEach((x, i) => drawable(layer.y[i], figure.y)
        && add(layer.type, layer, {x, y: layer.y[i], label: layer.labels?.[i] ?? ''}));
    } else if (layer.type === 'band') {
      layer.x.forEach((x, i) => drawable(layer.low[i], figure.y) && drawable(layer.high[i], figure.y)
        && add('band', layer, {x, y: (layer.low[i] + layer.high[i]) / 2, low: layer.low[i], high: layer.high[i]}));
    }
  }
  for (const one of series.values()) {
    if (one.kind === 'points' && one.items.every((item) => modeOf(item.key) !== null)) {
      one.items.sort((a, b) => modeOf(a.key) - modeOf(b.key));
    }
  }
  return [...series.values()];
}

/** How values of the figure lie on the screen, as long as nobody zooms. */
export function mapping(chart, figure) {
  const model = chart.getModel();
  const one = (kind, axis) => {
    const found = model.getComponent(kind, 0).axis;
    const place = (value) => found.toGlobalCoord(found.dataToCoord(value));
    const [low, high] = found.scale.getExtent();
    const of = axis.logarithmic ? (value) => Math.log10(value) : (value) => value;
    if (axis.categories.length > 0) {
      const width = place(1) - place(0) || found.getExtent()[1];
      return {at: (value) => place(0) + width * value, width};
    }
    const from = place(low);
    const slope = (place(high) - from) / (of(high) - of(low) || 1);
    const time = (value) => milliseconds(value, axis.time);
    return {at: (value) => from + slope * (of(time(value)) - of(low)), width: 0};
  };
  const across = one('xAxis', figure.x);
  const upwards = one('yAxis', figure.y);
  return {x: across.at, y: upwards.at, width: across.width};
}

/** The nearest thing to a place on the screen: marks before lines, a bar anywhere over its category; null when nothing is near. */
export function nearest(series, map, x, y) {
  let best = null;
  for (const one of series) {
    const reach = one.kind === 'points' ? POINT_REACH : LINE_REACH;
    for (const item of one.items) {
      const across = map.x(item.x) - x;
      const upwards = map.y(item.y) - y;
      const distance = one.kind === 'bars' ? Math.abs(across) : Math.hypot(across, upwards);
      const limit = one.kind === 'bars' ? map.width / 2 : one.kind === 'entries' ? Infinity : reach;
      const rank = distance + (one.kind === 'points' || one.kind === 'bars' ? 0 : POINT_REACH) + (one.kind === 'band' ? 30 : 0);
      if (distance <= limit && (best === null || rank < best.rank)) {
        best = {series: one, item, rank};
      }
    }
  }
  return best;
}

/** What is to be said of a thing: "Mode 2, stands: growth rate −0.078 1/s, frequency 0.62 Hz". */
export function reading(figure, series, item) {
  if (series.kind === 'entries') {
    return `Row ${told(item.y, figure.y)}, column ${told(item.x, figure.x)}: ${cell(item.value)}`;
  }
  const who = [item.key && !item.key.startsWith('channel:') && !item.key.startsWith('kernel:') ? words(item.key) : '',
    series.name && series.name !== words(item.key) && item.key !== `group:${series.name}` ? series.name : '']
    .filter(Boolean).join(', ');
  const label = item.label && item.label !== item.key.split(':')[1] ? ` (${item.label})` : '';
  const place = figure.x.categories.length > 0 ? onAxis(item.x, figure.x) : told(item.x, figure.x);
  const height = told(item.y, figure.y);
  const band = item.low === undefined ? height : `from ${onAxis(item.low, figure.y)} to ${told(item.high, figure.y)}`;
  const text = `${who}${label}${who || label ? ': ' : ''}${place}, ${band}`;
  return text.charAt(0).toUpperCase() + text.slice(1);
}
