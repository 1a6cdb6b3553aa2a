package sojourn.inference;

import org.apache.commons.math3.special.Beta;
import org.apache.commons.math3.special.Erf;
import org.apache.commons.math3.special.Gamma;
import sojourn.numeric.Check;

/**
 * Distribution functions that tests and pseudo-residuals read. The special functions come from commons-math3, which computes them in
 * plain double arithmetic with tables of its own ({@code FastMath}, nothing of {@code Math} whose bits may differ), so they have the same
 * bits on every machine.
 */
public final class Probability {
    private static final double ROOT_TWO = 1.4142135623730951;
    /** Beyond so many scales a Student-t distribution has nothing left that a double could hold, and squares would overflow. */
    private static final double FAR = 1e150;

    private Probability() {}

    /** P(Z &lt;= x), Z standard normal: erfc(-x / sqrt 2) / 2. */
    public static double normalBelow(double x) {
        return 0.5 * Erf.erfc(-x / ROOT_TWO);
    }

    /** P(T &lt;= t), Student's t with {@code dof} &gt; 0 degrees of freedom: I(dof / (dof + t^2); dof / 2, 1 / 2) / 2 on the left. */
    public static double studentBelow(double t, double dof) {
        Check.above(dof, 0, "degrees of freedom");
        double tail = studentTail(StrictMath.abs(t), dof);
        return t < 0 ? tail : 1 - tail;
    }

    /** P(|T| &gt;= |t|), Student's t with {@code dof} &gt; 0 degrees of freedom. */
    public static double studentBeyond(double t, double dof) {
        Check.above(dof, 0, "degrees of freedom");
        return 2 * studentTail(StrictMath.abs(t), dof);
    }

    /** P(X &gt;= x), chi-squared with {@code dof} degrees of freedom; 1 for x &lt;= 0. */
    public static double chiSquareAbove(double x, int dof) {
        Check.within(dof, 1, Integer.MAX_VALUE, "degrees of freedom");
        return x <= 0 ? 1 : Gamma.regularizedGammaQ(0.5 * dof, 0.5 * x);
    }

    private static double studentTail(double t, double dof) {
        if (!(t < FAR)) {
            return 0;
        }
        return 0.5 * Beta.regularizedBeta(dof / (dof + t * t), 0.5 * dof, 0.5);
    }
}
