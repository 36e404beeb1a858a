package emberline.judge;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** Makes the priority of an object from its claims and the further observations. */
final class Priorities {

    private Priorities() {}

    static Priority of(Map<Aim, Double> claims, List<NextStep> steps, Judging judging) {
        double score = 0;
        List<String> words = new ArrayList<>();
        for (Map.Entry<Aim, Double> wanted : new EnumMap<>(judging.aims()).entrySet()) {
            Aim aim = wanted.getKey();
            if (!claims.containsKey(aim)) {
                words.add(aim.word() + ": not judged");
                continue;
            }
            NextStep best = null;
            for (NextStep step : steps) {
                boolean better = best == null || step.gainBits() > best.gainBits();
                if (step.aim() == aim && step.isRecommended() && better) {
                    best = step;
                }
            }
            double gain = best == null ? 0 : best.gainBits();
            score += wanted.getValue() * claims.get(aim) * (Priority.FLOOR_BITS + gain);
            String chance = String.format(Locale.ROOT, "%s %.2f", aim.claim(), claims.get(aim));
            words.add(
                    best == null
                            ? chance + ", no further observation would change the decision"
                            : chance
                                    + String.format(
                                            Locale.ROOT, ", %s adds %.2f bit", best.label(), gain));
        }
        return new Priority(score, claims, String.join("; ", words));
    }
}
