package emberline.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import nom.tam.fits.AsciiTable;
import nom.tam.fits.AsciiTableHDU;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.BinaryTableHDU;
import nom.tam.fits.NullDataHDU;
import org.junit.jupiter.api.Test;
import uk.ac.starlink.fits.FitsTableBuilder;
import uk.ac.starlink.table.RowSequence;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StoragePolicy;
import uk.ac.starlink.util.ByteArrayDataSource;

class FitsTableTest {

    private static final double[] ANGSTROM = {6500, 6510, 6520};
    private static final float[] FLUX = {1, 2, 3};

    private static byte[] table(Map<String, Object> keywords, Object... columns) {
        BinaryTable table = new BinaryTable();
        for (Object column : columns) {
            table.addColumn(column);
        }
        BinaryTableHDU hdu = table.toHDU();
        FitsFiles.add(hdu.getHeader(), keywords);
        return FitsFiles.file(new NullDataHDU(), hdu);
    }

    private static Observation read(byte[] file) throws UnreadableSpectrumException {
        return new SpectrumReader().read(file, "table.fits");
    }

    private static String refusal(byte[] file) {
        return assertThrows(UnreadableSpectrumException.class, () -> read(file)).getMessage();
    }

    private static List<String> codes(Observation read) {
        return read.findings().stream().map(Finding::code).toList();
    }

    @Test
    void columnsAreFoundByName() throws IOException {
        byte[] file =
                table(
                        Map.of(
                                "TTYPE1",
                                "flux",
                                "TUNIT1",
                                "Jy",
                                "TTYPE2",
                                "WAVE",
                                "TUNIT2",
                                "Angstrom",
                                "TTYPE3",
                                "err",
                                "TUNIT3",
                                "Jy",
                                "TTYPE4",
                                "sky"),
                        FLUX,
                        ANGSTROM,
                        new float[] {0.1f, 0.2f, 0.3f},
                        new int[] {1, 2, 3});
        Observation read = read(file);
        assertEquals("FITS binary table, 4 columns", read.format());
        assertArrayEquals(new double[] {0.65, 0.651, 0.652}, read.wavelengthsMicron(), 1e-15);
        assertEquals(2 / (0.651 * 0.651), read.fluxes()[1], 1e-12);
        assertEquals(0.2f / (0.651 * 0.651), read.fluxSigmas().orElseThrow()[1], 1e-12);
        assertEquals(List.of("flux-from-f-nu"), codes(read));
    }

    @Test
    void logarithmInverseVarianceAndMaskAreRead() throws IOException {
        byte[] file =
                table(
                        Map.of(
                                "TTYPE1",
                                "flux",
                                "TTYPE2",
                                "loglam",
                                "TTYPE3",
                                "ivar",
                                "TTYPE4",
                                "and_mask",
                                "VACUUM",
                                true),
                        FLUX,
                        new float[] {4, 4.125f, 4.25f},
                        new float[] {4, 0, 16},
                        new int[] {0, 0, 8});
        Observation read = read(file);
        assertEquals(Math.pow(10, 0.25), read.wavelengthsMicron()[2], 1e-14);
        assertArrayEquals(new double[] {1, Double.NaN, Double.NaN}, read.fluxes());
        assertEquals(0.5, read.fluxSigmas().orElseThrow()[0]);
        assertEquals(Optional.of(Medium.VACUUM), read.medium());
        assertEquals(
                List.of(
                                "mask-applied",
                                "zero-weight-pixels",
                                "wavelength-unit-assumed",
                                "flux-unit-assumed")
                        .stream()
                        .sorted()
                        .toList(),
                codes(read).stream().sorted().toList());
    }

    @Test
    void oneRowOfArraysIsASpectrum() throws IOException {
        byte[] file =
                table(
                        Map.of("TTYPE1", "WAVE", "TUNIT1", "nm", "TTYPE2", "FLUX"),
                        new double[][] {{650, 651, 652}},
                        new float[][] {{1, 2, 3}});
        Observation read = read(file);
        assertEquals("FITS binary table, 2 columns, one row of arrays", read.format());
        assertArrayEquals(new double[] {1, 2, 3}, read.fluxes());
        assertArrayEquals(new double[] {0.65, 0.651, 0.652}, read.wavelengthsMicron(), 1e-15);
    }

    @Test
    void variableLengthArraysInOneRowAreASpectrum() throws IOException {
        BinaryTable table = new BinaryTable();
        table.addVariableSizeColumn(new double[][] {{1.0, 1.1, 1.2}});
        table.addVariableSizeColumn(new float[][] {{1, 2, 3}});
        BinaryTableHDU hdu = table.toHDU();
        FitsFiles.add(hdu.getHeader(), Map.of("TTYPE1", "WAVE", "TUNIT1", "um", "TTYPE2", "FLUX"));
        byte[] file = FitsFiles.file(new NullDataHDU(), hdu);
        assertArrayEquals(new double[] {1, 2, 3}, read(file).fluxes());
        // The same with the length of the first array, the first number of the table, made absurd.
        byte[] absurd = file.clone();
        int row = 2880 + 2880 * (1 + (hdu.getHeader().getNumberOfPhysicalCards() - 1) / 36);
        absurd[row] = 0x7f;
        assertTrue(refusal(absurd).contains("in column 'wave'; expected no more than"));
    }

