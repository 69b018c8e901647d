/** What lies on the bench: the workflow as a document that is edited, undone, kept on disk at once. */
package org.modestead.host.bench.desk;
