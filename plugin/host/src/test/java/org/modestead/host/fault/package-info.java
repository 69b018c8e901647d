/** Trust under fault: fuzzed inputs, killed processes, full disks, long lives. DEVELOPERS.md tells the figures and the commands. */
package org.modestead.host.fault;
