/**
 * Finitely many functions of a state: kernel sections at samples or landmarks, occupation functions of run segments, explicit
 * dictionaries, the coordinates themselves.
 */
package org.modestead.engine.basis;
