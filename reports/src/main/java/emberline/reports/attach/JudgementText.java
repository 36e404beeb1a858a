package emberline.reports.attach;

import emberline.judge.Estimate;
import emberline.judge.Judgement;
import emberline.judge.Ledger;
import emberline.judge.LedgerEntry;
import emberline.judge.Limits;
import emberline.judge.Properties;
import emberline.survey.ObjectResult;
import java.util.List;
import java.util.Locale;

/** Judgements as short blocks of lines for a terminal. */
public final class JudgementText {

    private JudgementText() {}

    /**
     * The judgements of objects, those that have one.
     *
     * @param results the results in their order
     * @return a block of lines for each, or nothing
     */
    public static String print(List<ObjectResult> results) {
        StringBuilder text = new StringBuilder();
        for (ObjectResult result : results) {
            result.judgement().ifPresent(j -> text.append(block(result.candidate().name(), j)));
        }
        return text.toString();
    }

    /**
     * A judgement as lines for a page.
     *
     * @param judgement the judgement
     * @return lines without line ends: decision, mass and age, properties, ledger, grids, next step
     */
    public static List<String> lines(Judgement judgement) {
        return block("Decision", judgement).strip().lines().map(String::strip).toList();
    }

    private static String block(String name, Judgement judgement) {
        Limits limits = judgement.limits();
        StringBuilder text = new StringBuilder("\n");
        line(
                text,
                AlignedTable.printable(name) + ": " + judgement.decision().word(),
                "P(substellar) %.3f at 0.072 Msun (%.3f at 0.070, %.3f at 0.075); P(< 13 Mjup)"
                        + " %.3f",
                limits.pSubstellar(),
                limits.pSubstellarLow(),
                limits.pSubstellarHigh(),
                limits.pPlanetaryMass());
        Estimate mass = judgement.massMsun();
        line(
                text,
                "  mass, age",
                "%.4f Msun (%.4f to %.4f); %s; P(age < 150 Myr) %.3f",
                mass.median(),
                mass.lo68(),
                mass.hi68(),
                judgement.ageWords(),
                judgement.age().pYoung());
        line(text, "  properties", "%s", properties(judgement.properties()));
        ledger(text, judgement.substellarLedger());
        if (!judgement.grids().isEmpty()) {
            StringBuilder grids = new StringBuilder();
            judgement
                    .grids()
                    .forEach(
                            g ->
                                    grids.append(grids.isEmpty() ? "" : ", ")
                                            .append(g.grid().label())
                                            .append(
                                                    String.format(
                                                            Locale.ROOT,
                                                            " %.3f",
                                                            g.pSubstellar())));
            line(text, "  other grids", "P(substellar) %s", grids);
        }
        line(text, "  next step", "%s", judgement.nextStepWords());
        return text.toString();
    }

    private static void ledger(StringBuilder text, Ledger ledger) {
        StringBuilder odds = new StringBuilder();
        odds.append(String.format(Locale.ROOT, "prior %+.2f", ledger.priorLog10Odds()));
        for (LedgerEntry entry : ledger.entries()) {
            odds.append(
                    String.format(
                            Locale.ROOT,
                            ", %s %+.2f%s",
                            entry.label(),
                            entry.log10Factor(),
                            entry.dependsOnOrder() ? "*" : ""));
        }
        boolean order = ledger.entries().stream().anyMatch(LedgerEntry::dependsOnOrder);
        line(
                text,
                "  log10 odds",
                "%s = %+.2f%s",
                odds,
                ledger.finalLog10Odds(),
                order ? "  (* depends on the order)" : "");
    }

    private static String properties(Properties properties) {
        StringBuilder text = new StringBuilder();
        properties.teffK().ifPresent(t -> add(text, "Teff %.0f +- %.0f K", t.median(), t.sigma()));
        properties
                .logL()
                .ifPresent(
                        l ->
                                add(
                                        text,
                                        "log L %.2f +- %.2f by " + properties.logLMethod(),
                                        l.median(),
                                        l.sigma()));
        add(text, "log g %.2f +- %.2f", properties.logG().median(), properties.logG().sigma());
        properties
                .distance()
                .ifPresent(
                        d ->
                                add(
                                        text,
                                        "%.1f pc (%.1f to %.1f) by " + d.method(),
                                        d.pc().median(),
                                        d.pc().lo68(),
                                        d.pc().hi68()));
        properties.kinematics().ifPresent(k -> add(text, "v_tan %.0f km/s", k.vtanKms()));
        return text.toString();
    }

    private static void add(StringBuilder text, String format, Object... values) {
        text.append(text.isEmpty() ? "" : ", ").append(String.format(Locale.ROOT, format, values));
    }

    private static void line(StringBuilder text, String head, String format, Object... values) {
        text.append(head)
                .append(": ")
                .append(String.format(Locale.ROOT, format, values))
                .append('\n');
    }
}
