package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.prepare.Preparing;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ChainTest {

    @TempDir private Path folder;

    private static Chain chain(SurveySettings settings) {
        return new Chain(FeatureCatalogue.standard(), Measuring.withDefaults(), settings);
    }

    private static boolean has(ObjectResult result, String code) {
        return result.findings().stream().map(Finding::code).anyMatch(code::equals);
    }

    private Candidate write(String name, DoubleUnaryOperator flux, Map<String, String> cells)
            throws IOException {
        StringBuilder text = new StringBuilder("wavelength_micron,flux,sigma\n");
        for (int i = 0; i < 6500; i++) {
            double micron = 0.9 * Math.pow(2.45 / 0.9, i / 6500.0);
            double value = flux.applyAsDouble(micron);
            text.append(String.format(Locale.ROOT, "%.8f,%.8f,0.005%n", micron, value));
        }
        Files.writeString(folder.resolve(name + ".csv"), text);
        return new Candidate(name, 1, List.of(name + ".csv"), cells);
    }

    /** Four potassium lines and two of sodium at R = 2000, moved by a velocity. */
    private static DoubleUnaryOperator alkali(double velocityKms) {
        double[] lines = {1.1693419, 1.1772861, 1.1776061, 1.2435675, 1.252556, 1.138457};
        return micron -> {
            double rest = micron / (1 + velocityKms / 299_792.458);
            double flux = 1;
            for (double line : lines) {
                double x = (rest - line) / (line / 2000 / 2.355);
                flux -= 0.35 * Math.exp(-0.5 * x * x);
            }
            return flux;
        };
    }

    @Test
    void theVelocityOfTheLinesIsTakenOutWhenAskedFor() throws IOException {
        Candidate moving = write("moving", alkali(180), Map.of("resolution", "2000"));
        SurveySettings settings = SurveySettings.withDefaults();
        ObjectResult left = chain(settings).run(moving, folder);
        ObjectResult taken = chain(settings.withMeasuredRest(true)).run(moving, folder);
        assertTrue(has(left, "velocity-left-in"), left.findings().toString());
        assertTrue(has(taken, "rest-frame"), taken.findings().toString());
        assertFalse(has(taken, "velocity-left-in"));
        double shift =
                left.spectra().get(0).prepared().spectrum().wavelengthMicron(3000)
                        / taken.spectra().get(0).prepared().spectrum().wavelengthMicron(3000);
        // three lines of one species, each good to a few km/s at this signal
        assertEquals(180, (shift - 1) * 299_792.458, 15);
    }

    @Test
    void whatTheListSaysGoesBeforeTheDefaults() throws IOException {
        Candidate stated =
                write("stated", alkali(0), Map.of("medium", "air", "resolution", "1500"));
        ObjectResult result =
                chain(
                                SurveySettings.withDefaults()
                                        .withPreparing(
                                                Preparing.withDefaults()
                                                        .withMedium(Medium.VACUUM)
                                                        .withResolvingPower(100)))
                        .run(stated, folder);
        var prepared = result.spectra().get(0).prepared();
        assertEquals(1500, prepared.resolvingPower().value());
        assertTrue(prepared.spectrum().wavelengthMicron(0) > 0.9001, "air was not converted");
    }

    @Test
    void nothingIsMeasuredWithoutAnyNoise() throws IOException {
        StringBuilder text = new StringBuilder("wavelength_micron,flux\n");
        for (int i = 0; i < 800; i++) {
            text.append(String.format(Locale.ROOT, "%.5f,1%n", 0.9 + i * 0.002));
        }
        Files.writeString(folder.resolve("constant.csv"), text);
        ObjectResult result =
                chain(SurveySettings.withDefaults())
                        .run(new Candidate("c", 1, List.of("constant.csv"), Map.of()), folder);
        assertTrue(has(result, "noise-unknown"), result.findings().toString());
        assertEquals(Status.PARTIAL, result.status());
        assertTrue(result.placement().orElseThrow().type().isEmpty());
        assertTrue(result.placement().orElseThrow().gravity().gravityClass().isEmpty());
    }

    @Test
    void wavelengthsTooShortForAirFailTheObjectWithAReason() throws IOException {
        Files.writeString(
                folder.resolve("short.csv"),
                "wavelength_micron,flux,sigma\n0.01,1,0.1\n0.02,1,0.1\n0.03,1,0.1\n");
        ObjectResult result =
                chain(SurveySettings.withDefaults())
                        .run(
                                new Candidate(
                                        "s", 1, List.of("short.csv"), Map.of("medium", "air")),
                                folder);
        assertEquals(Status.FAILED, result.status());
        assertTrue(result.reason().contains("where the refractive index"), result.reason());
    }

    @Test
    void severalSpectraAreMeasuredApartAndPlacedTogether() throws IOException {
        write("one", alkali(0), Map.of());
        write("other", micron -> 1.7 * alkali(0).applyAsDouble(micron), Map.of());
        Candidate two =
                new Candidate(
                        "two",
                        1,
                        List.of("one.csv", "other.csv"),
                        Map.of("resolution", "2000;1000"));
        ObjectResult result = chain(SurveySettings.withDefaults()).run(two, folder);
        assertEquals(2, result.spectra().size());
        assertTrue(has(result, "several-spectra"));
        assertFalse(has(result, "spectrum-twice"));
        assertEquals(2000, result.spectra().get(0).prepared().resolvingPower().value());
        assertEquals(1000, result.spectra().get(1).prepared().resolvingPower().value());
        assertEquals("other.csv", result.leading().orElseThrow().path());
        String id = "burgasser2006/h2o-h";
        double one = result.spectra().get(0).measurements().measured(id).orElseThrow().oneSigma();
        double other = result.spectra().get(1).measurements().measured(id).orElseThrow().oneSigma();
        double both = result.best().orElseThrow().measured(id).orElseThrow().oneSigma();
        assertTrue(both < one && both > one * other / Math.hypot(one, other) * 0.999);
    }

    @Test
    void aSpectrumListedTwiceCountsOnce() throws IOException {
        write("one", alkali(0), Map.of());
        Candidate two = new Candidate("two", 1, List.of("one.csv", "one.csv"), Map.of());
        ObjectResult result = chain(SurveySettings.withDefaults()).run(two, folder);
        assertEquals(1, result.spectra().size());
        assertTrue(has(result, "spectrum-twice"));
        assertFalse(has(result, "several-spectra"));
    }

    @Test
    void aCandidateWithColoursAloneIsTypedAndJudgedByThem() {
        Map<String, String> cells =
                Map.of(
                        "mag_system",
                        "2MASS",
                        "j_mag",
                        "14.00",
                        "j_mag_err",
                        "0.03",
                        "h_mag",
                        "13.00",
                        "h_mag_err",
                        "0.03",
                        "k_mag",
                        "12.37",
                        "k_mag_err",
                        "0.03",
                        "w1_mag",
                        "11.78",
                        "w1_mag_err",
                        "0.03",
                        "w2_mag",
                        "11.51");
        ObjectResult result =
                chain(SurveySettings.withDefaults())
                        .run(new Candidate("colours", 1, List.of(), cells), folder);
        assertEquals(Status.PHOTOMETRIC, result.status());
        assertTrue(has(result, "photometric-type"));
        assertTrue(has(result, "magnitude-error-assumed"));
        assertEquals(14, result.placement().orElseThrow().type().orElseThrow().typeNumber(), 2);
        assertTrue(result.judgement().isPresent(), result.findings().toString());
        assertTrue(result.judgement().get().properties().distance().isPresent());
        assertTrue(result.best().isEmpty() && result.spectra().isEmpty());
    }

    @Test
    void oneUnreadableSpectrumOfTwoIsPartial() throws IOException {
        write("one", alkali(0), Map.of());
        Candidate two = new Candidate("two", 1, List.of("one.csv", "gone.csv"), Map.of());
        ObjectResult result = chain(SurveySettings.withDefaults()).run(two, folder);
        assertEquals(Status.PARTIAL, result.status());
        assertTrue(result.reason().contains("gone.csv"), result.reason());
    }

    @Test
    void aCandidateWithoutSpectrumFails() {
        ObjectResult result =
                chain(SurveySettings.withDefaults())
                        .run(new Candidate("none", 1, List.of(), Map.of()), folder);
        assertEquals(Status.FAILED, result.status());
        assertFalse(result.reason().isBlank());
    }

    /** Reddening moves the water indices; taking it out brings the type back. */
    @Test
    void extinctionIsTakenOutOfRealSpectra() {
        Path shared = SharedSpectra.folder();
        Candidate candidate =
                new Candidate(
                        "template",
                        1,
                        List.of("cruz18_templates/L3_f.csv"),
                        Map.of("resolution", "120", "medium", "vacuum"));
        ObjectResult plain = chain(SurveySettings.withDefaults()).run(candidate, shared);
        ObjectResult dereddened =
                chain(
                                SurveySettings.withDefaults()
                                        .withPreparing(
                                                Preparing.withDefaults()
                                                        .withExtinction(
                                                                new Preparing.Extinction(3, 3.1))))
                        .run(candidate, shared);
        assertTrue(has(dereddened, "dereddened"));
        assertTrue(
                dereddened.best().orElseThrow().measured("burgasser2006/k-j").orElseThrow().value()
                        < plain.best()
                                .orElseThrow()
                                .measured("burgasser2006/k-j")
                                .orElseThrow()
                                .value());
    }
}
