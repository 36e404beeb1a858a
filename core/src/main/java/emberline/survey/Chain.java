package emberline.survey;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.measure.line.LineReport;
import emberline.measure.line.LineReporter;
import emberline.place.Placement;
import emberline.place.Placer;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.TypePrior;
import emberline.place.reddening.ReddeningFit;
import emberline.prepare.Degrader;
import emberline.prepare.Degrader.Degraded;
import emberline.prepare.Degrading;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The whole chain for one object: read, prepare, measure, place, judge. An object that fails gets a
 * result that says why; no exception leaves the chain for bad data. Safe for use by several
 * threads.
 */
public final class Chain {

    private final SpectrumReader reader = new SpectrumReader();
    private final Preparer preparer = new Preparer();
    private final Measurer measurer;
    private final LineReporter lines;
    private final PlacerChoice placers;
    private final Degrader degrader = new Degrader();
    private final Degrading degrading;
    private final JudgingStep judging;
    private final Preparing defaults;
    private final long seed;
    private final boolean fitReddening;
    private final boolean toMeasuredRest;

    /**
     * A chain.
     *
     * @param catalogue what is measured and by what it is placed
     * @param measuring how it is measured
     * @param settings what holds for all objects
     */
    public Chain(FeatureCatalogue catalogue, Measuring measuring, SurveySettings settings) {
        this(catalogue, measuring, settings, settings.prior().load());
    }

    private Chain(
            FeatureCatalogue catalogue,
            Measuring measuring,
            SurveySettings settings,
            TypePrior prior) {
        this(
                catalogue,
                measuring,
                settings,
                PlacerChoice.always(new Placer(catalogue, Calibration.standard(), prior)),
                prior);
    }

    /**
     * A chain that chooses a placer for each object.
     *
     * @param catalogue what is measured
     * @param measuring how it is measured
     * @param settings what holds for all objects
     * @param placers by what each object is placed; made for the same catalogue
     */
    public Chain(
            FeatureCatalogue catalogue,
            Measuring measuring,
            SurveySettings settings,
            PlacerChoice placers) {
        this(catalogue, measuring, settings, placers, settings.prior().load());
    }

    private Chain(
            FeatureCatalogue catalogue,
            Measuring measuring,
            SurveySettings settings,
            PlacerChoice placers,
            TypePrior prior) {
        this.measurer = new Measurer(catalogue, measuring);
        this.lines = new LineReporter(catalogue, measuring.site());
        this.placers = placers;
        this.degrading = settings.degrading();
        this.judging = new JudgingStep(settings.judging(), prior);
        this.defaults = settings.preparing();
        this.seed = settings.seed();
        this.fitReddening = settings.fitReddening();
        this.toMeasuredRest = settings.toMeasuredRest();
    }

    /**
     * Takes one object through the chain.
     *
     * @param candidate the object
     * @param folder the folder to which the paths of its spectra are relative
     * @return the result, whatever happened; a fault of the product itself is a failed object too
     */
    public ObjectResult run(Candidate candidate, Path folder) {
        try {
            return attempt(candidate, folder);
        } catch (RuntimeException e) { // must not end a night's run
            return internalError(candidate, e);
        }
    }

    /**
     * The result of an object on which the product itself failed.
     *
     * @param candidate the object
     * @param fault what happened
     * @return a result with status {@link Status#FAILED}
     */
    static ObjectResult internalError(Candidate candidate, RuntimeException fault) {
        return failed(
                candidate,
                "internal error: " + fault + "; please report it with the spectrum, and go on");
    }

    private ObjectResult attempt(Candidate candidate, Path folder) {
        Map<String, Degraded> used = new LinkedHashMap<>();
        List<SpectrumResult> spectra = new ArrayList<>();
        List<String> troubles = new ArrayList<>();
        for (String path : candidate.spectra()) {
            try {
                Degraded degraded =
                        degrader.degrade(
                                reader.read(folder.resolve(path)),
                                stated(candidate),
                                degrading,
                                ObjectSeed.of(candidate.name() + "; " + path, seed));
                spectra.add(measure(path, degraded.observation(), degraded.stated()));
                used.put(path, degraded);
            } catch (UnreadableSpectrumException e) {
                troubles.add(e.getMessage());
            } catch (InvalidPathException e) {
                troubles.add("path '" + path + "' is not a file name: " + e.getReason());
            }
        }
        if (spectra.isEmpty()) {
            return failed(
                    candidate,
                    troubles.isEmpty() ? "no spectrum is listed" : String.join(" | ", troubles));
        }
        Optional<ReddeningFit> reddening =
                fitReddening
                        ? placers.placerFor(candidate).fitReddening(av -> measuredAt(av, used))
                        : Optional.empty();
        if (reddening.isPresent()) {
            spectra.clear();
            used.forEach((path, one) -> spectra.add(again(path, one, reddening.get().avMag())));
        }
        return placed(candidate, spectra, reddening, troubles);
    }

