/** Which folders of the machine the bench may look into. */
package org.modestead.host.bench.folders;
