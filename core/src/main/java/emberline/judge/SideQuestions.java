package emberline.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** The aims that mass and age do not answer: metal-poor, nearby, and pairs. */
final class SideQuestions {

    /** The aims that are answered here. */
    static final Set<Aim> AIMS = Set.of(Aim.METAL_POOR, Aim.NEARBY, Aim.PAIRS);

    private static final int YES = 0;
    private static final int NO = 1;
    private static final int DISTANCES = 81;
    private static final double TAIL = 4;

    private final JudgeNumbers numbers;
    private final AgeEvidence age;
    private final NextSteps steps;

    SideQuestions(JudgeNumbers numbers, AgeEvidence age, NextSteps steps) {
        this.numbers = numbers;
        this.age = age;
        this.steps = steps;
    }

    /** Probability of a metal-poor object: local share or spectrum, times the velocity. */
    double metalPoor(
            Evidence evidence,
            Optional<Kinematics> kinematics,
            Optional<DistanceEstimate> distance,
            double type) {
        double p = evidence.pMetalPoor().orElse(numbers.of("metal-poor-share"));
        double factor =
                kinematics
                        .map(
                                k ->
                                        age.metalPoorFactor(
                                                k.vtanKms(),
                                                distance.orElseThrow().relativeSigma(),
                                                type))
                        .orElse(1.0);
        return p * factor / (p * factor + 1 - p);
    }

    /** Probability of a distance within the limit, log-normal with the error of the distance. */
    Optional<Double> nearby(Optional<DistanceEstimate> distance) {
        return distance.map(
                d -> {
                    double[][] joint = distances(d, 0);
                    double yes = 0;
                    double all = 0;
                    for (int o = 0; o < joint[YES].length; o++) {
                        yes += joint[YES][o];
                        all += joint[YES][o] + joint[NO][o];
                    }
                    return yes / all;
                });
    }

    /**
     * Probability of an unresolved pair: the share of pairs, times what the blend criteria say,
     * given how often pairs and single dwarfs meet them.
     */
    double pair(Evidence evidence) {
        double share = numbers.of("binary-share");
        if (evidence.pBlendCriteria().isEmpty()) {
            return share;
        }
        double met = evidence.pBlendCriteria().getAsDouble();
        double ofPairs = numbers.of("pair-meets-criteria");
        double ofSingles = numbers.of("single-meets-criteria");
        double yes = share * (met * ofPairs + (1 - met) * (1 - ofPairs));
        double no = (1 - share) * (met * ofSingles + (1 - met) * (1 - ofSingles));
        return yes / (yes + no);
    }

    /** Joint of nearby or not and of a measured log distance with a further error. */
    private double[][] distances(DistanceEstimate distance, double furtherError) {
        double sigma = Math.max(1e-3, distance.relativeSigma());
        double limit = Math.log(numbers.of("nearby-distance") / distance.pc().median());
        double[][] joint = new double[2][furtherError > 0 ? DISTANCES : 1];
        double reach = TAIL * (sigma + furtherError);
        for (int i = 0; i < DISTANCES; i++) {
            double off = TAIL * (2.0 * i / (DISTANCES - 1) - 1);
            double p = Math.exp(-off * off / 2);
            int side = off * sigma < limit ? YES : NO;
            if (furtherError == 0) {
                joint[side][0] += p;
                continue;
            }
            for (int o = 0; o < DISTANCES; o++) {
                double seen = reach * (2.0 * o / (DISTANCES - 1) - 1);
                double z = (seen - off * sigma) / furtherError;
                joint[side][o] += p * Math.exp(-z * z / 2);
            }
        }
        return joint;
    }

    /** The steps for these aims. */
    List<NextStep> steps(
            double pMetalPoor,
            double pPair,
            Optional<DistanceEstimate> distance,
            Evidence evidence,
            TypeMix mix,
            Judging judging) {
        List<NextStep> found = new ArrayList<>();
        if (judging.aims().containsKey(Aim.METAL_POOR)) {
            double right = steps.accuracy(FollowUp.METALLICITY);
            double q = 1 - pMetalPoor;
            OutcomeTable table =
                    new OutcomeTable(
                            new double[][] {
                                {pMetalPoor * right, pMetalPoor * (1 - right)},
                                {q * (1 - right), q * right}
                            });
            found.add(step(FollowUp.METALLICITY, Aim.METAL_POOR, table, mix, judging));
        }
        if (judging.aims().containsKey(Aim.PAIRS)) {
            double parted = steps.accuracy(FollowUp.IMAGING);
            OutcomeTable table =
                    new OutcomeTable(
                            new double[][] {
                                {pPair * parted, pPair * (1 - parted)}, {0, 1 - pPair}
                            });
            found.add(step(FollowUp.IMAGING, Aim.PAIRS, table, mix, judging));
        }
        if (judging.aims().containsKey(Aim.NEARBY)
                && distance.isPresent()
                && !NextSteps.hasGoodParallax(evidence.astrometry())) {
            double error = steps.accuracy(FollowUp.PARALLAX);
            OutcomeTable table = new OutcomeTable(distances(distance.get(), error));
            found.add(step(FollowUp.PARALLAX, Aim.NEARBY, table, mix, judging));
        }
        return found;
    }

    private NextStep step(
            FollowUp observation, Aim aim, OutcomeTable table, TypeMix mix, Judging judging) {
        return steps.step(
                observation,
                aim,
                table.information(new boolean[] {true, false}),
                table.change(p -> Limits.decide(p[YES], p[YES], judging)),
                mix);
    }
}
