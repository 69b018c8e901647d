/** Holds what is shipped against the table of dependencies, the lists of licences and the lists of parts. */
package org.modestead.release;
