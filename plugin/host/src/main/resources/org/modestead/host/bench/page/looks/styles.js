/**
 * Which colour, stroke and mark each layer of one picture gets. The rules are those of the pictures in the report: layers of one name
 * share a colour, a band takes that of the strong line it surrounds, and nothing is told by colour alone.
 */

const DASHES = [[], [9, 4], [3, 3], [12, 4, 3, 4], [6, 3], [2, 4]];
/** A curve of at most so many points shows them. */
const MARKED_UP_TO = 60;
const MARKS = ['DISC', 'SQUARE', 'RING', 'TRIANGLE', 'CROSS'];

/** @param {any} figure @param {ReturnType<import('./colours.js').colours>} theme */
export function layerStyles(figure, theme) {
  const key = (layer) => layer.name || layer.selection;
  const marked = (layer) => figure.kind === 'MARKS' && layer.type === 'points';
  const names = [...new Set(figure.layers.filter((layer) => !['rule', 'band', 'backdrop'].includes(layer.type) && !marked(layer)).map(key))];
  const strong = figure.layers.filter((layer) => layer.type === 'line' && layer.emphasis === 'STRONG');
  const overTime = figure.kind === 'TIME_SERIES' && strong.length > 0;
  const index = (layer) => Math.max(0, names.indexOf(key(layer)));
  const line = (number) => theme.lines[number % theme.lines.length];
  const strongColour = () => (overTime || strong.length === 0 ? line(0) : line(index(strong[0])));

  const colour = (layer) => {
    if (layer.type === 'band') {
      return strongColour();
    }
    if (layer.type === 'backdrop') {
      return theme['data-context'];
    }
    if (layer.type === 'rule') {
      return theme.quiet;
    }
    if (marked(layer)) {
      return {STRONG: theme.ink, NORMAL: theme.quiet, FAINT: theme['data-context']}[layer.emphasis];
    }
    if (layer.emphasis === 'FAINT') {
      return theme['data-context'];
    }
    if (overTime && layer.type === 'line') {
      return layer.emphasis === 'STRONG' ? strongColour() : theme['data-context'];
    }
    return line(index(layer));
  };
  const dashed = figure.kind === 'CURVES' || figure.kind === 'MARKS';
  return {
    colour,
    width: (layer) => theme.unit * (layer.emphasis === 'STRONG' ? (overTime ? 3.2 : 2.4) : layer.emphasis === 'NORMAL' ? (overTime ? 1.2 : 1.6) : 1.2),
    dash: (layer) => (dashed && layer.type === 'line' ? DASHES[index(layer) % DASHES.length].map((length) => length * theme.unit) : []),
    isMarked: (layer) => figure.kind === 'CURVES' && layer.type === 'line' && layer.x.length <= MARKED_UP_TO,
    curveMark: (layer) => MARKS[index(layer) % MARKS.length],
    overTime,
  };
}
