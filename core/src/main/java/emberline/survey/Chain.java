package emberline.survey;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.place.Placer;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.SeveralSpectra;
import emberline.place.calibrated.TypePrior;
import emberline.place.standard.StandardComparison;
import emberline.place.standard.StandardVerdict;
import emberline.prepare.Degrader;
import emberline.prepare.Degrader.Degraded;
import emberline.prepare.Degrading;
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
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * The whole chain for one object: read, prepare, measure, place, judge; for one without a spectrum
 * place and judge by its colours. An object that fails gets a result that says why; no exception
 * leaves the chain for bad data. Safe for use by several threads.
 */
public final class Chain {

    private final SpectrumReader reader = new SpectrumReader();
    private final MeasuringStep measuring;
    private final PlacingStep placing;
    private final ColourStep colours;
    private final JudgingStep judging;
    private final Degrader degrader = new Degrader();
    private final Degrading degrading;
    private final Preparing defaults;
    private final long seed;
    private final Optional<StandardComparison> standards;
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
        this.measuring = new MeasuringStep(catalogue, measuring, settings.toMeasuredRest(), times);
        this.placing =
                new PlacingStep(this.measuring, placers, settings.reddening(), settings.seed());
        this.degrading = settings.degrading();
        this.judging = new JudgingStep(settings.judging(), prior);
        this.colours = new ColourStep(prior);
        this.defaults = settings.preparing();
        this.seed = settings.seed();
        this.standards = settings.standards();
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

    private ObjectResult attempt(
            Candidate candidate, List<Address> addresses, Spectra from, List<String> troubles) {
        Map<String, Degraded> used = new LinkedHashMap<>();
        List<SpectrumResult> spectra = new ArrayList<>();
        List<Finding> twice = new ArrayList<>();
        if (candidate.spectra().isEmpty()) {
            return judging.judged(colours.byColours(candidate));
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
                SpectrumResult result =
                        measuring.measure(path, degraded.observation(), degraded.stated());
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

    /** One spectrum listed twice would have its noise counted as if it were two. */
    private static Finding countedOnce(String path, SpectrumResult same) {
        return Finding.caution(
                "spectrum-twice",
                path
                        + " is the same file as "
                        + same.path()
                        + " byte for byte; it was counted once");
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

    private ObjectResult placed(
            Candidate candidate,
            List<SpectrumResult> asSeen,
            Map<String, Degraded> used,
            List<String> troubles,
            List<Finding> twice) {
        PlacingStep.Placed placed =
                times.timed(Stage.PLACE, () -> placing.place(candidate, asSeen, used));
        List<SpectrumResult> spectra = placed.spectra();
        SeveralSpectra.Joined joined = placed.joined();
        Placement placement = colours.withColours(candidate, placed.placement());
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
        findings.addAll(colours.unlikeColours(candidate, placement));
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
}
