package org.wintersill.run;

/** Name and version of the program, as it stands in its outputs. */
public final class RunVersion {
    private RunVersion() {
    }

    /** {@code Wintersill 0.1.0}; without number when the program does not run from its jar. */
    public static String program() {
        String version = RunVersion.class.getPackage().getImplementationVersion();
        return version == null ? "Wintersill" : "Wintersill " + version;
    }
}
