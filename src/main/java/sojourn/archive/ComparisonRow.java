package sojourn.archive;

import java.time.LocalDate;
import java.util.Optional;
import sojourn.measure.Measure;
import sojourn.measure.Measured;
import sojourn.measure.Scorecard;

/**
 * One line of a comparison: a variant, or a yardstick it is held against.
 *
 * @param variant the variant's name, or the yardstick's with the variants it belongs to
 * @param kind what the line stands for
 * @param timeline address of the timeline it rests on; empty for a variant that has none
 * @param parameters whether the regime model was fitted or declared, or its probabilities computed elsewhere
 * @param reason why a variant failed or a yardstick is undefined; empty otherwise
 * @param judged the window and the measures; empty where there is a reason
 */
public record ComparisonRow(
        String variant, Kind kind, String timeline, Parameters parameters, String reason, Optional<Judged> judged) {
    /** Where the parameters of the regime model come from. */
    public enum Parameters {
        /** Fitted inside each window. */
        FITTED("fitted"),
        /** Declared in the strategy file. */
        EXTERNAL_PRIOR("external-prior"),
        /** There are none: the probabilities were computed elsewhere. */
        COMPUTED_ELSEWHERE("computed-elsewhere");

        private final String word;

        Parameters(String word) {
            this.word = word;
        }

        /** The word in files. */
        public String word() {
            return word;
        }
    }

    /** What a line stands for. */
    public enum Kind {
        /** A strategy. */
        STRATEGY("strategy"),
        /** A yardstick that could have been traded. */
        YARDSTICK("yardstick"),
        /** A yardstick that is known only after the fact. */
        AFTER_THE_FACT("yardstick-after-the-fact");

        private final String word;

        Kind(String word) {
            this.word = word;
        }

        /** The word in files. */
        public String word() {
            return word;
        }
    }

    /**
     * What a line came to.
     *
     * @param from base date of the window
     * @param to last date
     * @param bars returns between the two
     * @param outcome {@code ran}, or {@code ruined}
     * @param scorecard every measure
     */
    public record Judged(LocalDate from, LocalDate to, int bars, String outcome, Scorecard scorecard) {
        /** What one measure came to. */
        public Measured get(Measure measure) {
            return scorecard.get(measure);
        }
    }

    /** {@code ran}, {@code ruined}, {@code failed}, or of a yardstick {@code undefined}. */
    public String outcome() {
        return judged.map(Judged::outcome).orElse(kind == Kind.STRATEGY ? "failed" : "undefined");
    }
}
