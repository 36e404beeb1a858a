package emberline.place;

import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What the kind of an object means for its type: only a late dwarf gets one. */
final class KindGate {

    /**
     * A type is given from this probability of a late dwarf on: in cross-validation on the
     * reference list it keeps 98.5% of the late dwarfs (M0 and later) and lets in 1.6% of the
     * others. Other ways to share the objects out among the folds let in up to 2.8%.
     */
    private static final double LEAST = 0.35;

    /** Below this probability the observer should look at the spectrum. */
    private static final double SURE = 0.9;

    private KindGate() {}

    /** Why an object gets no type; empty where it is a late dwarf or its kind is not judged. */
    static Optional<String> refusal(KindVerdict kind) {
        if (kind.probability(ObjectKind.LATE_DWARF).orElse(1) >= LEAST) {
            return Optional.empty();
        }
        return kind.kind()
                .map(
                        most ->
                                String.format(
                                        Locale.ROOT,
                                        "kind: %s (p %.2f)",
                                        most.label(),
                                        kind.probability(most).orElseThrow()));
    }

    static List<Finding> findings(KindVerdict kind, boolean hasType) {
        if (kind.kind().isEmpty()) {
            return hasType
                    ? List.of(
                            Finding.caution(
                                    "kind-not-judged",
                                    "the type holds only if the object is a late dwarf, which could"
                                            + " not be judged: "
                                            + kind.reason()))
                    : List.of();
        }
        double pLateDwarf = kind.probability(ObjectKind.LATE_DWARF).orElseThrow();
        if (pLateDwarf < LEAST) {
            return List.of(
                    Finding.warning(
                            "not-a-late-dwarf",
                            String.format(
                                    Locale.ROOT,
                                    "the spectrum is that of no late dwarf with a probability of"
                                            + " %.2f (most probable: %s), so it gets no type; what the"
                                            + " published relations give means nothing then",
                                    1 - pLateDwarf,
                                    kind.kind().get().label())));
        }
        return pLateDwarf >= SURE
                ? List.of()
                : List.of(
                        Finding.caution(
                                "kind-unsure",
                                String.format(
                                        Locale.ROOT,
                                        "a late dwarf with a probability of only %.2f; look at the"
                                                + " spectrum and at the nearest kin",
                                        pLateDwarf)));
    }
}
