package emberline.place.reddening;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.CellQuantiles;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.CalibratedWitness;
import emberline.place.calibrated.Contribution;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.TreeMap;
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

    /** Distance of the extinctions that are tried at last (mag). */
    private static final double FINE = 0.1;

    private static final int GREATEST_TENTHS = (int) Math.round(GREATEST_AV / FINE);

    /** Distance of those that are tried first, in tenths of a magnitude. */
    private static final int COARSE_TENTHS = 10;

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
        NavigableMap<Integer, Trial> trials = new TreeMap<>();
        for (int tenths = 0; tenths <= GREATEST_TENTHS; tenths += COARSE_TENTHS) {
            trial(tenths, asSeen, measuredAt, trials);
        }
        if (trials.isEmpty()) {
            return Optional.empty();
        }
        double least = best(trials) - NEGLIGIBLE;
        NavigableMap<Integer, Trial> fine = new TreeMap<>();
        for (Map.Entry<Integer, Trial> coarse : trials.entrySet()) {
            if (coarse.getValue().logProbability > least) {
                fine.put(coarse.getKey(), coarse.getValue());
            }
        }
        for (int centre : List.copyOf(fine.keySet())) {
            int from = Math.max(0, centre - COARSE_TENTHS + 1);
            int to = Math.min(GREATEST_TENTHS, centre + COARSE_TENTHS - 1);
            for (int tenths = from; tenths <= to; tenths++) {
                if (!fine.containsKey(tenths)) {
                    trial(tenths, asSeen, measuredAt, fine);
                }
            }
        }
        return Optional.of(summary(fine, Optional.ofNullable(trials.get(0))));
    }

    private static double best(NavigableMap<Integer, Trial> trials) {
        return trials.values().stream().mapToDouble(Trial::logProbability).max().orElseThrow();
    }

    /** Tries an extinction, in tenths of a magnitude; where nothing can be placed, adds nothing. */
    private void trial(
            int tenths,
            Measurements asSeen,
            DoubleFunction<Measurements> measuredAt,
            NavigableMap<Integer, Trial> trials) {
        Measurements freed = tenths == 0 ? asSeen : measuredAt.apply(tenths * FINE);
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
        placed.posterior()
                .ifPresent(posterior -> trials.put(tenths, new Trial(logProbability, posterior)));
    }

    private static ReddeningFit summary(
            NavigableMap<Integer, Trial> trials, Optional<Trial> without) {
        double best = best(trials);
        List<TypePosterior> posteriors = trials.values().stream().map(Trial::posterior).toList();
        List<Double> weights =
                trials.values().stream()
                        .map(trial -> Math.exp(trial.logProbability - best))
                        .toList();
        CellQuantiles extinction =
                new CellQuantiles(
                        trials.keySet().stream().mapToDouble(tenths -> tenths * FINE).toArray(),
                        weights.stream().mapToDouble(Double::doubleValue).toArray(),
                        FINE);
        double mean =
                weights.stream().mapToDouble(Double::doubleValue).sum() / (GREATEST_TENTHS + 1);
        double logGain =
                without.map(trial -> best + Math.log(mean) - trial.logProbability()).orElse(0.0);
        return new ReddeningFit(
                positive(extinction.at(0.5)),
                positive(extinction.at(0.16)),
                positive(extinction.at(0.84)),
                positive(extinction.at(0.025)),
                positive(extinction.at(0.975)),
                logGain,
                TypePosterior.mixture(posteriors, weights));
    }

    /** The first cell reaches below zero, no extinction does. */
    private static double positive(double avMag) {
        return Math.max(0, avMag);
    }
}
