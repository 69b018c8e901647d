package org.modestead.host.cli;

import org.modestead.host.run.Versions;
import picocli.CommandLine.IVersionProvider;

/** Answers {@code --version}. */
final class ReleaseVersion implements IVersionProvider {
    @Override
    public String[] getVersion() {
        return new String[] {"Modestead " + Versions.modestead()};
    }
}
