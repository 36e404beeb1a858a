package emberline.judge;

import emberline.measure.line.LineMeasurement;
import emberline.measure.line.LineMeasurement.Detection;
import emberline.measure.line.LineReport;
import emberline.place.Activity;
import emberline.place.ActivityLevel;
import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.TypePrior;
import emberline.place.photometric.PhotometricType;
import emberline.read.CandidatePhotometry;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The evidence that the row of a list, a placement and the lines of the spectra hold.
 *
 * <p>Of the list are read {@code ra_deg, dec_deg, parallax_mas, parallax_mas_err, pmra_masyr,
 * pmdec_masyr, rv_kms}, the magnitudes {@code j_mag, h_mag, k_mag, w1_mag, w2_mag} with {@code
 * _err}, {@code mag_system} (2MASS or MKO), {@code age} as {@link AgeStatement#parse} reads it, and
 * {@code lithium} (yes or no).
 *
 * @param evidence all that can be used
 * @param findings what was assumed or could not be used
 */
public record GatheredEvidence(Evidence evidence, List<Finding> findings) {

    private static final String LITHIUM = "Li";
    private static final String STRONG_HALPHA = "halpha-above-saturation";

    /** Copies the list. */
    public GatheredEvidence {
        findings = List.copyOf(findings);
    }

    /**
     * Gathers the evidence of an object.
     *
     * <p>Type and gravity come from the posterior of the calibrated witness where there is one,
     * else the type from the adopted one with normal errors, else, without a spectrum, from the
     * posterior of the colours. Where the gravity class rests on the published scores, their
     * probabilities take the place of those of the posterior.
     *
     * @param candidate the row of the list
     * @param placement type and gravity
     * @param lines the lines of its spectra
     * @param prior what was thought of type and gravity before, in the posterior of the placement
     * @return the evidence, or empty where there is no type
     */
    public static Optional<GatheredEvidence> of(
            Candidate candidate, Placement placement, List<LineReport> lines, TypePrior prior) {
        return placement
                .type()
                .map(type -> of(candidate, placement, lines, gravity(placement, type, prior)));
    }

    /** A posterior and the prior of the classes in it; no prior where the class says nothing. */
    private record TypeAndGravity(TypePosterior posterior, Map<GravityClass, Double> prior) {}

    /** The posterior of the colours where nothing else gives the type. */
    private static Optional<TypePosterior> byColoursAlone(Placement placement) {
        return placement.published().type().isPresent()
                ? Optional.empty()
                : placement.photometric().flatMap(PhotometricType::posterior);
    }

    private static TypeAndGravity gravity(Placement placement, TypeEstimate type, TypePrior prior) {
        GravityVerdict verdict = placement.gravity();
        Optional<TypePosterior> posterior =
                placement.calibrated().posterior().or(() -> byColoursAlone(placement));
        if (posterior.isPresent() && isOf(verdict, posterior.get())) {
            return new TypeAndGravity(posterior.get(), prior.classShares(type.typeNumber()));
        }
        Map<GravityClass, Double> share = new EnumMap<>(GravityClass.class);
        Map<GravityClass, Double> flat = new EnumMap<>(GravityClass.class);
        double third = 1.0 / GravityOrder.COUNT;
        for (GravityClass gravity : GravityClass.values()) {
            share.put(gravity, verdict.probability(gravity).orElse(third));
            flat.put(gravity, third);
        }
        TypePosterior apart =
                posterior
                        .map(joint -> withShares(joint, share))
                        .orElseGet(
                                () ->
                                        NormalType.posterior(
                                                type.typeNumber(), type.sigmaSubclass(), share));
        return new TypeAndGravity(apart, verdict.gravityClass().isPresent() ? flat : Map.of());
    }

    /** Whether the probabilities of a verdict are those of a posterior. */
    private static boolean isOf(GravityVerdict verdict, TypePosterior posterior) {
        for (GravityClass gravity : GravityClass.values()) {
            OptionalDouble p = verdict.probability(gravity);
            if (p.isEmpty() || p.getAsDouble() != posterior.probability(gravity)) {
                return false;
            }
        }
        return true;
    }

    /** The types of a posterior with other shares of the classes, the same at every type. */
    private static TypePosterior withShares(TypePosterior joint, Map<GravityClass, Double> share) {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[joint.size()];
            for (int i = 0; i < ofClass.length; i++) {
                ofClass[i] = joint.probability(i) * share.get(gravity);
            }
            weights.put(gravity, ofClass);
        }
        return TypePosterior.of(joint.typeNumber(0), joint.stepSubclass(), weights);
    }

    private static GatheredEvidence of(
            Candidate candidate,
            Placement placement,
            List<LineReport> lines,
            TypeAndGravity placed) {
        JudgeNumbers numbers = JudgeNumbers.standard();
        List<Finding> findings = new ArrayList<>();
        Evidence evidence =
                new Evidence(
                        placed.posterior(),
                        placed.prior(),
                        lithium(candidate, lines, numbers, findings),
                        halpha(placement, numbers),
                        photometry(candidate, placement, findings),
                        astrometry(candidate, findings),
                        age(candidate, findings),
                        placement.metallicity().pSubdwarf(),
                        placement.pair().pPair());
        return new GatheredEvidence(evidence, findings);
    }

    private static LithiumTest lithium(
            Candidate candidate,
            List<LineReport> lines,
            JudgeNumbers numbers,
            List<Finding> findings) {
        Optional<String> stated = candidate.text("lithium");
        if (stated.isPresent()) {
            if (stated.get().equalsIgnoreCase("yes")) {
                return LithiumTest.seen();
            }
            if (stated.get().equalsIgnoreCase("no")) {
                return LithiumTest.notSeen(0);
            }
            findings.add(unusable("lithium", stated.get(), "yes or no"));
        }
        LithiumTest best = LithiumTest.unknown();
        for (LineReport report : lines) {
            for (LineMeasurement line : report.lines()) {
                if (!line.feature().species().equals(LITHIUM)) {
                    continue;
                }
                if (line.detection() == Detection.ABSORPTION) {
                    return new LithiumTest(LithiumTest.Outcome.SEEN, 0, true);
                }
                if (line.detection() == Detection.NOT_SEEN) {
                    double limit =
                            line.limit3SigmaAngstrom().orElseThrow()
                                    + numbers.of("lithium-band-bias");
                    boolean deeper =
                            best.outcome() == LithiumTest.Outcome.UNKNOWN
                                    || limit < best.limitAngstrom();
                    best =
                            deeper
                                    ? new LithiumTest(LithiumTest.Outcome.NOT_SEEN, limit, true)
                                    : best;
                }
            }
        }
        return best;
    }

    private static Halpha halpha(Placement placement, JudgeNumbers numbers) {
        Activity activity = placement.activity();
        if (placement.findings().stream().anyMatch(f -> f.code().equals(STRONG_HALPHA))) {
            return Halpha.ABOVE_SATURATION;
        }
        Halpha seen = Halpha.UNKNOWN;
        for (ActivityLevel level : activity.levels()) {
            if (!level.isUpperLimit()) {
                return Halpha.EMISSION;
            }
            if (level.logRatio() < numbers.of("halpha-quiet")) {
                seen = Halpha.NO_EMISSION;
            }
        }
        return seen;
    }

    private static Map<MagnitudeBand, Magnitude> photometry(
            Candidate candidate, Placement placement, List<Finding> findings) {
        CandidatePhotometry photometry = CandidatePhotometry.of(candidate);
        // a placement by colours has told them already
        photometry.findings().stream()
                .filter(finding -> !placement.findings().contains(finding))
                .forEach(findings::add);
        if (photometry.systemAssumed()) {
            findings.add(
                    Finding.note(
                            "mag-system-assumed",
                            "the list does not state the system of J, H and K (column mag_system);"
                                    + " 2MASS was assumed"));
        }
        return photometry.magnitudes();
    }

    private static Astrometry astrometry(Candidate candidate, List<Finding> findings) {
        OptionalDouble parallax = candidate.number("parallax_mas");
        OptionalDouble error = candidate.number("parallax_mas_err");
        if (parallax.isPresent() && !(error.isPresent() && error.getAsDouble() > 0)) {
            findings.add(
                    Finding.caution(
                            "parallax-without-error",
                            "the parallax has no error (column parallax_mas_err) and was not"
                                    + " used"));
            parallax = OptionalDouble.empty();
        }
        return new Astrometry(
                candidate.number("ra_deg"),
                candidate.number("dec_deg"),
                parallax,
                parallax.isPresent() ? error : OptionalDouble.empty(),
                candidate.number("pmra_masyr"),
                candidate.number("pmdec_masyr"),
                candidate.number("rv_kms"));
    }

    private static Optional<AgeStatement> age(Candidate candidate, List<Finding> findings) {
        Optional<String> text = candidate.text("age");
        if (text.isEmpty()) {
            return Optional.empty();
        }
        try {
            return Optional.of(AgeStatement.parse(text.get()));
        } catch (IllegalArgumentException e) {
            findings.add(
                    Finding.caution("age-unusable", "column age was not used: " + e.getMessage()));
            return Optional.empty();
        }
    }

    private static Finding unusable(String column, String cell, String expected) {
        return Finding.caution(
                column.replace('_', '-') + "-unusable",
                "column " + column + ": expected " + expected + " but was '" + cell + "'");
    }
}
