import {html, useMemo, useRef} from '../lib.js';
import {count} from '../js/words.js';
import {scale, useColours} from './colours.js';
import {numbersOfMatrix} from './figure-numbers.js';
import {isSelected, words} from './keys.js';
import {cell} from './numbers.js';
import {Frame} from './picture.js';
import {Plot} from './plot.js';
import {useRead} from './reading.js';
import {useSeen} from './seen.js';

/** Most labels on the upright axis. */
const MOST_LABELS = 12;

/**
 * A matrix as a map of colours. Where the sign matters the colours part at zero, in equal steps to both sides; else they run from
 * light to dark (or dark to light on a dark ground). The range is told at the bar beneath.
 */
export function HeatMap({head, address, resultId, selection, select}) {
  const frame = useRef(null);
  const seen = useSeen(frame);
  const {value: matrix, fault} = useRead(seen ? address : null, resultId);
  const caption = matrix?.caption ?? '';
  const keys = [...(matrix?.rowSelections ?? []), ...(matrix?.columnSelections ?? [])];
  const chosen = keys.some((key) => isSelected(key, selection)) ? selection : '';
  return html`<${Frame} frame=${frame} id=${head.id} kind="MATRIX" title=${head.title} fault=${fault} selection=${selection} select=${select}
      caption=${`${caption} ${count(head.rows)} rows, ${count(head.columns)} columns.`.trim()} files=${address} chosen=${chosen && words(chosen)}
      numbers=${matrix ? () => numbersOfMatrix(matrix) : null}>
    ${(tools) => (matrix ? html`<${Drawn} matrix=${matrix} selection=${chosen} select=${select} ...${tools} />`
      : html`<div class="lk-plot lk-empty"></div>`)}
  </${Frame}>`;
}

function Drawn({matrix, selection, select, handle, captionId, title, say}) {
  const theme = useColours();
  const figure = useMemo(() => figureOf(matrix), [matrix]);
  const range = rangeOf(matrix);
  const stops = palette(matrix, theme);
  return html`
    <p class="lk-axes" aria-hidden="true"><span>${matrix.rowTitle}, downwards</span></p>
    <${Plot} figure=${figure} theme=${theme} selection=${selection} select=${select} hidden=${NONE} handle=${handle} say=${say}
      option=${mapOption} points=${entries}
      label=${`${title}. Arrow keys go from entry to entry, Enter selects, plus and minus zoom, 0 shows all.`} describedBy=${captionId} />
    <p class="lk-axes lk-axis-x" aria-hidden="true"><span>${matrix.columnTitle}</span></p>
    <div class="lk-scale" role="img" aria-label=${`Colours from ${cell(range.low)} to ${cell(range.high)}; entries from ${cell(matrix.low)} to ${cell(matrix.high)}`}>
      <span>${cell(range.low)}</span>
      <svg viewBox=${`0 0 ${stops.length} 1`} preserveAspectRatio="none" aria-hidden="true" focusable="false">
        ${stops.map((colour, i) => html`<rect key=${i} x=${i} y="0" width="1.02" height="1" fill=${colour} />`)}
      </svg>
      <span>${cell(range.high)}</span>
      <span class="lk-quiet">entries from ${cell(matrix.low)} to ${cell(matrix.high)}</span>
    </div>`;
}

const NONE = new Set();

/** What a picture of numbers needs to know of a matrix to be pointed at and walked through. */
function figureOf(matrix) {
  const names = (labels, every, size) => labels ?? Array.from({length: size}, (_, i) => String(i * every + 1));
  return {
    matrix, kind: 'MATRIX', layers: [], right: null,
    x: {label: matrix.columnTitle, logarithmic: false, time: '', categories: names(matrix.columnLabels, matrix.everyColumn, matrix.shownColumns)},
    y: {label: matrix.rowTitle, logarithmic: false, time: '', categories: names(matrix.rowLabels, matrix.everyRow, matrix.shownRows)},
  };
}

