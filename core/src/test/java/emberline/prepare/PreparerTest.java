package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.AirToVacuum;
import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PreparerTest {

    private static final Preparing NOTHING = Preparing.withDefaults();
    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;

    private static Observation observed(
            double low,
            double high,
            DoubleUnaryOperator flux,
            Optional<Medium> medium,
            Optional<ResolvingPower> resolvingPower) {
        int size = 2001;
        double[] wavelengths = new double[size];
        Arrays.setAll(wavelengths, i -> low + (high - low) * i / (size - 1));
        double[] sigma = new double[size];
        Arrays.fill(sigma, 0.01);
        return Observation.of(
                new Observation.Origin("test.csv", "made here", "00"),
                wavelengths,
                Arrays.stream(wavelengths).map(flux).toArray(),
                Optional.of(sigma),
                new Observation.Stated(medium, resolvingPower),
                List.of(Finding.note("from-reading", "was found on reading")));
    }

    private static Observation flat(double low, double high, Medium medium) {
        return observed(low, high, x -> 1, Optional.ofNullable(medium), Optional.empty());
    }

    private static PreparedSpectrum prepare(Observation observation, Preparing stated)
            throws UnreadableSpectrumException {
        return new Preparer().prepare(observation, stated);
    }

    private static List<String> codes(PreparedSpectrum prepared) {
        return prepared.findings().stream().map(Finding::code).toList();
    }

    /** Line at rest at 1.2525 micron, observed by the relativistic Doppler formula. */
    @ParameterizedTest
    @ValueSource(doubles = {250, -250, 12_000})
    void aMovingLineComesBackToRest(double velocityKms) throws Exception {
        double rest = 1.2525;
        double beta = velocityKms / SPEED_OF_LIGHT_KMS;
        double seen = rest * Math.sqrt((1 + beta) / (1 - beta));
        Observation observation =
                observed(
                        seen - 0.01,
                        seen + 0.01,
                        x -> 1 - 0.5 * Math.exp(-0.5 * Math.pow((x - seen) / 0.0005, 2)),
                        Optional.of(Medium.VACUUM),
                        Optional.empty());
        PreparedSpectrum prepared =
                prepare(observation, NOTHING.withRadialVelocityKms(velocityKms));
        double[] flux = prepared.spectrum().fluxes();
        int deepest = 0;
        for (int i = 0; i < flux.length; i++) {
            deepest = flux[i] < flux[deepest] ? i : deepest;
        }
        // a pixel spans 1e-5 micron; a shift of the wrong sign would be 2e-3
        assertEquals(rest, prepared.spectrum().wavelengthMicron(deepest), 1e-5);
        assertTrue(codes(prepared).contains("rest-frame"));
    }

    @Test
    void theMediumOfTheFileIsFollowed() throws Exception {
        PreparedSpectrum air = prepare(flat(1.2, 1.3, Medium.AIR), NOTHING);
        // air at 1.2 micron is 3.3 Angstrom short of vacuum: refractive index 1.000274
        assertEquals(1.2 + 3.28e-4, air.spectrum().wavelengthMicron(0), 1e-6);
        PreparedSpectrum vacuum = prepare(flat(1.2, 1.3, Medium.VACUUM), NOTHING);
        assertEquals(1.2, vacuum.spectrum().wavelengthMicron(0));
        assertTrue(codes(vacuum).stream().noneMatch(code -> code.startsWith("medium")));
    }

    @Test
    void theObserverGoesBeforeTheFile() throws Exception {
        PreparedSpectrum prepared =
                prepare(flat(1.2, 1.3, Medium.AIR), NOTHING.withMedium(Medium.VACUUM));
        assertEquals(1.2, prepared.spectrum().wavelengthMicron(0));
        assertTrue(codes(prepared).contains("medium-conflict"));
        PreparedSpectrum agreed =
                prepare(flat(1.2, 1.3, Medium.AIR), NOTHING.withMedium(Medium.AIR));
        assertTrue(!codes(agreed).contains("medium-conflict"));
    }

    @Test
    void anUnknownMediumIsAssumedToBeVacuum() throws Exception {
        PreparedSpectrum prepared = prepare(flat(1.2, 1.3, null), NOTHING);
        assertEquals(1.2, prepared.spectrum().wavelengthMicron(0));
        assertTrue(codes(prepared).contains("medium-assumed"));
        assertEquals("from-reading", codes(prepared).get(0));
    }

    @Test
    void theResolvingPowerIsGivenOrStatedOrSampled() throws Exception {
        ResolvingPower header = new ResolvingPower(900, Basis.HEADER);
        Observation stated =
                observed(1.2, 1.3, x -> 1, Optional.of(Medium.VACUUM), Optional.of(header));
        assertEquals(
                new ResolvingPower(1500, Basis.GIVEN),
                prepare(stated, NOTHING.withResolvingPower(1500)).resolvingPower());
        assertEquals(header, prepare(stated, NOTHING).resolvingPower());
        PreparedSpectrum sampled = prepare(flat(1.2, 1.3, Medium.VACUUM), NOTHING);
        assertEquals(Basis.SAMPLING, sampled.resolvingPower().basis());
        // 1.25 micron over two pixels of 5e-5 micron
        assertEquals(12_500, sampled.resolvingPower().value(), 20);
        assertTrue(codes(sampled).contains("resolution-estimated"));
    }

    /** 1.25 micron over two pixels of 5e-5 micron is 12,500: twice that is a pixel an element. */
    @Test
    void aResolvingPowerBeyondTheSamplingIsDoubted() throws Exception {
        String code = "resolution-beyond-sampling";
        Observation flat = flat(1.2, 1.3, Medium.VACUUM);
        assertTrue(!codes(prepare(flat, NOTHING.withResolvingPower(24_000))).contains(code));
        PreparedSpectrum beyond = prepare(flat, NOTHING.withResolvingPower(26_000));
        assertEquals(26_000, beyond.resolvingPower().value());
        Finding finding =
                beyond.findings().stream()
                        .filter(f -> f.code().equals(code))
                        .findFirst()
                        .orElseThrow();
        assertEquals(Finding.Severity.CAUTION, finding.severity());
        assertTrue(finding.text().contains("is 26000, but"), finding.text());
        Observation header =
                observed(
                        1.2,
                        1.3,
                        x -> 1,
                        Optional.of(Medium.VACUUM),
                        Optional.of(new ResolvingPower(30_000, Basis.HEADER)));
        assertTrue(codes(prepare(header, NOTHING)).contains(code));
        assertTrue(!codes(prepare(header, NOTHING.withResolvingPower(9000))).contains(code));
        assertTrue(!codes(prepare(flat, NOTHING)).contains(code));
    }

    /** A note on the header would speak of a number that is not used. */
    @Test
    void theNoteOnTheHeaderGoesWhereTheObserverIsFollowed(@TempDir Path folder) throws Exception {
        Path file = folder.resolve("header.txt");
        Files.writeString(
                file,
                "# RESOLVING_POWER = 800\n# wavelength(micron) flux sigma\n"
                        + IntStream.range(0, 200)
                                .mapToObj(i -> (1.2 + 5e-4 * i) + " 1.0 0.1\n")
                                .collect(Collectors.joining()));
        Observation read = new SpectrumReader().read(file);
        String code = Observation.RESOLVING_POWER_FROM_HEADER;
        assertTrue(codes(prepare(read, NOTHING)).contains(code));
        PreparedSpectrum given = prepare(read, NOTHING.withResolvingPower(900));
        assertEquals(new ResolvingPower(900, Basis.GIVEN), given.resolvingPower());
        assertTrue(!codes(given).contains(code), codes(given).toString());
    }

    @Test
    void extinctionRaisesFluxAndNoiseByTheLaw() throws Exception {
        PreparedSpectrum prepared =
                prepare(
                        flat(1.2, 1.3, Medium.VACUUM),
                        NOTHING.withExtinction(new Preparing.Extinction(2, 3.1)));
        double micron = prepared.spectrum().wavelengthMicron(1000);
        double factor =
                Math.pow(10, 0.4 * 2 * ExtinctionLaw.fitzpatrick1999(3.1).relativeTo(micron));
        assertTrue(factor > 1.5, "two magnitudes in V are half a magnitude in J: " + factor);
        assertEquals(factor, prepared.spectrum().flux(1000), 1e-12);
        assertEquals(0.01 * factor, prepared.spectrum().fluxSigma(1000), 1e-12);
        assertTrue(codes(prepared).contains("dereddened"));
    }

    @Test
    void pixelsTooShortForAirAreCut() throws Exception {
        PreparedSpectrum prepared = prepare(flat(0.1, 2.1, Medium.AIR), NOTHING);
        // pixels of 0.001 micron from 0.1 on: 100 of them below 0.2
        assertEquals(1901, prepared.spectrum().size());
        assertEquals(AirToVacuum.vacuumMicron(0.2), prepared.spectrum().wavelengthMicron(0), 1e-12);
        Finding cut =
                prepared.findings().stream()
                        .filter(finding -> finding.code().equals("pixels-cut"))
                        .findFirst()
                        .orElseThrow();
        assertTrue(cut.text().startsWith("100 pixels below 0.2 micron"), cut.text());
        assertEquals(2001, prepare(flat(0.1, 2.1, Medium.VACUUM), NOTHING).spectrum().size());
    }

    @Test
    void pixelsTooShortForExtinctionAreCut() throws Exception {
        PreparedSpectrum prepared =
                prepare(
                        flat(0.1, 2.1, Medium.VACUUM),
                        NOTHING.withExtinction(new Preparing.Extinction(1, 3.1)));
        assertEquals(0.304, prepared.spectrum().wavelengthMicron(0), 1e-12);
        assertTrue(codes(prepared).contains("pixels-cut"));
    }

    @Test
    void aSpectrumWithNothingLeftIsRefusedWithAdvice() {
        String message =
                assertThrows(
                                UnreadableSpectrumException.class,
                                () -> prepare(flat(0.01, 0.1, Medium.AIR), NOTHING))
                        .getMessage();
        assertTrue(message.startsWith("test.csv: 0 of 2001 pixels from 0.2 micron;"), message);
        assertTrue(message.contains("Check the unit of the wavelengths"), message);
    }

    @Test
    void impossibleStatementsSayWhatToDo() {
        assertTrue(
                refusal(() -> NOTHING.withRadialVelocityKms(30_000)).contains("Give it in km/s"));
        assertTrue(refusal(() -> NOTHING.withResolvingPower(0)).contains("e.g. 2000"));
        assertTrue(refusal(() -> new Preparing.Extinction(-1, 3.1)).contains("R_V = 3.1"));
        assertTrue(refusal(() -> ExtinctionLaw.fitzpatrick1999(9)).contains("Use 3.1"));
    }

    private static String refusal(Runnable call) {
        return assertThrows(IllegalArgumentException.class, call::run).getMessage();
    }
}
