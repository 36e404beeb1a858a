package emberline.reports.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.judge.Judgement;
import emberline.judge.LedgerEntry;
import emberline.judge.MassAgePlane;
import emberline.judge.MassLimits;
import emberline.place.calibrated.Contribution;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import emberline.reports.chart.Layer.Block;
import emberline.survey.ObjectResult;
import java.util.List;
import org.junit.jupiter.api.Test;

class EvidenceChartsTest {

    private static final ObjectResult OBJECT = Samples.judged(Samples.lDwarf());

    private static Judgement judgement() {
        return OBJECT.judgement().orElseThrow();
    }

    private static List<Block> blocks(Chart chart, Tone tone) {
        return chart.layers(Layer.Blocks.class).stream()
                .filter(layer -> layer.tone() == tone)
                .flatMap(layer -> layer.blocks().stream())
                .toList();
    }

    @Test
    void theLedgerStepsFromThePriorToTheResult() {
        var ledger = judgement().substellarLedger();
        Chart chart = LedgerChart.of(ledger);
        double odds = ledger.priorLog10Odds();
        for (LedgerEntry entry : ledger.entries()) {
            double then = odds + entry.log10Factor();
            double low = Math.min(odds, then);
            double high = Math.max(odds, then);
            Tone tone = then >= odds ? Tone.TOWARDS : Tone.AGAINST;
            assertTrue(
                    blocks(chart, tone).stream()
                            .anyMatch(b -> b.left() == low && b.right() == high),
                    entry.label());
            odds = then;
        }
        assertEquals(ledger.finalLog10Odds(), odds, 1e-9);
        Layer.Point result = chart.layers(Layer.Points.class).get(0).points().get(0);
        assertEquals(ledger.finalLog10Odds(), result.x());
        assertEquals(ledger.entries().size() + 2, chart.y().ticks().size());
    }

    @Test
    void regionsHoldTheirShareAndLieInEachOther() {
        MassAgePlane plane = judgement().plane();
        Chart chart = MassAgeChart.of(judgement());
        double inner = share(plane, blocks(chart, Tone.RESULT_68));
        double outer = share(plane, blocks(chart, Tone.RESULT_95));
        assertTrue(inner >= 0.68 && inner < 0.9, "inner " + inner);
        assertTrue(outer >= 0.95, "outer " + outer);
        Block limit = blocks(chart, Tone.LIMIT).get(0);
        assertEquals(Math.log10(MassLimits.standard().hydrogenLowMsun()), limit.bottom());
        assertEquals(0.075, Math.pow(10, limit.top()), 1e-9);
    }

    private static double share(MassAgePlane plane, List<Block> region) {
        double sum = 0;
        for (int a = 0; a < plane.ages(); a++) {
            for (int m = 0; m < plane.masses(); m++) {
                double age = Math.log10(plane.ageEdgeMyr(a)) + 1e-6;
                double mass = Math.log10(plane.massEdgeMsun(m)) + 1e-6;
                boolean inside =
                        region.stream()
                                .anyMatch(
                                        b ->
                                                age >= b.left()
                                                        && age <= b.right()
                                                        && mass >= b.bottom()
                                                        && mass <= b.top());
                sum += inside ? plane.probability(a, m) : 0;
            }
        }
        return sum;
    }

    @Test
    void contributionsStandOnTheirSide() {
        List<Contribution> contributions =
                List.of(
                        new Contribution("burgasser2006/h2o-j", 0.2, 0.3, 0.4, false),
                        new Contribution("burgasser2006/h2o-h", -0.2, -0.3, 0.4, false),
                        new Contribution("allers2013/ki_j", 5, 0.1, 0.2, true));
        Chart chart = ContributionChart.of(contributions, Samples.CATALOGUE, 9);
        assertEquals(0.3, blocks(chart, Tone.TOWARDS).get(0).right());
        assertEquals(-0.3, blocks(chart, Tone.AGAINST).get(0).left());
        assertEquals(1, blocks(chart, Tone.SET_ASIDE).size());
        assertEquals(3, chart.y().ticks().size());
        assertTrue(chart.y().ticks().get(0).label().startsWith("H2O-J"));
        Chart few =
                ContributionChart.of(
                        OBJECT.placement().orElseThrow().calibrated().contributions(),
                        Samples.CATALOGUE,
                        5);
        assertEquals(5, few.y().ticks().size());
    }

    @Test
    void linesAreShownWhereTheyAreResolved() {
        assertEquals(List.of(), LineInset.of(Samples.lDwarf(), Samples.CATALOGUE, 5));
        ObjectResult fine =
                Samples.object(
                        "fine", Samples.spectrum(1.1, 1.35, 3000, Bands.L_DWARF, 80, 5), 2000);
        List<Chart> charts = LineInset.of(fine, Samples.CATALOGUE, 5);
        assertEquals(List.of("K I", "K I"), charts.stream().map(Chart::title).toList());
        for (Chart chart : charts) {
            assertEquals(chart.layers(Layer.Segment.class).get(0).tone(), Tone.LINE);
            assertTrue(chart.layers(Curve.class).get(0).hasBand());
        }
        ObjectResult optical =
                Samples.object(
                        "optical", Samples.spectrum(0.6, 0.95, 4000, Bands.L_DWARF, 80, 5), 1800);
        assertEquals(
                List.of("H\u03b1", "Li I", "K I", "Na I"),
                LineInset.of(optical, Samples.CATALOGUE, 5).stream().map(Chart::title).toList());
    }

    @Test
    void kindsAreSortedByProbability() {
        var verdict = OBJECT.placement().orElseThrow().kind();
        Chart chart = KindChart.of(verdict);
        assertEquals(verdict.probabilities().size(), chart.y().ticks().size());
        assertEquals(verdict.kind().orElseThrow().label(), chart.y().ticks().get(0).label());
    }
}
