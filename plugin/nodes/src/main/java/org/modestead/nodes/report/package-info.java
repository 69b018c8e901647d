/** The Mode Report node, the report of a whole run, and the page writer. */
package org.modestead.nodes.report;
