import {api} from '../js/api.js';
import {rowKeys} from './keys.js';

/**
 * Where the rows of a table come from.
 * @typedef {{name: string, unit: string, cell: string, kind: string}} Column
 * @typedef {{rows: any[][], numbers: number[], keys: string[], found: number, total: number, whole: boolean}} Page
 * `whole` tells whether the table was read to its end; where it was not, it has more rows than are told of, and `count` waits for their number.
 * @typedef {{columns: Column[], total: number|null, selectable: boolean, searchable: boolean,
 *   count?: () => Promise<{found: number, total: number}>,
 *   page: (offset: number, limit: number, order: {sort: string, down: boolean, find: string}) => Promise<Page>}} Source
 */

/** Most rows in one answer of the server. */
export const PAGE = 200;

/** @returns {Source} rows that are here already */
export function inMemory(columns, rows, keys) {
  const orders = new Map();
  const ordered = (sort, down, find) => {
    const id = JSON.stringify([sort, down, find]);
    if (!orders.has(id)) {
      orders.clear();
      const wanted = find.toLowerCase();
      let index = rows.map((_, i) => i);
      if (wanted) {
        index = index.filter((i) => rows[i].some((cell) => String(cell ?? '').toLowerCase().includes(wanted)));
      }
      const column = columns.findIndex((one) => one.name === sort);
      if (column >= 0) {
        index.sort((a, b) => compare(rows[a][column], rows[b][column], down) || a - b);
      }
      orders.set(id, index);
    }
    return orders.get(id);
  };
  return {
    columns, total: rows.length, selectable: keys.some(Boolean), searchable: rows.length > 12,
    page: async (offset, limit, {sort, down, find}) => {
      const index = ordered(sort, down, find);
      const some = index.slice(offset, offset + limit);
      return {rows: some.map((i) => rows[i]), numbers: some.map((i) => i + 1), keys: some.map((i) => keys[i] ?? ''), found: index.length, total: rows.length, whole: true};
    },
  };
}

/** Missing cells come last in either order. */
function compare(a, b, down) {
  if (a === b) {
    return 0;
  }
  if (a === null || b === null) {
    return a === null ? 1 : -1;
  }
  const order = typeof a === 'number' && typeof b === 'number' ? a - b : String(a).localeCompare(String(b), 'en', {numeric: true});
  return down ? -order : order;
}

/** @returns {Source} rows that the server sends page by page, sorted and counted by it */
export function fromServer(address, table) {
  const keyOf = rowKeys(table.columns);
  return {
    columns: table.columns, total: table.rows, selectable: keyOf !== null, searchable: true,
    count: async () => api.get(`${address}?limit=0&whole=1`),
    page: async (offset, limit, {sort, down, find}) => {
      const query = new URLSearchParams({offset: String(offset), limit: String(limit)});
      if (sort) {
        query.set('sort', sort);
        query.set('order', down ? 'down' : 'up');
      }
      if (find) {
        query.set('find', find);
      }
      const answer = await api.get(`${address}?${query}`);
      return {rows: answer.rows, numbers: answer.numbers, keys: answer.rows.map((row) => (keyOf ? keyOf(row) : '')), found: answer.found, total: answer.total,
        whole: answer.whole};
    },
  };
}
