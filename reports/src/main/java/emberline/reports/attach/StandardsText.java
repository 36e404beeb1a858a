package emberline.reports.attach;

import emberline.place.TypeEstimate;
import emberline.place.standard.PairFit;
import emberline.place.standard.Range;
import emberline.place.standard.StandardMatch;
import emberline.place.standard.StandardVerdict;
import emberline.spectrum.SpectralType;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/** What the comparison with standards gave, in words. */
public final class StandardsText {

    private StandardsText() {}

    /**
     * The comparison in a few lines.
     *
     * @param verdict the comparison
     * @return the type over all ranges, the best standards, the type in each range and the pair; or
     *     why nothing was compared
     */
    public static List<String> lines(StandardVerdict verdict) {
        if (verdict.type().isEmpty()) {
            return List.of("not compared: " + verdict.reason());
        }
        List<String> lines = new ArrayList<>();
        lines.add(
                withError(verdict.type().get())
                        + " over "
                        + ranges(verdict.ranges())
                        + ", by "
                        + verdict.compared()
                        + (verdict.compared() == 1 ? " standard" : " standards"));
        lines.add(
                "best: "
                        + verdict.best().stream()
                                .map(m -> named(m) + " " + chiSquare(m))
                                .collect(Collectors.joining(", ")));
        if (!verdict.byRange().isEmpty()) {
            lines.add("by range: " + byRange(verdict));
        }
        verdict.pair().ifPresent(fit -> lines.add("sum of two: " + pair(fit)));
        return lines;
    }

    private static String byRange(StandardVerdict verdict) {
        return verdict.byRange().entrySet().stream()
                .map(StandardsText::inRange)
                .collect(Collectors.joining(", "));
    }

    private static String inRange(Map.Entry<Range, StandardVerdict.RangeResult> entry) {
        return entry.getKey().label() + " " + withError(entry.getValue().type());
    }

    /**
     * The letters or wavelengths of ranges.
     *
     * @param ranges the ranges
     * @return for instance {@code Y, J, H, K}
     */
    public static String ranges(List<Range> ranges) {
        return ranges.stream().map(Range::label).collect(Collectors.joining(", "));
    }

    /**
     * A type with its one-sigma error.
     *
     * @param type an estimate
     * @return for instance {@code L3.5 ± 0.7}
     */
    public static String withError(TypeEstimate type) {
        return TypeText.code(type) + " ± " + Digits.fixed(type.sigmaSubclass(), 1);
    }

    /**
     * A standard, or two, by name and type.
     *
     * @param match the match
     * @return for instance {@code Gl 752B (M8)}
     */
    public static String named(StandardMatch match) {
        String first = match.first().name() + " (" + code(match.first().typeNumber()) + ")";
        return match.second()
                .map(two -> first + " + " + two.name() + " (" + code(two.typeNumber()) + ")")
                .orElse(first);
    }

    /**
     * The types of a match.
     *
     * @param match one standard or two
     * @return for instance {@code L5 + T4.5}
     */
    public static String types(StandardMatch match) {
        String first = code(match.first().typeNumber());
        return match.second().map(two -> first + " + " + code(two.typeNumber())).orElse(first);
    }

    /**
     * The reduced chi-square of a match.
     *
     * @param match the match
     * @return with two decimals
     */
    public static String chiSquare(StandardMatch match) {
        return Digits.fixed(match.reducedChiSquare(), 2);
    }

    private static String pair(PairFit fit) {
        if (fit.ratio() <= 1) {
            return String.format(
                    Locale.ROOT,
                    "%s %s, no better than %s %s: %s",
                    named(fit.pair()),
                    chiSquare(fit.pair()),
                    named(fit.single()),
                    chiSquare(fit.single()),
                    fit.outcome().word());
        }
        return String.format(
                Locale.ROOT,
                "%s %s, against %s %s; F test %.3f, %s: %s",
                named(fit.pair()),
                chiSquare(fit.pair()),
                named(fit.single()),
                chiSquare(fit.single()),
                fit.confidence(),
                fit.pFalseAlarm().isPresent()
                        ? String.format(
                                Locale.ROOT,
                                "%.0f%% of single standards look so too",
                                100 * fit.pFalseAlarm().getAsDouble())
                        : "too few standards to tell how often single ones look so",
                fit.outcome().word());
    }

    private static String code(double typeNumber) {
        return new SpectralType(typeNumber).code();
    }
}