/** One series a row, so that the arrows go along rows and from row to row. */
function entries(figure) {
  const {matrix} = figure;
  return matrix.values.map((row, i) => ({name: '', kind: 'entries', items: row.map((value, j) => ({
    x: j, y: i, value, key: matrix.rowSelections?.[i] ?? matrix.columnSelections?.[j] ?? '', label: '',
  }))}));
}

function rangeOf(matrix) {
  if (matrix.low === null) {
    return {low: 0, high: 1};
  }
  if (matrix.diverging) {
    const most = Math.max(Math.abs(matrix.low), Math.abs(matrix.high)) || 1;
    return {low: -most, high: most};
  }
  const low = Math.min(0, matrix.low);
  return {low, high: matrix.high > low ? matrix.high : low + 1};
}

function palette(matrix, theme) {
  return matrix.diverging ? scale(theme['apart-low'], theme['apart-middle'], theme['apart-high'])
    : scale(theme['sequence-low'], theme['sequence-middle'], theme['sequence-high']);
}

function mapOption(figure, theme, selection) {
  const {matrix} = figure;
  const range = rangeOf(matrix);
  const data = matrix.values.flatMap((row, i) => row.map((value, j) => [j, i, value ?? '-']));
  const labels = {color: theme.quiet, fontSize: theme.small, fontFamily: theme.font};
  const side = (axis) => ({type: 'category', data: axis.categories, axisLine: {show: false}, axisTick: {show: false},
    splitArea: {show: false}, axisLabel: {...labels, hideOverlap: true, width: theme.small * 9, overflow: 'truncate'}});
  const upright = side(figure.y);
  // the library leaves out too few of many upright labels
  upright.axisLabel.interval = Math.ceil(figure.y.categories.length / MOST_LABELS) - 1;
  const chosen = [...chosenOf(matrix.rowSelections, 0), ...chosenOf(matrix.columnSelections, 1)];
  return {
    animation: false, backgroundColor: 'transparent',
    grid: {left: figure.x.categories[0]?.length > 3 ? 34 : 6, right: 14, top: 6, bottom: 6, containLabel: true, show: true, borderColor: theme.edge, borderWidth: 1},
    xAxis: side(figure.x),
    yAxis: {...upright, inverse: true},
    visualMap: {show: false, min: range.low, max: range.high, inRange: {color: palette(matrix, theme)}, seriesIndex: 0},
    dataZoom: [{type: 'inside', id: 'across', xAxisIndex: 0, zoomOnMouseWheel: 'ctrl', moveOnMouseMove: true, moveOnMouseWheel: false, filterMode: 'none'},
      {type: 'inside', id: 'upwards', yAxisIndex: 0, zoomOnMouseWheel: 'ctrl', moveOnMouseMove: true, moveOnMouseWheel: false, filterMode: 'none'}],
    series: [
      {type: 'heatmap', silent: true, data, progressive: 0},
      {type: 'custom', silent: true, clip: true, z: 5, data: chosen, encode: {x: -1, y: -1}, renderItem: (params, api) => {
        const {x, y, width, height} = params.coordSys;
        const [across, upwards] = api.size([1, 1]);
        const [centreX, centreY] = api.coord(api.value(0) === 0 ? [0, api.value(1)] : [api.value(1), 0]);
        const shape = api.value(0) === 0 ? {x: x + 1, y: centreY - upwards / 2, width: width - 2, height: upwards}
          : {x: centreX - across / 2, y: y + 1, width: across, height: height - 2};
        return {type: 'rect', silent: true, shape, style: {fill: 'transparent', stroke: theme.accent, lineWidth: 2}};
      }},
    ],
  };

  /** Rows (0) and columns (1) that belong to what is selected. */
  function chosenOf(keys, side) {
    return (keys ?? []).flatMap((key, i) => (isSelected(key, selection) ? [[side, i]] : []));
  }
}