    private Measurements measuredAt(double avMag, Map<String, Degraded> used) {
        List<Measurements> all = new ArrayList<>();
        for (Degraded one : used.values()) {
            try {
                all.add(measurer.measure(preparer.prepare(one.observation(), freed(one, avMag))));
            } catch (UnreadableSpectrumException e) {
                throw new IllegalStateException("prepared before, but not now", e);
            }
        }
        return Measurements.best(all);
    }

    /** Measures a spectrum that was measured before, with another extinction taken out. */
    private SpectrumResult again(String path, Degraded one, double avMag) {
        try {
            return measure(path, one.observation(), freed(one, avMag));
        } catch (UnreadableSpectrumException e) {
            throw new IllegalStateException(path + ": prepared before, but not now", e);
        }
    }

    private static Preparing freed(Degraded one, double avMag) {
        return one.stated()
                .withExtinction(new Preparing.Extinction(avMag, ExtinctionLaw.DIFFUSE_RV));
    }

    /**
     * The result of an object that cannot be taken through the chain.
     *
     * @param candidate the object
     * @param reason why
     * @return a result with status {@link Status#FAILED}
     */
    public static ObjectResult failed(Candidate candidate, String reason) {
        return new ObjectResult(
                candidate,
                Status.FAILED,
                reason,
                List.of(),
                Optional.empty(),
                Optional.empty(),
                List.of());
    }

    private SpectrumResult measure(String path, Observation observation, Preparing stated)
            throws UnreadableSpectrumException {
        PreparedSpectrum prepared = preparer.prepare(observation, stated);
        Measurements measurements = measurer.measure(prepared);
        LineReport seen = lines.report(prepared, measurements);
        OptionalDouble velocity =
                stated.radialVelocityKms().isPresent()
                        ? OptionalDouble.empty()
                        : seen.velocity().significantKms();
        if (velocity.isPresent() && toMeasuredRest) {
            return measure(path, observation, stated.withRadialVelocityKms(velocity.getAsDouble()));
        }
        return new SpectrumResult(
                path,
                observation.format(),
                observation.sha256(),
                velocity.isPresent()
                        ? prepared.with(velocityLeftIn(velocity.getAsDouble()))
                        : prepared,
                measurements,
                seen);
    }

    private static Finding velocityLeftIn(double velocityKms) {
        return Finding.note(
                "velocity-left-in",
                String.format(
                        Locale.ROOT,
                        "the lines show a radial velocity of %.0f km/s, which was not taken out;"
                                + " it moves narrow windows by %.1f Angstrom at 1.25 micron",
                        velocityKms,
                        velocityKms / Preparer.SPEED_OF_LIGHT_KMS * 12_500));
    }

    private ObjectResult placed(
            Candidate candidate,
            List<SpectrumResult> spectra,
            Optional<ReddeningFit> reddening,
            List<String> troubles) {
        Measurements best =
                Measurements.best(spectra.stream().map(SpectrumResult::measurements).toList());
        Placement placement =
                placers.placerFor(candidate)
                        .place(best, reddening, ObjectSeed.of(candidate.name(), seed));
        List<Finding> findings = new ArrayList<>();
        spectra.forEach(spectrum -> findings.addAll(spectrum.prepared().findings()));
        for (String trouble : troubles) {
            findings.add(Finding.warning("spectrum-unreadable", trouble));
        }
        if (spectra.size() > 1) {
            findings.add(
                    Finding.note(
                            "several-spectra",
                            spectra.size()
                                    + " spectra were measured apart; of each feature the"
                                    + " measurement with the smallest error was placed"));
        }
        reddening.ifPresent(fit -> findings.add(fitted(fit)));
        findings.addAll(placement.findings());
        List<String> reasons = new ArrayList<>(troubles);
        if (placement.type().isEmpty()) {
            reasons.add(placement.typeReason());
        }
        return judging.judged(
                new ObjectResult(
                        candidate,
                        reasons.isEmpty() ? Status.MEASURED : Status.PARTIAL,
                        String.join(" | ", reasons),
                        spectra,
                        Optional.of(best),
                        Optional.of(placement),
                        findings));
    }

    private static Finding fitted(ReddeningFit fit) {
        return Finding.note(
                "reddening-fitted",
                String.format(
                        Locale.ROOT,
                        "extinction in V fitted together with the type: %.1f mag (68%%: %.1f to"
                                + " %.1f); %.1f mag was taken out before measuring",
                        fit.avMag(),
                        fit.lo68Mag(),
                        fit.hi68Mag(),
                        fit.avMag()));
    }

    /** What is stated about the spectra of a candidate: the list goes before the defaults. */
    private Preparing stated(Candidate candidate) {
        Preparing stated = defaults;
        Optional<Medium> medium = candidate.text("medium").flatMap(Medium::named);
        if (medium.isPresent()) {
            stated = stated.withMedium(medium.get());
        }
        if (candidate.number("resolution").isPresent()) {
            stated = stated.withResolvingPower(candidate.number("resolution").getAsDouble());
        }
        if (candidate.number("rv_kms").isPresent()) {
            stated = stated.withRadialVelocityKms(candidate.number("rv_kms").getAsDouble());
        }
        return stated;
    }
}
