package emberline.reports.attach;

import emberline.judge.Aim;
import emberline.judge.Estimate;
import emberline.judge.Judge;
import emberline.judge.Judgement;
import emberline.judge.Ledger;
import emberline.judge.LedgerEntry;
import emberline.judge.NextStep;
import emberline.spectrum.MagnitudeBand;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** What a table cannot hold of a judgement: ledgers, other grids, all further observations. */
final class JudgementJson {

    private static final int ODDS_DECIMALS = 3;

    private JudgementJson() {}

    static Map<String, Object> map(Judgement judgement) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("age", judgement.ageWords());
        map.put("age_prior", judgement.age().prior().text());
        map.put("age_information_bits", fixed(judgement.age().informationBits(), 3));
        map.put("age_myr_95", pair(judgement.age().ageMyr(), 0));
        map.put("mass_msun_95", pair(judgement.massMsun(), 4));
        map.put("log_l_method", judgement.properties().logLMethod());
        map.put("absolute_magnitudes", bands(judgement.properties().absoluteMagnitudes()));
        map.put("bolometric_corrections", bands(judgement.properties().bolometricCorrections()));
        map.put("substellar_ledger", ledger(judgement.substellarLedger()));
        map.put("young_ledger", ledger(judgement.youngLedger()));
        map.put(
                "other_grids",
                judgement.grids().stream()
                        .map(
                                grid -> {
                                    Map<String, Object> one = new LinkedHashMap<>();
                                    one.put("grid", grid.grid().label());
                                    one.put("p_substellar", fixed(grid.pSubstellar(), 3));
                                    one.put("mass_msun", fixed(grid.massMedianMsun(), 4));
                                    return one;
                                })
                        .toList());
        map.put(
                "further_observations",
                judgement.nextSteps().stream().map(JudgementJson::step).toList());
        Map<String, Object> aims = new LinkedHashMap<>();
        new EnumMap<>(judgement.priority().pByAim())
                .forEach((Aim aim, Double p) -> aims.put(aim.word(), fixed(p, 3)));
        map.put("probability_by_aim", aims);
        map.put(
                "sources",
                Judge.sources().stream()
                        .map(source -> source.key() + ": " + source.cite())
                        .toList());
        return map;
    }

    private static Object fixed(double value, int decimals) {
        return JsonText.number(Digits.fixed(value, decimals));
    }

    private static List<Object> pair(Estimate estimate, int decimals) {
        return List.of(fixed(estimate.lo95(), decimals), fixed(estimate.hi95(), decimals));
    }

    private static Map<String, Object> bands(Map<MagnitudeBand, Estimate> values) {
        Map<String, Object> map = new LinkedHashMap<>();
        values.forEach(
                (band, estimate) ->
                        map.put(
                                band.label(),
                                List.of(fixed(estimate.median(), 2), fixed(estimate.sigma(), 2))));
        return map;
    }

    private static Map<String, Object> ledger(Ledger ledger) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("claim", ledger.claim());
        map.put("prior_log10_odds", fixed(ledger.priorLog10Odds(), ODDS_DECIMALS));
        map.put("entries", ledger.entries().stream().map(JudgementJson::entry).toList());
        map.put("final_log10_odds", fixed(ledger.finalLog10Odds(), ODDS_DECIMALS));
        map.put("not_counted", ledger.notCounted());
        return map;
    }

    private static Map<String, Object> entry(LedgerEntry entry) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("evidence", entry.label());
        map.put("log10_factor", fixed(entry.log10Factor(), ODDS_DECIMALS));
        map.put("log10_factor_last", fixed(entry.log10FactorLast(), ODDS_DECIMALS));
        map.put("note", entry.note());
        return map;
    }

    private static Map<String, Object> step(NextStep step) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("observation", step.label());
        map.put("aim", step.aim().word());
        map.put("gain_bits", fixed(step.gainBits(), 4));
        map.put("p_change", fixed(step.pChange(), 3));
        map.put("recommended", step.isRecommended());
        map.put("min_resolution", optional(step.resolvingPower()));
        map.put("min_snr", optional(step.snr()));
        map.put("cost", step.cost());
        return map;
    }

    private static Object optional(OptionalDouble value) {
        return value.isPresent() ? fixed(value.getAsDouble(), 0) : null;
    }
}
