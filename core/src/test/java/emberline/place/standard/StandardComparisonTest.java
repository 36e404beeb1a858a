package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.TypeEstimate;
import emberline.place.standard.PairFit.Outcome;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.read.ProductTable;
import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;

class StandardComparisonTest {

    private static final Set<Range> NEAR_INFRARED = Set.of(Range.Y, Range.J, Range.H, Range.K);

    /** An invented spectrum: a slope and bands that deepen with the type. */
    private static PreparedSpectrum invented(
            double type, double low, double high, double power, double scale) {
        List<double[]> pixels = new ArrayList<>();
        for (double w = low; w < high; w *= 1 + 1 / (2.5 * power)) {
            double depth = 0.05 * type;
            double water =
                    Math.exp(-Math.pow((w - 1.15) / 0.04, 2))
                            + Math.exp(-Math.pow((w - 1.5) / 0.06, 2))
                            + Math.exp(-Math.pow((w - 2.0) / 0.08, 2));
            double methane =
                    Math.max(0, type - 15) * 0.1 * Math.exp(-Math.pow((w - 2.25) / 0.06, 2))
                            + Math.max(0, type - 18)
                                    * 0.25
                                    * Math.exp(-Math.pow((w - 1.68) / 0.05, 2))
                            + Math.max(0, type - 21)
                                    * 0.6
                                    * Math.exp(-Math.pow((w - 1.31) / 0.03, 2));
            double flux = scale * Math.exp(-depth * water - methane) / w;
            pixels.add(new double[] {w, flux, 0.01 * flux});
        }
        return new PreparedSpectrum(
                Spectrum.of(column(pixels, 0), column(pixels, 1), column(pixels, 2)),
                new ResolvingPower(power, ResolvingPower.Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }

    private static double[] column(List<double[]> pixels, int column) {
        return pixels.stream().mapToDouble(pixel -> pixel[column]).toArray();
    }

    private static Standard standard(double type, double low, double high, double power) {
        String name = "S" + type + " " + low;
        return new Standard(name, type, name, "", invented(type, low, high, power, 1 + type));
    }

    private static List<Standard> sequence() {
        List<Standard> standards = new ArrayList<>();
        for (double type = 6; type <= 28; type++) {
            standards.add(standard(type, 0.65, 2.45, type % 2 == 0 ? 120 : 800));
        }
        return standards;
    }

    /** Standards of other resolving power, flux scale and range than the object. */
    @Test
    void theTypeIsFoundWhateverScaleAndResolvingPower() {
        StandardComparison comparison = new StandardComparison(sequence());
        for (double power : new double[] {70, 300, 2000}) {
            StandardVerdict verdict =
                    comparison.compare(List.of(invented(14, 0.65, 2.45, power, 7e-15)), s -> false);
            TypeEstimate type = verdict.type().orElseThrow();
            assertEquals(14, type.typeNumber(), 0.7, "R " + power);
            assertEquals(14, verdict.best().get(0).first().typeNumber(), 1);
            assertEquals(5, verdict.best().size());
            assertEquals(23, verdict.compared());
            assertEquals(List.of(Range.values()), verdict.ranges());
            for (Range range : Range.values()) {
                assertTrue(verdict.byRange().containsKey(range), range + " " + verdict);
            }
            assertTrue(verdict.findings(Optional.of(TypeEstimate.normal(14.5, 0.5))).isEmpty());
        }
    }

    @Test
    void rangesThatMostStandardsShareAreComparedTogether() {
        List<Standard> standards = new ArrayList<>();
        for (double type = 6; type <= 20; type++) {
            standards.add(standard(type, 1.05, 1.85, 120)); // J and H
        }
        standards.add(standard(10, 0.65, 2.45, 120));
        StandardVerdict verdict =
                new StandardComparison(standards)
                        .compare(List.of(invented(12, 0.65, 2.45, 120, 1)), s -> false);
        assertEquals(List.of(Range.J, Range.H), verdict.ranges());
        assertEquals(16, verdict.compared());
        assertEquals(12, verdict.type().orElseThrow().typeNumber(), 0.7);
        assertEquals(1, verdict.byRange().get(Range.K).compared());
    }

    @Test
    void eachRangeIsTakenFromASpectrumThatCoversIt() {
        StandardVerdict verdict =
                new StandardComparison(sequence())
                        .compare(
                                List.of(
                                        invented(12, 0.65, 0.96, 800, 1),
                                        invented(12, 0.97, 2.45, 120, 5)),
                                s -> false);
        assertEquals(NEAR_INFRARED, new HashSet<>(verdict.ranges()));
        assertEquals(1, verdict.spectrum());
        assertTrue(verdict.byRange().containsKey(Range.OPTICAL));
    }

    @Test
    void theObjectItselfIsNoStandard() {
        StandardVerdict verdict =
                new StandardComparison(sequence())
                        .compare(
                                List.of(invented(14, 0.65, 2.45, 120, 1)),
                                s -> s.typeNumber() == 14);
        assertEquals(22, verdict.compared());
        assertTrue(verdict.best().stream().allMatch(m -> m.first().typeNumber() != 14));
    }

    @Test
    void whatCannotBeComparedSaysWhy() {
        assertThrows(IllegalArgumentException.class, () -> new StandardComparison(List.of()));
        StandardComparison optical = new StandardComparison(List.of(standard(8, 0.65, 0.97, 800)));
        StandardVerdict verdict =
                optical.compare(List.of(invented(12, 0.97, 2.45, 120, 1)), s -> false);
        assertTrue(verdict.type().isEmpty());
        assertEquals("no standard covers a range that the object covers", verdict.reason());
        assertEquals("standards-not-compared", verdict.findings(Optional.empty()).get(0).code());
        StandardVerdict nothing =
                optical.compare(List.of(invented(12, 2.5, 3, 120, 1)), s -> false);
        assertTrue(nothing.reason().contains("is covered well enough"), nothing.reason());
    }

    @Test
    void disagreementWithThePosteriorAndBadFitsAreFindings() {
        StandardVerdict verdict =
                new StandardComparison(sequence())
                        .compare(List.of(invented(14, 0.65, 2.45, 120, 1)), s -> false);
        List<Finding> findings = verdict.findings(Optional.of(TypeEstimate.normal(20, 0.6)));
        assertEquals("standards-disagree", findings.get(0).code());
        assertTrue(findings.get(0).text().contains("joint sigma"), findings.toString());
        StandardVerdict bad =
                new StandardComparison(List.of(standard(6, 0.65, 2.45, 120)))
                        .compare(List.of(invented(28, 0.65, 2.45, 120, 1)), s -> false);
        assertTrue(
                bad.findings(Optional.empty()).stream()
                        .anyMatch(f -> f.code().equals("standards-fit-badly")),
                bad.toString());
        assertTrue(bad.pair().isEmpty());
    }

    @Test
    void aSumIsNoCandidateWhereFalseAlarmsCannotBeTold() {
        List<Standard> few =
                List.of(
                        standard(8, 0.65, 2.45, 120),
                        standard(14, 0.65, 2.45, 120),
                        standard(25, 0.65, 2.45, 120));
        PreparedSpectrum a = invented(14, 0.65, 2.45, 120, 1);
        PreparedSpectrum b = invented(25, 0.65, 2.45, 120, 0.35);
        double[] flux = a.spectrum().fluxes();
        for (int i = 0; i < flux.length; i++) {
            flux[i] += b.spectrum().flux(i);
        }
        PreparedSpectrum blend =
                new PreparedSpectrum(
                        a.spectrum().withFluxes(flux, a.spectrum().fluxSigmas()),
                        a.resolvingPower(),
                        a.noise(),
                        List.of());
        PairFit fit =
                new StandardComparison(few)
                        .compare(List.of(blend), s -> false)
                        .pair()
                        .orElseThrow();
        assertEquals(14, fit.pair().first().typeNumber());
        assertEquals(25, fit.pair().second().orElseThrow().typeNumber());
        assertEquals(1, fit.pair().scale() * (1 + 14), 0.1);
        assertTrue(fit.confidence() > 0.9, fit.toString());
        assertTrue(fit.pFalseAlarm().isEmpty());
        assertEquals(Outcome.UNSURE, fit.outcome());
        PairFit rich =
                new StandardComparison(sequence())
                        .compare(List.of(blend), s -> false)
                        .pair()
                        .orElseThrow();
        assertEquals(Outcome.CANDIDATE, rich.outcome(), rich.toString());
        assertTrue(rich.pFalseAlarm().getAsDouble() <= 0.05);
    }

    @Test
    void aSpectrumFitsItselfWithItsScale() {
        Standard self = standard(9, 0.65, 2.45, 120);
        StandardMatch match =
                new StandardComparison(List.of(self))
                        .compare(List.of(invented(9, 0.65, 2.45, 120, 30)), s -> false)
                        .best()
                        .get(0);
        assertEquals(3, match.scale(), 1e-6); // standards have the scale 1 + type
        assertEquals(0, match.chiSquare(), 1e-6);
        assertFalse(match.second().isPresent());
    }

    /**
     * Real field dwarfs, each compared with those of other objects: rms 0.97 subclass for all, the
     * sparse T dwarfs included.
     */
    @Test
    void leftOutDwarfsAreLikeTheirNeighboursInType() throws Exception {
        List<Standard> standards = SharedStandards.of("A");
        StandardComparison comparison = new StandardComparison(standards);
        double squares = 0;
        int inside = 0;
        int count = 0;
        for (Standard one : standards) {
            if (one.typeNumber() < 20) {
                TypeEstimate type =
                        comparison
                                .compare(
                                        List.of(one.prepared()), s -> s.group().equals(one.group()))
                                .type()
                                .orElseThrow();
                double off = type.typeNumber() - one.typeNumber();
                squares += off * off;
                inside += Math.abs(off) <= type.sigmaSubclass() ? 1 : 0;
                count++;
            }
        }
        assertTrue(Math.sqrt(squares / count) < 0.8, "rms " + Math.sqrt(squares / count));
        double share = inside / (double) count;
        assertTrue(share > 0.65 && share < 0.95, "in 68%: " + share);
    }

    /** A straight line is its own mean at the middle of a bin, whatever the pixels. */
    @Test
    void binsKeepTheFlux() {
        double[] micron = new double[900];
        double[] flux = new double[900];
        double[] sigma = new double[900];
        for (int i = 0; i < micron.length; i++) {
            micron[i] = 1.09 + 3.1e-4 * i;
            flux[i] = 2 + 3 * micron[i];
            sigma[i] = 0.1;
        }
        PreparedSpectrum line =
                new PreparedSpectrum(
                        Spectrum.of(micron, flux, sigma),
                        new ResolvingPower(2000, ResolvingPower.Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of());
        CommonGrid grid = new CommonGrid(100);
        Binned binned = grid.of(line);
        for (int bin = grid.from(Range.J); bin < grid.to(Range.J); bin++) {
            assertEquals(2 + 3 * grid.centreMicron(bin), binned.flux(bin), 2e-3);
            double pixels = grid.centreMicron(bin) / 100 / 3.1e-4;
            assertEquals(0.1 / Math.sqrt(pixels), binned.sigma(bin), 0.1 / pixels);
        }
        assertEquals(Set.of(Range.J), binned.covered());
        assertTrue(Double.isNaN(binned.flux(grid.from(Range.K))));
    }

    /** The table of absolute magnitudes repeats a relation of the judgement. */
    @Test
    void absoluteMagnitudesAreThoseOfTheRelation() {
        Map<String, String> relation = new HashMap<>();
        ProductTable.at("/emberline/judge/relations.csv").rows().stream()
                .filter(row -> row.getField("id").equals("m-j-2m-field"))
                .forEach(row -> relation.putAll(row.getFieldsAsMap()));
        ProductTable.at("/emberline/place/standard/absolute-j.csv")
                .rows()
                .forEach(
                        row -> {
                            double x =
                                    Double.parseDouble(row.getField("type_number"))
                                            - Double.parseDouble(relation.get("x0"));
                            double mag = 0;
                            for (int k = 7; k >= 0; k--) {
                                String c = relation.get("c" + k);
                                mag = mag * x + (c.isEmpty() ? 0 : Double.parseDouble(c));
                            }
                            assertEquals(mag, Double.parseDouble(row.getField("j_mag")), 0.001);
                            assertEquals(relation.get("rms"), row.getField("scatter_mag"));
                        });
    }
}
