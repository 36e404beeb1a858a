package emberline.judge;

import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What an observer should know about a judgement. */
final class JudgeFindings {

    private static final double FEW_PERCENT = 0.05;
    private static final double EARLY = 5.5;
    private static final double LATE = 29;
    private static final double UNLIKE = 3;
    private static final double NO_TEST = 0.3;

    private final Judging judging;
    private final List<Finding> findings = new ArrayList<>();

    JudgeFindings(Judging judging) {
        this.judging = judging;
    }

    List<Finding> list() {
        return List.copyOf(findings);
    }

    void offRelations(double outside) {
        if (outside > FEW_PERCENT) {
            findings.add(
                    Finding.warning(
                            "type-off-relations",
                            String.format(
                                    Locale.ROOT,
                                    "%.0f%% of the type lies before M3 or after Y5, beyond all"
                                            + " relations used here; it is counted at the nearest"
                                            + " end, so properties and mass are no use",
                                    100 * outside)));
        }
    }

    void lateOrEarly(double type) {
        if (type < EARLY) {
            findings.add(
                    Finding.note(
                            "mass-at-grid-edge",
                            "the grids end at 0.2 solar masses, about M4: the mass is a lower"
                                    + " estimate; the decision does not hang on it"));
        } else if (type > LATE) {
            findings.add(
                    Finding.note(
                            "few-y-dwarfs",
                            "temperatures beyond T9 rest on a short table of few objects"));
        }
    }

    void grids(Limits limits, List<GridComparison> others) {
        for (GridComparison other : others) {
            Decision there = Limits.decide(other.pSubstellar(), other.pSubstellar(), judging);
            boolean opposite =
                    limits.decision() != Decision.UNDECIDED
                            && there != Decision.UNDECIDED
                            && there != limits.decision();
            if (opposite) {
                findings.add(
                        Finding.warning(
                                "grids-disagree",
                                "the grid "
                                        + other.grid().label()
                                        + " alone would say "
                                        + there.word()));
            }
        }
    }

    void metalPoor(double p) {
        if (p > 0.5) {
            findings.add(
                    Finding.warning(
                            "grids-are-solar",
                            String.format(
                                    Locale.ROOT,
                                    "metal-poor with p = %.2f: grids and relations hold for solar"
                                            + " metallicity; the hydrogen-burning limit is higher"
                                            + " (about 0.083 solar masses at a tenth of it)",
                                    p)));
        }
    }

    void luminosity(Estimate measured, Estimate byType) {
        double off =
                (measured.median() - byType.median())
                        / Math.hypot(measured.sigma(), byType.sigma());
        if (Math.abs(off) > UNLIKE) {
            findings.add(
                    Finding.caution(
                            "luminosity-unlike-type",
                            String.format(
                                    Locale.ROOT,
                                    "log L %.2f from the parallax is %.1f sigma %s than field"
                                            + " objects of the type: %s",
                                    measured.median(),
                                    Math.abs(off),
                                    off > 0 ? "brighter" : "fainter",
                                    off > 0
                                            ? "young, or an unresolved pair"
                                            : "check type, magnitude and parallax")));
        }
    }

    void lithium(LithiumTest test, double chance) {
        if (test.outcome() == LithiumTest.Outcome.NOT_SEEN && chance < NO_TEST) {
            findings.add(
                    Finding.note(
                            "lithium-limit-useless",
                            "Li I 6708 is not seen, but neither would a full line be: the"
                                    + " spectrum is not deep enough, or the type too late for"
                                    + " atomic lithium"));
        }
    }

    void motion(Kinematics motion) {
        motion.space()
                .flatMap(Kinematics.Space::likeGroup)
                .ifPresent(
                        group ->
                                findings.add(
                                        Finding.note(
                                                "moves-like-group",
                                                "moves within 8 km/s of "
                                                        + group.name()
                                                        + ", which alone proves nothing; where"
                                                        + " membership is accepted, state the age"
                                                        + " (--age "
                                                        + group.name()
                                                        + ")")));
    }

    void parallax(Evidence evidence, boolean used) {
        if (evidence.astrometry().parallaxMas().isPresent() && !used) {
            findings.add(
                    Finding.note(
                            "parallax-weak",
                            "the parallax is below 5 times its error: alone it would give the"
                                    + " volume prior back, so it only weighs the photometric"
                                    + " distance"));
        }
    }
}
