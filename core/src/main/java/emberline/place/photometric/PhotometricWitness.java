package emberline.place.photometric;

import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.TypePrior;
import emberline.place.kind.KindPrior;
import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.read.CandidatePhotometry;
import emberline.spectrum.Finding;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;

/**
 * Types late dwarfs by their colours. For every type from M5 to Y1, gravity class and extinction
 * the colours have a median and a scatter; the posterior over type and gravity class is the prior
 * times the normal likelihood of the colours, extinction averaged over. This is typing by
 * chi-square against templates as in Skrzypek et al. (2015, A&amp;A 574, A78), with the scatter of
 * each colour in place of one for all. Holds no state of an object; one witness may serve many
 * threads.
 */
public final class PhotometricWitness {

    /** A fit worse than this probability is a finding: 3.3 sigma. */
    private static final double UNLIKELY = 1e-3;

    /** From this type on back an object may be earlier than all templates. */
    private static final double EDGE = 5.5;

    private static final double EDGE_SHARE = 0.16;
    private static final double HALF = 0.5;
    private static final double SURE = 0.9;

    /** With fewer colours a quasar is not told from a T dwarf. */
    private static final int FEW = 3;

    private final ColourTemplates templates = ColourTemplates.standard();
    private final ColourSettings settings = ColourSettings.standard();
    private final TypePrior prior;
    private final ColourKinds kinds;

    /**
     * A witness.
     *
     * @param prior what is thought of types and gravities before colours are looked at
     */
    public PhotometricWitness(TypePrior prior) {
        this.prior = prior;
        this.kinds = new ColourKinds(templates, prior, KindPrior.standard());
    }

    /**
     * The most probable template of an object, and the extinction that was averaged over.
     *
     * @param point grid point of its type
     * @param gravity place of its gravity class
     * @param avMag its extinction in V (mag)
     * @param pReddened probability of any extinction
     * @param medianAvMag median extinction in V where there is any (mag)
     */
    private record Best(
            int point, int gravity, double avMag, double pReddened, double medianAvMag) {}

    /**
     * Types an object.
     *
     * @param photometry its magnitudes
     * @return the posterior, or why there is none
     */
    public PhotometricType witness(CandidatePhotometry photometry) {
        Map<MagnitudeBand, Magnitude> magnitudes = photometry.magnitudes();
        ColourVector colours = ColourVector.of(magnitudes);
        List<Finding> findings = new ArrayList<>(photometry.findings());
        if (colours.size() == 0) {
            return PhotometricType.none(
                    "a type from colours needs two magnitudes of y_mag, j_mag, h_mag, k_mag, w1_mag"
                            + " and w2_mag at least; "
                            + magnitudes.size()
                            + " can be used",
                    findings);
        }
        ColourFit fit = new ColourFit(templates, colours);
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        Best best = average(fit, weights);
        TypePosterior posterior =
                TypePosterior.of(ColourTemplates.FIRST_TYPE, ColourTemplates.STEP, weights);
        KindVerdict kind = kinds.judge(ColourVector.ofKinds(magnitudes));
        double pDwarf = kind.probability(ObjectKind.LATE_DWARF).orElse(1);
        double chiSquare = fit.chiSquare(best.point, best.gravity, best.avMag);
        int freedom = Math.max(0, colours.size() - 1 - (best.avMag > 0 ? 1 : 0));
        assumptions(photometry, findings);
        findings.addAll(ofFit(colours, chiSquare, best));
        findings.addAll(ofKind(kind, pDwarf));
        findings.addAll(ofEdge(posterior));
        if (colours.size() < FEW || chance(chiSquare, colours.size()) < UNLIKELY) {
            findings.addAll(ofQuasars(magnitudes));
        }
        String reason =
                PhotometricType.allowsType(pDwarf)
                        ? ""
                        : String.format(
                                Locale.ROOT,
                                "kind by colours: %s (p %.2f)",
                                kind.kind().orElseThrow().label(),
                                kind.probability(kind.kind().orElseThrow()).orElseThrow());
        return new PhotometricType(
                colours.labels(),
                Optional.of(posterior),
                reason,
                kind,
                chiSquare,
                freedom,
                best.pReddened,
                best.medianAvMag,
                gain(kind, pDwarf, posterior.estimate()),
                findings);
    }

