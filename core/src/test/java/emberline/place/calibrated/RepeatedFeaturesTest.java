package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedList;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.spectrum.Candidate;
import emberline.survey.ObjectGroup;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** How far spectra of one object differ beyond their noise, on the public spectra. */
class RepeatedFeaturesTest {

    private record Pair(String name, double type, Measurements one, Measurements two) {}

    private static List<Pair> pairs() throws Exception {
        Map<String, List<Candidate>> groups = new LinkedHashMap<>();
        for (Candidate candidate : SharedList.candidates()) {
            if (candidate.text("known_kind").orElse("").equals("dwarf")
                    && candidate.number("known_type_number").isPresent()
                    && !candidate.name().contains("verage")) {
                groups.computeIfAbsent(
                                ObjectGroup.of(candidate)
                                        + candidate.text("known_type_number").orElseThrow(),
                                g -> new ArrayList<>())
                        .add(candidate);
            }
        }
        Measurer measurer = new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
        List<Pair> pairs = new ArrayList<>();
        for (Map.Entry<String, List<Candidate>> group : groups.entrySet()) {
            List<Measurements> measured = new ArrayList<>();
            for (Candidate candidate : group.getValue()) {
                measured.add(measurer.measure(SharedList.prepared(candidate)));
            }
            for (int a = 0; a < measured.size(); a++) {
                for (int b = a + 1; b < measured.size(); b++) {
                    pairs.add(
                            new Pair(
                                    group.getValue().get(a).name(),
                                    group.getValue()
                                            .get(a)
                                            .number("known_type_number")
                                            .getAsDouble(),
                                    measured.get(a),
                                    measured.get(b)));
                }
            }
        }
        return pairs;
    }

    @Tag("slow")
    @Test
    void independentSpectraOfOneObjectSeldomContradictEachOther() throws Exception {
        Calibration calibration = Calibration.standard();
        SeveralSpectra several =
                new SeveralSpectra(
                        calibration, new CalibratedWitness(calibration, TypePriors.FLAT.load()));
        int compared = 0;
        for (Pair pair : pairs()) {
            SeveralSpectra.Repeats repeats = several.repeats(pair.one, pair.two, pair.type);
            compared += repeats.features().isEmpty() ? 0 : 1;
            assertTrue(
                    repeats.chance() > 1e-3,
                    pair.name
                            + ": chi-square "
                            + repeats.chiSquare()
                            + " of "
                            + repeats.features().size());
        }
        assertTrue(compared > 20, compared + " pairs");
    }

    /** The calibration error that is assumed, against the objects that two instruments saw. */
    @Tag("slow")
    @Test
    void theCalibrationErrorIsThatOfRepeatedFeatures() throws Exception {
        List<String> independent =
                List.of("2MASS J15065441+1321060", "SIMP J1150+0520", "SIMP J1613-0747");
        List<Double> shares = new ArrayList<>();
        for (Pair pair : pairs()) {
            List<double[]> own = new ArrayList<>();
            for (Locus locus : Calibration.standard().loci()) {
                Optional<Measured> a = pair.one.measured(locus.feature());
                Optional<Measured> b = pair.two.measured(locus.feature());
                if (a.isPresent() && b.isPresent()) {
                    double variance = Math.pow(locus.scatter(pair.type), 2);
                    double noise =
                            Math.pow(a.get().oneSigma(), 2) + Math.pow(b.get().oneSigma(), 2);
                    own.add(
                            new double[] {
                                Math.pow(a.get().value() - b.get().value(), 2) / variance,
                                noise / variance
                            });
                }
            }
            // the prism spectra of the same objects have too few features to say anything
            if (independent.contains(pair.name) && own.size() > 30) {
                shares.add(kappa(own));
            }
        }
        assertEquals(3, shares.size());
        assertTrue(
                shares.stream().mapToDouble(k -> k).min().orElseThrow()
                        < SeveralSpectra.CALIBRATION_SHARE);
        assertTrue(
                shares.stream().mapToDouble(k -> k).max().orElseThrow()
                        > SeveralSpectra.CALIBRATION_SHARE);
    }

    /** Calibration error in units of scatter for which half of the differences lie inside. */
    private static double kappa(List<double[]> all) {
        double low = 0;
        double high = 10;
        for (int i = 0; i < 50; i++) {
            double k = (low + high) / 2;
            long inside =
                    all.stream().filter(x -> x[0] < 0.6745 * 0.6745 * (x[1] + 2 * k * k)).count();
            if (inside * 2 > all.size()) {
                high = k;
            } else {
                low = k;
            }
        }
        return low;
    }
}
