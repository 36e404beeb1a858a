package emberline.measure;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Part;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Measures every feature of a catalogue on a prepared spectrum. Safe for use by several threads;
 * window operators are kept by wavelength grid, so that the spectra of one instrument share one.
 */
public final class Measurer {

    private final FeatureCatalogue catalogue;
    private final Measuring settings;
    private final TelluricCheck tellurics;
    private final Map<String, Double> telluricShares = new HashMap<>();
    private final GridCache grids = new GridCache();

    /**
     * A measurer.
     *
     * @param catalogue what is measured
     * @param settings how
     */
    public Measurer(FeatureCatalogue catalogue, Measuring settings) {
        this.catalogue = catalogue;
        this.settings = settings;
        this.tellurics = new TelluricCheck(catalogue, catalogue.telluricRegions(), settings.site());
        for (Feature feature : catalogue.features()) {
            telluricShares.put(feature.id(), tellurics.share(feature));
        }
    }

    /**
     * The catalogue that is measured.
     *
     * @return the catalogue
     */
    public FeatureCatalogue catalogue() {
        return catalogue;
    }

    /**
     * Measures a spectrum.
     *
     * @param prepared the spectrum, in vacuum and at rest
     * @return every feature of the catalogue: its value, or the reason why there is none
     */
    public Measurements measure(PreparedSpectrum prepared) {
        Plan plan = grids.of(prepared.spectrum(), prepared.resolvingPower(), () -> plan(prepared));
        MeasuredSpectrum measured = new MeasuredSpectrum(plan.book(), plan.operator(), prepared);
        List<FeatureMeasurement> results = new ArrayList<>(plan.steps().size());
        for (Step step : plan.steps()) {
            results.add(step.refused().orElseGet(() -> measure(step, measured)));
        }
        return Measurements.of(measured, results);
    }

    /** What can be prepared for a wavelength grid, before any flux is looked at. */
    record Plan(FormulaBook book, WindowOperator operator, List<Step> steps) {}

    /**
     * One feature on one wavelength grid.
     *
     * @param formula how it is computed; empty where it does not apply
     * @param refused what came of it, where the grid alone decides
     */
    private record Step(
            Feature feature,
            Optional<Formula> formula,
            double coverage,
            double telluricShare,
            OptionalDouble smoothing,
            Optional<FeatureMeasurement> refused) {}

    private Plan plan(PreparedSpectrum prepared) {
        Spectrum spectrum = prepared.spectrum();
        Applicability applicability = new Applicability(spectrum, prepared.resolvingPower());
        Map<String, NotMeasured> refusals = new LinkedHashMap<>();
        List<Feature> applicable = new ArrayList<>();
        for (Feature feature : catalogue.features()) {
            Optional<NotMeasured> refusal =
                    applicability.refusal(feature).or(() -> tellurics.refusal(feature));
            if (refusal.isPresent()) {
                refusals.put(feature.id(), refusal.get());
            } else {
                applicable.add(feature);
            }
        }
        FormulaBook book = FormulaBook.of(catalogue, applicable, applicability::smoothing);
        WindowOperator operator =
                WindowOperator.of(spectrum, prepared.resolvingPower().value(), book.functionals());
        List<Step> steps = new ArrayList<>();
        for (Feature feature : catalogue.features()) {
            Optional<NotMeasured> refusal = Optional.ofNullable(refusals.get(feature.id()));
            steps.add(step(feature, book, operator, refusal, applicability));
        }
        return new Plan(book, operator, List.copyOf(steps));
    }

    private Step step(
            Feature feature,
            FormulaBook book,
            WindowOperator operator,
            Optional<NotMeasured> refusal,
            Applicability applicability) {
        Optional<Formula> formula =
                refusal.isPresent() ? Optional.empty() : book.formula(feature.id());
        double coverage = formula.map(f -> operator.coverage(f.rows())).orElse(0.0);
        Optional<NotMeasured> why =
                refusal.or(
                        () ->
                                formula.isEmpty()
                                        ? Optional.of(missingPart(feature, book))
                                        : uncovered(
                                                coverage,
                                                operator.lineCoverage(formula.get().rows())));
        double telluric = telluricShares.get(feature.id());
        OptionalDouble smoothing = applicability.smoothing(feature);
        return new Step(
                feature,
                formula,
                coverage,
                telluric,
                smoothing,
                why.map(w -> new FeatureMeasurement(feature, w, coverage, 0, telluric, smoothing)));
    }

