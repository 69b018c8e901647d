/** From tables to snapshots. */
package org.modestead.nodes.prepare;
