package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.judge.Judgement;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measuring;
import emberline.place.TypePosterior;
import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Numbers at the edge: the whole chain gives an answer or says why there is none. */
class StressTest {

    private static final Chain CHAIN =
            new Chain(
                    FeatureCatalogue.standard(),
                    Measuring.withDefaults(),
                    SurveySettings.withDefaults());

    @TempDir private Path folder;

    /** Flux of something like an L dwarf, about 1. */
    private static double dwarf(double micron) {
        double flux = Math.exp(-0.5 * Math.pow((micron - 1.3) / 0.45, 2));
        flux *= 1 - 0.45 * Math.exp(-0.5 * Math.pow((micron - 1.40) / 0.05, 2));
        flux *= 1 - 0.5 * Math.exp(-0.5 * Math.pow((micron - 1.87) / 0.07, 2));
        return flux * (1 - 0.2 * Math.exp(-0.5 * Math.pow((micron - 2.32) / 0.02, 2)));
    }

    /** What is written into the cells of a pixel. */
    private interface Cells {
        String of(double micron, double flux, double noise);
    }

    private ObjectResult run(int pixels, double signal, Cells cells, String header, long seed)
            throws IOException {
        RandomGenerator random = new SplittableRandom(seed);
        StringBuilder text = new StringBuilder(header).append('\n');
        for (int i = 0; i < pixels; i++) {
            double micron = pixels == 1 ? 1.2 : 0.8 * Math.pow(2.5 / 0.8, i / (pixels - 1.0));
            double sigma = dwarf(micron) / signal;
            double flux = dwarf(micron) + sigma * random.nextGaussian();
            text.append(cells.of(micron, flux, sigma)).append('\n');
        }
        Files.writeString(folder.resolve("s.csv"), text);
        return CHAIN.run(
                new Candidate("s", 1, List.of("s.csv"), Map.of("medium", "vacuum")), folder);
    }

    private ObjectResult run(int pixels, double signal, Cells cells) throws IOException {
        return run(pixels, signal, cells, "wavelength_micron,flux,sigma", 1);
    }

    private static String row(double micron, double flux, double sigma) {
        return String.format(Locale.ROOT, "%.9f,%.9e,%.5e", micron, flux, sigma);
    }

    /** Whatever came of it, it is finite, and what is missing has a reason. */
    private static void requireAnswerOrReason(ObjectResult result) {
        assertFalse(result.reason().contains("internal error"), result.reason());
        assertEquals(result.status() == Status.MEASURED, result.reason().isBlank(), "reason");
        result.best()
                .ifPresent(
                        best -> {
                            for (FeatureMeasurement one : best.all()) {
                                boolean sound =
                                        one.result()
                                                .fold(
                                                        m ->
                                                                Double.isFinite(m.value())
                                                                        && m.oneSigma() > 0
                                                                        && Double.isFinite(
                                                                                m.oneSigma()),
                                                        n -> !n.detail().isBlank());
                                assertTrue(sound, one.feature().id() + ": " + one.result());
                            }
                        });
        result.placement()
                .ifPresent(
                        placement ->
                                assertEquals(
                                        placement.type().isEmpty(),
                                        !placement.typeReason().isBlank(),
                                        placement.typeReason()));
        result.placement()
                .flatMap(placement -> placement.type())
                .ifPresent(
                        type ->
                                assertTrue(
                                        type.typeNumber() >= -5 && type.typeNumber() <= 40,
                                        type.toString()));
        result.judgement().ifPresent(StressTest::requireProbabilities);
    }

    private static void requireProbabilities(Judgement judgement) {
        for (double p :
                new double[] {
                    judgement.limits().pSubstellarLow(),
                    judgement.limits().pSubstellar(),
                    judgement.limits().pSubstellarHigh()
                }) {
            assertTrue(p >= 0 && p <= 1, "probability " + p);
        }
        assertTrue(judgement.massMsun().median() > 0, "mass");
    }

