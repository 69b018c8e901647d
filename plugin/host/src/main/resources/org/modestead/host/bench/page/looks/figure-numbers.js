import {isDated, labelled, onAxis} from './numbers.js';
import {inMemory} from './sources.js';

/** The numbers of a picture as a table: what is drawn, and nothing else. */

/** @returns {import('./sources.js').Source} */
export function numbersOf(figure) {
  return figure.x.categories.length > 0 ? byCategory(figure) : byPoint(figure);
}

const number = (name, unit) => ({name, unit, cell: 'DOUBLE', kind: ''});
const text = (name) => ({name, unit: '', cell: 'TEXT', kind: ''});

function byCategory(figure) {
  const y = labelled(figure.y.label);
  const drawn = figure.layers.filter((layer) => layer.type !== 'rule');
  const columns = [text(figure.x.label || 'category'), ...drawn.map((layer) => number(layer.name || y.what, y.unit))];
  const rows = figure.x.categories.map((name, i) => [name, ...drawn.map((layer) => {
    if (layer.type === 'bars') {
      return layer.heights[i] ?? null;
    }
    const at = layer.x.findIndex((x) => Math.round(x) === i);
    return at < 0 ? null : layer.y[at];
  })]);
  const keys = new Set(drawn.map((layer) => layer.selection));
  const key = keys.size === 1 ? [...keys][0] : '';
  return inMemory(columns, rows, rows.map(() => key));
}

function byPoint(figure) {
  const x = labelled(figure.x.label);
  const y = labelled(figure.y.label);
  const drawn = figure.layers.filter((layer) => layer.type !== 'rule');
  const dated = isDated(figure.x);
  const parts = {
    series: drawn.some((layer) => layer.name),
    key: drawn.some((layer) => layer.selection),
    band: drawn.some((layer) => layer.type === 'band'),
    value: drawn.some((layer) => layer.type !== 'band'),
    label: drawn.some((layer) => layer.labels?.some(Boolean)),
  };
  const columns = [parts.series && text('drawn as'), parts.key && text('what'), dated ? text(x.what) : number(x.what, x.unit),
    parts.value && number(y.what, y.unit), parts.band && number('low', y.unit), parts.band && number('high', y.unit),
    parts.label && text('label')].filter(Boolean);
  const rows = [];
  const keys = [];
  for (const layer of drawn) {
    layer.x.forEach((at, i) => {
      rows.push([parts.series && (layer.name || ''), parts.key && layer.selection.replace(':', ' '), dated ? onAxis(at, figure.x) : at,
        parts.value && (layer.y ? layer.y[i] : null), parts.band && (layer.low ? layer.low[i] : null),
        parts.band && (layer.high ? layer.high[i] : null), parts.label && (layer.labels?.[i] ?? '')].filter((cell) => cell !== false));
      keys.push(layer.selection);
    });
  }
  return inMemory(columns, rows, keys);
}

/** The numbers of a matrix: one row an entry row. */
export function numbersOfMatrix(matrix) {
  const rowName = (i) => matrix.rowLabels?.[i] ?? String(i * matrix.everyRow + 1);
  const columnName = (j) => matrix.columnLabels?.[j] ?? String(j * matrix.everyColumn + 1);
  const columns = [text(matrix.rowTitle), ...matrix.values[0].map((_, j) => number(columnName(j), ''))];
  const rows = matrix.values.map((row, i) => [rowName(i), ...row]);
  return inMemory(columns, rows, rows.map((_, i) => matrix.rowSelections?.[i] ?? ''));
}
