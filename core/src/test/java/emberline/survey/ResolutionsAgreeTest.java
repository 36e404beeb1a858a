package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Kind;
import emberline.catalogue.Purpose;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measuring;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.spectrum.Candidate;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/**
 * The same object seen by two instruments of different resolution must give the same indices. The
 * two spectra also differ by slit losses, telluric correction and the object's own weather, which
 * the pixel noise does not hold: hence the allowance of 0.02 beside the errors. Colours are left
 * out: they compare bands far apart, and measure the flux calibration of the two instruments.
 */
class ResolutionsAgreeTest {

    /** Names of pairs in the list: a coarse spectrum and a finer one of the same object. */
    private static final List<List<String>> PAIRS =
            List.of(
                    List.of("LHS 2924 (2)", "LHS 2924"),
                    List.of("2MASSW J1506544+132106", "2MASS J15065441+1321060"),
                    List.of("2MASS J1247-3816", "2MASS J1247-3816 (2)"),
                    List.of("2MASS J1207-3932", "2MASSW J1207334-393254 A"),
                    List.of("SIMP J1150+0520 (2)", "SIMP J1150+0520"),
                    List.of("SIMP J1343-1216 (3)", "SIMP J1343-1216"));

    private static Measurements measurements(CandidateList list, String name, Path folder) {
        Candidate candidate =
                list.rows().stream()
                        .map(ListedCandidate::candidate)
                        .filter(c -> c.name().equals(name))
                        .findFirst()
                        .orElseThrow();
        return new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults())
                .run(candidate, folder)
                .best()
                .orElseThrow();
    }

    @Test
    void indicesOfTheSameObjectAgreeAcrossResolutions() throws Exception {
        Path folder = SharedSpectra.folder();
        CandidateList list = new CandidateListReader().read(folder.resolve("list.csv"));
        Map<String, List<Double>> excess = new TreeMap<>();
        for (List<String> pair : PAIRS) {
            Measurements coarse = measurements(list, pair.get(0), folder);
            Measurements fine = measurements(list, pair.get(1), folder);
            for (FeatureMeasurement one : coarse.all()) {
                String id = one.feature().id();
                boolean both =
                        one.feature().kind() == Kind.BAND_INDEX
                                && one.feature().purpose() != Purpose.COLOUR
                                && coarse.measured(id).isPresent()
                                && fine.measured(id).isPresent();
                if (both) {
                    Measured a = coarse.measured(id).orElseThrow();
                    Measured b = fine.measured(id).orElseThrow();
                    excess.computeIfAbsent(id, unseen -> new ArrayList<>())
                            .add(
                                    Math.abs(a.value() - b.value())
                                            - 2 * Math.hypot(a.oneSigma(), b.oneSigma()));
                }
            }
        }
        List<String> off = new ArrayList<>();
        int judged = 0;
        for (Map.Entry<String, List<Double>> entry : excess.entrySet()) {
            List<Double> sorted = entry.getValue().stream().sorted().toList();
            if (sorted.size() >= 3) {
                judged++;
                double median = sorted.get(sorted.size() / 2);
                if (median > 0.02) {
                    off.add(String.format(Locale.ROOT, "%s %.3f", entry.getKey(), median));
                }
            }
        }
        assertTrue(judged > 40 && off.isEmpty(), judged + " judged, off: " + off);
    }
}
