package emberline.reports.page;

import emberline.catalogue.MetallicityClass;
import emberline.judge.Decision;
import emberline.judge.Limits;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.place.kind.ObjectKind;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairVerdict;
import emberline.place.pair.PairVerdict.Strength;
import emberline.prepare.BandSignal;
import emberline.reports.attach.Digits;
import emberline.reports.attach.TypeText;
import emberline.survey.ObjectResult;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/** The finding on an object in a sentence: what, how sure, from how much. */
public final class FindingSentence {

    private FindingSentence() {}

    /**
     * The finding.
     *
     * @param result the result of an object
     * @return for instance "Spectral type L3.5 ± 0.7 by 6 published relations; gravity VL-G (P =
     *     0.93) by 3 scores; S/N about 40 in J."; where something is not known it says so and why
     */
    public static String of(ObjectResult result) {
        if (result.placement().isEmpty()) {
            return "Nothing was measured: " + result.reason() + ".";
        }
        Placement placement = result.placement().get();
        StringBuilder text = new StringBuilder();
        if (placement.type().isPresent()) {
            TypeEstimate type = placement.type().get();
            text.append("Spectral type ")
                    .append(withError(type))
                    .append(" by ")
                    .append(witnesses(placement))
                    .append("; ")
                    .append(gravity(placement.gravity()));
            metallicity(placement.metallicity()).ifPresent(m -> text.append("; ").append(m));
            pair(placement.pair()).ifPresent(p -> text.append("; ").append(p));
            result.judgement().ifPresent(j -> text.append("; ").append(decision(j.limits())));
        } else {
            text.append(
                    otherKind(placement)
                            .map(kind -> kind + "; no spectral type is given")
                            .orElse("No spectral type: " + placement.typeReason()));
        }
        signal(result).ifPresent(signal -> text.append("; ").append(signal));
        return text.append('.').toString();
    }

    /** The kind with its probability, where it is that of no late dwarf. */
    private static Optional<String> otherKind(Placement placement) {
        return placement
                .kind()
                .kind()
                .filter(kind -> kind != ObjectKind.LATE_DWARF)
                .map(
                        kind ->
                                "Most probable kind: "
                                        + kind.label()
                                        + " (P "
                                        + probability(
                                                placement.kind().probability(kind).orElseThrow())
                                        + ")");
    }

    /** The decision; one that is open says how far it hangs on the hydrogen-burning limit. */
    static String decision(Limits limits) {
        String share = "P(substellar) " + probability(limits.pSubstellar());
        return limits.decision() == Decision.UNDECIDED
                ? "undecided whether substellar (" + share + "; " + byLimit(limits) + ")"
                : limits.decision().word() + " (" + share + ")";
    }

    /** What P(substellar) is at the lowest and the highest hydrogen-burning limit. */
    static String byLimit(Limits limits) {
        return Digits.fixed(limits.pSubstellarLow(), 2)
                + " to "
                + Digits.fixed(limits.pSubstellarHigh(), 2)
                + " by the limit";
    }

    /** By what the type was found. */
    private static String witnesses(Placement placement) {
        String relations = count(used(placement), "published relation");
        if (placement.calibrated().posterior().isEmpty()) {
            return relations;
        }
        String loci =
                count(placement.calibrated().contributions().size(), "feature")
                        + " against spectra of known type";
        return placement
                .published()
                .type()
                .map(type -> loci + " (" + relations + ": " + withError(type) + ")")
                .orElse(loci);
    }

    /**
     * A type with its one-sigma error.
     *
     * @param type an estimate
     * @return for instance {@code L3.5 ± 0.7}
     */
    static String withError(TypeEstimate type) {
        return TypeText.code(type) + " ± " + Digits.fixed(type.sigmaSubclass(), 1);
    }

    /**
     * A probability with its sign: draws do not tell 0.999 from 1.
     *
     * @param share 0 to 1
     * @return for instance {@code = 0.93} or {@code > 0.99}
     */
    static String probability(double share) {
        return share >= 0.995 ? "> 0.99" : share < 0.005 ? "< 0.01" : "= " + Digits.fixed(share, 2);
    }

    /** The number of relations that were combined. */
    static long used(Placement placement) {
        return placement.published().estimates().stream()
                .filter(e -> e.use() == Use.COMBINED)
                .count();
    }

    private static String gravity(GravityVerdict verdict) {
        if (verdict.gravityClass().isEmpty()) {
            return "gravity not judged (" + verdict.reason() + ")";
        }
        long scores = verdict.scores().stream().filter(s -> s.score().isPresent()).count();
        OptionalDouble share = verdict.pOfClass();
        return "gravity "
                + verdict.gravityClass().get().label()
                + (share.isPresent() ? " (P " + probability(share.getAsDouble()) + ")" : "")
                + verdict.byScores()
                        .map(
                                byScores ->
                                        "; "
                                                + byScores.label()
                                                + " by "
                                                + count(scores, "published score"))
                        .orElse("");
    }

    /** Said where an object is poor in metals. */
    static Optional<String> metallicity(MetallicityVerdict verdict) {
        return verdict.adopted()
                .filter(found -> found != MetallicityClass.Name.DWARF)
                .map(found -> "metal-poor, class " + found.prefix());
    }

    /** Said where the criteria point to an unresolved pair. */
    static Optional<String> pair(PairVerdict verdict) {
        return verdict.strength()
                .filter(strength -> strength != Strength.NONE)
                .map(
                        strength ->
                                (strength == Strength.CANDIDATE ? "perhaps" : "weak hint of")
                                        + " an unresolved pair ("
                                        + verdict.criteriaMet()
                                        + " of "
                                        + verdict.criteriaJudged()
                                        + " criteria)");
    }

    private static Optional<String> signal(ObjectResult result) {
        return result.leading()
                .flatMap(s -> BandSignal.best(s.quality().bands()))
                .map(
                        s ->
                                String.format(
                                        Locale.ROOT,
                                        "S/N about %s per pixel in %s",
                                        about(s.medianSignalToNoise()),
                                        s.range().words()));
    }

    private static String about(double ratio) {
        return ratio < 10 ? Digits.fixed(ratio, 1) : Digits.fixed(ratio, 0);
    }

    private static String count(long number, String what) {
        return number + " " + what + (number == 1 ? "" : "s");
    }
}
