package org.modestead.nodes.contract;

import java.nio.file.Path;
import org.modestead.engine.Progress;

/**
 * What a host gives a running node.
 *
 * @param progress where to report and whom to ask about stopping
 * @param baseFolder folder against which file settings are resolved (that of the workflow file)
 * @param outputFolder folder for files that the node itself writes; files there appear whole or not at all
 */
public record RunContext(Progress progress, Path baseFolder, Path outputFolder) {}
