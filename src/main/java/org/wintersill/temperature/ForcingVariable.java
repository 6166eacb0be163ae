package org.wintersill.temperature;

/** The daily quantities that a run can be driven by. */
public enum ForcingVariable {
    MINIMUM("minimum"), MAXIMUM("maximum"), MEAN("mean");

    private final String word;

    ForcingVariable(String word) {
        this.word = word;
    }

    /** Key of the run file and word of the CF cell method. */
    public String word() {
        return word;
    }
}
