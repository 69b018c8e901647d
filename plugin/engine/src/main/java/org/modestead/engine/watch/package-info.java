/** A stored spectrum held against new recordings, window by window: tracked modes, control limits, alarms. */
package org.modestead.engine.watch;
