package emberline.judge.plan;

import emberline.judge.Aim;
import emberline.judge.Evidence;
import emberline.judge.Judge;
import emberline.judge.Judgement;
import emberline.judge.NextStep;
import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import emberline.place.calibrated.Forecast;
import emberline.place.calibrated.TypePrior;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import org.apache.commons.math3.stat.descriptive.rank.Median;

/**
 * Plans spectra: for each signal-to-noise it draws what would be measured, places it as any
 * spectrum, and judges it. The same random numbers are used at every signal-to-noise, so that the
 * steps differ by the noise alone.
 */
public final class SignalPlanner {

    private static final long SEEDS_APART = 0x9E3779B97F4A7C15L;

    private final Forecast forecast;
    private final Judge judge;
    private final TypePrior prior;

    /**
     * A planner.
     *
     * @param forecast draws spectra
     * @param judge judges them; its aims must hold that of the plan
     * @param prior what the forecast takes as known of types before
     */
    public SignalPlanner(Forecast forecast, Judge judge, TypePrior prior) {
        this.forecast = forecast;
        this.judge = judge;
        this.prior = prior;
    }

    /** What one drawn spectrum tells. */
    private record Told(double probability, boolean wrong, double typeSigma, String next) {}

    /**
     * Plans.
     *
     * @param question object, instrument and aim
     * @return one step for each signal-to-noise
     * @throws IllegalArgumentException if spectra of such a resolution and type are not known
     */
    public SignalPlan plan(PlanQuestion question) {
        List<String> features = forecast.features(question.setting());
        List<SignalPlan.Step> steps = new ArrayList<>();
        String next = "";
        for (double signal : question.signals()) {
            List<Told> told = new ArrayList<>();
            for (int draw = 0; draw < question.draws(); draw++) {
                long seed = question.seed() + draw * SEEDS_APART;
                forecast.draw(question.setting(), signal, seed)
                        .posterior()
                        .ifPresent(posterior -> told.add(told(question, posterior)));
            }
            if (told.isEmpty()) {
                throw new IllegalArgumentException(
                        "only "
                                + features.size()
                                + " calibrated features are known from spectra of such a type at"
                                + " this resolving power, which is too few: expected a type from M4"
                                + " to T8 and a resolving power of about 120, 750 or 2000");
            }
            steps.add(step(question, signal, told));
            next = mostFrequent(told);
        }
        return new SignalPlan(question, features.size(), steps, next);
    }

    private static SignalPlan.Step step(PlanQuestion question, double signal, List<Told> told) {
        double sure = told.stream().filter(t -> t.probability() >= question.sure()).count();
        double wrong = told.stream().filter(Told::wrong).count();
        return new SignalPlan.Step(
                signal,
                median(told, Told::probability),
                sure / told.size(),
                question.aim() == PlanAim.GRAVITY
                        ? OptionalDouble.of(wrong / told.size())
                        : OptionalDouble.empty(),
                median(told, Told::typeSigma));
    }

    private static double median(List<Told> told, ToDoubleFunction<Told> of) {
        return new Median().evaluate(told.stream().mapToDouble(of).toArray());
    }

    /** The words that most draws give; of equals the first by the alphabet. */
    private static String mostFrequent(List<Told> told) {
        Map<String, Long> counts =
                told.stream()
                        .collect(
                                Collectors.groupingBy(
                                        Told::next, TreeMap::new, Collectors.counting()));
        return Collections.max(counts.entrySet(), Map.Entry.comparingByValue()).getKey();
    }

    private Told told(PlanQuestion question, TypePosterior posterior) {
        double typeSigma = posterior.estimate().sigmaSubclass();
        if (question.aim() == PlanAim.GRAVITY) {
            GravityClass truth = question.setting().gravity();
            boolean wrong =
                    Arrays.stream(GravityClass.values())
                            .filter(gravity -> gravity != truth)
                            .anyMatch(g -> posterior.probability(g) >= question.sure());
            return new Told(posterior.probability(truth), wrong, typeSigma, "");
        }
        Judgement judgement =
                judge.judge(
                        Evidence.of(
                                posterior, prior.classShares(posterior.estimate().typeNumber())));
        return new Told(
                certainty(question.aim(), judgement),
                false,
                typeSigma,
                judgement.nextSteps().stream().anyMatch(NextStep::isRecommended)
                        ? judgement.nextStepWords()
                        : "");
    }

    private static double certainty(PlanAim aim, Judgement judgement) {
        return switch (aim) {
            case SUBSTELLAR ->
                    Math.max(
                            judgement.limits().pSubstellarLow(),
                            1 - judgement.limits().pSubstellarHigh());
            case YOUNG -> ofEitherSide(judgement.age().pYoung());
            case COOLEST -> ofEitherSide(judgement.priority().pByAim().get(Aim.COOLEST));
            case GRAVITY -> throw new IllegalArgumentException("gravity is placed, not judged");
        };
    }

    private static double ofEitherSide(double probability) {
        return Math.max(probability, 1 - probability);
    }
}
