/** Answers that are kept as long as they are asked for. */
package org.modestead.host.recent;
