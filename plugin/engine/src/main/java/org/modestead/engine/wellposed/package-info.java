/**
 * Decides whether modes exist. The {@link org.modestead.engine.wellposed.Ladder} looks at nested ranks, each
 * {@link org.modestead.engine.wellposed.Check} puts one question to the evidence and answers with a figure and a sentence, and the
 * {@link org.modestead.engine.wellposed.Verdict} says for every mode what may be reported and which checks decided.
 */
package org.modestead.engine.wellposed;
