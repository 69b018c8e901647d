import {isSelected} from './keys.js';
import {faded} from './colours.js';
import {isDated, milliseconds, tick} from './numbers.js';
import {drawable, rangeRight, rangeX, rangeY} from './ranges.js';
import {symbolOf} from './marks.js';
import {layerStyles} from './styles.js';

/** Turns a figure, the same data that the report's picture is drawn from, into what the chart library draws. */

const DIMMED = 0.22;
const LETTER = 0.56;
const LONGEST = 22;
/* How far right of and above a mark its label stands. */
const ASIDE = 6;
const ABOVE = 3;

const DATES = {
  year: '{yyyy}', month: '{yyyy}-{MM}', day: '{MM}-{dd}', hour: '{HH}:{mm}', minute: '{HH}:{mm}', second: '{HH}:{mm}:{ss}',
  millisecond: '{HH}:{mm}:{ss}.{SSS}',
};

/** Whether a number is one that a tick stands at, not the odd end of an axis, which would take the room of its many digits. */
function round(value) {
  return Math.abs(value - Number(value.toPrecision(7))) <= 1e-12 * Math.abs(value);
}

/**
 * @param {any} figure as the server tells it
 * @param {ReturnType<import('./colours.js').colours>} theme
 * @param {string} selection of the page
 * @param {{hidden: Set<string>, width: number}} view names that are hidden, width of the plot in pixels
 * @returns {object} option of the chart library
 */
export function optionOf(figure, theme, selection, view) {
  const drawing = new Drawing(figure, theme, selection, view);
  return {
    animation: false,
    useUTC: true,
    backgroundColor: 'transparent',
    textStyle: {fontFamily: theme.font, fontSize: theme.small, color: theme.quiet},
    grid: {left: drawing.left(), right: figure.right ? 6 : 14, top: drawing.top(), bottom: 6, containLabel: true, show: true, borderColor: theme.edge, borderWidth: 1},
    xAxis: drawing.across(),
    yAxis: figure.right ? [drawing.upwards(), drawing.onTheRight()] : [drawing.upwards()],
    series: drawing.series(),
    dataZoom: drawing.zooms(),
  };
}

class Drawing {
  constructor(figure, theme, selection, view) {
    this.figure = figure;
    this.theme = theme;
    this.selection = selection;
    this.view = view;
    this.styles = layerStyles(figure, theme);
    this.category = figure.x.categories.length > 0;
    this.x = rangeX(figure);
    this.y = rangeY(figure);
    this.some = figure.layers.some((layer) => isSelected(layer.selection, selection));
    this.apart = this.labelMover();
  }

  /** Whether names of categories have no room side by side. */
  slanted() {
    const letters = this.figure.x.categories.map((name) => Math.min(name.length, LONGEST) + 2);
    const room = (this.view.width - 60) / Math.max(1, letters.length);
    return Math.max(...letters) * this.theme.small * LETTER > room;
  }

  /** Slanted names reach out to the left of their category. */
  left() {
    if (!this.category || !this.slanted()) {
      return 6;
    }
    const {categories} = this.figure.x;
    const band = (this.view.width - 60) / categories.length;
    const reach = categories.slice(0, 3).map((name, i) => Math.min(name.length, LONGEST) * this.theme.small * LETTER * 0.77 - band * (i + 0.5) - 30);
    return Math.max(6, ...reach);
  }

  /** Names of upright lines stand above the plot, where they cover no mark; so do the labels of marks at its upper edge, in two lines where they are close. */
  top() {
    const {layers, kind} = this.figure;
    if (kind === 'MARKS' && layers.some((layer) => layer.type === 'points' && layer.labels.some(Boolean))) {
      return 2 * this.theme.small + 8;
    }
    return layers.some((layer) => layer.type === 'rule' && layer.vertical && layer.name) ? this.theme.small + 8 : 10;
  }

  across() {
    const {figure, theme} = this;
    if (this.category) {
      const slanted = this.slanted();
      return {
        ...this.axis(), type: 'category', data: figure.x.categories, splitLine: {show: false},
        axisTick: {show: false},
        axisLabel: {...this.labels(), interval: 0, rotate: slanted ? 40 : 0, width: theme.small * LETTER * LONGEST, overflow: 'truncate',
          hideOverlap: false, formatter: (name) => name},
      };
    }
    return {...this.axis(), ...this.numeric(figure.x, this.x)};
  }

