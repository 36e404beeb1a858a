package emberline.reports.page;

import emberline.judge.Estimate;
import emberline.judge.Judgement;
import emberline.judge.Limits;
import emberline.measure.Measurement.Measured;
import emberline.place.GravityVerdict;
import emberline.place.TypeEstimate;
import emberline.place.kind.KindVerdict;
import emberline.place.reddening.ReddeningFit;
import emberline.place.standard.StandardMatch;
import emberline.place.standard.StandardVerdict;
import emberline.prepare.BandSignal;
import emberline.prepare.Quality;
import emberline.reports.attach.Digits;
import emberline.reports.attach.StandardsText;
import emberline.spectrum.Candidate;
import emberline.spectrum.SpectralType;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import emberline.survey.verdict.Verdict;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/** The key numbers of a report: a label and a value each. */
final class KeyNumbers {

    private static final List<String> MAGNITUDES =
            List.of("i_mag", "z_mag", "y_mag", "j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag");

    /** Characters of a verdict that find room; the JSON holds all. */
    private static final int LONGEST_VERDICT = 90;

    private static final int LONGEST_NAME = 21;

    private KeyNumbers() {}

    /** A number with its label. */
    record Entry(String label, String value) {}

    /** What was found. */
    static List<Entry> found(ObjectResult result) {
        List<Entry> entries = new ArrayList<>();
        result.verdict().ifPresent(verdict -> addVerdict(entries, verdict));
        result.placement().flatMap(p -> p.type()).ifPresent(type -> addType(entries, type));
        result.placement().flatMap(p -> p.reddening()).ifPresent(f -> addReddening(entries, f));
        result.standards().ifPresent(verdict -> addStandards(entries, verdict));
        result.placement().ifPresent(p -> addGravity(entries, p.gravity()));
        result.placement().ifPresent(p -> addKind(entries, p.kind()));
        result.judgement().ifPresent(judgement -> addJudgement(entries, judgement));
        return entries;
    }

    /** What it was found from. */
    static List<Entry> given(ObjectResult result) {
        List<Entry> entries = new ArrayList<>();
        addSpectra(entries, result);
        addListed(entries, result.candidate());
        return entries;
    }

    private static void addVerdict(List<Entry> entries, Verdict verdict) {
        String words = verdict.words().replaceAll("\\s+", " ");
        entries.add(
                new Entry(
                        "Verdict",
                        words.length() > LONGEST_VERDICT
                                ? words.substring(0, LONGEST_VERDICT) + " \u2026"
                                : words));
    }

    private static void addType(List<Entry> entries, TypeEstimate type) {
        entries.add(
                new Entry(
                        "Type number",
                        Digits.type(type.typeNumber())
                                + " ± "
                                + Digits.type(type.sigmaSubclass())));
        entries.add(new Entry("68% interval", interval(type.lo68(), type.hi68())));
        entries.add(new Entry("95% interval", interval(type.lo95(), type.hi95())));
    }

    private static void addReddening(List<Entry> entries, ReddeningFit fit) {
        entries.add(
                new Entry(
                        "A(V) fitted (mag)",
                        Digits.fixed(fit.avMag(), 1)
                                + " ("
                                + Digits.fixed(fit.lo68Mag(), 1)
                                + " to "
                                + Digits.fixed(fit.hi68Mag(), 1)
                                + ")"));
    }

    /** The type by standards, and the best of them with their reduced chi-squares. */
    private static void addStandards(List<Entry> entries, StandardVerdict verdict) {
        if (verdict.type().isEmpty()) {
            entries.add(new Entry("Standards", "not compared"));
            return;
        }
        entries.add(
                new Entry(
                        "Standards",
                        StandardsText.withError(verdict.type().get())
                                + "  ("
                                + StandardsText.ranges(verdict.ranges())
                                + ")"));
        for (StandardMatch match : verdict.best()) {
            entries.add(
                    new Entry(
                            "   \u03c7² = " + StandardsText.chiSquare(match),
                            shortened(match.first().name())
                                    + " ("
                                    + new SpectralType(match.first().typeNumber()).code()
                                    + ")"));
        }
    }

    /** A name that leaves room for a type in its line; the whole names stand on the next page. */
    private static String shortened(String name) {
        return name.length() <= LONGEST_NAME
                ? name
                : name.substring(0, LONGEST_NAME - 1).strip() + "\u2026";
    }

    private static String interval(double low, double high) {
        return fine(low) + " to " + fine(high);
    }

    private static String fine(double number) {
        if (!(number >= -9)) {
            return "before K";
        }
        return number < 40 ? new SpectralType(number).fineCode() : "after Y";
    }

    private static void addGravity(List<Entry> entries, GravityVerdict verdict) {
        if (verdict.gravityClass().isEmpty()) {
            entries.add(new Entry("Gravity", "not judged"));
            return;
        }
        entries.add(
                new Entry(
                        "FLD, INT, VL",
                        "P "
                                + share(verdict.pFieldGravity())
                                + ", "
                                + share(verdict.pIntermediateGravity())
                                + ", "
                                + share(verdict.pVeryLowGravity())));
    }

    private static String share(OptionalDouble share) {
        return share.isPresent() ? Digits.fixed(share.getAsDouble(), 2) : "\u2013";
    }

