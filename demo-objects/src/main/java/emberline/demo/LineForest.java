package emberline.demo;

import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * The unresolved lines of a molecular band: a log-normal random texture of mean one that multiplies
 * the opacity. Bands are thousands of lines; their crowding and gaps are what a spectrum at a
 * resolving power of 2000 shows inside a band and one of 100 does not.
 */
final class LineForest {

    /** Standard deviation of the smoothing in grid points: structure down to R of about 2000. */
    private static final double SMOOTHING_POINTS = 2.0;

    private LineForest() {}

    /**
     * The texture of a band.
     *
     * @param component the name of the band, which seeds the texture
     * @param size number of points of the logarithmic grid
     * @param roughness standard deviation of the natural logarithm of the texture
     * @return factors of mean one
     */
    static double[] of(String component, int size, double roughness) {
        UniformRandomProvider random =
                RandomSource.XO_RO_SHI_RO_128_PP.create(Seeds.of("forest/" + component));
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double[] white = new double[size];
        for (int i = 0; i < size; i++) {
            white[i] = normal.sample();
        }
        double[] smooth = GaussianBlur.blur(white, SMOOTHING_POINTS);
        double scale = roughness / standardDeviation(smooth);
        for (int i = 0; i < size; i++) {
            smooth[i] = StrictMath.exp(scale * smooth[i] - roughness * roughness / 2);
        }
        return smooth;
    }

    private static double standardDeviation(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value * value;
        }
        return Math.sqrt(sum / values.length);
    }
}