  upwards() {
    return {...this.axis(), ...this.numeric(this.figure.y, this.y), position: 'left'};
  }

  onTheRight() {
    const {figure} = this;
    return {...this.axis(), ...this.numeric(figure.right, rangeRight(figure)), position: 'right', splitLine: {show: false}};
  }

  labels() {
    return {color: this.theme.quiet, fontSize: this.theme.small, fontFamily: this.theme.font};
  }

  axis() {
    const {theme} = this;
    return {
      axisLine: {show: false, onZero: false},
      axisTick: {show: true, lineStyle: {color: theme.edge}},
      splitLine: {show: true, lineStyle: {color: theme['data-grid']}},
      axisLabel: {...this.labels(), hideOverlap: true},
    };
  }

  numeric(axis, range) {
    const shown = {...this.labels(), hideOverlap: true, showMinLabel: false, showMaxLabel: false};
    if (isDated(axis)) {
      return {type: 'time', min: milliseconds(range.low, axis.time), max: milliseconds(range.high, axis.time), splitNumber: 6,
        axisLabel: {...shown, formatter: DATES}};
    }
    if (axis.logarithmic) {
      const power = (value) => Math.abs(Math.log10(value) - Math.round(Math.log10(value))) < 1e-6;
      return {type: 'log', min: range.low, max: range.high,
        axisLabel: {...shown, showMinLabel: undefined, showMaxLabel: undefined, formatter: (value) => (power(value) ? tick(value) : '')}};
    }
    return {type: 'value', min: range.low, max: range.high, scale: true, minInterval: axis.time === 'whole' ? 1 : undefined,
      axisLabel: {...shown, formatter: (value) => (round(value) && (axis.time !== 'whole' || Number.isInteger(value)) ? tick(value) : '')}};
  }

  zooms() {
    const common = {type: 'inside', filterMode: 'none', zoomOnMouseWheel: 'ctrl', moveOnMouseMove: true, moveOnMouseWheel: false,
      minSpan: 0.05};
    const across = {...common, id: 'across', xAxisIndex: 0};
    const sideways = this.category || this.figure.kind === 'TIME_SERIES';
    return sideways ? [across] : [across, {...common, id: 'upwards', yAxisIndex: 0}];
  }

  /** How much ink a layer gets: what is not selected steps back where something is. */
  ink(key) {
    return !this.some || isSelected(key, this.selection) ? 1 : DIMMED;
  }

  isShown(layer) {
    return !layer.name || !this.view.hidden.has(layer.name);
  }

  time(value) {
    return milliseconds(value, this.figure.x.time);
  }

  /** Where a value stands on the horizontal axis, as the chart library counts: the number of its category, or a number. */
  place(x) {
    return this.category ? Math.round(x) : this.time(x);
  }

  series() {
    const layers = this.figure.layers.filter((layer) => this.isShown(layer));
    const of = (type) => layers.filter((layer) => layer.type === type);
    return [
      ...of('backdrop').map((layer) => this.backdrop(layer)),
      ...of('band').map((layer) => this.band(layer)),
      ...this.lines(of('line')),
      ...this.bars(of('bars')),
      ...this.points(of('points')),
      this.rules(of('rule')),
    ];
  }

  backdrop(layer) {
    return {type: 'line', yAxisIndex: 1, z: 1, silent: true, showSymbol: false, connectNulls: false, name: layer.name,
      lineStyle: {color: this.styles.colour(layer), width: 1.3 * this.theme.unit, opacity: 0.8},
      data: layer.x.map((x, i) => [this.time(x), drawable(layer.y[i], this.figure.right) ? layer.y[i] : null])};
  }

