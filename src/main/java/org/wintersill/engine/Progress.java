package org.wintersill.engine;

/** Told how far the work is. Calls may come from several threads. */
public interface Progress {

    /**
     * A part of the work begins.
     *
     * @param phase a few words
     * @param total size of the part in any unit
     */
    void begin(String phase, long total);

    /** So much more of the part is done. */
    void advance(long n);

    /** The part is done. */
    void end();

    /** Shows nothing. */
    static Progress silent() {
        return new Progress() {
            @Override
            public void begin(String phase, long total) {
                // silent
            }

            @Override
            public void advance(long n) {
                // silent
            }

            @Override
            public void end() {
                // silent
            }
        };
    }
}
