package sojourn.world;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * How an asset trades through the day; an asset without it has a close only.
 *
 * @param overnightShare share of a bar's variance that comes between the last close and the open, from 0 to below 1
 * @param typicalVolume units traded on an ordinary day of the first state
 * @param volumeElasticity by how many percent volume rises when the bar's volatility rises by 1 percent
 */
public record Trading(double overnightShare, double typicalVolume, double volumeElasticity) {
    private static final double LARGEST_SHARE = 0.99;
    private static final double LARGEST_VOLUME = 1e12;
    private static final double LARGEST_ELASTICITY = 3;

    private static final Field<Double> OVERNIGHT = Field.required(
            "overnight-share",
            Shapes.number().atLeast(0).atMost(LARGEST_SHARE),
            "share of a bar's variance between the last close and the open, a fraction");
    private static final Field<Double> VOLUME = Field.required(
            "typical-volume",
            Shapes.number().atLeast(1).atMost(LARGEST_VOLUME),
            "units traded on an ordinary day of the first state");
    private static final Field<Double> ELASTICITY = Field.defaulted(
            "volume-elasticity",
            Shapes.number().atLeast(0).atMost(LARGEST_ELASTICITY),
            "0.7",
            "percent by which volume rises when volatility rises by 1 percent");

    /** Reads {@code {overnight-share: 0.2, typical-volume: 400000, volume-elasticity: 0.7}}. */
    public static final Shape<Trading> SHAPE = Shapes.object(
            "trading",
            f -> new Trading(f.get(OVERNIGHT), f.get(VOLUME), f.get(ELASTICITY)),
            OVERNIGHT,
            VOLUME,
            ELASTICITY);

    /** Checks the bounds. */
    public Trading {
        Check.within(overnightShare, 0, LARGEST_SHARE, "overnightShare");
        Check.within(typicalVolume, 1, LARGEST_VOLUME, "typicalVolume");
        Check.within(volumeElasticity, 0, LARGEST_ELASTICITY, "volumeElasticity");
    }
}
