package emberline.reports.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.Placement;
import emberline.place.RelationEstimate.Use;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import emberline.reports.chart.LabelRows.Wanted;
import emberline.reports.chart.PlacedLabel.Span;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ChartTest {

    private static final ChartSize SIZE = new ChartSize(470, 250, 6.6);
    private static final TextWidth WIDTH = (text, size) -> text.length() * size * 0.6;

    private static Chart spectrumChart(ObjectResult object) {
        return new SpectrumChart(Samples.CATALOGUE, SIZE, WIDTH).of(object).chart();
    }

    @Test
    void theSpectrumIsNormalisedToItsPeakAndInsideItsAxes() {
        Chart chart = spectrumChart(Samples.tDwarf());
        Curve curve = chart.layers(Curve.class).get(0);
        double highest = 0;
        for (int i = 0; i < curve.size(); i++) {
            highest = Math.max(highest, curve.y(i));
            assertTrue(curve.x(i) > chart.x().low() && curve.x(i) < chart.x().high());
        }
        assertEquals(1, highest, 0.12);
        assertTrue(curve.hasBand());
        assertTrue(curve.ceiling() < chart.y().high(), "no room is left for labels");
    }

    @Test
    void bandsFollowTheType() {
        assertTrue(labels(Samples.tDwarf()).contains("CH\u2084"));
        assertFalse(labels(Samples.demoLDwarf()).contains("CH\u2084"));
        assertTrue(labels(Samples.demoLDwarf()).contains("CO"));
    }

    private static List<String> labels(ObjectResult object) {
        return spectrumChart(object).layers(Layer.Labels.class).get(0).labels().stream()
                .map(PlacedLabel::text)
                .toList();
    }

    @Test
    void gapsAreHatchedAndBreakTheCurve() {
        Spectrum gappy =
                Samples.withGap(Samples.spectrum(0.8, 2.45, 600, Bands.L_DWARF, 60, 9), 1.34, 1.45);
        Chart chart = spectrumChart(Samples.object("Gap", gappy, 120));
        List<Layer.Region> hatched =
                chart.layers(Layer.Region.class).stream().filter(Layer.Region::hatched).toList();
        assertEquals(1, hatched.size());
        assertEquals(1.34, hatched.get(0).from(), 0.01);
        assertEquals(1.45, hatched.get(0).to(), 0.01);
        Curve curve = chart.layers(Curve.class).get(0);
        long breaks = 0;
        for (int i = 0; i < curve.size(); i++) {
            breaks += Double.isFinite(curve.y(i)) ? 0 : 1;
        }
        assertEquals(1, breaks);
    }

    @Test
    void manyPixelsAreReducedWithoutLosingExtremes() {
        Spectrum fine = Samples.spectrum(0.8, 2.45, 30_000, Bands.L_DWARF, 100, 5);
        Reduction reduction = Reduction.ofPixels(fine, 0.79, 2.46, 500);
        assertTrue(reduction.size() <= 1100, reduction.size() + " points");
        double highest = Double.NEGATIVE_INFINITY;
        for (double flux : fine.fluxes()) {
            highest = Math.max(highest, flux);
        }
        assertEquals(highest, reduction.quantile(1), 0);
    }

    @Test
    void aNoisySpectrumIsShownAsMeansOverItsPixels() {
        ObjectResult noisy =
                Samples.object(
                        "Noisy", Samples.spectrum(0.8, 2.45, 4000, Bands.L_DWARF, 3, 9), 750);
        SpectrumChart.Drawn drawn = new SpectrumChart(Samples.CATALOGUE, SIZE, WIDTH).of(noisy);
        assertEquals(2, drawn.chart().layers(Curve.class).size());
        assertTrue(drawn.remark().contains("means of up to 15 pixels"), drawn.remark());
    }

    @Test
    void everyCombinedRelationHasAPointAtItsType() {
        Placement placement = Samples.lDwarf().placement().orElseThrow();
        Chart chart = PosteriorChart.of(placement, Samples.CATALOGUE, 20);
        long combined =
                placement.published().estimates().stream()
                        .filter(e -> e.use() == Use.COMBINED)
                        .count();
        Layer.Points used =
                chart.layers(Layer.Points.class).stream()
                        .filter(p -> p.tone() == Tone.USED)
                        .findFirst()
                        .orElseThrow();
        assertEquals(combined, used.points().size());
        Layer.Points result =
                chart.layers(Layer.Points.class).stream()
                        .filter(p -> p.tone() == Tone.USED && !p.filled())
                        .findFirst()
                        .orElseThrow();
        double published = placement.published().type().orElseThrow().typeNumber();
        assertEquals(published, result.points().get(0).x(), 0);
        Layer.Segment mark = chart.layers(Layer.Segment.class).get(0);
        assertEquals(published, mark.fromX(), 0);
        assertTrue(mark.dashed() && mark.toY() < -1, "the posterior has no mark of it");
        assertEquals(chart.y().ticks().size(), 2 + used.points().size() + aside(chart));
    }

    private static int aside(Chart chart) {
        return chart.layers(Layer.Points.class).stream()
                .filter(p -> p.tone() == Tone.SHOWN)
                .mapToInt(p -> p.points().size())
                .sum();
    }

    /** The areas must agree with the scores: 2 lies in the area of very low gravity. */
    @Test
    void theObjectLiesInTheAreaOfItsScore() {
        ObjectResult object = Samples.demoLDwarf();
        Placement placement = object.placement().orElseThrow();
        List<Tone> tones = List.of(Tone.FIELD, Tone.INTERMEDIATE, Tone.VERY_LOW);
        int checked = 0;
        for (var score : placement.gravity().scores()) {
            if (score.score().isEmpty()) {
                continue;
            }
            Chart chart =
                    new GravityChart(
                                    Samples.CATALOGUE,
                                    emberline.place.calibrated.Calibration.standard())
                            .of(score, placement.type());
            Layer.Point point = chart.layers(Layer.Points.class).get(0).points().get(0);
            for (Layer.Area area : chart.layers(Layer.Area.class)) {
                boolean inside =
                        point.y() > at(area.lower(), point.x())
                                && point.y() < at(area.upper(), point.x());
                boolean expected = area.tone() == tones.get(score.score().getAsInt());
                assertEquals(expected, inside, score.feature().id() + " " + area.tone());
            }
            checked++;
        }
        assertTrue(checked >= 1);
    }

    private static double at(List<Layer.Vertex> chain, double x) {
        for (int i = 1; i < chain.size(); i++) {
            Layer.Vertex a = chain.get(i - 1);
            Layer.Vertex b = chain.get(i);
            if (x >= a.x() && x <= b.x()) {
                return a.y() + (b.y() - a.y()) * (x - a.x()) / (b.x() - a.x());
            }
        }
        throw new IllegalArgumentException("x = " + x + " outside the chain");
    }

    @Test
    void labelsNeverTouch() {
        Random random = new Random(2);
        List<Wanted> wanted = new ArrayList<>();
        for (int i = 0; i < 60; i++) {
            double from = 100 * random.nextDouble();
            Span span = new Span(from, from + 8 * random.nextDouble());
            wanted.add(new Wanted("B" + i % 7, 2 + i % 5, List.of(span), Tone.BAND));
        }
        List<PlacedLabel> placed = new LabelRows(0, 110, 1, 6).place(wanted);
        assertTrue(placed.size() > 10);
        for (int i = 0; i < placed.size(); i++) {
            for (int k = 0; k < i; k++) {
                PlacedLabel one = placed.get(i);
                PlacedLabel two = placed.get(k);
                boolean apart =
                        one.row() != two.row() || from(one) > to(two) || from(two) > to(one);
                assertTrue(apart, one + " touches " + two);
            }
        }
    }

    private static double from(PlacedLabel label) {
        return label.spans().stream().mapToDouble(Span::from).min().orElseThrow();
    }

    private static double to(PlacedLabel label) {
        return label.spans().stream().mapToDouble(Span::to).max().orElseThrow();
    }

    @Test
    void ticksAreRound() {
        assertEquals(
                List.of("0.8", "1.0", "1.2"),
                Ticks.round(0.75, 1.3, 3).stream().map(Axis.Tick::label).toList());
        assertEquals(
                List.of("\u22120.50", "\u22120.25", "0.00", "0.25"),
                Ticks.round(-0.6, 0.3, 4).stream().map(Axis.Tick::label).toList());
        assertEquals("L0", Ticks.types(9.5, 10.5, 2).get(0).label());
    }

    @Test
    void anAxisRefusesNaN() {
        assertThrows(
                IllegalArgumentException.class, () -> new Axis("", "", 0, Double.NaN, List.of()));
    }
}
