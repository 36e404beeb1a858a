package emberline.judge;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import java.util.EnumMap;
import java.util.Map;

/** A posterior of the type with normal errors and a gravity class apart from it. */
final class NormalType {

    private static final double STEP = 0.1;
    private static final double TAIL = 4;

    private NormalType() {}

    /**
     * The posterior.
     *
     * @param typeNumber mean type
     * @param sigmaSubclass one-sigma error (subclass), positive
     * @param share probability of each class, whatever the type
     */
    static TypePosterior posterior(
            double typeNumber, double sigmaSubclass, Map<GravityClass, Double> share) {
        if (!(sigmaSubclass > 0)) {
            throw new IllegalArgumentException(
                    "error of the type " + sigmaSubclass + ": expected a positive number");
        }
        double sigma = Math.max(sigmaSubclass, STEP / 2);
        int half = (int) Math.ceil(TAIL * sigma / STEP);
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[2 * half + 1];
            for (int i = 0; i < ofClass.length; i++) {
                double off = (i - half) * STEP / sigma;
                ofClass[i] = share.getOrDefault(gravity, 0.0) * Math.exp(-off * off / 2);
            }
            weights.put(gravity, ofClass);
        }
        return TypePosterior.of(typeNumber - half * STEP, STEP, weights);
    }
}
