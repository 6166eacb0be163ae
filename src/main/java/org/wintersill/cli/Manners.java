package org.wintersill.cli;

import picocli.CommandLine.Option;

/** Flags that every command has. */
final class Manners {

    @Option(names = {"-q", "--quiet"}, description = "Say nothing but problems; show no progress.")
    boolean quiet;

    @Option(names = {"-v", "--verbose"}, description = "Say more about what is found and done.")
    boolean verbose;

    @Option(names = "--strict", description = "Exit with 3 if there was anything to note, even though all went well.")
    boolean strict;

    @Option(names = "--debug", description = "Show technical causes of problems.")
    boolean debug;

    @Option(names = {"-h", "--help"}, usageHelp = true, description = "Show this help and stop.")
    boolean help;

    Console.Level level() {
        if (quiet) {
            return Console.Level.QUIET;
        }
        return verbose ? Console.Level.VERBOSE : Console.Level.NORMAL;
    }

    /** A command that has these flags. */
    interface Kept {
        Manners manners();
    }
}