  /** A polygon for every stretch without a hole. */
  band(layer) {
    const {figure} = this;
    const fill = faded(this.styles.colour(layer), this.theme.band * (this.ink(layer.selection) < 1 ? 0.4 : 1));
    const stretches = [];
    let open = [];
    layer.x.forEach((x, i) => {
      if (drawable(layer.low[i], figure.y) && drawable(layer.high[i], figure.y)) {
        open.push(i);
      } else {
        stretches.push(open);
        open = [];
      }
    });
    stretches.push(open);
    const drawn = stretches.filter((stretch) => stretch.length > 1);
    return {
      type: 'custom', z: 2, silent: true, clip: true, name: layer.name, data: drawn.map((_, i) => [i]), encode: {x: -1, y: -1},
      renderItem: (_, api) => {
        const stretch = drawn[api.value(0)];
        const corner = (values) => (i) => api.coord([this.time(layer.x[i]), values[i]]);
        return {type: 'polygon', silent: true, style: {fill}, shape: {
          points: [...stretch.map(corner(layer.low)), ...stretch.slice().reverse().map(corner(layer.high))]}};
      },
    };
  }

  /** Layers that look alike become one series with holes between them, for there may be one a run. */
  lines(layers) {
    const groups = new Map();
    for (const layer of layers) {
      const key = JSON.stringify([layer.name, layer.selection, layer.emphasis]);
      groups.set(key, [...(groups.get(key) ?? []), layer]);
    }
    return [...groups.values()].map((group) => this.line(group));
  }

  line(group) {
    const {figure, styles, theme} = this;
    const layer = group[0];
    const ink = this.ink(layer.selection);
    const chosen = isSelected(layer.selection, this.selection);
    const colour = styles.colour(layer);
    const mark = symbolOf(styles.curveMark(layer), colour, theme, 8 * theme.unit, ink);
    const data = [];
    for (const one of group) {
      one.x.forEach((x, i) => data.push([this.place(x), drawable(one.y[i], figure.y) ? one.y[i] : null]));
      data.push([data.at(-1)?.[0] ?? 0, null]);
    }
    return {
      type: 'line', name: layer.name, z: chosen ? 6 : styles.overTime && layer.emphasis === 'STRONG' ? 3 : 4,
      silent: true, clip: true, connectNulls: false, showSymbol: group.every(styles.isMarked), showAllSymbol: true, symbol: mark.symbol, symbolSize: mark.size,
      itemStyle: mark.itemStyle, data,
      lineStyle: {color: colour, width: styles.width(layer) + (chosen ? 1.2 * theme.unit : 0), type: styles.dash(layer).length ? styles.dash(layer) : 'solid',
        opacity: ink, cap: 'butt', join: 'round'},
    };
  }

  bars(layers) {
    const overlapped = this.figure.kind === 'SHAPES' && layers.length > 1;
    return layers.map((layer) => ({
      type: 'bar', name: layer.name, z: 3, silent: true, barMaxWidth: 5 * this.theme.size, barGap: overlapped ? '-100%' : '10%', barCategoryGap: '32%',
      itemStyle: {color: this.styles.colour(layer), opacity: this.ink(layer.selection)},
      data: layer.heights.map((height) => (drawable(height, this.figure.y) ? height : '-')),
    }));
  }

  /** Marks of one name, shape and weight are one series; each keeps its own label and key. */
  points(layers) {
    const groups = new Map();
    for (const layer of layers) {
      const key = JSON.stringify([layer.name, layer.mark, layer.emphasis]);
      groups.set(key, [...(groups.get(key) ?? []), layer]);
    }
    const all = [...groups.values()].map((group) => this.marks(group));
    const chosen = layers.filter((layer) => isSelected(layer.selection, this.selection));
    return chosen.length === 0 ? all : [...all, this.ring(chosen)];
  }

  marks(group) {
    const {figure, theme} = this;
    const colour = this.styles.colour(group[0]);
    const base = symbolOf(group[0].mark, colour, theme);
    const data = group.flatMap((layer) => layer.x.map((x, i) => {
      const ink = this.ink(layer.selection);
      return {
        value: [this.place(x), layer.y[i]],
        itemStyle: {opacity: ink},
        label: layer.labels[i] ? {show: true, formatter: layer.labels[i], opacity: Math.max(ink, 0.5), ...this.labelPlace(x)} : {show: false},
      };
    }).filter((item) => drawable(item.value[1], figure.y)));
    return {
      type: 'scatter', name: group[0].name, z: 5, silent: true, clip: true, symbol: base.symbol, symbolSize: base.size,
      itemStyle: base.itemStyle, data,
      label: {color: theme.ink, fontSize: theme.small, fontFamily: theme.font,
        textBorderColor: theme.paper, textBorderWidth: 3},
      labelLayout: this.apart,
    };
  }