    @Test
    void integersAreScaledAndNullsAreBad() throws IOException {
        byte[] file =
                table(
                        Map.of(
                                "TTYPE1",
                                "wavelength",
                                "TUNIT1",
                                "um",
                                "TTYPE2",
                                "flux",
                                "TSCAL2",
                                0.5,
                                "TZERO2",
                                10.0,
                                "TNULL2",
                                -1),
                        new double[] {1, 2, 3},
                        new int[] {2, -1, 4});
        assertArrayEquals(new double[] {11, Double.NaN, 12}, read(file).fluxes());
    }

    @Test
    void asciiTablesAreRead() throws IOException {
        AsciiTable table = new AsciiTable();
        table.addColumn(new double[] {650, 651, 652});
        table.addColumn(new float[] {1, 2, 3});
        AsciiTableHDU hdu = table.toHDU();
        FitsFiles.add(
                hdu.getHeader(), Map.of("TTYPE1", "lambda", "TUNIT1", "nm", "TTYPE2", "flux"));
        Observation read = read(FitsFiles.file(new NullDataHDU(), hdu));
        assertEquals("FITS ASCII table, 2 columns", read.format());
        assertArrayEquals(new double[] {1, 2, 3}, read.fluxes());
    }

    @Test
    void aTableWithoutSpectrumIsPassedOver() throws IOException {
        BinaryTable log = new BinaryTable();
        log.addColumn(new double[] {1, 2});
        BinaryTable spectrum = new BinaryTable();
        spectrum.addColumn(new double[] {1, 2});
        spectrum.addColumn(new double[] {3, 4});
        BinaryTableHDU second = spectrum.toHDU();
        FitsFiles.add(second.getHeader(), Map.of("TTYPE1", "wave", "TTYPE2", "flux"));
        byte[] file = FitsFiles.file(new NullDataHDU(), log.toHDU(), second);
        assertArrayEquals(new double[] {3, 4}, read(file).fluxes());
    }

    @Test
    void tablesThatAreNoSpectrumAreRefused() {
        assertTrue(
                refusal(table(Map.of("TTYPE1", "id", "TTYPE2", "flux"), FLUX, FLUX))
                        .contains("HDU 1: a table with the columns id, flux; expected a column"));
        byte[] rows =
                table(
                        Map.of("TTYPE1", "WAVE", "TTYPE2", "FLUX"),
                        new double[][] {{1, 2, 3}, {1, 2, 3}},
                        new double[][] {{1, 2, 3}, {1, 2, 3}});
        assertTrue(refusal(rows).contains("2 rows of arrays in column 'wave'"));
        byte[] equal =
                table(
                        Map.of("TTYPE1", "WAVE", "TTYPE2", "FLUX"),
                        new double[] {1, 2, 2},
                        new double[] {1, 2, 3});
        assertTrue(
                refusal(equal).contains("table.fits, HDU 1, row 3: wavelength 2.0 micron stands"));
    }

    /** Against an independent library: the same bytes, cell by cell. */
    @Test
    void agreesWithAnotherFitsLibrary() throws IOException {
        SplittableRandom random = new SplittableRandom(7);
        int rows = 500;
        double[] wave = new double[rows];
        float[] flux = new float[rows];
        double[] sigma = new double[rows];
        for (int i = 0; i < rows; i++) {
            wave[i] = 1 + 0.001 * (i + 0.5 * random.nextDouble());
            flux[i] = (float) random.nextDouble(-1, 5);
            sigma[i] = random.nextDouble(0.1, 1);
        }
        byte[] file =
                table(
                        Map.of(
                                "TTYPE1", "wave", "TUNIT1", "um", "TTYPE2", "flux", "TUNIT2",
                                "W/m2/um", "TTYPE3", "sigma"),
                        wave,
                        flux,
                        sigma);
        Observation ours = read(file);
        StarTable theirs =
                new FitsTableBuilder()
                        .makeStarTable(
                                new ByteArrayDataSource("t", file),
                                false,
                                StoragePolicy.PREFER_MEMORY);
        List<double[]> cells = new ArrayList<>();
        try (RowSequence sequence = theirs.getRowSequence()) {
            while (sequence.next()) {
                cells.add(
                        new double[] {
                            ((Number) sequence.getCell(0)).doubleValue(),
                            ((Number) sequence.getCell(1)).doubleValue(),
                            ((Number) sequence.getCell(2)).doubleValue()
                        });
            }
        }
        assertEquals(rows, cells.size());
        for (int i = 0; i < rows; i++) {
            assertEquals(cells.get(i)[0], ours.wavelengthsMicron()[i]);
            assertEquals(cells.get(i)[1], ours.fluxes()[i]);
            assertEquals(cells.get(i)[2], ours.fluxSigmas().orElseThrow()[i]);
        }
    }
}
