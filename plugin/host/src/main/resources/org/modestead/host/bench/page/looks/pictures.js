import {html} from '../lib.js';
import {HeatMap} from './heat-map.js';
import {Picture} from './picture.js';

/** Pictures side by side, as many as there is room for; those over time get wider rooms of their own. */
export function Pictures({figures, base, matrices = [], matrixBase = '', ...common}) {
  const groups = [];
  for (const figure of figures) {
    const wide = figure.kind === 'TIME_SERIES';
    if (groups.at(-1)?.wide !== wide) {
      groups.push({wide, figures: []});
    }
    groups.at(-1).figures.push(figure);
  }
  if (matrices.length > 0 && (groups.length === 0 || groups.at(-1).wide)) {
    groups.push({wide: false, figures: []});
  }
  return groups.map((group, i) => {
    const maps = i === groups.length - 1 ? matrices : [];
    return html`<div key=${i} class=${`lk-pictures${group.wide ? ' lk-wide' : ''}${group.figures.length + maps.length === 1 ? ' lk-single' : ''}`}>
      ${group.figures.map((figure) => html`<${Picture} key=${figure.id} head=${figure} address=${`${base}/${figure.id}`} ...${common} />`)}
      ${maps.map((matrix) => html`<${HeatMap} key=${matrix.id} head=${matrix} address=${`${matrixBase}/${matrix.id}`} ...${common} />`)}
    </div>`;
  });
}
