package emberline.place.standard;

import java.util.Collection;
import java.util.EnumSet;
import java.util.Set;

/** A spectrum in the bins of a grid; a bin that is not covered has no number. */
final class Binned {

    /** Share of the bins of a range that must be covered. */
    private static final double LEAST_COVERAGE = 0.8;

    private final CommonGrid grid;
    private final double[] flux;
    private final double[] sigma;

    Binned(CommonGrid grid, double[] flux, double[] sigma) {
        this.grid = grid;
        this.flux = flux;
        this.sigma = sigma;
    }

    CommonGrid grid() {
        return grid;
    }

    /** The mean flux in a bin; NaN where it is not covered. */
    double flux(int bin) {
        return flux[bin];
    }

    /** The one-sigma error of the flux in a bin; NaN where it is not covered. */
    double sigma(int bin) {
        return sigma[bin];
    }

    /** The ranges that are covered well enough to compare in. */
    Set<Range> covered() {
        Set<Range> covered = EnumSet.noneOf(Range.class);
        for (Range range : Range.values()) {
            int good = good(range);
            if (good >= LEAST_COVERAGE * (grid.to(range) - grid.from(range))) {
                covered.add(range);
            }
        }
        return covered;
    }

    /** The number of covered bins in some ranges. */
    int good(Collection<Range> ranges) {
        return ranges.stream().mapToInt(this::good).sum();
    }

    private int good(Range range) {
        int good = 0;
        for (int bin = grid.from(range); bin < grid.to(range); bin++) {
            good += Double.isNaN(flux[bin]) ? 0 : 1;
        }
        return good;
    }

    /** The mean flux over the covered bins of a range; NaN where there are none. */
    double mean(Range range) {
        double sum = 0;
        int count = 0;
        for (int bin = grid.from(range); bin < grid.to(range); bin++) {
            if (!Double.isNaN(flux[bin])) {
                sum += flux[bin];
                count++;
            }
        }
        return sum / count;
    }
}
