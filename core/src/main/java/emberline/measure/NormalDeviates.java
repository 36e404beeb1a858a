package emberline.measure;

import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * A sequence of independent normal deviates with mean 0 and standard deviation 1.
 *
 * <p>By the ziggurat of Marsaglia and Tsang (2000, J. Stat. Softw. 5, 8) with 256 strips, strip and
 * place taken from different bits (Doornik 2005). The bits are those of a Weyl sequence, mixed by
 * the finaliser of SplitMix64 (Steele, Lea and Flood 2014, OOPSLA); 32 bits make a deviate, so that
 * neighbouring values are at most 4.4e-7 apart. A few numbers to hold and no call inside the loop
 * make this several times faster than a sampler of single values, and drawing is most of the cost
 * of an interval.
 *
 * <p>Not safe for use by several threads.
 */
final class NormalDeviates {

    private static final int STRIPS = 256;

    /** Where the tail begins, for {@value #STRIPS} strips of equal area. */
    private static final double TAIL = 3.654152885361009;

    /** Places in a strip on either side of zero: 23 bits and a sign. */
    private static final int PLACES = 1 << 23;

    /** Width of a place in each strip. */
    private static final double[] STEP = new double[STRIPS];

    /** How far out each strip lies under the curve over its whole height. */
    private static final double[] INNER = new double[STRIPS];

    /** The curve exp(-x^2 / 2) at the outer edge of each strip, and 1 after the last. */
    private static final double[] CURVE = new double[STRIPS + 1];

    private static final long WEYL = 0x9E3779B97F4A7C15L;
    private static final double UNIT = 0x1p-53;

    private long state;
    private long rareState;

    static {
        double area =
                TAIL * curve(TAIL)
                        + NormalDistribution.of(0, 1).survivalProbability(TAIL)
                                * Math.sqrt(2 * Math.PI);
        double[] edge = new double[STRIPS + 1];
        edge[0] = area / curve(TAIL);
        edge[1] = TAIL;
        for (int strip = 2; strip < STRIPS; strip++) {
            edge[strip] = Math.sqrt(-2 * Math.log(area / edge[strip - 1] + curve(edge[strip - 1])));
        }
        for (int strip = 0; strip < STRIPS; strip++) {
            STEP[strip] = edge[strip] / PLACES;
            INNER[strip] = edge[strip + 1];
        }
        for (int strip = 0; strip <= STRIPS; strip++) {
            CURVE[strip] = curve(edge[strip]);
        }
    }

    /**
     * A sequence.
     *
     * @param seed start of the random numbers
     * @param stream which of the sequences of the seed; they are independent of each other
     */
    NormalDeviates(long seed, int stream) {
        state = mixed(mixed(seed) + stream * WEYL);
        rareState = mixed(~state);
    }

    private static double curve(double x) {
        return Math.exp(-x * x / 2);
    }

    private static long mixed(long bits) {
        long z = (bits ^ (bits >>> 30)) * 0xBF58476D1CE4E5B9L;
        z = (z ^ (z >>> 27)) * 0x94D049BB133111EBL;
        return z ^ (z >>> 31);
    }

    /**
     * Writes the next deviates. The sequence does not depend on how it is cut, as long as all cuts
     * but the last are even.
     *
     * @param out where they are written, from the first element on
     * @param count how many
     */
    void fill(double[] out, int count) {
        long weyl = state;
        int even = count & ~1;
        for (int n = 0; n < even; n += 2) {
            weyl += WEYL;
            long bits = mixed(weyl);
            out[n] = deviate((int) bits);
            out[n + 1] = deviate((int) (bits >>> 32));
        }
        if (even < count) {
            weyl += WEYL;
            out[even] = deviate((int) mixed(weyl));
        }
        state = weyl;
    }

    private double deviate(int bits) {
        int strip = bits & (STRIPS - 1);
        double x = (bits >> 8) * STEP[strip];
        return Math.abs(x) < INNER[strip] ? x : atTheEdge(strip, x);
    }

    /** What becomes of one deviate in a hundred: it lies at the edge of its strip. */
    private double atTheEdge(int firstStrip, double firstX) {
        int strip = firstStrip;
        double x = firstX;
        while (true) {
            if (Math.abs(x) < INNER[strip]) {
                return x;
            }
            if (strip == 0) {
                return Math.copySign(beyondTail(), x);
            }
            double height = CURVE[strip] + uniform() * (CURVE[strip + 1] - CURVE[strip]);
            if (height < curve(x)) {
                return x;
            }
            int bits = (int) rareBits();
            strip = bits & (STRIPS - 1);
            x = (bits >> 8) * STEP[strip];
        }
    }

    /** A deviate from the tail, by the method of Marsaglia (1964). */
    private double beyondTail() {
        while (true) {
            double beyond = -Math.log(uniform()) / TAIL;
            if (-2 * Math.log(uniform()) > beyond * beyond) {
                return TAIL + beyond;
            }
        }
    }

    /** Above 0, up to 1. */
    private double uniform() {
        return ((rareBits() >>> 11) + 1) * UNIT;
    }

    private long rareBits() {
        rareState += WEYL;
        return mixed(rareState);
    }
}