    /** Ratios know no scale: the same answers for any unit of flux. */
    @ParameterizedTest
    @CsvSource({"1e-20", "1e20", "1e-100", "1e100", "1e-140", "1e140"})
    void theScaleOfTheFluxChangesNothing(double scale) throws IOException {
        ObjectResult one = run(900, 80, StressTest::row);
        ObjectResult other = run(900, 80, (w, f, s) -> row(w, f * scale, s * scale));
        requireAnswerOrReason(other);
        assertEquals(one.status(), other.status(), other.reason());
        double[] shares = shares(one);
        double[] others = shares(other);
        for (int k = 0; k < shares.length; k++) {
            assertEquals(shares[k], others[k], 1e-3, "posterior at " + k);
        }
        int compared = 0;
        for (FeatureMeasurement feature : one.best().orElseThrow().all()) {
            String id = feature.feature().id();
            if (feature.result() instanceof Measured m) {
                Measured n = other.best().orElseThrow().measured(id).orElseThrow();
                // ten digits are written into the file
                assertEquals(m.value(), n.value(), 1e-6 * Math.max(1, Math.abs(m.value())), id);
                assertEquals(1, n.oneSigma() / m.oneSigma(), 1e-3, id);
                compared++;
            }
        }
        assertTrue(compared > 30, "only " + compared + " features were measured");
    }

    private static double[] shares(ObjectResult result) {
        TypePosterior posterior =
                result.placement().orElseThrow().calibrated().posterior().orElseThrow();
        return IntStream.range(0, posterior.size()).mapToDouble(posterior::probability).toArray();
    }

    /** At the ends of what a double holds there may be a refusal, but nothing without a reason. */
    @ParameterizedTest
    @CsvSource({"1e-320", "1e-300", "1e-170", "1e160", "1e200", "1e300", "1e307"})
    void fluxesThatADoubleBarelyHolds(double scale) throws IOException {
        requireAnswerOrReason(run(900, 80, (w, f, s) -> row(w, f * scale, s * scale)));
    }

