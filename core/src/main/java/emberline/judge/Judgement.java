package emberline.judge;

import emberline.spectrum.Finding;
import java.util.List;
import java.util.Locale;

/**
 * What an object is judged to be.
 *
 * @param limits probabilities at the mass limits, and the decision
 * @param massMsun the mass (solar) from the main grid
 * @param age the age
 * @param properties physical properties
 * @param substellarLedger how the evidence made the odds of a mass below 0.072 solar
 * @param youngLedger how it made the odds of an age below 150 Myr
 * @param grids the same evidence on other grids: how far models differ
 * @param nextSteps further observations, those worth making first, the best of them first
 * @param priority place in the order of a survey
 * @param plane the posterior over mass and age
 * @param findings what the observer should know
 */
public record Judgement(
        Limits limits,
        Estimate massMsun,
        AgeResult age,
        Properties properties,
        Ledger substellarLedger,
        Ledger youngLedger,
        List<GridComparison> grids,
        List<NextStep> nextSteps,
        Priority priority,
        MassAgePlane plane,
        List<Finding> findings) {

    /** Copies the lists. */
    public Judgement {
        grids = List.copyOf(grids);
        nextSteps = List.copyOf(nextSteps);
        findings = List.copyOf(findings);
    }

    /**
     * The decision.
     *
     * @return substellar, stellar or undecided
     */
    public Decision decision() {
        return limits.decision();
    }

    /**
     * The next step in words.
     *
     * @return the best observation, what it takes and what it would add; or that none would change
     *     the decision
     */
    public String nextStepWords() {
        if (nextSteps.isEmpty() || !nextSteps.get(0).isRecommended()) {
            return nextSteps.isEmpty() || decision() != Decision.UNDECIDED
                    ? "none of the further observations weighed here could change the decision"
                    : String.format(
                            Locale.ROOT,
                            "no single further observation is likely to change the decision; most"
                                    + " would come from: %s (%.2f bit on %s)",
                            nextSteps.get(0).label(),
                            nextSteps.get(0).gainBits(),
                            nextSteps.get(0).aim().word());
        }
        NextStep best = nextSteps.get(0);
        StringBuilder words = new StringBuilder(best.label());
        if (best.resolvingPower().isPresent() || best.snr().isPresent()) {
            words.append(" (");
            best.resolvingPower()
                    .ifPresent(r -> words.append(String.format(Locale.ROOT, "R >= %.0f", r)));
            if (best.snr().isPresent()) {
                words.append(best.resolvingPower().isPresent() ? ", " : "")
                        .append(
                                String.format(
                                        Locale.ROOT, "S/N >= %.0f", best.snr().getAsDouble()));
            }
            words.append(')');
        }
        return words.append(
                        String.format(
                                Locale.ROOT,
                                ": %.2f bit expected on %s, changes the decision with p = %.2f; %s",
                                best.gainBits(),
                                best.aim().word(),
                                best.pChange(),
                                best.cost()))
                .toString();
    }

    /**
     * The age in words.
     *
     * @return the 68% interval, or that nothing tells the age
     */
    public String ageWords() {
        Estimate myr = age.ageMyr();
        String range =
                myr.hi68() < 1000
                        ? String.format(Locale.ROOT, "%.0f to %.0f Myr", myr.lo68(), myr.hi68())
                        : String.format(
                                Locale.ROOT,
                                "%.2f to %.2f Gyr",
                                myr.lo68() / 1000,
                                myr.hi68() / 1000);
        return age.isTold()
                ? range
                : age.prior().isStated()
                        ? range + " (as stated)"
                        : "no age information (prior " + range + ")";
    }
}
