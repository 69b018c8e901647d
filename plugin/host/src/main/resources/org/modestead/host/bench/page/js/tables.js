/** Files that can be read as tables, known by how their names end. */

export const TABLES = ['csv', 'tsv', 'txt', 'parquet', 'json', 'ndjson'];

/** @param {string} name @returns {boolean} whether such a file can be read as a table */
export function isTable(name) {
  return TABLES.some((end) => name.toLowerCase().endsWith('.' + end));
}
