package org.modestead.host.cli;

import java.io.PrintStream;

/**
 * Where the command line speaks.
 *
 * @param out results
 * @param err problems and progress
 * @param live whether a person watches: one line may be overwritten to show progress
 */
public record Terminal(PrintStream out, PrintStream err, boolean live) {}
