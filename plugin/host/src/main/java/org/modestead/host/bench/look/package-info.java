/** What the bench's page shows of results, as JSON: pictures, matrices, verdicts, reports. Knows no HTTP. */
package org.modestead.host.bench.look;
