package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.AirToVacuum;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Stream;
import java.util.zip.GZIPInputStream;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.Fits;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StarTableFactory;
import uk.ac.starlink.table.Tables;
import uk.ac.starlink.util.ByteArrayDataSource;

/** The committed survey is what the simulator makes, and other software can read its files. */
class SurveyFilesTest {

    private static final Path SURVEY =
            Path.of(System.getProperty("emberline.root", ".."), "demo-objects", "survey");

    private static Map<String, byte[]> made;

    @BeforeAll
    static void make() throws IOException {
        made = new SurveyMaker().files();
    }

    @Test
    void committedFilesAreThoseTheSimulatorMakes() throws IOException {
        Map<String, byte[]> committed = new TreeMap<>();
        try (Stream<Path> paths = Files.walk(SURVEY)) {
            for (Path path : paths.filter(Files::isRegularFile).toList()) {
                String name = SURVEY.relativize(path).toString().replace('\\', '/');
                committed.put(name, Files.readAllBytes(path));
            }
        }
        assertEquals(new TreeSet<>(made.keySet()), committed.keySet(), "run MakeSurvey anew");
        for (Map.Entry<String, byte[]> file : made.entrySet()) {
            assertArrayEquals(
                    unpacked(file.getKey(), file.getValue()),
                    unpacked(file.getKey(), committed.get(file.getKey())),
                    file.getKey() + ": run MakeSurvey anew");
        }
        int total = committed.values().stream().mapToInt(bytes -> bytes.length).sum();
        assertTrue(total < 1_200_000, "bytes of the survey: " + total);
    }

    /** Packed bytes may differ between builds of the compression library, their content may not. */
    private static byte[] unpacked(String name, byte[] bytes) throws IOException {
        if (!name.endsWith(".gz")) {
            return bytes;
        }
        try (GZIPInputStream gzip = new GZIPInputStream(new ByteArrayInputStream(bytes))) {
            return gzip.readAllBytes();
        }
    }

    @Test
    void makingTheSurveyWritesTheSameFiles(@TempDir Path folder) throws IOException {
        MakeSurvey.main(new String[] {folder.toString()});
        for (Map.Entry<String, byte[]> file : made.entrySet()) {
            assertArrayEquals(file.getValue(), Files.readAllBytes(folder.resolve(file.getKey())));
        }
        assertThrows(IllegalArgumentException.class, () -> MakeSurvey.main(new String[0]));
    }

    @Test
    void theListHasARowForEveryObjectAndNoNameTwice() {
        List<String> rows = new ArrayList<>(lines("candidates.csv"));
        assertTrue(rows.size() - 1 >= 36, "objects: " + (rows.size() - 1));
        rows.addAll(lines("spoilt.csv").subList(1, 6));
        List<String> names = rows.stream().map(row -> row.split(",", -1)[0]).toList();
        assertEquals(rows.size(), new TreeSet<>(names).size());
        assertEquals(names, lines("truth.csv").stream().map(row -> row.split(",", -1)[0]).toList());
        int columns = rows.get(0).split(",", -1).length;
        for (String row : rows) {
            assertEquals(columns, row.split(",", -1).length, row);
        }
    }

    private static List<String> lines(String file) {
        return new String(made.get(file), StandardCharsets.UTF_8).lines().toList();
    }

    @Test
    void magnitudesFollowFromTypeAndDistance() {
        for (SurveyObject object : SurveyObject.all()) {
            Photometry photometry = Photometry.of(object);
            double j = photometry.trueMagnitude("j_mag");
            double seen = photometry.measured("j_mag").orElseThrow();
            assertEquals(j, seen, 5 * photometry.error("j_mag").orElseThrow(), object.name());
        }
        SurveyObject l3 =
                SurveyObject.all().stream()
                        .filter(o -> o.name().equals("Tamarisk-0238+0014"))
                        .findFirst()
                        .orElseThrow();
        // M_J of L3 is 12.67 in magnitudes.csv; the distance modulus of 29 pc is 2.312.
        assertEquals(14.982, Photometry.of(l3).trueMagnitude("j_mag"), 0.001);
    }

    @Test
    void fitsFilesAreRegular() throws Exception {
        try (Fits fits = fits("spectra/tamarisk-0155+0109.fits")) {
            float[][] rows = (float[][]) fits.readHDU().getKernel();
            assertEquals(3, rows.length);
            assertEquals(0.9, rows[0][0], 0.001, "micron");
            assertTrue(rows[1][500] > 0 && rows[2][500] > 0);
        }
        try (Fits fits = fits("spectra/tamarisk-0140+0522.fits")) {
            BasicHDU<?> unit = fits.readHDU();
            assertEquals("Tamarisk-0140+0522", unit.getHeader().getStringValue("OBJECT"));
            double first = unit.getHeader().getDoubleValue("CRVAL1");
            assertEquals(9400, Math.pow(10, first), 3, "Angstrom");
            int last = unit.getAxes()[0] - 1;
            double end = first + last * unit.getHeader().getDoubleValue("CDELT1");
            assertEquals(24000, Math.pow(10, end), 15, "Angstrom");
        }
    }

    private static Fits fits(String file) throws Exception {
        return new Fits(new ByteArrayInputStream(made.get(file)));
    }

    @Test
    void tablesAreReadByTheTableLibrary() throws IOException {
        assertTable("spectra/tamarisk-0217+0635.fits", "fits", 9400, "Angstrom");
        assertTable("spectra/tamarisk-0246+0411.vot", "votable", 0.82, "um");
        assertTable("spectra/tamarisk-0308+0256.ecsv", "ecsv", 820, "nm");
        assertTable("spectra/tamarisk-0335+0137.ecsv", "ecsv", 0.82, "um");
    }

    private static void assertTable(String file, String format, double first, String unit)
            throws IOException {
        StarTable table =
                Tables.randomTable(
                        new StarTableFactory()
                                .makeStarTable(
                                        new ByteArrayDataSource(file, made.get(file)), format));
        assertEquals(3, table.getColumnCount());
        assertEquals(unit, table.getColumnInfo(0).getUnitString());
        assertEquals(first, ((Number) table.getCell(0, 0)).doubleValue(), 0.005 * first);
        assertTrue(((Number) table.getCell(table.getRowCount() / 3, 1)).doubleValue() > 0);
    }

    @Test
    void theOpticalSpectrumIsInAir() {
        List<String> rows = lines("spectra/tamarisk-0131-0207.txt");
        String first = rows.stream().filter(row -> !row.startsWith("#")).findFirst().orElseThrow();
        double angstrom = Double.parseDouble(first.split(" ", -1)[0]);
        Instrument red = Instrument.named("red");
        double[] edges = red.edgesMicron();
        double air = AirToVacuum.airMicron((edges[0] + edges[1]) / 2);
        assertEquals(air * 1e4, angstrom, 0.006);
    }
}
