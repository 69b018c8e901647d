/** Files that a run leaves behind: each appears whole or not at all. */
package org.modestead.host.output;
