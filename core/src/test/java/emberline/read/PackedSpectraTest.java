package emberline.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.BinaryTableHDU;
import nom.tam.fits.Fits;
import nom.tam.fits.FitsException;
import nom.tam.fits.NullDataHDU;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PackedSpectraTest {

    private static final int ROWS = 12;
    private static final int PIXELS = 40;

    @TempDir private Path folder;

    private final SpectrumReader reader = new SpectrumReader();

    private static double[] wavelengths(int row) {
        double[] values = new double[PIXELS];
        for (int i = 0; i < PIXELS; i++) {
            values[i] = 1 + 0.01 * i + 0.001 * row;
        }
        return values;
    }

    private static float[] fluxes(int row) {
        float[] values = new float[PIXELS];
        for (int i = 0; i < PIXELS; i++) {
            values[i] = (float) (2 + Math.sin(0.3 * i + row));
        }
        return values;
    }

    private static float[] sigmas(int row) {
        float[] values = new float[PIXELS];
        Arrays.fill(values, 0.01f * (row + 1));
        return values;
    }

    private static BinaryTableHDU table(boolean ownWavelengths) {
        String[] names = new String[ROWS];
        double[][] waves = new double[ROWS][];
        float[][] flux = new float[ROWS][];
        float[][] sigma = new float[ROWS][];
        double[] magnitudes = new double[ROWS];
        int[] numbers = new int[ROWS];
        for (int row = 0; row < ROWS; row++) {
            names[row] = "Object " + (row + 1);
            waves[row] = wavelengths(row);
            flux[row] = fluxes(row);
            sigma[row] = sigmas(row);
            magnitudes[row] = 14.25 + row;
            numbers[row] = 7 * row;
        }
        BinaryTable table = new BinaryTable();
        List<String> labels = new ArrayList<>();
        try {
            table.addColumn(names);
            labels.add("Object");
            if (ownWavelengths) {
                table.addColumn(waves);
                labels.add("wavelength");
            }
            table.addColumn(flux);
            table.addColumn(sigma);
            table.addColumn(magnitudes);
            table.addColumn(numbers);
            labels.addAll(List.of("flux", "sigma", "J_mag", "visit"));
            BinaryTableHDU hdu = table.toHDU();
            for (int i = 0; i < labels.size(); i++) {
                hdu.getHeader().addValue("TTYPE" + (i + 1), labels.get(i), "");
                if (labels.get(i).equals("wavelength")) {
                    hdu.getHeader().addValue("TUNIT" + (i + 1), "um", "");
                }
            }
            hdu.getHeader().addValue("MEDIUM", "vacuum", "");
            return hdu;
        } catch (FitsException e) {
            throw new IllegalStateException(e);
        }
    }

    private Path write(String name, BasicHDU<?>... units) throws IOException {
        return Files.write(folder.resolve(name), FitsFiles.file(units));
    }

    private static BasicHDU<?> image(Object array, Map<String, Object> keys) {
        try {
            BasicHDU<?> hdu = Fits.makeHDU(array);
            FitsFiles.add(hdu.getHeader(), keys);
            return hdu;
        } catch (FitsException e) {
            throw new IllegalStateException(e);
        }
    }

    private static void assertRow(Observation found, int row, double[] wavelengths) {
        assertArrayEquals(wavelengths, found.wavelengthsMicron(), 1e-12);
        float[] flux = fluxes(row);
        for (int i = 0; i < PIXELS; i++) {
            assertEquals(flux[i], found.fluxes()[i]);
            assertEquals(sigmas(row)[i], found.fluxSigmas().orElseThrow()[i]);
        }
    }

    private List<ListedCandidate> rows(Path argument) throws IOException {
        List<ListedCandidate> rows = new ArrayList<>();
        try (CandidateRows open = CandidateSource.of(argument).open()) {
            for (var row = open.next(); row.isPresent(); row = open.next()) {
                rows.add(row.get());
            }
        }
        return rows;
    }

    @Test
    void eachRowOfATableIsASpectrumAndARowOfTheList() throws IOException {
        Path file = write("pack.fits", new NullDataHDU(), table(true));
        List<ListedCandidate> rows = rows(file);
        assertEquals(ROWS, rows.size());
        for (int row = 0; row < ROWS; row++) {
            var candidate = rows.get(row).candidate();
            assertEquals(Optional.empty(), rows.get(row).problem());
            assertEquals("Object " + (row + 1), candidate.name());
            assertEquals(14.25 + row, candidate.number("j_mag").orElseThrow());
            assertEquals(Optional.of("" + 7 * row), candidate.text("visit"));
            String address = candidate.spectra().get(0);
            assertEquals("pack.fits#hdu=1&row=" + (row + 1), address);
            Observation found = reader.read(folder, address);
            assertRow(found, row, wavelengths(row));
            assertEquals("pack.fits, HDU 1, row " + (row + 1), found.source());
            assertEquals(found.sha256(), reader.checksum(folder, address).orElseThrow());
        }
        assertNotEquals(
                reader.checksum(folder, "pack.fits#row=1"),
                reader.checksum(folder, "pack.fits#row=2"));
        assertRow(reader.read(folder, "pack.fits#row=3"), 2, wavelengths(2));
    }

    @Test
    void wavelengthsMayStandInAnImageOfTheirOwn() throws IOException {
        BasicHDU<?> waves = image(wavelengths(0), Map.of("EXTNAME", "WAVELENGTH", "BUNIT", "um"));
        Path file = write("shared.fits", new NullDataHDU(), waves, table(false));
        assertEquals(ROWS, rows(file).size());
        assertRow(reader.read(folder, "shared.fits#hdu=2&row=5"), 4, wavelengths(0));
    }

    @Test
    void arraysOfVariableLengthAreGathered() throws Exception {
        double[][] waves = new double[3][];
        float[][] flux = new float[3][];
        for (int row = 0; row < 3; row++) {
            waves[row] = Arrays.copyOf(wavelengths(row), 10 + row);
            flux[row] = Arrays.copyOf(fluxes(row), 10 + row);
        }
        BinaryTable table = new BinaryTable();
        table.addVariableSizeColumn(waves);
        table.addVariableSizeColumn(flux);
        BinaryTableHDU hdu = table.toHDU();
        FitsFiles.add(hdu.getHeader(), Map.of("TTYPE1", "wavelength", "TTYPE2", "flux"));
        write("variable.fits", new NullDataHDU(), hdu);
        for (int row = 0; row < 3; row++) {
            Observation found = reader.read(folder, "variable.fits#row=" + (row + 1));
            assertArrayEquals(waves[row], found.wavelengthsMicron(), 1e-12);
            assertEquals(10 + row, found.size());
            assertEquals(flux[row][9], found.fluxes()[9]);
        }
    }

    @Test
    void eachHduCanBeASpectrum() throws IOException {
        List<BasicHDU<?>> units = new ArrayList<>(List.of(new NullDataHDU()));
        for (int row = 0; row < 3; row++) {
            double[][] lines = new double[3][PIXELS];
            lines[0] = wavelengths(row);
            for (int i = 0; i < PIXELS; i++) {
                lines[1][i] = fluxes(row)[i];
                lines[2][i] = sigmas(row)[i];
            }
            units.add(image(lines, Map.of("EXTNAME", "Star " + (row % 2), "XUNITS", "um")));
        }
        Path file = write("many.fits", units.toArray(new BasicHDU<?>[0]));
        List<ListedCandidate> rows = rows(file);
        assertEquals(
                List.of("Star 0", "Star 1", "Star 0-3"),
                rows.stream().map(row -> row.candidate().name()).toList());
        for (int row = 0; row < 3; row++) {
            assertRow(
                    reader.read(folder, rows.get(row).candidate().spectra().get(0)),
                    row,
                    wavelengths(row));
        }
    }

    @Test
    void eachRowOfAnImageIsASpectrum() throws IOException {
        float[][] flux = new float[ROWS][];
        float[][] sigma = new float[ROWS][];
        for (int row = 0; row < ROWS; row++) {
            flux[row] = fluxes(row);
            sigma[row] = sigmas(row);
        }
        Map<String, Object> axis =
                Map.of("CRVAL1", 1.0, "CDELT1", 0.01, "CRPIX1", 1.0, "CUNIT1", "um");
        Path file = write("rows.fits", image(flux, axis), image(sigma, Map.of("EXTNAME", "ERROR")));
        List<ListedCandidate> rows = rows(file);
        assertEquals(ROWS, rows.size());
        assertEquals("rows-4", rows.get(3).candidate().name());
        assertRow(reader.read(folder, "rows.fits#hdu=0&row=4"), 3, wavelengths(0));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "pack.fits#row=13 | pack.fits, HDU 1 | no row 13 | one of its 12 rows",
                "pack.fits#hdu=7 | pack.fits | no HDU 7 | HDUs 0 to 1",
                "pack.fits#row=0 | pack.fits#row=0 | cannot be read | rows from 1",
                "pack.fits#hdu=1row=2 | pack.fits#hdu | cannot be read | FILE#hdu=H&row=R",
                "pack.fits#hdu=0&row=1 | pack.fits, HDU 0 | no rows | array columns",
                "pack.fits#hdu=0 | pack.fits | without data | spectrum",
                "text.csv#row=1 | text.csv | no FITS file | FITS",
                "gone.fits#row=1 | gone.fits | no such file | path",
                "cut.fits#row=1 | cut.fits, HDU 1 | declares | whole FITS file",
                "bad.fits#row=2 | bad.fits, HDU 1, row 2 | none of the 40 pixels | flux"
            })
    void whatIsWrongIsSaidWithHduAndRow(String address, String where, String found, String expected)
            throws IOException {
        Path file = write("pack.fits", new NullDataHDU(), table(true));
        Files.writeString(folder.resolve("text.csv"), "wavelength,flux\n1,2\n");
        byte[] bytes = Files.readAllBytes(file);
        Files.write(folder.resolve("cut.fits"), Arrays.copyOf(bytes, 5760 + 2000));
        int rowBytes = (bytes.length - 2880) / ROWS;
        assertTrue(rowBytes > 100);
        write("bad.fits", new NullDataHDU(), withoutFlux());
        UnreadableSpectrumException refused =
                assertThrows(UnreadableSpectrumException.class, () -> reader.read(folder, address));
        String message = refused.getMessage();
        assertTrue(message.startsWith(where), message);
        assertTrue(message.contains(found) && message.contains(expected), message);
    }

    /** A table whose second row holds no flux. */
    private static BinaryTableHDU withoutFlux() {
        BinaryTableHDU hdu = table(true);
        try {
            hdu.getData().setElement(1, 2, new float[PIXELS]);
        } catch (FitsException e) {
            throw new IllegalStateException(e);
        }
        return hdu;
    }

    @Test
    void aFileThatIsNamedLikeAnAddressIsAFile() throws IOException {
        Files.writeString(folder.resolve("odd#row=1"), "wavelength_um,flux\n1.0,2\n1.1,3\n1.2,4\n");
        assertEquals(3, reader.read(folder, "odd#row=1").size());
    }

    @Test
    void foldersAndPatternsGiveAnObjectForEachFile() throws IOException {
        Files.createDirectories(folder.resolve("in/deep"));
        for (String name : List.of("b.csv", "a.txt", "deep/c.csv", ".hidden")) {
            Files.writeString(
                    folder.resolve("in").resolve(name), "wavelength_um,flux\n1,2\n1.1,3\n1.2,4\n");
        }
        Files.copy(write("pack.fits", new NullDataHDU(), table(true)), folder.resolve("in/p.fits"));
        assertEquals(
                List.of("a", "b", "deep/c", "Object 1", "Object 2"),
                rows(folder.resolve("in")).stream()
                        .map(row -> row.candidate().name())
                        .limit(5)
                        .toList());
        assertEquals(
                List.of("b"),
                rows(folder.resolve("in/*.csv")).stream()
                        .map(row -> row.candidate().name())
                        .toList());
        assertEquals(List.of("in/a.txt"), reader.expanded(folder, "in/a.*"));
        assertEquals(List.of("in/b.csv", "in/deep/c.csv"), reader.expanded(folder, "in/**.csv"));
        assertEquals(List.of("in/z*"), reader.expanded(folder, "in/z*"));
        String whole = folder.resolve("in") + "/b.*";
        assertEquals(
                List.of(folder.resolve("in/b.csv").toString()), reader.expanded(folder, whole));
        assertEquals(3, reader.read(folder, reader.expanded(folder, whole).get(0)).size());
        String noFolder = "in\0/*.csv";
        UnreadableSpectrumException badName =
                assertThrows(
                        UnreadableSpectrumException.class, () -> reader.expanded(folder, noFolder));
        assertTrue(badName.getMessage().contains("no name of a folder"), badName.getMessage());
        UnreadableListException none =
                assertThrows(UnreadableListException.class, () -> rows(folder.resolve("in/*.vot")));
        assertTrue(none.getMessage().contains("no files"), none.getMessage());
    }

    @Test
    void aListWithAColumnOfPathsStaysAList() throws IOException {
        BinaryTable table = new BinaryTable();
        try {
            table.addColumn(new String[] {"A", "B"});
            table.addColumn(new String[] {"a.fits", "b.fits"});
            BinaryTableHDU hdu = table.toHDU();
            FitsFiles.add(hdu.getHeader(), Map.of("TTYPE1", "name", "TTYPE2", "spectrum"));
            Path file = write("list.fits", new NullDataHDU(), hdu);
            assertEquals(List.of("a.fits"), rows(file).get(0).candidate().spectra());
        } catch (FitsException e) {
            throw new IllegalStateException(e);
        }
    }
}
