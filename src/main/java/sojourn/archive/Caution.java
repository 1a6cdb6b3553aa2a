package sojourn.archive;

/** The caution that stands above every figure. */
public final class Caution {
    /** One paragraph. */
    public static final String TEXT =
            "Hypothetical performance: computed from past or invented prices, not traded. It leaves out what was not modelled and"
                    + " flatters rules chosen after the fact; past prices do not tell future ones. Not advice: local rules and"
                    + " licensed professionals decide.";

    private Caution() {}
}
