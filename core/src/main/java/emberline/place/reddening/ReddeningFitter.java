package emberline.place.reddening;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.CalibratedWitness;
import emberline.place.calibrated.Contribution;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.TreeMap;
import java.util.function.Consumer;
import java.util.function.DoubleFunction;

/**
 * Fits type and extinction together: the spectrum is freed of one extinction after the other,
 * measured anew, and each extinction is as probable as what was measured then is under the
 * calibration. Every extinction up to {@value #GREATEST_AV} mag is equally probable beforehand.
 *
 * <p>Taking out extinction stretches ratios of fluxes, and their scatter does not stretch with
 * them; the probability is therefore multiplied by the stretch of each ratio, which is that of its
 * noise.
 */
public final class ReddeningFitter {

    /** Greatest extinction in V that is tried (mag). */
    private static final double GREATEST_AV = 15;

    private static final double COARSE = 1;
    private static final double FINE = 0.1;

    /** Extinctions less probable than the best by more than this logarithm are not refined. */
    private static final double NEGLIGIBLE = 8;

    private final CalibratedWitness witness;

    /**
     * A fitter.
     *
     * @param witness what places the measurements
     */
    public ReddeningFitter(CalibratedWitness witness) {
        this.witness = witness;
    }

    /** One extinction that was tried. */
    private record Trial(double logProbability, TypePosterior posterior) {}

    /**
     * Fits an object.
     *
     * @param measuredAt what is measured once an extinction in V (mag) is taken out
     * @return the fit; empty where too little was measured to place the object
     */
    public Optional<ReddeningFit> fit(DoubleFunction<Measurements> measuredAt) {
        Measurements asSeen = measuredAt.apply(0);
        NavigableMap<Double, Trial> trials = new TreeMap<>();
        for (double av = 0; av <= GREATEST_AV; av += COARSE) {
            trial(av, asSeen, measuredAt).ifPresent(put(trials, av));
        }
        if (trials.isEmpty()) {
            return Optional.empty();
        }
        double best = best(trials);
        List<Double> refined = new ArrayList<>();
        for (Map.Entry<Double, Trial> entry : trials.entrySet()) {
            if (entry.getValue().logProbability > best - NEGLIGIBLE) {
                for (double step = -COARSE + FINE; step < COARSE; step += FINE) {
                    double av = Math.rint((entry.getKey() + step) / FINE) * FINE;
                    if (av >= 0 && av <= GREATEST_AV && !refined.contains(av)) {
                        refined.add(av);
                    }
                }
            }
        }
        NavigableMap<Double, Trial> fine = new TreeMap<>();
        for (double av : refined) {
            trial(av, asSeen, measuredAt).ifPresent(put(fine, av));
        }
        return Optional.of(summary(fine));
    }

    private static Consumer<Trial> put(NavigableMap<Double, Trial> trials, double av) {
        return trial -> trials.put(av, trial);
    }

    private static double best(NavigableMap<Double, Trial> trials) {
        return trials.values().stream().mapToDouble(Trial::logProbability).max().orElseThrow();
    }

    private Optional<Trial> trial(
            double av, Measurements asSeen, DoubleFunction<Measurements> measuredAt) {
        Measurements freed = measuredAt.apply(av);
        CalibratedType placed = witness.witness(freed);
        double stretch = 0;
        for (Contribution one : placed.contributions()) {
            Optional<Measured> before = asSeen.measured(one.feature());
            Optional<Measured> after = freed.measured(one.feature());
            if (before.isPresent() && after.isPresent() && before.get().oneSigma() > 0) {
                stretch += Math.log(after.get().oneSigma() / before.get().oneSigma());
            }
        }
        double logProbability = placed.logEvidence() + stretch;
        return placed.posterior().map(posterior -> new Trial(logProbability, posterior));
    }

    private static ReddeningFit summary(NavigableMap<Double, Trial> trials) {
        double best = best(trials);
        double total = 0;
        List<TypePosterior> posteriors = new ArrayList<>();
        List<Double> weights = new ArrayList<>();
        for (Trial trial : trials.values()) {
            double weight = Math.exp(trial.logProbability - best);
            total += weight;
            weights.add(weight);
            posteriors.add(trial.posterior);
        }
        List<Double> avs = new ArrayList<>(trials.keySet());
        return new ReddeningFit(
                quantile(avs, weights, 0.5 * total),
                quantile(avs, weights, 0.16 * total),
                quantile(avs, weights, 0.84 * total),
                quantile(avs, weights, 0.025 * total),
                quantile(avs, weights, 0.975 * total),
                TypePosterior.mixture(posteriors, weights));
    }

    /** The extinction below which a part of the weight lies, within cells around the trials. */
    private static double quantile(List<Double> avs, List<Double> weights, double part) {
        double below = 0;
        for (int i = 0; i < avs.size(); i++) {
            if (below + weights.get(i) >= part) {
                double within = (part - below) / weights.get(i) - 0.5;
                return Math.max(0, avs.get(i) + within * FINE);
            }
            below += weights.get(i);
        }
        return avs.get(avs.size() - 1);
    }
}
