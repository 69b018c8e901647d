package org.modestead.engine.operator;

/**
 * The rank chosen and why.
 *
 * @param rank r
 * @param reason in words, with the figures
 */
record RankChoice(int rank, String reason) {}
