/** A recording at a glance: one strip a channel, each in its own range, time running to the right. */
import {html} from '../../lib.js';
import {moment, number} from '../words.js';

const WIDTH = 1000;
const HEIGHT = 60;
const FEW = 3;

/** @param {{figure: object}} props a figure of lines over time */
export function Preview({figure}) {
  const lines = figure.layers.filter((layer) => layer.type === 'line');
  const all = lines.flatMap((line) => line.x.filter((x) => x !== null));
  const from = all.reduce((a, b) => Math.min(a, b), Infinity);
  const to = all.reduce((a, b) => Math.max(a, b), -Infinity);
  return html`<figure class=${'preview' + (lines.length <= FEW ? ' few' : '')}><ul>${lines.map((line, i) => html`<${Strip} key=${i} line=${line} from=${from} to=${to} />`)}</ul>
    <figcaption class="quiet small">${figure.x.label}: ${moment(from, figure.x.time)} to ${moment(to, figure.x.time)}. ${figure.caption}</figcaption></figure>`;
}

function Strip({line, from, to}) {
  const values = line.y.filter((y) => y !== null);
  const low = values.reduce((a, b) => Math.min(a, b), Infinity);
  const high = values.reduce((a, b) => Math.max(a, b), -Infinity);
  return html`<li><p class="small"><span class="clip">${line.name}</span><span class="quiet">${number(low, 3)} to ${number(high, 3)}</span></p>
    <svg viewBox=${`0 0 ${WIDTH} ${HEIGHT}`} preserveAspectRatio="none" role="img" aria-label=${`${line.name}, from ${number(low, 3)} to ${number(high, 3)}`}>
      <path d=${path(line, from, to, low, high)} vector-effect="non-scaling-stroke" /></svg></li>`;
}

function path(line, from, to, low, high) {
  const across = WIDTH / (to - from || 1);
  const up = (HEIGHT - 4) / (high - low || 1);
  let d = '';
  let pen = 'M';
  for (let i = 0; i < line.x.length; i += 1) {
    if (line.x[i] === null || line.y[i] === null) {
      pen = 'M';
    } else {
      d += `${pen}${((line.x[i] - from) * across).toFixed(1)} ${(HEIGHT - 2 - (line.y[i] - low) * up).toFixed(1)}`;
      pen = 'L';
    }
  }
  return d;
}
