/**
 * Tables from and to files through DuckDB: read row by row, never whole; queried with SQL; written whole or not at all.
 */
package org.modestead.host.table;
