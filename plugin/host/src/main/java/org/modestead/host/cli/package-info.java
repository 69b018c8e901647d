/** The command line: run, check and explain, for people and for scripts. */
package org.modestead.host.cli;
