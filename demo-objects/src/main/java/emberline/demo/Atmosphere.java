package emberline.demo;

import java.util.List;

/** The transmission of the atmosphere over the invented site, read from {@code telluric.csv}. */
final class Atmosphere {

    /** Share of the width of a region over which its edges are soft. */
    private static final double SOFT = 0.2;

    private final List<DemoTable.Row> regions = DemoTable.named("telluric.csv").rows();

    /**
     * The transmission at a wavelength.
     *
     * @param micron wavelength (micron, vacuum)
     * @return share of the light that comes through, above 0 to 1
     */
    double transmission(double micron) {
        double depth = 0;
        for (DemoTable.Row region : regions) {
            double low = region.number("low_micron");
            double high = region.number("high_micron");
            double soft = SOFT * (high - low);
            double opacity = -StrictMath.log(region.number("transmission"));
            depth +=
                    opacity * OpacityShape.TRAPEZOID.at(micron, low - soft, low, high, high + soft);
        }
        return StrictMath.exp(-depth);
    }
}
