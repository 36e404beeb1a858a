package emberline.place.reddening;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.CellQuantiles;
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

    /** Distance of the extinctions whose probability is told (mag). */
    private static final double CELL = 0.1;

    private static final int LAST_CELL = (int) Math.round(GREATEST_AV / CELL);

    /** Least distance of the extinctions that are tried (mag). */
    private static final double STEP = 0.25;

    private static final int LAST_STEP = (int) Math.round(GREATEST_AV / STEP);

    /** Distance of those that are tried first, in steps; a power of two. */
    private static final int COARSE = 8;

    /** Extinctions less probable than the best by more than this logarithm are not refined. */
    private static final double NEGLIGIBLE = 8;

    /** Between neighbours whose logarithms differ by less than this a line is good enough. */
    private static final double SMOOTH = 0.5;

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
     * @param leastGain how much more probable extinction must make the measurements (natural
     *     logarithm); where the first trials show that none will, no more are made
     * @return the fit; empty where too little was measured to place the object, or where the gain
     *     is out of reach
     */
    public Optional<ReddeningFit> fit(DoubleFunction<Measurements> measuredAt, double leastGain) {
        Measurements asSeen = measuredAt.apply(0);
        NavigableMap<Integer, Trial> trials = new TreeMap<>();
        for (int step = 0; step <= LAST_STEP; step += COARSE) {
            trial(step, asSeen, measuredAt, trials);
        }
        trial(LAST_STEP, asSeen, measuredAt, trials);
        if (trials.isEmpty() || greatestGain(trials) < leastGain) {
            return Optional.empty();
        }
        for (int apart = COARSE; apart > 1; apart /= 2) {
            for (int middle : worthTrying(trials, apart)) {
                trial(middle, asSeen, measuredAt, trials);
            }
        }
        return Optional.of(summary(trials));
    }

    /**
     * The gain of the best trial, and what a better one between the first may add: a parabola rises
     * above its best place by at most an eighth of the second difference, twice that is allowed.
     */
    private static double greatestGain(NavigableMap<Integer, Trial> trials) {
        if (trials.get(0) == null) {
            return 0;
        }
        double most = 0;
        for (int step : trials.keySet()) {
            Trial before = trials.get(step - COARSE);
            Trial after = trials.get(step + COARSE);
            if (before != null && after != null) {
                double ends = before.logProbability + after.logProbability;
                most = Math.max(most, Math.abs(ends - 2 * trials.get(step).logProbability));
            }
        }
        return best(trials) + most / 4 - trials.get(0).logProbability;
    }

    /** The middles between neighbours, so far apart, where the probability has a shape to find. */
    private static List<Integer> worthTrying(NavigableMap<Integer, Trial> trials, int apart) {
        double best = best(trials);
        List<Integer> middles = new ArrayList<>();
        for (int step : trials.keySet()) {
            Trial here = trials.get(step);
            Trial next = trials.get(step + apart);
            if (next == null || trials.higherKey(step) != step + apart) {
                continue;
            }
            double higher = Math.max(here.logProbability, next.logProbability);
            double slope = Math.abs(here.logProbability - next.logProbability);
            if (higher > best - NEGLIGIBLE && (slope > SMOOTH || higher == best)) {
                middles.add(step + apart / 2);
            }
        }
        return middles;
    }

    private static double best(NavigableMap<Integer, Trial> trials) {
        return trials.values().stream().mapToDouble(Trial::logProbability).max().orElseThrow();
    }

    /** Tries an extinction, in steps; where nothing can be placed, adds nothing. */
    private void trial(
            int step,
            Measurements asSeen,
            DoubleFunction<Measurements> measuredAt,
            NavigableMap<Integer, Trial> trials) {
        Measurements freed = step == 0 ? asSeen : measuredAt.apply(step * STEP);
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
                .ifPresent(posterior -> trials.put(step, new Trial(logProbability, posterior)));
    }

    /**
     * Extinctions by cells; between trials the logarithm of the probability runs linearly, and the
     * type is as at the nearer one.
     */
    private static ReddeningFit summary(NavigableMap<Integer, Trial> trials) {
        double best = best(trials);
        List<Double> extinctions = new ArrayList<>();
        List<Double> weights = new ArrayList<>();
        Map<Integer, Double> ofTrial = new TreeMap<>();
        double sum = 0;
        for (int cell = 0; cell <= LAST_CELL; cell++) {
            double place = cell * CELL / STEP;
            Integer before = trials.floorKey((int) Math.floor(place + 1e-9));
            Integer after = trials.ceilingKey((int) Math.ceil(place - 1e-9));
            if (before == null || after == null || after - before > COARSE) {
                continue;
            }
            double part = after.equals(before) ? 0 : (place - before) / (after - before);
            double log =
                    (1 - part) * trials.get(before).logProbability
                            + part * trials.get(after).logProbability;
            double weight = Math.exp(log - best);
            extinctions.add(cell * CELL);
            weights.add(weight);
            ofTrial.merge(part < 0.5 ? before : after, weight, Double::sum);
            sum += weight;
        }
        CellQuantiles extinction = new CellQuantiles(array(extinctions), array(weights), CELL);
        Trial without = trials.get(0);
        double logGain =
                without == null
                        ? 0
                        : best + Math.log(sum / (LAST_CELL + 1)) - without.logProbability;
        return new ReddeningFit(
                positive(extinction.at(0.5)),
                positive(extinction.at(0.16)),
                positive(extinction.at(0.84)),
                positive(extinction.at(0.025)),
                positive(extinction.at(0.975)),
                logGain,
                TypePosterior.mixture(
                        ofTrial.keySet().stream().map(step -> trials.get(step).posterior).toList(),
                        List.copyOf(ofTrial.values())));
    }

    private static double[] array(List<Double> numbers) {
        return numbers.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** The first cell reaches below zero, no extinction does. */
    private static double positive(double avMag) {
        return Math.max(0, avMag);
    }
}
