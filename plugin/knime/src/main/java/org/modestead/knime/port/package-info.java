/** What travels between the nodes besides tables, as port objects of the platform, kept in the open model-file format. */
package org.modestead.knime.port;
