package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;

/** Reads the reason out of a measure that must be undefined. */
final class Undefinedness {
    private Undefinedness() {}

    static Measured.Reason reason(Measured measured) {
        assertThat(measured).isInstanceOf(Measured.Undefined.class);
        Measured.Undefined none = (Measured.Undefined) measured;
        assertThat(none.because()).isNotBlank();
        return none.reason();
    }
}
