/** A recording of one's own: the file that was brought, what is guessed of it, and the steps that are laid out for it. */
package org.modestead.host.bench.recording;
