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
import emberline.place.calibrated.SeveralSpectra;
import emberline.place.calibrated.TypePrior;
import emberline.place.photometric.PhotometricType;
import emberline.place.photometric.PhotometricWitness;
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
import emberline.read.CandidatePhotometry;
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
 * The whole chain for one object: read, prepare, measure, place, judge; for one without a spectrum
 * place and judge by its colours. An object that fails gets a result that says why; no exception
 * leaves the chain for bad data. Safe for use by several threads.
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
    private final PhotometricWitness colours;
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
        this.colours = new PhotometricWitness(prior);
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
                path -> reader.read(folder, path),
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
        List<Address> addresses = new ArrayList<>();
        for (String path : candidate.spectra()) {
            addresses.add(new Address(path, addresses.size()));
        }
        return run(candidate, addresses, spectra, new ArrayList<>());
    }

    private ObjectResult run(
            Candidate candidate, List<Address> addresses, Spectra spectra, List<String> troubles) {
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
            Candidate candidate, List<Address> addresses, Spectra from, List<String> troubles) {
        Map<String, Degraded> used = new LinkedHashMap<>();
        List<SpectrumResult> spectra = new ArrayList<>();
        List<Finding> twice = new ArrayList<>();
        if (candidate.spectra().isEmpty()) {
            return byColours(candidate);
        }
        for (Address address : addresses) {
            String path = address.path();
            try {
                Degraded degraded =
                        degrader.degrade(
                                times.timed(Stage.READ, () -> from.at(path)),
                                Statements.of(candidate.forSpectrum(address.place()), defaults),
                                degrading,
                                ObjectSeed.of(candidate.name() + "; " + path, seed));
                SpectrumResult result = measure(path, degraded.observation(), degraded.stated());
                Optional<SpectrumResult> same =
                        spectra.stream()
                                .filter(one -> one.sha256().equals(result.sha256()))
                                .findFirst();
                if (same.isPresent()) {
                    twice.add(countedOnce(path, same.get()));
                } else {
                    spectra.add(result);
                    used.put(path, degraded);
                }
            } catch (UnreadableSpectrumException e) {
                troubles.add(e.getMessage());
            } catch (InvalidPathException e) {
                troubles.add("path '" + path + "' is not a file name: " + e.getReason());
            }
        }
        if (spectra.isEmpty()) {
            return failed(candidate, String.join(" | ", troubles));
        }
        return placed(candidate, spectra, used, troubles, twice);
    }

    /** A placement with the spectra that it rests on and what is to be said of its extinction. */
    private record Placed(
            List<SpectrumResult> spectra,
            SeveralSpectra.Joined joined,
            Placement placement,
            Optional<Finding> reddening) {}

    /** Places an object as it is seen, or with the extinction taken out that was fitted. */
    private Placed place(
            Candidate candidate, List<SpectrumResult> spectra, Map<String, Degraded> used) {
        Placer placer = placers.placerFor(candidate);
        long draws = ObjectSeed.of(candidate.name(), seed);
        SeveralSpectra.Joined joined = joined(placer, spectra);
        Placement asSeen = placer.place(joined.measurements(), draws);
        Optional<String> call =
                switch (reddeningMode) {
                    case NEVER -> Optional.empty();
                    case CALLED_FOR -> ReddeningCall.reason(asSeen);
                    case ALWAYS -> Optional.of("");
                };
        Optional<ReddeningFit> fit =
                call.flatMap(
                        reason -> placer.fitReddening(avMag -> measuredAt(avMag, used, placer)));
        if (fit.isEmpty()) {
            return new Placed(spectra, joined, asSeen, Optional.empty());
        }
        List<SpectrumResult> freed = new ArrayList<>();
        used.forEach((path, one) -> freed.add(again(path, one, fit.get().avMag())));
        SeveralSpectra.Joined freedJoined = joined(placer, freed);
        Placement placement = placer.place(freedJoined.measurements(), fit, draws);
        if (reddeningMode == ReddeningMode.CALLED_FOR
                && !ReddeningCall.isBelieved(fit.get(), placement)) {
            Finding finding = notBelieved(call.orElseThrow(), fit.get());
            return new Placed(spectra, joined, asSeen, Optional.of(finding));
        }
        Finding finding = fitted(call.orElseThrow(), fit.get());
        return new Placed(freed, freedJoined, placement, Optional.of(finding));
    }

    private static SeveralSpectra.Joined joined(Placer placer, List<SpectrumResult> spectra) {
        return placer.join(spectra.stream().map(SpectrumResult::measurements).toList());
    }

    /** One spectrum listed twice would have its noise counted as if it were two. */
    private static Finding countedOnce(String path, SpectrumResult same) {
        return Finding.caution(
                "spectrum-twice",
                path
                        + " is the same file as "
                        + same.path()
                        + " byte for byte; it was counted once");
    }

    /** An object without a spectrum. */
    private ObjectResult byColours(Candidate candidate) {
        PhotometricType type = colours.witness(CandidatePhotometry.of(candidate));
        if (type.posterior().isEmpty()) {
            return failed(candidate, "no spectrum is listed, and " + type.reason());
        }
        List<Finding> findings = new ArrayList<>();
        findings.add(
                Finding.note(
                        "photometric-type",
                        "there is no spectrum; type and kind rest on the colours "
                                + String.join(", ", type.colours())
                                + " alone, and the intervals are those of colours"));
        findings.addAll(type.findings());
        return judging.judged(
                new ObjectResult(
                        candidate,
                        Status.PHOTOMETRIC,
                        type.reason().isEmpty()
                                ? "no spectrum: type from colours"
                                : "no spectrum, and no type from colours: " + type.reason(),
                        List.of(),
                        Optional.empty(),
                        Optional.of(Placement.byColours(type)),
                        findings));
    }

    /**
     * Where a spectrum of an object is.
     *
     * @param path path as listed, or one of those that a listed pattern stands for
     * @param place which of the listed ones it is, from 0
     */
    private record Address(String path, int place) {}

    /** The addresses of the spectra of an object, patterns expanded. */
    private List<Address> addresses(Candidate candidate, Path folder, List<String> troubles) {
        List<Address> addresses = new ArrayList<>();
        for (int place = 0; place < candidate.spectra().size(); place++) {
            try {
                for (String path : reader.expanded(folder, candidate.spectra().get(place))) {
                    addresses.add(new Address(path, place));
                }
            } catch (UnreadableSpectrumException e) {
                troubles.add(e.getMessage());
            }
        }
        return addresses;
    }

    private Measurements measuredAt(double avMag, Map<String, Degraded> used, Placer placer) {
        List<Measurements> all = new ArrayList<>();
        for (Degraded one : used.values()) {
            try {
                all.add(measurer.measure(preparer.prepare(one.observation(), freed(one, avMag))));
            } catch (UnreadableSpectrumException e) {
                throw new IllegalStateException("prepared before, but not now", e);
            }
        }
        return placer.join(all).measurements();
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
            List<String> troubles,
            List<Finding> twice) {
        Placed placed = times.timed(Stage.PLACE, () -> place(candidate, asSeen, used));
        List<SpectrumResult> spectra = placed.spectra();
        SeveralSpectra.Joined joined = placed.joined();
        Placement placement = withColours(candidate, placed.placement());
        List<SpectrumResult> apart = new ArrayList<>();
        for (int i = 0; i < spectra.size(); i++) {
            apart.add(spectra.get(i).withTypeAlone(joined.apart().get(i)));
        }
        List<Finding> findings = new ArrayList<>();
        spectra.forEach(spectrum -> findings.addAll(spectrum.prepared().findings()));
        findings.addAll(twice);
        for (String trouble : troubles) {
            findings.add(Finding.warning("spectrum-unreadable", trouble));
        }
        if (spectra.size() > 1) {
            findings.add(
                    Finding.note(
                            "several-spectra",
                            spectra.size()
                                    + " spectra were measured apart and placed together; what"
                                    + " several of them have entered as a mean weighted by noise"
                                    + " and calibration error"));
            findings.addAll(joined.findings());
        }
        placed.reddening().ifPresent(findings::add);
        findings.addAll(placement.findings());
        findings.addAll(unlikeColours(candidate, placement));
        List<String> reasons = new ArrayList<>(troubles);
        if (placement.type().isEmpty()) {
            reasons.add(placement.typeReason());
        }
        ObjectResult result =
                new ObjectResult(
                        candidate,
                        reasons.isEmpty() ? Status.MEASURED : Status.PARTIAL,
                        String.join(" | ", reasons),
                        apart,
                        Optional.of(joined.measurements()),
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

    /** The placement with what the colours say, where two magnitudes are listed at least. */
    private Placement withColours(Candidate candidate, Placement placement) {
        PhotometricType byColours = colours.witness(CandidatePhotometry.of(candidate));
        return byColours.posterior().isPresent() ? placement.with(byColours) : placement;
    }

    private List<Finding> unlikeColours(Candidate candidate, Placement placement) {
        if (placement.type().isEmpty() || placement.photometric().isEmpty()) {
            return List.of();
        }
        return colours.disagreement(
                        CandidatePhotometry.of(candidate),
                        placement.type().get(),
                        placement.reddening().map(ReddeningFit::avMag).orElse(0.0))
                .map(List::of)
                .orElse(List.of());
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
