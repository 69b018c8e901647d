package org.modestead.nodes.table;

/**
 * Name and type of one column.
 *
 * @param name unique in its table
 * @param type what the cells are
 */
public record Column(String name, CellType type) {}
