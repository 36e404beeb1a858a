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
import emberline.place.reddening.ReddeningCall;
import emberline.place.reddening.ReddeningFit;
import emberline.place.standard.StandardComparison;
import emberline.place.standard.StandardVerdict;
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
import emberline.survey.StageTimes.Stage;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;

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
    private final ReddeningMode reddeningMode;
    private final Optional<StandardComparison> standards;
    private final boolean toMeasuredRest;
    private final StageTimes times = new StageTimes();

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
        this.reddeningMode = settings.reddening();
        this.standards = settings.standards();
        this.toMeasuredRest = settings.toMeasuredRest();
    }

    /**
     * Where the time of this chain went so far.
     *
     * @return times that go on counting
     */
    public StageTimes times() {
        return times;
    }

    /**
     * Takes one object through the chain.
     *
     * @param candidate the object
     * @param folder the folder to which the paths of its spectra are relative
     * @return the result, whatever happened; a fault of the product itself is a failed object too
     */
    public ObjectResult run(Candidate candidate, Path folder) {
        List<String> troubles = new ArrayList<>();
        return run(
                candidate,
                addresses(candidate, folder, troubles),
                address -> reader.read(folder, address),
                troubles);
    }

    /** Gives the spectra of an object by their addresses. */
    @FunctionalInterface
    public interface Spectra {

        /**
         * A spectrum.
         *
         * @param address one of those that the object lists
         * @return the spectrum as read
         * @throws UnreadableSpectrumException if there is none; its message says what to do
         */
        Observation at(String address) throws UnreadableSpectrumException;
    }

    /**
     * Takes one object through the chain whose spectra come from elsewhere than files, such as a
     * table in memory.
     *
     * @param candidate the object
     * @param spectra gives its spectra
     * @return the result, whatever happened
     */
    public ObjectResult run(Candidate candidate, Spectra spectra) {
        return run(candidate, candidate.spectra(), spectra, new ArrayList<>());
    }

    private ObjectResult run(
            Candidate candidate, List<String> addresses, Spectra spectra, List<String> troubles) {
        try {
            return attempt(candidate, addresses, spectra, troubles);
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

    private ObjectResult attempt(
            Candidate candidate, List<String> addresses, Spectra from, List<String> troubles) {
        Map<String, Degraded> used = new LinkedHashMap<>();
        List<SpectrumResult> spectra = new ArrayList<>();
        for (String path : addresses) {
            try {
                Degraded degraded =
                        degrader.degrade(
                                times.timed(Stage.READ, () -> from.at(path)),
                                Statements.of(candidate, defaults),
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
        return placed(candidate, spectra, used, troubles);
    }

    /** A placement with the spectra that it rests on and what is to be said of its extinction. */
    private record Placed(
            List<SpectrumResult> spectra, Placement placement, Optional<Finding> reddening) {

        Measurements best() {
            return Measurements.best(spectra.stream().map(SpectrumResult::measurements).toList());
        }
    }

    /** Places an object as it is seen, or with the extinction taken out that was fitted. */
    private Placed place(
            Candidate candidate, List<SpectrumResult> spectra, Map<String, Degraded> used) {
        Placer placer = placers.placerFor(candidate);
        long draws = ObjectSeed.of(candidate.name(), seed);
        Measurements best =
                Measurements.best(spectra.stream().map(SpectrumResult::measurements).toList());
        Placement asSeen = placer.place(best, draws);
        Optional<String> call =
                switch (reddeningMode) {
                    case NEVER -> Optional.empty();
                    case CALLED_FOR -> ReddeningCall.reason(asSeen);
                    case ALWAYS -> Optional.of("");
                };
        Optional<ReddeningFit> fit =
                call.flatMap(reason -> placer.fitReddening(avMag -> measuredAt(avMag, used)));
        if (fit.isEmpty()) {
            return new Placed(spectra, asSeen, Optional.empty());
        }
        List<SpectrumResult> freedSpectra = new ArrayList<>();
        used.forEach((path, one) -> freedSpectra.add(again(path, one, fit.get().avMag())));
        Placed freed = new Placed(freedSpectra, asSeen, Optional.empty());
        Placement placement = placer.place(freed.best(), fit, draws);
        if (reddeningMode == ReddeningMode.CALLED_FOR
                && !ReddeningCall.isBelieved(fit.get(), placement)) {
            return new Placed(
                    spectra, asSeen, Optional.of(notBelieved(call.orElseThrow(), fit.get())));
        }
        return new Placed(
                freedSpectra, placement, Optional.of(fitted(call.orElseThrow(), fit.get())));
    }

    /** The addresses of the spectra of an object, patterns expanded. */
    private List<String> addresses(Candidate candidate, Path folder, List<String> troubles) {
        List<String> addresses = new ArrayList<>();
        for (String listed : candidate.spectra()) {
            try {
                addresses.addAll(reader.expanded(folder, listed));
            } catch (UnreadableSpectrumException e) {
                troubles.add(e.getMessage());
            }
        }
        return addresses;
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
        PreparedSpectrum prepared =
                times.timed(Stage.PREPARE, () -> preparer.prepare(observation, stated));
        Measurements measurements = times.timed(Stage.MEASURE, () -> measurer.measure(prepared));
        LineReport seen = times.timed(Stage.MEASURE, () -> lines.report(prepared, measurements));
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
            List<SpectrumResult> asSeen,
            Map<String, Degraded> used,
            List<String> troubles) {
        Placed placed = times.timed(Stage.PLACE, () -> place(candidate, asSeen, used));
        List<SpectrumResult> spectra = placed.spectra();
        Placement placement = placed.placement();
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
        placed.reddening().ifPresent(findings::add);
        findings.addAll(placement.findings());
        List<String> reasons = new ArrayList<>(troubles);
        if (placement.type().isEmpty()) {
            reasons.add(placement.typeReason());
        }
        ObjectResult result =
                new ObjectResult(
                        candidate,
                        reasons.isEmpty() ? Status.MEASURED : Status.PARTIAL,
                        String.join(" | ", reasons),
                        spectra,
                        Optional.of(placed.best()),
                        Optional.of(placement),
                        findings);
        return times.timed(
                Stage.JUDGE,
                () ->
                        judging.judged(
                                standards
                                        .map(
                                                comparison ->
                                                        result.withStandards(
                                                                compared(comparison, result)))
                                        .orElse(result)));
    }

    /** Compares an object with the standards, of which itself is none. */
    private static StandardVerdict compared(StandardComparison comparison, ObjectResult result) {
        String group = ObjectGroup.of(result.candidate());
        Set<String> own =
                result.spectra().stream().map(SpectrumResult::sha256).collect(Collectors.toSet());
        return comparison.compare(
                result.spectra().stream().map(SpectrumResult::prepared).toList(),
                standard -> standard.group().equals(group) || own.contains(standard.sha256()));
    }

    private static Finding fitted(String reason, ReddeningFit fit) {
        return Finding.note(
                "reddening-fitted",
                String.format(
                        Locale.ROOT,
                        "%sextinction in V fitted together with the type: %.1f mag (68%%: %.1f to"
                                + " %.1f); %.1f mag was taken out before measuring",
                        reason.isEmpty() ? "" : reason + ": ",
                        fit.avMag(),
                        fit.lo68Mag(),
                        fit.hi68Mag(),
                        fit.avMag()));
    }

    private static Finding notBelieved(String reason, ReddeningFit fit) {
        return Finding.note(
                "reddening-not-believed",
                String.format(
                        Locale.ROOT,
                        "%s, so extinction was fitted; the best for a late dwarf is %.1f mag in V,"
                                + " which does not make it one surely enough: nothing was taken out"
                                + " (--fit-reddening takes it out)",
                        reason,
                        fit.avMag()));
    }
}
