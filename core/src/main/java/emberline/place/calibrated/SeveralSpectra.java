package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.SpectraMerger;
import emberline.place.LowerFactor;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;

/**
 * Joins the measurements of several spectra of one object, so that it is placed once: the features
 * of all spectra enter one likelihood, with the scatter of objects and the correlation of their
 * residuals, which all spectra of the object share. A feature that several spectra have enters as
 * their mean ({@link SpectraMerger}). Says where the spectra contradict one another.
 */
public final class SeveralSpectra {

    /**
     * Calibration error of a feature on one spectrum in units of the scatter of its locus, in which
     * it is contained. The three public objects with independent spectra on different instruments
     * give 0.5, 1.4 and 1.4 (see {@code RepeatedFeaturesTest}), too few to say more.
     */
    static final double CALIBRATION_SHARE = 0.8;

    /** Spectra disagree where chance does so less often than this: 3.3 sigma, two-sided. */
    private static final double UNLIKELY = 1e-3;

    /** Repeated features beyond this number of sigma are named. */
    private static final double NAMED = 3.3;

    private final Calibration calibration;
    private final CalibratedWitness witness;

    /**
     * Joins by a calibration.
     *
     * @param calibration loci, scatter and correlations
     * @param witness the witness of that calibration
     */
    public SeveralSpectra(Calibration calibration, CalibratedWitness witness) {
        this.calibration = calibration;
        this.witness = witness;
    }

    /**
     * What came of joining.
     *
     * @param measurements the features of all spectra
     * @param apart the type by each spectrum alone, in their order; empty where too little of a
     *     spectrum was measured, and for the only spectrum of an object
     * @param findings where spectra contradict one another
     */
    public record Joined(
            Measurements measurements, List<Optional<TypeEstimate>> apart, List<Finding> findings) {

        /** Copies the lists. */
        public Joined {
            apart = List.copyOf(apart);
            findings = List.copyOf(findings);
        }
    }

    /**
     * Joins spectra.
     *
     * @param several measurements with one catalogue, at least one
     * @return the measurements to place; those of an only spectrum as they are
     */
    public Joined join(List<Measurements> several) {
        if (several.size() == 1) {
            return new Joined(several.get(0), List.of(Optional.empty()), List.of());
        }
        List<Optional<TypeEstimate>> apart = new ArrayList<>();
        double sum = 0;
        double weights = 0;
        for (Measurements one : several) {
            Optional<TypeEstimate> type =
                    witness.witness(one).posterior().map(TypePosterior::estimate);
            apart.add(type);
            if (type.isPresent()) {
                double weight = 1 / Math.pow(type.get().sigmaSubclass(), 2);
                sum += weight * type.get().typeNumber();
                weights += weight;
            }
        }
        if (weights == 0) {
            return new Joined(
                    new SpectraMerger(id -> OptionalDouble.empty()).merge(several),
                    apart,
                    List.of());
        }
        double near = sum / weights;
        Measurements merged = new SpectraMerger(id -> calibrationSigma(id, near)).merge(several);
        return new Joined(merged, apart, conflicts(several, apart, near));
    }

    private OptionalDouble calibrationSigma(String feature, double typeNumber) {
        return calibration
                .expected(feature, typeNumber, 0)
                .map(expected -> OptionalDouble.of(CALIBRATION_SHARE * expected.scatter()))
                .orElse(OptionalDouble.empty());
    }

    private List<Finding> conflicts(
            List<Measurements> several, List<Optional<TypeEstimate>> apart, double near) {
        List<Finding> findings = new ArrayList<>();
        int pairs = several.size() * (several.size() - 1) / 2;
        for (int a = 0; a < several.size(); a++) {
            for (int b = a + 1; b < several.size(); b++) {
                Repeats repeats = repeats(several.get(a), several.get(b), near);
                boolean differ = repeats.chance() * pairs < UNLIKELY;
                boolean typesApart = excluded(apart.get(a), apart.get(b));
                if (differ || typesApart) {
                    findings.add(
                            finding(a, b, apart, differ ? Optional.of(repeats) : Optional.empty()));
                }
            }
        }
        return findings;
    }

