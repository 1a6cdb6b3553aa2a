package sojourn.compare;

/** Told how far a run has come. Methods may be called from any thread. */
public interface Progress {
    /** A stage of so many steps begins. */
    void begin(String stage, long steps);

    /** So many further steps are done. */
    void advance(long steps);

    /** The stage is over. */
    void end();

    /** Says nothing. */
    static Progress silent() {
        return new Progress() {
            @Override
            public void begin(String stage, long steps) {}

            @Override
            public void advance(long steps) {}

            @Override
            public void end() {}
        };
    }
}