  /**
   * Moves a label off those laid out before it: a line up, to the left of its mark, both, two lines up; a label that no move frees is hidden.
   * Labels are laid out one after the other, again and again as the picture changes: one that comes a second time begins another round. Its own place
   * is told from its mark, for the frame that the library tells of a label is where the round before left it.
   */
  labelMover() {
    const {theme} = this;
    const taken = new Map();
    return ({seriesIndex, dataIndex, align, rect, labelRect: {width, height}}) => {
      const id = `${seriesIndex} ${dataIndex}`;
      if (taken.has(id)) {
        taken.clear();
      }
      const x = rect.x + ASIDE * theme.unit - (align === 'right' ? width : 0);
      const y = rect.y - ABOVE - height;
      const left = align === 'right' ? 0 : -(width + 2 * ASIDE * theme.unit);
      const line = -(height + 1);
      const free = ([dx, dy]) => [...taken.values()].every((other) => x + dx >= other.x + other.width || x + dx + width <= other.x
        || y + dy >= other.y + other.height || y + dy + height <= other.y);
      const [dx, dy] = [[0, 0], [0, line], [left, 0], [left, line], [0, 2 * line]].find(free) ?? [0, 0];
      taken.set(id, {x: x + dx, y: y + dy, width, height});
      return {dx, dy, hideOverlap: true};
    };
  }

  /** Above the mark, towards the side that has room. */
  labelPlace(x) {
    const of = this.figure.x.logarithmic ? Math.log10 : (value) => value;
    const share = this.category ? 0 : (of(x) - of(this.x.low)) / (of(this.x.high) - of(this.x.low));
    return {position: [ASIDE * this.theme.unit, -ABOVE], align: share > 0.82 ? 'right' : 'left', verticalAlign: 'bottom'};
  }

  /** A ring around what is selected. */
  ring(layers) {
    return {
      type: 'scatter', z: 7, silent: true, clip: true, symbol: 'circle', symbolSize: 22 * this.theme.unit,
      itemStyle: {color: 'transparent', borderColor: this.theme.accent, borderWidth: 2.2 * this.theme.unit},
      data: layers.flatMap((layer) => layer.x.map((x, i) => [this.place(x), layer.y[i]])),
    };
  }

  /** Straight lines across the whole plot, each with its name: above it, or inside at the right end. */
  rules(layers) {
    const {theme} = this;
    return {
      type: 'custom', z: 6, silent: true, clip: false, data: layers.map((_, i) => [i]), encode: {x: -1, y: -1},
      renderItem: (params, api) => {
        const rule = layers[api.value(0)];
        const {x, y, width, height} = params.coordSys;
        const [across, upwards] = api.coord(rule.vertical ? [this.time(rule.at), this.y.low] : [this.category ? 0 : this.time(this.x.low), rule.at]);
        if (rule.vertical ? across < x - 1 || across > x + width + 1 : upwards < y - 1 || upwards > y + height + 1) {
          return null;
        }
        const shape = rule.vertical ? {x1: across, x2: across, y1: y, y2: y + height} : {x1: x, x2: x + width, y1: upwards, y2: upwards};
        const align = across - x < 0.25 * width ? 'left' : across - x > 0.75 * width ? 'right' : 'center';
        const text = rule.vertical ? {x: across, y: y - 4, align, verticalAlign: 'bottom'}
          : {x: x + width - 5, y: upwards - 3, align: 'right', verticalAlign: 'bottom'};
        const children = [{type: 'line', silent: true, shape, style: {stroke: theme.quiet, lineWidth: 1.2, lineDash: [5, 4]}}];
        if (rule.name) {
          children.push({type: 'text', silent: true, style: {...text, text: rule.name, fill: theme.ink, font: `${theme.small}px ${theme.font}`,
            stroke: theme.paper, lineWidth: 3}});
        }
        return {type: 'group', silent: true, children};
      },
    };
  }
}