    /** Whether the 95% intervals of two types have nothing in common. */
    private static boolean excluded(Optional<TypeEstimate> one, Optional<TypeEstimate> two) {
        return one.isPresent()
                && two.isPresent()
                && (one.get().hi95() < two.get().lo95() || two.get().hi95() < one.get().lo95());
    }

    /**
     * The features that two spectra have in common.
     *
     * @param features their ids
     * @param chiSquare of their differences, with noise, calibration error and its correlation
     * @param far those that differ most, by more than 3.3 sigma each
     */
    record Repeats(List<String> features, double chiSquare, List<String> far) {

        /** Probability that chance makes such a difference. */
        double chance() {
            return features.isEmpty()
                    ? 1
                    : 1
                            - new ChiSquaredDistribution(null, features.size())
                                    .cumulativeProbability(chiSquare);
        }
    }

    /** Compares the features with a locus that two spectra have in common. */
    Repeats repeats(Measurements one, Measurements two, double typeNumber) {
        List<String> ids = new ArrayList<>();
        List<Integer> places = new ArrayList<>();
        List<Double> difference = new ArrayList<>();
        for (int i = 0; i < calibration.loci().size(); i++) {
            String id = calibration.loci().get(i).feature();
            Optional<Measured> first = one.measured(id);
            Optional<Measured> second = two.measured(id);
            if (first.isPresent() && second.isPresent()) {
                ids.add(id);
                places.add(i);
                difference.add(first.get().value() - second.get().value());
            }
        }
        double[][] ofOne = one.covariance(ids);
        double[][] ofTwo = two.covariance(ids);
        double[][] matrix = new double[ids.size()][ids.size()];
        double[] scatter =
                ids.stream()
                        .mapToDouble(id -> calibrationSigma(id, typeNumber).orElseThrow())
                        .toArray();
        List<String> far = new ArrayList<>();
        for (int f = 0; f < ids.size(); f++) {
            for (int g = 0; g < ids.size(); g++) {
                double shared =
                        2
                                * calibration.correlation(places.get(f), places.get(g))
                                * scatter[f]
                                * scatter[g];
                matrix[f][g] = ofOne[f][g] + ofTwo[f][g] + shared;
            }
            if (Math.abs(difference.get(f)) > NAMED * Math.sqrt(matrix[f][f])) {
                far.add(ids.get(f));
            }
        }
        double[] apart = difference.stream().mapToDouble(Double::doubleValue).toArray();
        return new Repeats(ids, LowerFactor.of(matrix).chiSquare(apart), far);
    }

    private static Finding finding(
            int a, int b, List<Optional<TypeEstimate>> apart, Optional<Repeats> repeats) {
        StringBuilder text = new StringBuilder();
        text.append("spectra ").append(a + 1).append(" and ").append(b + 1);
        text.append(" contradict each other: ");
        repeats.ifPresent(
                found -> {
                    text.append(
                            String.format(
                                    Locale.ROOT,
                                    "chi-square %.0f for the %d features that both have",
                                    found.chiSquare,
                                    found.features.size()));
                    if (!found.far.isEmpty()) {
                        text.append(", ")
                                .append(found.far.size())
                                .append(" of them beyond 3.3 sigma (such as ")
                                .append(found.far.get(0))
                                .append(")");
                    }
                    text.append("; ");
                });
        text.append("types apart ")
                .append(code(apart.get(a)))
                .append(" and ")
                .append(code(apart.get(b)))
                .append("; they were placed together: look at both, and leave the wrong one out");
        return Finding.caution("spectra-disagree", text.toString());
    }

    private static String code(Optional<TypeEstimate> type) {
        return type.map(t -> String.format(Locale.ROOT, "%s +- %.1f", t.code(), t.sigmaSubclass()))
                .orElse("none");
    }
}
