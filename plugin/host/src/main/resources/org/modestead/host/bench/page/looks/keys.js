/** Selection keys: one text such as `mode:3` says what is selected on the whole page; '' says nothing is. */

/**
 * Whether a thing is part of what is selected.
 * @param {string} key of the thing, '' for none
 * @param {string} selection of the page
 */
export function isSelected(key, selection) {
  if (!key || !selection) {
    return false;
  }
  if (key === selection) {
    return true;
  }
  const [kind, name] = split(selection);
  const [own, pair] = split(key);
  return kind === 'mode' && own === 'pair' && pair.split('-')[0] === name;
}

function split(key) {
  const at = key.indexOf(':');
  return at < 0 ? [key, ''] : [key.slice(0, at), key.slice(at + 1)];
}

/** A key in words: "mode 3", "modes 1 and 2", "group machine". */
export function words(key) {
  const [kind, name] = split(key);
  return kind === 'pair' ? `modes ${name.replace('-', ' and ')}` : `${kind} ${name}`;
}

/** The number of a key of a mode, else null. */
export function modeOf(key) {
  const [kind, name] = split(key);
  return kind === 'mode' ? Number(name) : null;
}

/**
 * How rows of a table are selected: a function from a row to its key, or null when rows stand for nothing.
 * @param {{name: string}[]} columns
 */
export function rowKeys(columns) {
  const at = (name) => columns.findIndex((column) => column.name === name);
  const [first, second] = [at('mode_a'), at('mode_b')];
  if (first >= 0 && second >= 0) {
    return (row) => (row[first] > 0 && row[second] > 0 ? `pair:${row[first]}-${row[second]}` : '');
  }
  for (const kind of ['mode', 'line', 'kernel', 'group']) {
    const column = at(kind);
    if (column >= 0) {
      return (row) => (row[column] === null || row[column] === 0 ? '' : `${kind}:${row[column]}`);
    }
  }
  return null;
}
