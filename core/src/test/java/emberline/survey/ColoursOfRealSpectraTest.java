package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedList;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import emberline.spectrum.Spectrum;
import emberline.survey.score.ScoredObject;
import emberline.survey.score.TypeScore;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/**
 * Types from colours of real objects of known type. The public tables beside the checkout hold no
 * magnitudes of single objects, so J, H and Ks are made from the real spectra that cover them, with
 * boxes of the isophotal wavelength and width of the 2MASS filters in place of their curves. Errors
 * of 0.08 mag are stated for that and for the flux calibration between bands. None of the objects
 * is known to be among those that the templates were learned from; some will be.
 */
class ColoursOfRealSpectraTest {

    /**
     * Isophotal wavelength and width (micron) and flux of magnitude 0 (W/m2/micron) of 2MASS: Cohen
     * et al. 2003, AJ 126, 1090.
     */
    private static final double[][] FILTERS = {
        {1.235, 0.162, 3.129e-9}, {1.662, 0.251, 1.133e-9}, {2.159, 0.262, 4.283e-10}
    };

    private static final String[] COLUMNS = {"j_mag", "h_mag", "k_mag"};

    private static Optional<Candidate> withColours(Candidate listed) throws Exception {
        Spectrum spectrum;
        try {
            spectrum = SharedList.prepared(listed).spectrum();
        } catch (UnreadableSpectrumException e) {
            return Optional.empty();
        }
        Map<String, String> cells = new LinkedHashMap<>(listed.cells());
        cells.put("mag_system", "2MASS");
        for (int f = 0; f < FILTERS.length; f++) {
            double low = FILTERS[f][0] - FILTERS[f][1] / 2;
            double high = FILTERS[f][0] + FILTERS[f][1] / 2;
            double sum = 0;
            double width = 0;
            for (int i = 1; i < spectrum.size(); i++) {
                double from = spectrum.wavelengthMicron(i - 1);
                double to = spectrum.wavelengthMicron(i);
                double flux = (spectrum.flux(i - 1) + spectrum.flux(i)) / 2;
                boolean inside = from >= low && to <= high;
                if (inside && Double.isFinite(flux) && to - from < 0.05 * FILTERS[f][1]) {
                    sum += flux * (to - from);
                    width += to - from;
                }
            }
            if (width < 0.9 * FILTERS[f][1] || !(sum > 0)) {
                return Optional.empty();
            }
            // the scale of the spectrum is not known; only differences of magnitudes are used
            double mag = -2.5 * Math.log10(sum / width / FILTERS[f][2]);
            cells.put(COLUMNS[f], String.format(Locale.ROOT, "%.4f", mag));
            cells.put(COLUMNS[f] + "_err", "0.08");
        }
        double shift = 14 - Double.parseDouble(cells.get("j_mag"));
        for (String column : COLUMNS) {
            cells.put(
                    column,
                    String.format(
                            Locale.ROOT, "%.4f", Double.parseDouble(cells.get(column)) + shift));
        }
        return Optional.of(new Candidate(listed.name(), listed.row(), List.of(), cells));
    }

    @Test
    void typesOfRealObjects() throws Exception {
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        List<ScoredObject> scored = new ArrayList<>();
        int others = 0;
        int othersTyped = 0;
        int dwarfs = 0;
        int dwarfsTyped = 0;
        for (Candidate listed : SharedList.candidates()) {
            Optional<Candidate> candidate = withColours(listed);
            if (candidate.isEmpty()) {
                continue;
            }
            ObjectResult result = chain.run(candidate.get(), Path.of("."));
            assertEquals(Status.PHOTOMETRIC, result.status(), result.reason());
            boolean typed = result.placement().orElseThrow().type().isPresent();
            String kind = listed.text("known_kind").orElse("");
            if (kind.equals("giant") || kind.equals("early") || kind.equals("carbon")) {
                others++;
                othersTyped += typed ? 1 : 0;
            }
            double type = listed.number("known_type_number").orElse(-9);
            if (kind.equals("dwarf")
                    && type >= 5.5
                    && List.of("A", "B").contains(listed.text("tier").orElse(""))) {
                dwarfs++;
                dwarfsTyped += typed ? 1 : 0;
                scored.add(ScoredObject.of(result));
            }
        }
        // giants and earlier stars are not told from dwarfs of M5 to M7 by J, H and Ks alone
        assertEquals(183, others);
        assertTrue(othersTyped < 0.45 * others, othersTyped + " of others got a type");
        assertTrue(dwarfsTyped > 0.9 * dwarfs, dwarfsTyped + " of " + dwarfs);
        // two colours: 2.6 subclass all, 1.9 for M, 3.0 for L; 78% and 95% inside, as found
        assertScore(scored, 5, 40, 3.0);
        assertScore(scored, 5, 10, 2.4);
        assertScore(scored, 10, 20, 3.4);
    }

    private static void assertScore(
            List<ScoredObject> scored, double from, double to, double mostRms) {
        List<ScoredObject> some =
                scored.stream()
                        .filter(o -> o.known().typeNumber().orElseThrow() >= from)
                        .filter(o -> o.known().typeNumber().orElseThrow() < to)
                        .toList();
        TypeScore.Figures figures = TypeScore.of("", some).figures().orElseThrow();
        assertTrue(figures.rms() < mostRms, figures.toString());
        assertEquals(0.75, figures.inside68(), 0.12, figures.toString());
        assertEquals(0.95, figures.inside95(), 0.05, figures.toString());
    }
}
