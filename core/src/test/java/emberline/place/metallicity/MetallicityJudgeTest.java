package emberline.place.metallicity;

import static emberline.PublishedRows.number;
import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.SharedSpectra;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.MetallicityClass.Name;
import emberline.catalogue.Role;
import emberline.catalogue.Window;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Candidate;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.SpectralType;
import emberline.spectrum.Spectrum;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class MetallicityJudgeTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();
    private final MetallicityJudge judge = new MetallicityJudge(CATALOGUE);

    private final Chain chain =
            new Chain(CATALOGUE, Measuring.withDefaults(), SurveySettings.withDefaults());

    /** CaH1 as low as in the subdwarfs of the table. */
    private static final double LOW_CAH1 = 0.45;

    private static Optional<SpectralType> type(double number) {
        return Optional.of(new SpectralType(number));
    }

    /** A flat spectrum with the windows of TiO5, CaH1, CaH2 and CaH3 at given heights. */
    private static Measurements measured(
            double tio5, double cah1, double cah2, double cah3, double sigma) {
        int size = 2000;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] noise = new double[size];
        Arrays.fill(flux, 1);
        Arrays.fill(noise, sigma);
        for (int i = 0; i < size; i++) {
            wavelengths[i] = 0.63 + i * 5e-5;
        }
        fill(wavelengths, flux, "reid1995/tio5", tio5);
        fill(wavelengths, flux, "reid1995/cah1", cah1);
        fill(wavelengths, flux, "reid1995/cah2", cah2);
        fill(wavelengths, flux, "reid1995/cah3", cah3);
        return new Measurer(CATALOGUE, Measuring.withDefaults())
                .measure(
                        new PreparedSpectrum(
                                Spectrum.of(wavelengths, flux, noise),
                                new ResolvingPower(1500, Basis.GIVEN),
                                NoiseModel.INDEPENDENT,
                                List.of()));
    }

    private static void fill(double[] wavelengths, double[] flux, String id, double height) {
        Feature feature = CATALOGUE.feature(id).orElseThrow();
        Window window = feature.windows(Role.NUMERATOR).get(0).window();
        for (int i = 0; i < flux.length; i++) {
            if (wavelengths[i] > window.lowMicron() - 1e-4
                    && wavelengths[i] < window.highMicron() + 1e-4) {
                flux[i] = height;
            }
        }
    }

    /**
     * Subdwarfs and a dwarf with printed indices and classes; source and tolerances stand in the
     * table. CaH1 is read from the table of the same paper in the trade's files, here taken low for
     * subdwarfs and as printed for the dwarf (0.853).
     */
    @Test
    void publishedSubdwarfsGetTheirClasses() throws IOException {
        assertAll(PublishedRows.of("subdwarf-examples.csv").stream().map(row -> () -> check(row)));
    }

    private void check(NamedCsvRecord row) {
        String published = row.getField("published_type");
        double cah1 = published.startsWith("dM") ? 0.853 : LOW_CAH1;
        Measurements measurements =
                measured(number(row, "tio5"), cah1, number(row, "cah2"), number(row, "cah3"), 1e-4);
        MetallicityVerdict verdict = judge.judge(measurements, type(4), 1);
        assertEquals("", verdict.reason(), row.getField("object"));
        assertEquals(
                published.substring(0, published.indexOf('M')),
                verdict.adopted().orElseThrow().prefix(),
                row.getField("object"));
        ZetaReading lepine = reading(verdict, "lepine2007/zeta");
        assertEquals(
                number(row, "zeta"), ((Measured) lepine.zeta()).value(), 3e-4, "zeta as printed");
    }

    private static ZetaReading reading(MetallicityVerdict verdict, String id) {
        return verdict.readings().stream()
                .filter(r -> r.feature().id().equals(id))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void recalibrationsStandSideBySideWithTheirRanges() {
        MetallicityVerdict wide = judge.judge(measured(0.63, 0.5, 0.55, 0.75, 0.001), type(2), 1);
        assertTrue(reading(wide, "lepine2007/zeta").isUsed());
        assertTrue(reading(wide, "dhital2012/zeta").isUsed());
        ZetaReading corrected = reading(wide, "lepine2013/zeta");
        assertTrue(!corrected.isUsed() && corrected.zeta() instanceof Measured);
        MetallicityVerdict narrow = judge.judge(measured(0.63, 0.4, 0.3, 0.5, 0.001), type(5), 1);
        ZetaReading outside = reading(narrow, "dhital2012/zeta");
        assertTrue(outside.reason().contains("begins at 1.00"), outside.reason());
    }

    /** The class of "8 SDSS" (zeta 0.524) is open to noise; its probabilities say so. */
    @Test
    void noiseSpreadsTheProbabilities() {
        MetallicityVerdict sharp =
                judge.judge(measured(0.629, 0.56, 0.384, 0.552, 1e-4), type(4), 1);
        MetallicityVerdict noisy =
                judge.judge(measured(0.629, 0.56, 0.384, 0.552, 0.15), type(4), 1);
        assertEquals(1, sharp.probabilities().get(Name.SUBDWARF), 1e-9);
        assertTrue(noisy.probabilities().get(Name.EXTREME_SUBDWARF) > 0.1);
        double sum = noisy.probabilities().values().stream().mapToDouble(p -> p).sum();
        assertEquals(1, sum, 1e-9);
        assertEquals(
                1 - noisy.probabilities().get(Name.DWARF), noisy.pSubdwarf().orElseThrow(), 1e-12);
        assertEquals("subdwarf", MetallicityJudge.findings(sharp).get(0).code());
    }

    @Test
    void aSubdwarfNeedsLowCah1() {
        MetallicityVerdict high =
                judge.judge(measured(0.629, 0.95, 0.384, 0.552, 1e-4), type(4), 1);
        assertTrue(high.adopted().isEmpty() && high.pSubdwarf().isEmpty());
        assertTrue(high.reason().contains("CaH1 = 0.950 is not below"), high.reason());
        assertTrue(MetallicityJudge.findings(high).isEmpty());
    }

    @Test
    void outsideItsTypesNothingIsJudged() {
        Measurements likeSubdwarf = measured(0.66, 0.74, 0.5, 0.62, 1e-3);
        String late = judge.judge(likeSubdwarf, type(10.5), 1).reason();
        assertTrue(late.contains("outside K5 to M9"), late);
        assertTrue(judge.judge(likeSubdwarf, Optional.empty(), 1).reason().contains("no type"));
        String early = judge.judge(measured(0.96, 1, 1, 1, 1e-3), type(-1), 1).reason();
        assertTrue(early.contains("ends at 1.70"), early);
    }

    private static List<String> codes(MetallicityVerdict verdict) {
        return MetallicityJudge.findings(verdict).stream().map(f -> f.code()).toList();
    }

    @Test
    void aDwarfIsNotRemarkedOnUnlessItsClassIsOpen() {
        MetallicityVerdict dwarf = judge.judge(measured(0.63, 0.85, 0.60, 0.80, 1e-4), type(2), 1);
        assertEquals(Optional.of(Name.DWARF), dwarf.adopted(), dwarf.reason());
        assertEquals(List.of(), codes(dwarf));
        assertEquals(0, dwarf.pSubdwarf().orElseThrow(), 1e-12);
        assertEquals("", dwarf.hint(), "nothing of the near-infrared was seen");
        MetallicityVerdict noisy =
                judge.judge(measured(0.629, 0.30, 0.384, 0.552, 0.15), type(4), 1);
        assertTrue(codes(noisy).contains("metallicity-class-unsure"), codes(noisy).toString());
        assertTrue(
                reading(dwarf, "lepine2013/zeta").reason().startsWith("shown only"),
                "a scale without limits");
    }

    @Test
    void withoutCah1ASubdwarfIsNotBelieved() {
        MetallicityVerdict verdict =
                judge.judge(measured(0.629, Double.NaN, 0.384, 0.552, 1e-4), type(4), 1);
        assertTrue(verdict.adopted().isEmpty());
        assertTrue(verdict.reason().startsWith("zeta says sdM, but CaH1"), verdict.reason());
        assertTrue(verdict.reason().endsWith("was not measured"), verdict.reason());
    }

    /** In L dwarfs dust weakens TiO. */
    @Test
    void theClassEndsWhereLDwarfsBegin() {
        Measurements dwarf = measured(0.63, 0.85, 0.60, 0.80, 1e-4);
        assertEquals("", judge.judge(dwarf, type(9.7), 1).reason());
        assertTrue(judge.judge(dwarf, type(10), 1).reason().contains("outside K5 to M9"));
    }

    /** Two readings of the same object are averaged. */
    @Test
    void theClassIsTheMeanOfTheReadingsThatApply() {
        MetallicityVerdict verdict = judge.judge(measured(0.63, 0.3, 0.52, 0.70, 0.03), type(3), 1);
        List<ZetaReading> used = verdict.readings().stream().filter(ZetaReading::isUsed).toList();
        assertTrue(used.size() >= 2, "two scales apply");
        for (Name name : verdict.probabilities().keySet()) {
            double mean =
                    used.stream().mapToDouble(r -> r.probabilities().get(name)).average().orElse(0);
            assertEquals(mean, verdict.probabilities().get(name), 1e-12, name.toString());
        }
    }

    private MetallicityVerdict onReal(Path folder, String file) {
        ObjectResult result = chain.run(new Candidate(file, 1, List.of(file), Map.of()), folder);
        return result.placement().orElseThrow().metallicity();
    }

    /** Composite spectra of field M dwarfs (Bochanski et al. 2007): near-solar metallicity. */
    @Test
    void fieldTemplatesAreDwarfs() {
        Path folder = SharedSpectra.folder();
        assertAll(
                IntStream.rangeClosed(0, 9)
                        .mapToObj(m -> "sdss_bochanski07/m" + m + "_all_na_k.csv")
                        .map(
                                file ->
                                        () ->
                                                assertEquals(
                                                        Optional.of(Name.DWARF),
                                                        onReal(folder, file).adopted(),
                                                        file)));
    }

    /** What is seen in the near-infrared alone gets no class, and the hint says what it lacks. */
    @Test
    void theNearInfraredGivesNoClass() {
        Path folder = SharedSpectra.folder();
        MetallicityVerdict field = onReal(folder, "cruz18_templates/L3_f.csv");
        assertTrue(field.adopted().isEmpty());
        assertTrue(field.reason().contains("not all measured"), field.reason());
        assertTrue(field.hint().startsWith("no hint available"), field.hint());
        String subdwarf = "montreal/SIMPJ1158+0435_NIR_SpeX_Robert2016.csv";
        assertTrue(onReal(folder, subdwarf).adopted().isEmpty());
    }
}