    /** Fills the weights of types and classes and finds the most probable template. */
    private Best average(ColourFit fit, Map<GravityClass, double[]> weights) {
        double step = settings.of("a-v-step");
        int steps = (int) Math.round(settings.of("a-v-greatest") / step);
        double share = settings.of("reddened-share");
        double[][][] log = new double[GravityClass.values().length][ColourTemplates.SIZE][];
        double highest = Double.NEGATIVE_INFINITY;
        int[] at = new int[3];
        int g = 0;
        for (GravityClass gravity : GravityClass.values()) {
            for (int point = 0; point < ColourTemplates.SIZE; point++) {
                double type = ColourTemplates.typeNumber(point);
                double before = Math.log(prior.density(type, gravity));
                double[] each = new double[steps + 1];
                for (int a = 0; a <= steps; a++) {
                    each[a] =
                            before
                                    + Math.log(a == 0 ? 1 - share : share / steps)
                                    + fit.logLikelihood(point, g, a * step);
                    if (each[a] > highest) {
                        highest = each[a];
                        at = new int[] {point, g, a};
                    }
                }
                log[g][point] = each;
            }
            g++;
        }
        double[] byExtinction = new double[steps + 1];
        g = 0;
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[ColourTemplates.SIZE];
            for (int point = 0; point < ColourTemplates.SIZE; point++) {
                for (int a = 0; a <= steps; a++) {
                    double weight = Math.exp(log[g][point][a] - highest);
                    ofClass[point] += weight;
                    byExtinction[a] += weight;
                }
            }
            weights.put(gravity, ofClass);
            g++;
        }
        double total = Arrays.stream(byExtinction).sum();
        double reddened = total - byExtinction[0];
        int median = 0;
        for (double sum = 0; sum < HALF * reddened && median < steps; ) {
            sum += byExtinction[++median];
        }
        return new Best(at[0], at[1], at[2] * step, reddened / total, median * step);
    }

    /**
     * Whether the colours of an object fit the type that its spectrum gives.
     *
     * @param photometry its magnitudes
     * @param bySpectrum type from the spectrum
     * @param avMag extinction in V that was fitted to the spectrum (mag), 0 where none was
     * @return a finding where no template of any gravity class within the 95% interval fits with a
     *     probability of 0.001 at least; empty where one does or there are no colours
     */
    public Optional<Finding> disagreement(
            CandidatePhotometry photometry, TypeEstimate bySpectrum, double avMag) {
        ColourVector colours = ColourVector.of(photometry.magnitudes());
        if (colours.size() == 0 || bySpectrum.hi95() < EDGE) {
            return Optional.empty();
        }
        ColourFit fit = new ColourFit(templates, colours);
        double least = Double.POSITIVE_INFINITY;
        int last = ColourTemplates.point(bySpectrum.hi95());
        for (int point = ColourTemplates.point(bySpectrum.lo95()); point <= last; point++) {
            for (int g = 0; g < GravityClass.values().length; g++) {
                least = Math.min(least, fit.chiSquare(point, g, avMag));
            }
        }
        if (chance(least, colours.size()) >= UNLIKELY) {
            return Optional.empty();
        }
        TypeEstimate byColours = witness(photometry).posterior().orElseThrow().estimate();
        return Optional.of(
                Finding.caution(
                        "colours-unlike-type",
                        String.format(
                                Locale.ROOT,
                                "the spectrum gives %s, but the colours %s fit no template between"
                                        + " %.1f and %.1f (M0 = 0; chi-square %.0f for %d colours);"
                                        + " taken alone they give %s +- %.1f: dust, a companion, a"
                                        + " wrong match, the system of the magnitudes or the type"
                                        + " may be the reason",
                                bySpectrum.code(),
                                String.join(", ", colours.labels()),
                                bySpectrum.lo95(),
                                bySpectrum.hi95(),
                                least,
                                colours.size(),
                                byColours.code(),
                                byColours.sigmaSubclass())));
    }

    private static double chance(double chiSquare, int freedom) {
        return 1 - new ChiSquaredDistribution(null, freedom).cumulativeProbability(chiSquare);
    }

    /** Bits that a spectrum is expected to add: on the kind, and on the type of a late dwarf. */
    private double gain(KindVerdict kind, double pDwarf, TypeEstimate type) {
        double bits = 0;
        for (ObjectKind one : ObjectKind.values()) {
            double p = kind.probability(one).orElse(0);
            bits -= p > 0 ? p * Math.log(p) / Math.log(2) : 0;
        }
        double narrower = type.sigmaSubclass() / settings.of("spectrum-sigma");
        return bits + pDwarf * Math.max(0, Math.log(narrower) / Math.log(2));
    }

    private static void assumptions(CandidatePhotometry photometry, List<Finding> findings) {
        if (!photometry.withoutError().isEmpty()) {
            findings.add(
                    Finding.caution(
                            "magnitude-error-assumed",
                            photometry.withoutError().stream()
                                            .map(MagnitudeBand::label)
                                            .collect(Collectors.joining(", "))
                                    + ": listed without an error; "
                                    + CandidatePhotometry.ASSUMED_ERROR_MAG
                                    + " mag was taken (a limit has no place here: leave the cell"
                                    + " empty)"));
        }
    }

    private static List<Finding> ofFit(ColourVector colours, double chiSquare, Best best) {
        List<Finding> findings = new ArrayList<>();
        if (colours.size() == 1) {
            findings.add(
                    Finding.caution(
                            "one-colour",
                            "the type rests on the colour "
                                    + colours.labels().get(0)
                                    + " alone, which several types share"));
        }
        if (chance(chiSquare, colours.size()) < UNLIKELY) {
            findings.add(
                    Finding.caution(
                            "colours-unlike-templates",
                            String.format(
                                    Locale.ROOT,
                                    "the colours fit no late dwarf: chi-square %.0f for %d colours"
                                            + " at best; the type means little",
                                    chiSquare,
                                    colours.size())));
        }
        if (best.pReddened > HALF) {
            findings.add(
                    Finding.caution(
                            "colours-reddened",
                            String.format(
                                    Locale.ROOT,
                                    "the colours are those of a late dwarf behind dust with a"
                                            + " probability of %.2f (A(V) about %.1f mag)",
                                    best.pReddened,
                                    best.medianAvMag)));
        }
        return findings;
    }

    private static List<Finding> ofKind(KindVerdict kind, double pDwarf) {
        if (kind.kind().isEmpty()) {
            return List.of(
                    Finding.caution(
                            "kind-not-judged",
                            "the type holds only if the object is a late dwarf, which could not be"
                                    + " judged: "
                                    + kind.reason()));
        }
        if (!PhotometricType.allowsType(pDwarf)) {
            return List.of(
                    Finding.warning(
                            "not-a-late-dwarf",
                            String.format(
                                    Locale.ROOT,
                                    "the colours are those of no late dwarf with a probability of"
                                            + " %.2f (most probable: %s), so it gets no type",
                                    1 - pDwarf,
                                    kind.kind().get().label())));
        }
        return pDwarf >= SURE
                ? List.of()
                : List.of(
                        Finding.caution(
                                "kind-unsure",
                                String.format(
                                        Locale.ROOT,
                                        "by its colours a late dwarf with a probability of only"
                                                + " %.2f",
                                        pDwarf)));
    }

    private static List<Finding> ofEdge(TypePosterior posterior) {
        return posterior.quantile(EDGE_SHARE) >= EDGE
                ? List.of()
                : List.of(
                        Finding.caution(
                                "type-at-edge",
                                "there are no colours of dwarfs earlier than M5, so the object may"
                                        + " be of any earlier type"));
    }

    private List<Finding> ofQuasars(Map<MagnitudeBand, Magnitude> magnitudes) {
        Magnitude w1 = magnitudes.get(MagnitudeBand.W1);
        Magnitude w2 = magnitudes.get(MagnitudeBand.W2);
        if (w1 == null || w2 == null) {
            return List.of();
        }
        double colour = w1.mag() - w2.mag();
        double reach = Math.hypot(w1.sigmaMag(), w2.sigmaMag());
        double limit = settings.of("quasar-w1-w2");
        return colour + reach < limit
                ? List.of()
                : List.of(
                        Finding.caution(
                                "quasar-not-excluded",
                                String.format(
                                        Locale.ROOT,
                                        "W1-W2 = %.2f: active galaxies lie at %.1f and above, far"
                                                + " more of them than dwarfs on the sky, and no"
                                                + " colours of them are compared",
                                        colour,
                                        limit)));
    }
}
