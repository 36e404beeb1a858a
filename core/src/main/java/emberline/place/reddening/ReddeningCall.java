package emberline.place.reddening;

import emberline.place.Placement;
import emberline.place.calibrated.Contribution;
import emberline.place.kind.ObjectKind;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * When extinction is fitted without being asked for, and when the fit is believed. Fitting always
 * would widen the types of the many objects that lie behind no dust.
 */
public final class ReddeningCall {

    /**
     * From this probability of a reddened or early star, or of nothing known, on extinction is
     * tried. Dwarfs behind much dust are mostly still known as dwarfs, so the call comes early: for
     * 17 of 23 reference dwarfs seen through 8 mag in V, and one of the 23 through none.
     */
    private static final double STAR_LIKELY = 0.08;

    /** Colours whose mean lies this many sigma on the red side call for a fit. */
    private static final double RED_SIGMA = 2.5;

    /** Ratios of a redder band to a bluer one. */
    private static final List<String> RED_COLOURS =
            List.of("burgasser2002/h-j", "burgasser2006/k-j", "burgasser2006b/k-h");

    /** From here on (L0) dwarfs of low gravity are red by the dust in their own atmospheres. */
    private static final double OWN_DUST_FROM = 10;

    /** From this probability of a low gravity on a dwarf counts as young. */
    private static final double YOUNG = 0.5;

    /** Extinction must make the measurements so much more probable (natural logarithm). */
    public static final double LEAST_GAIN = 15;

    /** And a late dwarf so probable once it is taken out. */
    private static final double DWARF_SURE = 0.9;

    /** And the 95% interval must begin above this extinction in V (mag). */
    private static final double LEAST_AV = 0.5;

    private ReddeningCall() {}

    /**
     * Why extinction should be fitted.
     *
     * @param asSeen the placement without extinction taken out
     * @return the reason in words; empty for an object that gives no cause
     */
    public static Optional<String> reason(Placement asSeen) {
        double star =
                probability(asSeen, ObjectKind.REDDENED_BACKGROUND)
                        + probability(asSeen, ObjectKind.UNLIKE_KNOWN)
                        + probability(asSeen, ObjectKind.EARLY_STAR);
        if (star >= STAR_LIKELY) {
            return Optional.of(
                    String.format(
                            Locale.ROOT,
                            "the spectrum may be that of a reddened or early star, or like none known"
                                    + " (p %.2f)",
                            star));
        }
        if (asSeen.type().isEmpty() || isRedByItself(asSeen)) {
            return Optional.empty();
        }
        OptionalDouble red =
                asSeen.calibrated().contributions().stream()
                        .filter(one -> RED_COLOURS.contains(one.feature()))
                        .mapToDouble(Contribution::deviationSigma)
                        .average();
        return red.orElse(0) > RED_SIGMA
                ? Optional.of(
                        String.format(
                                Locale.ROOT,
                                "its colours are redder than its type lets expect (by %.1f sigma)",
                                red.getAsDouble()))
                : Optional.empty();
    }

    /** Interstellar dust cannot be told from that of a young L dwarf by colours. */
    private static boolean isRedByItself(Placement asSeen) {
        double low =
                asSeen.gravity().pIntermediateGravity().orElse(0)
                        + asSeen.gravity().pVeryLowGravity().orElse(0);
        return asSeen.type().orElseThrow().typeNumber() >= OWN_DUST_FROM && low >= YOUNG;
    }

    /**
     * Whether a fit that was called for is believed: extinction is needed, and without it the
     * object is a late dwarf. Otherwise the object stays as it was seen.
     *
     * @param fit the fit
     * @param freed the placement with the extinction taken out
     * @return true to take the placement without extinction
     */
    public static boolean isBelieved(ReddeningFit fit, Placement freed) {
        return fit.logGain() > LEAST_GAIN
                && fit.lo95Mag() > LEAST_AV
                && freed.type().isPresent()
                && probability(freed, ObjectKind.LATE_DWARF) >= DWARF_SURE
                && freed.findings().stream().noneMatch(f -> f.code().equals("no-bands"));
    }

    private static double probability(Placement placement, ObjectKind kind) {
        return placement.kind().probability(kind).orElse(0);
    }
}
