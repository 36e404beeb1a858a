package emberline.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.zip.GZIPOutputStream;
import nom.tam.fits.Fits;
import nom.tam.fits.NullDataHDU;
import nom.tam.util.ArrayFuncs;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FitsImageTest {

    private static final float[] FLUX = {1, 2, 3, 4, 5};
    private static final float[] MICRON = {1.0f, 1.125f, 1.25f, 1.375f, 1.5f};
    private static final float[] SIGMA = {0.5f, 0.25f, 0.5f, 0.25f, 0.5f};

    private static Observation read(byte[] file) throws UnreadableSpectrumException {
        return new SpectrumReader().read(file, "made.fits");
    }

    private static String refusal(byte[] file) {
        return assertThrows(UnreadableSpectrumException.class, () -> read(file)).getMessage();
    }

    private static List<String> codes(Observation read) {
        return read.findings().stream().map(Finding::code).toList();
    }

    private static Map<String, Object> axis(double start, double step, Object... more) {
        Map<String, Object> keywords = new HashMap<>(Map.of("CRVAL1", start, "CDELT1", step));
        keywords.put("CRPIX1", 1.0);
        for (int i = 0; i < more.length; i += 2) {
            keywords.put((String) more[i], more[i + 1]);
        }
        return keywords;
    }

    @Test
    void threeRowsAreWavelengthFluxSigma() throws IOException {
        Map<String, Object> keywords =
                Map.of(
                        "XUNITS",
                        "um",
                        "YUNITS",
                        "Wm-2um-1",
                        "WAVETYPE",
                        "Vacuum",
                        "SXD_R",
                        "2000",
                        "LXD_R",
                        "2500");
        Observation read = read(FitsFiles.image(new float[][] {MICRON, FLUX, SIGMA}, keywords));
        assertEquals("FITS image, 3 rows of 5", read.format());
        assertArrayEquals(new double[] {1, 1.125, 1.25, 1.375, 1.5}, read.wavelengthsMicron());
        assertArrayEquals(new double[] {1, 2, 3, 4, 5}, read.fluxes());
        assertArrayEquals(
                new double[] {0.5, 0.25, 0.5, 0.25, 0.5}, read.fluxSigmas().orElseThrow());
        assertEquals(Optional.of(Medium.VACUUM), read.medium());
        assertEquals(
                Optional.of(new ResolvingPower(2000, ResolvingPower.Basis.HEADER)),
                read.resolvingPower());
        assertEquals(List.of("resolving-power-from-header"), codes(read));
    }

    @Test
    void columnsInsteadOfRowsReadTheSame() throws IOException {
        double[][] columns = new double[5][2];
        for (int i = 0; i < 5; i++) {
            columns[i] = new double[] {MICRON[i] * 1e4, FLUX[i]};
        }
        Observation read =
                read(FitsFiles.image(columns, Map.of("CUNIT1", "deg", "CTYPE1", "RA---TAN")));
        assertEquals("FITS image, 2 columns of 5", read.format());
        assertArrayEquals(
                new double[] {1, 1.125, 1.25, 1.375, 1.5}, read.wavelengthsMicron(), 1e-15);
        assertTrue(read.fluxSigmas().isEmpty());
        assertEquals(List.of("wavelength-unit-assumed", "flux-unit-assumed"), codes(read));
    }

    @Test
    void rowsWinOverAxisKeywordsLeftFromBefore() throws IOException {
        byte[] file =
                FitsFiles.image(
                        new float[][] {MICRON, FLUX, SIGMA}, axis(8452, 2.5, "CTYPE1", "LINEAR"));
        assertEquals(1.5, read(file).wavelengthsMicron()[4]);
    }

    @Test
    void axisKeywordsGiveWavelengths() throws IOException {
        byte[] file =
                FitsFiles.image(
                        FLUX,
                        axis(
                                6500,
                                2,
                                "CRPIX1",
                                2.0,
                                "CTYPE1",
                                "AWAV",
                                "CUNIT1",
                                "Angstrom",
                                "BUNIT",
                                "erg/s/cm2/A"));
        Observation read = read(file);
        assertEquals("FITS image, 5 pixels", read.format());
        assertArrayEquals(
                new double[] {0.6498, 0.65, 0.6502, 0.6504, 0.6506},
                read.wavelengthsMicron(),
                1e-15);
        assertEquals(Optional.of(Medium.AIR), read.medium());
        assertEquals(List.of(), codes(read));
    }

    /**
     * Axis keywords and the wavelength of the fifth pixel; WAVE-LOG after eq. 5 of Greisen et al.
     * 2006 (from memory): start exp(4 step / start).
     */
    @ParameterizedTest
    @CsvSource({
        "WAVE, 1.0, 0.01, 0, um, 1.04",
        "LINEAR, 1000, 10, 0, nm, 1.04",
        "LINEAR, 1e-6, 1e-8, 0, m, 1.04",
        "LINEAR, 4.0, 0.001, 1, Angstrom, 1.0092528860766844",
        "LOG10, 4.0, 0.001, 0, Angstrom, 1.0092528860766844",
        "LOG-LINEAR, 4.0, 0.001, 0, Angstrom, 1.0092528860766844",
        "LN, 9.210340371976184, 0.001, 0, Angstrom, 1.004008010677342",
        "WAVE-LOG, 10000, 10, 0, Angstrom, 1.004008010677342",
    })
    void logarithmsAndUnitsOfTheAxisAreKnown(
            String type, double start, double step, int flag, String unit, double fifth)
            throws IOException {
        Map<String, Object> keywords =
                axis(start, step, "CTYPE1", type, "CUNIT1", unit, "DC-FLAG", flag);
        double[] micron = read(FitsFiles.image(FLUX, keywords)).wavelengthsMicron();
        assertEquals(fifth, micron[4], 1e-12);
    }

    @Test
    void decimalLogarithmCoefficientsOfSurveysAreKnown() throws IOException {
        Map<String, Object> keywords =
                Map.of(
                        "COEFF0",
                        4.0,
                        "COEFF1",
                        0.0001,
                        "VACUUM",
                        true,
                        "ARRAY1",
                        "SPECTRUM",
                        "ARRAY3",
                        "ERROR",
                        "BUNIT",
                        "1.0E-17 erg/cm/s/Ang");
        Observation read = read(FitsFiles.image(new float[][] {FLUX, FLUX, SIGMA, FLUX}, keywords));
        assertEquals(Math.pow(10, 0.0004), read.wavelengthsMicron()[4], 1e-14);
        assertArrayEquals(new double[] {1, 2, 3, 4, 5}, read.fluxes());
        assertEquals(0.25, read.fluxSigmas().orElseThrow()[1]);
        assertEquals(Optional.of(Medium.VACUUM), read.medium());
        assertEquals(List.of("planes-not-used"), codes(read));
    }

    @Test
    void planesOfACubeAreToldByName() throws IOException {
        float[][][] cube = {{{3, 1, 2, 5, 4}}, {{9, 9, 9, 9, 9}}, {SIGMA}};
        Map<String, Object> named =
                axis(6500, 2, "BANDID1", "spectrum", "BANDID3", "sigma - background fit");
        Observation read = read(FitsFiles.image(cube, named));
        assertEquals("FITS image, 3 planes of 5", read.format());
        assertArrayEquals(new double[] {3, 1, 2, 5, 4}, read.fluxes());
        assertEquals(0.25, read.fluxSigmas().orElseThrow()[1]);
        Observation unnamed = read(FitsFiles.image(cube, axis(6500, 2)));
        assertTrue(unnamed.fluxSigmas().isEmpty());
        assertTrue(
                unnamed.findings()
                        .contains(
                                Finding.caution(
                                        "planes-not-used",
                                        "Of 3 planes the first was taken as flux; no other is"
                                                + " named as its noise, so they were not used.")));
    }

    @Test
    void noiseMayLieInAnExtension() throws IOException {
        byte[] file =
                FitsFiles.file(
                        FitsFiles.imageHdu(FLUX, axis(1, 0.1, "CUNIT1", "um")),
                        FitsFiles.imageHdu(
                                new float[] {4, 4, 16, 0, 1}, Map.of("EXTNAME", "IVAR")));
        Observation read = read(file);
        double[] sigma = read.fluxSigmas().orElseThrow();
        assertEquals(0.25, sigma[2]);
        assertTrue(Double.isNaN(read.fluxes()[3]), "a pixel without weight is bad");
        assertTrue(codes(read).contains("noise-from-extension"));
    }

    @Test
    void spectrumMayLieInAnExtension() throws IOException {
        byte[] file =
                FitsFiles.file(
                        new NullDataHDU(),
                        FitsFiles.imageHdu(
                                new double[][] {{3, 2, 1}, {1, 2, 3}}, Map.of("XUNITS", "um")));
        Observation read = read(file);
        assertArrayEquals(new double[] {1, 2, 3}, read.wavelengthsMicron());
        assertArrayEquals(new double[] {3, 2, 1}, read.fluxes());
        assertTrue(codes(read).contains("wavelengths-reversed"));
    }

    @Test
    void scaledIntegersAndBlanksAreRead() throws IOException {
        byte[] file =
                FitsFiles.image(
                        new short[] {10, 20, -32768, 40},
                        axis(
                                1, 0.1, "CUNIT1", "um", "BSCALE", 0.5, "BZERO", 100.0, "BLANK",
                                -32768));
        assertArrayEquals(new double[] {105, 110, Double.NaN, 120}, read(file).fluxes());
    }

    /** Numbers of every kind, against what the FITS library reads from the same bytes. */
    @Test
    void everyKindOfNumberIsReadAsTheFitsLibraryReadsIt() throws IOException {
        Object[] images = {
            new byte[] {0, 1, 127, -128, -1},
            new short[] {0, 1, -1, Short.MAX_VALUE, Short.MIN_VALUE},
            new int[] {0, 1, -1, Integer.MAX_VALUE, Integer.MIN_VALUE},
            new long[] {0, 1, -1, Long.MAX_VALUE, Long.MIN_VALUE},
            new float[] {0, -1.5f, Float.MIN_VALUE, Float.NaN, Float.MAX_VALUE},
            new double[] {0, -1.5, Double.MIN_VALUE, Double.NaN, Double.MAX_VALUE},
            new double[][][] {{{1, 2, 3}, {4, 5, 6}}, {{7, 8, 9}, {10, 11, 12}}},
        };
        for (Object image : images) {
            byte[] file = FitsFiles.image(image, Map.of());
            Object theirs;
            try (Fits fits = new Fits(new ByteArrayInputStream(file))) {
                theirs = ArrayFuncs.flatten(fits.getHDU(0).getKernel());
            }
            FitsUnit unit = FitsUnit.all(FileContent.of(file, "made.fits")).get(0);
            assertArrayEquals(FitsImage.toDouble(theirs), FitsImage.of(unit).values());
        }
    }

    @Test
    void anIntegerOffsetLeftOnAllRowsIsTakenOff() throws IOException {
        double[][] rows = {
            {32768 + 6500, 32768 + 6501, 32768 + 6502},
            {32768 + 1, 32768 - 0.5, 32768 + 3}
        };
        Observation read = read(FitsFiles.image(rows, Map.of("O_BZERO", 32768.0)));
        assertArrayEquals(new double[] {0.65, 0.6501, 0.6502}, read.wavelengthsMicron(), 1e-15);
        assertArrayEquals(new double[] {1, -0.5, 3}, read.fluxes());
        assertTrue(codes(read).contains("integer-offset-removed"));
    }

    @Test
    void missingReferencePixelIsStated() throws IOException {
        byte[] file =
                FitsFiles.image(FLUX, Map.of("CRVAL1", 1.0, "CD1_1", 0.1, "CUNIT1", "micron"));
        assertTrue(codes(read(file)).contains("reference-pixel-assumed"));
    }

    @Test
    void magnitudesAndResolutionsInOtherUnitsAreNoResolvingPower() throws IOException {
        Map<String, Object> magnitude = axis(1, 0.1, "R", 12.5);
        assertTrue(read(FitsFiles.image(FLUX, magnitude)).resolvingPower().isEmpty());
        Map<String, Object> tiny = axis(1, 0.1, "RESOLUTI", 0.002);
        assertTrue(read(FitsFiles.image(FLUX, tiny)).resolvingPower().isEmpty());
        Map<String, Object> stated = axis(1, 0.1, "SPEC_RP", 75.0);
        assertEquals(
                75, read(FitsFiles.image(FLUX, stated)).resolvingPower().orElseThrow().value());
    }

    @Test
    void packedFileReadsAsTheUnpackedOneButHasItsOwnChecksum() throws IOException {
        byte[] file = FitsFiles.image(FLUX, axis(1, 0.1, "CUNIT1", "um"));
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
            out.write(file);
        }
        Observation read = read(packed.toByteArray());
        assertEquals("FITS image, 5 pixels, gzip", read.format());
        assertArrayEquals(read(file).fluxes(), read.fluxes());
        assertTrue(!read.sha256().equals(read(file).sha256()));
    }

    @Test
    void imagesThatAreNoSpectrumAreRefused() {
        assertTrue(
                refusal(FitsFiles.image(FLUX, Map.of()))
                        .contains("HDU 0: an image without wavelength keywords; expected CRVAL1"));
        assertTrue(
                refusal(FitsFiles.image(new float[40][50], axis(1, 0.1)))
                        .contains("an image of 50 x 40 numbers that holds several spectra"));
        assertTrue(
                refusal(FitsFiles.image(FLUX, axis(180, 0.1, "CTYPE1", "RA---TAN")))
                        .contains("an image whose first axis is RA---TAN"));
        assertTrue(
                refusal(FitsFiles.image(FLUX, axis(1, 0.1, "CUNIT1", "parsec")))
                        .contains("unknown wavelength unit 'parsec'"));
        assertTrue(
                refusal(FitsFiles.file(new NullDataHDU()))
                        .contains("one HDU without data; expected an image or a table"));
        assertTrue(
                refusal(FitsFiles.image(new float[][] {{1, 2, 3}, {0, 0, Float.NaN}}, Map.of()))
                        .contains("none of the 3 pixels has a flux"));
        assertTrue(
                refusal(
                                FitsFiles.image(
                                        new float[][] {
                                            {1, 2, 2, 3, 4, 5, 6, 7, 8, 9, 10},
                                            {1, 2, 3, 4, 5, 6, 7, 8, 9, 1, 2}
                                        },
                                        Map.of()))
                        .contains("made.fits, pixel 3: wavelength 2.0 micron stands twice"));
    }
}
