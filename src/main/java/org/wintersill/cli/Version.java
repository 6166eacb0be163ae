package org.wintersill.cli;

/** The version in the manifest of the jar. */
final class Version {
    private Version() {
    }

    /** Such as {@code 0.1.0}; {@code development} when the program does not run from its jar. */
    static String text() {
        String version = Version.class.getPackage().getImplementationVersion();
        return version == null ? "development" : version;
    }
}
