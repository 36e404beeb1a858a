package emberline.judge;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Weighs the further observations that an object allows, for each aim. */
final class NextSteps {

    private static final double TYPE_UNSURE = 0.7;
    private static final double NEW_PARALLAX_SNR = 10;

    /** Signal-to-noise times width (angstrom) for 3 sigma on 0.4 of the width at R = 2000. */
    private static final double LITHIUM_SNR_ANGSTROM = 37.7;

    private static final double LEAST_LITHIUM_SNR = 10;

    private final Map<FollowUp, FollowUpTerms> terms = FollowUpTerms.all();
    private final TypeKernel kernel;
    private final LithiumEvidence lithium;

    NextSteps(TypeKernel kernel, LithiumEvidence lithium) {
        this.kernel = kernel;
        this.lithium = lithium;
    }

    /** The steps for the aims that mass and age answer, the best of the weighted gains first. */
    List<NextStep> of(
            OutcomeSimulator simulator, EvidenceCurves curves, TypeMix mix, Judging judging) {
        Map<FollowUp, OutcomeTable> tables = tables(simulator, curves, mix);
        List<NextStep> steps = new ArrayList<>();
        for (Aim aim : Aim.values()) {
            if (!judging.aims().containsKey(aim) || SideQuestions.AIMS.contains(aim)) {
                continue;
            }
            tables.forEach(
                    (observation, table) ->
                            steps.add(
                                    step(
                                            observation,
                                            aim,
                                            table.information(Kinds.yes(aim)),
                                            table.change(p -> Kinds.verdict(aim, p, judging)),
                                            mix)));
        }
        return steps;
    }

    /** Sorted: those worth making first, then by information and cost as listed. */
    static List<NextStep> sorted(List<NextStep> steps, Judging judging) {
        List<NextStep> sorted = new ArrayList<>(steps);
        sorted.sort(
                Comparator.comparing((NextStep step) -> !step.isRecommended())
                        .thenComparing(
                                step ->
                                        -step.gainBits()
                                                * judging.aims().getOrDefault(step.aim(), 0.0)));
        return List.copyOf(sorted);
    }

    /** A step with its terms. */
    NextStep step(FollowUp observation, Aim aim, double gain, double change, TypeMix mix) {
        FollowUpTerms of = terms.get(observation);
        OptionalDouble snr =
                observation == FollowUp.LITHIUM
                        ? OptionalDouble.of(lithiumSnr(mix.meanType()))
                        : of.snr();
        return new NextStep(
                observation, of.label(), aim, gain, change, of.resolvingPower(), snr, of.cost());
    }

    double accuracy(FollowUp observation) {
        return terms.get(observation).accuracy();
    }

    private double lithiumSnr(double type) {
        double snr = LITHIUM_SNR_ANGSTROM / lithium.width(type);
        return Math.max(LEAST_LITHIUM_SNR, 5 * Math.ceil(snr / 5));
    }

    private Map<FollowUp, OutcomeTable> tables(
            OutcomeSimulator simulator, EvidenceCurves curves, TypeMix mix) {
        Map<FollowUp, OutcomeTable> tables = new EnumMap<>(FollowUp.class);
        Evidence evidence = curves.evidence();
        boolean stated = evidence.age().isPresent();
        if (!lithiumDone(evidence, mix)) {
            tables.put(FollowUp.LITHIUM, simulator.lithium());
        }
        if (mix.allowsClass() && !stated) {
            tables.put(
                    FollowUp.POTASSIUM,
                    simulator.gravity(terms.get(FollowUp.POTASSIUM).accuracy()));
            tables.put(FollowUp.H_SHAPE, simulator.gravity(terms.get(FollowUp.H_SHAPE).accuracy()));
        }
        if (mix.sigmaType() > TYPE_UNSURE) {
            tables.put(FollowUp.LOW_RESOLUTION, simulator.type(kernel));
        }
        if (!hasGoodParallax(evidence.astrometry())) {
            tables.put(
                    FollowUp.PARALLAX, simulator.parallax(terms.get(FollowUp.PARALLAX).accuracy()));
        }
        Optional<OutcomeTable> velocity = stated ? Optional.empty() : simulator.velocity();
        velocity.ifPresent(table -> tables.put(FollowUp.VELOCITY, table));
        return tables;
    }

    private boolean lithiumDone(Evidence evidence, TypeMix mix) {
        return switch (evidence.lithium().outcome()) {
            case SEEN -> true;
            case UNKNOWN -> false;
            case NOT_SEEN -> evidence.lithium().limitAngstrom() < lithium.width(mix.meanType()) / 2;
        };
    }

    static boolean hasGoodParallax(Astrometry astrometry) {
        return astrometry.parallaxMas().isPresent()
                && astrometry.parallaxMas().getAsDouble()
                        >= NEW_PARALLAX_SNR * astrometry.parallaxSigmaMas().orElseThrow();
    }
}
