import {html} from '../lib.js';
import {HeatMap} from './heat-map.js';
import {Picture} from './picture.js';

/**
 * Pictures side by side, as many as there is room for; those over time get wider rooms of their own.
 * The figures are heads whose data are read from the base, or whole.
 */
export function Pictures({figures, base = '', whole = false, matrices = [], matrixBase = '', ...common}) {
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
    const few = ['', ' lk-single', group.wide ? '' : ' lk-pair'][group.figures.length + maps.length] ?? '';
    return html`<div key=${i} class=${`lk-pictures${group.wide ? ' lk-wide' : ''}${few}`}>
      ${group.figures.map((figure) => html`<${Picture} key=${figure.id} head=${figure} data=${whole ? figure : null} address=${whole ? '' : `${base}/${figure.id}`} ...${common} />`)}
      ${maps.map((matrix) => html`<${HeatMap} key=${matrix.id} head=${matrix} address=${`${matrixBase}/${matrix.id}`} ...${common} />`)}
    </div>`;
  });
}