    private static void addKind(List<Entry> entries, KindVerdict verdict) {
        verdict.kind()
                .ifPresent(
                        kind ->
                                entries.add(
                                        new Entry(
                                                "Kind",
                                                kind.label()
                                                        + ", P "
                                                        + FindingSentence.probability(
                                                                verdict.probabilities()
                                                                        .get(kind)))));
    }

    private static void addJudgement(List<Entry> entries, Judgement judgement) {
        Limits limits = judgement.limits();
        entries.add(
                new Entry(
                        "Substellar",
                        String.format(
                                Locale.ROOT,
                                "P %.2f (%s)",
                                limits.pSubstellar(),
                                FindingSentence.byLimit(limits))));
        Estimate mass = judgement.massMsun();
        entries.add(
                new Entry(
                        "Mass (solar)",
                        String.format(
                                Locale.ROOT,
                                "%.3f (%.3f to %.3f)",
                                mass.median(),
                                mass.lo68(),
                                mass.hi68())));
        entries.add(new Entry("Age", judgement.ageWords()));
        judgement
                .properties()
                .teffK()
                .ifPresent(
                        t ->
                                entries.add(
                                        new Entry(
                                                "Teff (K)",
                                                Digits.fixed(t.median(), 0)
                                                        + " ± "
                                                        + Digits.fixed(t.sigma(), 0))));
        judgement
                .properties()
                .distance()
                .ifPresent(
                        d ->
                                entries.add(
                                        new Entry(
                                                "Distance",
                                                Digits.fixed(
                                                                d.pc().median(),
                                                                decimals(d.pc().sigma()))
                                                        + " ± "
                                                        + Digits.fixed(
                                                                d.pc().sigma(),
                                                                decimals(d.pc().sigma()))
                                                        + " pc by "
                                                        + d.method())));
    }

    /** Decimals with which an error is not zero. */
    private static int decimals(double sigma) {
        return sigma >= 0.1 ? 1 : sigma >= 0.01 ? 2 : 3;
    }

    private static void addSpectra(List<Entry> entries, ObjectResult result) {
        Optional<SpectrumResult> leading = result.leading();
        if (leading.isEmpty()) {
            return;
        }
        List<BandSignal> signals = leading.get().quality().bands();
        boolean bands = signals.stream().anyMatch(s -> s.range() != BandSignal.Range.WHOLE);
        String signal =
                signals.stream()
                        .filter(s -> !bands || s.range() != BandSignal.Range.WHOLE)
                        .map(
                                s ->
                                        Digits.fixed(
                                                        s.medianSignalToNoise(),
                                                        s.medianSignalToNoise() < 10 ? 1 : 0)
                                                + " ("
                                                + s.range().words().replace("the optical", "opt")
                                                + ")")
                        .collect(Collectors.joining(", "));
        Quality quality = leading.get().quality();
        entries.add(
                new Entry(
                        "Quality",
                        quality.grade().word()
                                + ": "
                                + quality.reason()
                                + (result.spectra().size() > 1 ? " (the best spectrum)" : "")));
        entries.add(new Entry("S/N per pixel", signal.isEmpty() ? "not known" : signal));
        result.best()
                .ifPresent(
                        best -> {
                            long measured =
                                    best.all().stream()
                                            .filter(m -> m.result() instanceof Measured)
                                            .count();
                            entries.add(
                                    new Entry("Features", measured + " of " + best.all().size()));
                        });
    }

    private static void addListed(List<Entry> entries, Candidate candidate) {
        List<String> known = new ArrayList<>();
        candidate.text("known_type").ifPresent(known::add);
        candidate.text("known_gravity").ifPresent(known::add);
        if (!known.isEmpty()) {
            entries.add(new Entry("Listed as", String.join(", ", known)));
        }
        OptionalDouble ra = candidate.number("ra_deg");
        OptionalDouble dec = candidate.number("dec_deg");
        if (ra.isPresent() && dec.isPresent()) {
            entries.add(
                    new Entry(
                            "RA, Dec (deg)",
                            Digits.fixed(ra.getAsDouble(), 5)
                                    + ", "
                                    + Digits.fixed(dec.getAsDouble(), 5).replace('-', '\u2212')));
        }
        String magnitudes =
                MAGNITUDES.stream()
                        .filter(column -> candidate.number(column).isPresent())
                        .map(
                                column ->
                                        column.replace("_mag", "").toUpperCase(Locale.ROOT)
                                                + " "
                                                + Digits.fixed(
                                                        candidate.number(column).getAsDouble(), 2))
                        .collect(Collectors.joining(", "));
        if (!magnitudes.isEmpty()) {
            entries.add(new Entry("Magnitudes", magnitudes));
        }
        OptionalDouble parallax = candidate.number("parallax_mas");
        if (parallax.isPresent()) {
            OptionalDouble error = candidate.number("parallax_mas_err");
            entries.add(
                    new Entry(
                            "Parallax (mas)",
                            Digits.fixed(parallax.getAsDouble(), 2)
                                    + (error.isPresent()
                                            ? " ± " + Digits.fixed(error.getAsDouble(), 2)
                                            : "")));
        }
    }
}
