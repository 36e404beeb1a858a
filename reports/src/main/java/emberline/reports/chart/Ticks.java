package emberline.reports.chart;

import emberline.reports.chart.Axis.Tick;
import emberline.spectrum.SpectralType;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;

/** Round values for the ticks of an axis. */
final class Ticks {

    private static final double[] ROUND = {1, 2, 2.5, 5, 10};
    private static final double EARLIEST = -9;
    private static final double LATEST = 39;

    private Ticks() {}

    /** About so many round values between two ends, labelled. */
    static List<Tick> round(double low, double high, int about) {
        double step = roundStep((high - low) / Math.max(1, about));
        List<Tick> ticks = new ArrayList<>();
        for (long k = (long) Math.ceil(low / step - 1e-9); k * step <= high + 1e-9 * step; k++) {
            BigDecimal value = BigDecimal.valueOf(k).multiply(BigDecimal.valueOf(step));
            ticks.add(new Tick(value.doubleValue(), plain(value, step)));
        }
        return ticks;
    }

    private static String plain(BigDecimal value, double step) {
        int decimals = Math.max(0, BigDecimal.valueOf(step).stripTrailingZeros().scale());
        return value.setScale(decimals, java.math.RoundingMode.HALF_EVEN)
                .toPlainString()
                .replace('-', '\u2212');
    }

    private static double roundStep(double rough) {
        double decade = Math.pow(10, Math.floor(Math.log10(rough)));
        for (double factor : ROUND) {
            if (factor * decade >= rough * 0.999) {
                return BigDecimal.valueOf(factor * decade)
                        .round(new java.math.MathContext(3))
                        .doubleValue();
            }
        }
        return 10 * decade;
    }

    /** Spectral types between two ends: a code every few subclasses. */
    static List<Tick> types(double low, double high, int about) {
        double rough = (high - low) / Math.max(1, about);
        int step = rough <= 1 ? 1 : rough <= 2 ? 2 : rough <= 5 ? 5 : 10;
        List<Tick> ticks = new ArrayList<>();
        for (int type = (int) Math.ceil(low); type <= high; type++) {
            boolean named = Math.floorMod(type, step) == 0 && type >= EARLIEST && type <= LATEST;
            ticks.add(new Tick(type, named ? new SpectralType(type).code() : ""));
        }
        return ticks;
    }
}