    @ParameterizedTest
    @CsvSource({"2", "3", "4", "5", "7", "10", "20", "40", "49", "55", "80", "120", "200", "400"})
    void fewPixels(int pixels) throws IOException {
        for (int seed = 0; seed < 2; seed++) {
            for (double signal : new double[] {1, 30, 1000}) {
                requireAnswerOrReason(
                        run(pixels, signal, StressTest::row, "wavelength_micron,flux,sigma", seed));
                requireAnswerOrReason(
                        run(
                                pixels,
                                signal,
                                (w, f, s) -> w + "," + f,
                                "wavelength_micron,flux",
                                seed));
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"0.01", "0.1", "0.5", "1", "3", "1e9"})
    void anySignal(double signal) throws IOException {
        requireAnswerOrReason(run(1200, signal, StressTest::row));
        requireAnswerOrReason(
                run(1200, signal, (w, f, s) -> w + "," + f, "wavelength_micron,flux", 1));
    }

    private record Case(String name, Cells cells) {
        @Override
        public String toString() {
            return name;
        }
    }

    static List<Case> cases() {
        return List.of(
                new Case("negative flux", (w, f, s) -> row(w, -f, s)),
                new Case("negative in half", (w, f, s) -> row(w, w > 1.5 ? -f : f, s)),
                new Case("zero sigma", (w, f, s) -> row(w, f, 0)),
                new Case("zero sigma in half", (w, f, s) -> row(w, f, w > 1.5 ? 0 : s)),
                new Case("negative sigma", (w, f, s) -> row(w, f, -s)),
                new Case("infinite sigma", (w, f, s) -> w + "," + f + ",inf"),
                new Case(
                        "infinite sigma in half",
                        (w, f, s) -> w + "," + f + "," + (w > 1.5 ? "inf" : "" + s)),
                new Case("huge sigma", (w, f, s) -> row(w, f, 1e12)),
                new Case(
                        "sigma of 14 decades",
                        (w, f, s) -> row(w, f, s * Math.pow(10, 14 * (w - 1.6)))),
                new Case("NaN islands", (w, f, s) -> w * 40 % 2 < 1 ? row(w, f, s) : w + ",nan,1"),
                new Case("mostly NaN", (w, f, s) -> w * 40 % 2 < 0.1 ? row(w, f, s) : w + ",nan,1"),
                new Case(
                        "infinite fluxes",
                        (w, f, s) -> w * 40 % 2 < 1 ? row(w, f, s) : w + ",inf,1"),
                new Case("constant flux", (w, f, s) -> row(w, 1, 0.01)),
                new Case("constant flux, no error", (w, f, s) -> row(w, 1, 0)),
                new Case("zero flux", (w, f, s) -> row(w, 0, 0.01)),
                new Case("zero beyond 1.3", (w, f, s) -> row(w, w > 1.3 ? 0 : f, s)),
                new Case(
                        "one cosmic ray",
                        (w, f, s) -> row(w, Math.abs(w - 1.25) < 0.001 ? 1e15 : f, s)),
                new Case("rays everywhere", (w, f, s) -> row(w, w * 1000 % 3 < 1 ? 1e9 : f, s)),
                new Case("alternating sign", (w, f, s) -> row(w, w * 1e4 % 2 < 1 ? f : -f, s)),
                new Case("steps", (w, f, s) -> row(w, Math.floor(w * 10), s)),
                new Case(
                        "growing by 200 decades",
                        (w, f, s) ->
                                row(
                                        w,
                                        Math.pow(10, 120 * (w - 1.6)),
                                        Math.pow(10, 120 * (w - 1.6)) / 50)),
                new Case(
                        "rounded to one digit",
                        (w, f, s) -> w + "," + Math.round(f * 10) / 10.0 + "," + s),
                new Case("sigma above all", (w, f, s) -> row(w, f, 1000)));
    }

    @ParameterizedTest
    @MethodSource("cases")
    void oddNumbers(Case odd) throws IOException {
        for (int pixels : new int[] {40, 300, 2500}) {
            requireAnswerOrReason(run(pixels, 50, odd.cells()));
        }
    }

    /** Anything at random: any of the above for any pixel. */
    @Test
    void anyMixture() throws IOException {
        SplittableRandom random = new SplittableRandom(77);
        List<Case> cases = cases();
        for (int trial = 0; trial < 25; trial++) {
            Cells one = cases.get(random.nextInt(cases.size())).cells();
            Cells two = cases.get(random.nextInt(cases.size())).cells();
            double border = random.nextDouble(0.8, 2.5);
            int pixels = (int) Math.pow(10, random.nextDouble(0.3, 3.3));
            requireAnswerOrReason(
                    run(
                            Math.max(2, pixels),
                            Math.pow(10, random.nextDouble(-1, 3)),
                            (w, f, s) -> (w < border ? one : two).of(w, f, s)));
        }
    }

    @Test
    @Timeout(240)
    void aMillionPixels() throws IOException {
        ObjectResult result = run(1_000_000, 30, StressTest::row);
        requireAnswerOrReason(result);
        assertEquals(1_000_000, result.spectra().get(0).prepared().spectrum().size());
    }

    @Test
    void pixelsAnywhere() throws IOException {
        SplittableRandom random = new SplittableRandom(5);
        for (int trial = 0; trial < 20; trial++) {
            StringBuilder text = new StringBuilder("wavelength_micron,flux,sigma\n");
            double[] places =
                    IntStream.range(0, 2 + random.nextInt(400))
                            .mapToDouble(i -> Math.pow(10, random.nextDouble(-1, 1)))
                            .sorted()
                            .distinct()
                            .toArray();
            for (double micron : places) {
                text.append(row(micron, dwarf(micron) + 1e-6, 0.01)).append('\n');
            }
            Files.writeString(folder.resolve("s.csv"), text);
            requireAnswerOrReason(
                    CHAIN.run(
                            new Candidate("s", 1, List.of("s.csv"), Map.of("medium", "air")),
                            folder));
        }
    }
}
