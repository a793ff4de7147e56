package org.hingeline;

import picocli.CommandLine.IVersionProvider;

/** The version of the jar this runs from. */
final class Version implements IVersionProvider {
    @Override
    public String[] getVersion() {
        String version = Version.class.getPackage().getImplementationVersion();
        return new String[] {"Hingeline " + (version == null ? "(not packaged)" : version)};
    }
}