    private FeatureMeasurement measure(Step step, MeasuredSpectrum measured) {
        Formula formula = step.formula().orElseThrow();
        double signal = continuumSignal(formula, measured);
        Measurement result = evaluate(formula, signal, measured);
        return new FeatureMeasurement(
                step.feature(),
                result,
                step.coverage(),
                result instanceof Measured ? signal : 0,
                step.telluricShare(),
                step.smoothing());
    }

    /**
     * Least signal-to-noise of the continua of a formula and of what else it divides by; NaN where
     * a continuum is not positive.
     */
    private static double continuumSignal(Formula formula, MeasuredSpectrum measured) {
        double least = Double.POSITIVE_INFINITY;
        for (Formula.Continuum continuum : formula.continua()) {
            double level = measured.continuum(continuum);
            double signal = level / measured.continuumSigma(continuum);
            least = level > 0 ? Math.min(least, signal) : Double.NaN;
        }
        for (Formula divisor : formula.divisors()) {
            least = Math.min(least, divisorSignal(divisor, measured));
        }
        return least;
    }

    private static double divisorSignal(Formula divisor, MeasuredSpectrum measured) {
        double signal = Math.abs(measured.value(divisor)) / measured.sigma(divisor);
        // a part that has no value gives the feature none either, whatever it divides by
        return Double.isNaN(signal) ? Double.POSITIVE_INFINITY : signal;
    }

    private static NotMeasured missingPart(Feature feature, FormulaBook book) {
        String part =
                feature.parts().stream()
                        .map(Part::feature)
                        .filter(id -> book.formula(id).isEmpty())
                        .findFirst()
                        .orElse("");
        return new NotMeasured(Why.PART_MISSING, "its part " + part + " does not apply");
    }

    private Optional<NotMeasured> uncovered(double coverage, double lineCoverage) {
        if (coverage < settings.minCoverage()) {
            return Optional.of(
                    refuse(
                            Why.NOT_COVERED,
                            "good pixels cover %.0f%% of a window; %.0f%% are needed",
                            100 * coverage,
                            100 * settings.minCoverage()));
        }
        if (lineCoverage < Measuring.LEAST_LINE_COVERAGE) {
            return Optional.of(
                    refuse(
                            Why.NOT_COVERED,
                            "good pixels cover %.1f%% of the window of the line; an equivalent"
                                    + " width needs %.0f%%",
                            100 * lineCoverage,
                            100 * Measuring.LEAST_LINE_COVERAGE));
        }
        return Optional.empty();
    }

    private Measurement evaluate(Formula formula, double signal, MeasuredSpectrum measured) {
        if (Double.isNaN(signal)) {
            return refuse(Why.NEGATIVE_CONTINUUM, "a continuum is zero or negative");
        }
        for (Formula divisor : formula.divisors()) {
            if (divisorSignal(divisor, measured) < settings.leastContinuumSignal()) {
                return refuse(
                        Why.TOO_NOISY,
                        "it divides by %.3g +- %.2g, which must be %.1f times its error from zero",
                        measured.value(divisor),
                        measured.sigma(divisor),
                        settings.leastContinuumSignal());
            }
        }
        if (signal < settings.leastContinuumSignal()) {
            return refuse(
                    Why.TOO_NOISY,
                    "the continuum has a signal-to-noise of %.1f; %.1f is needed",
                    signal,
                    settings.leastContinuumSignal());
        }
        double value = measured.value(formula);
        double sigma = measured.sigma(formula);
        if (!Double.isFinite(value) || !Double.isFinite(sigma)) {
            return refuse(Why.OUTSIDE_VALID_RANGE, "the definition has no value for these fluxes");
        }
        if (!(sigma > 0)) {
            return refuse(
                    Why.NOISE_UNKNOWN, "the error of every pixel in its windows is given as zero");
        }
        return new Measured(value, sigma);
    }

    private static NotMeasured refuse(Why why, String format, Object... figures) {
        return new NotMeasured(why, String.format(Locale.ROOT, format, figures));
    }
}
