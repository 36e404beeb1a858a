package emberline.spark;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import de.siegmar.fastcsv.writer.CsvWriter;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import org.apache.spark.sql.Dataset;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructField;
import org.apache.spark.sql.types.StructType;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;

/** The demo survey on Spark with two threads, beside {@code sort} of the same spectra. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SparkSurveyTest {

    private static final Path ROOT = Path.of(System.getProperty("emberline.root", ".."));
    private static final Path LIST = ROOT.resolve("demo-objects/survey/candidates.csv");

    @TempDir private Path folder;
    private SparkSession spark;

    @BeforeAll
    void start(@TempDir Path tables) {
        spark =
                SparkSession.builder()
                        .master("local[2]")
                        .appName("test")
                        .config("spark.ui.enabled", "false")
                        .config("spark.sql.shuffle.partitions", "2")
                        .config("spark.sql.warehouse.dir", tables.toString())
                        .config("spark.driver.bindAddress", "127.0.0.1")
                        .config("spark.driver.host", "127.0.0.1")
                        .getOrCreate();
    }

    @AfterAll
    void stop() {
        spark.close();
    }

    private static StructType schema(List<String> columns) {
        List<StructField> fields = new ArrayList<>();
        for (String column : columns) {
            fields.add(DataTypes.createStructField(column, DataTypes.StringType, true));
        }
        for (String array : SpectrumRow.ARRAYS) {
            fields.add(
                    DataTypes.createStructField(
                            array, DataTypes.createArrayType(DataTypes.DoubleType), true));
        }
        return DataTypes.createStructType(fields);
    }

    private static Row withoutSpectrum(List<String> cells) {
        List<Object> all = new ArrayList<>(cells);
        all.add(null);
        all.add(null);
        all.add(null);
        return RowFactory.create(all.toArray());
    }

    private static Row row(List<String> cells, Observation spectrum) {
        List<Object> all = new ArrayList<>(cells);
        all.add(spectrum.wavelengthsMicron());
        all.add(spectrum.fluxes());
        all.add(spectrum.fluxSigmas().orElse(null));
        return RowFactory.create(all.toArray());
    }

    /** Writes pixels as text that gives the same numbers when it is read. */
    private static void write(Observation spectrum, Path file) throws IOException {
        double[] wavelengths = spectrum.wavelengthsMicron();
        double[] fluxes = spectrum.fluxes();
        boolean noise = spectrum.fluxSigmas().isPresent();
        double[] sigmas = spectrum.fluxSigmas().orElse(fluxes);
        StringBuilder text = new StringBuilder("# ");
        text.append('%').append("ECSV 1.0\n# ---\n# datatype:\n");
        text.append("# - {name: wavelength, unit: um, datatype: float64}\n");
        text.append("# - {name: flux, unit: W m-2 um-1, datatype: float64}\n");
        if (noise) {
            text.append("# - {name: sigma, unit: W m-2 um-1, datatype: float64}\n");
        }
        text.append(noise ? "wavelength flux sigma\n" : "wavelength flux\n");
        for (int i = 0; i < wavelengths.length; i++) {
            text.append(cell(wavelengths[i])).append(' ').append(cell(fluxes[i]));
            text.append(noise ? " " + cell(sigmas[i]) : "").append('\n');
        }
        Files.writeString(file, text);
    }

    private static String cell(double value) {
        return Double.isNaN(value) ? "nan" : Double.toString(value);
    }

    /**
     * The objects of the demo survey with one spectrum or none: as a list with files that hold
     * nothing beside their arrays, and as rows of a table.
     */
    private List<Row> sameSpectra(Path list) throws IOException {
        SpectrumReader reader = new SpectrumReader();
        Path beside = LIST.toAbsolutePath().getParent();
        CandidateList demo = new CandidateListReader().read(LIST);
        List<Row> table = new ArrayList<>();
        try (CsvWriter csv = CsvWriter.builder().build(list)) {
            csv.writeRecord(demo.columns());
            for (ListedCandidate listed : demo.rows()) {
                Candidate candidate = listed.candidate();
                if (candidate.spectra().size() > 1) {
                    continue;
                }
                Map<String, String> cells = new LinkedHashMap<>(candidate.cells());
                if (candidate.spectra().isEmpty()) {
                    csv.writeRecord(cells.values());
                    table.add(withoutSpectrum(List.copyOf(cells.values())));
                    continue;
                }
                String file = "pixels-" + table.size() + ".ecsv";
                Observation read = reader.read(beside, candidate.spectra().get(0));
                write(read, list.resolveSibling(file));
                Observation again = reader.read(list.resolveSibling(file));
                assertArrayEquals(read.wavelengthsMicron(), again.wavelengthsMicron());
                assertArrayEquals(read.fluxes(), again.fluxes());
                assertEquals(List.of(), again.findings(), candidate.name());
                cells.put("spectrum", file);
                csv.writeRecord(cells.values());
                table.add(row(List.copyOf(cells.values()), again));
            }
        }
        return table;
    }

    /** What {@code sort} writes, as built by the package phase. */
    private Map<String, Map<String, String>> sorted(Path list)
            throws IOException, InterruptedException {
        Path jar = ROOT.resolve("cli/target/emberline.jar");
        assertTrue(Files.isRegularFile(jar), jar + ": expected the packaged program; use verify");
        Path out = folder.resolve("sorted");
        Process sort =
                new ProcessBuilder(
                                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                                "-jar",
                                jar.toString(),
                                "sort",
                                list.toString(),
                                "--no-reports",
                                "--out",
                                out.toString())
                        .redirectErrorStream(true)
                        .redirectOutput(folder.resolve("sort.log").toFile())
                        .start();
        assertTrue(sort.waitFor(10, TimeUnit.MINUTES), "sort ends");
        assertEquals(0, sort.exitValue(), Files.readString(folder.resolve("sort.log")));
        Map<String, Map<String, String>> rows = new TreeMap<>();
        try (CsvReader<NamedCsvRecord> csv =
                CsvReader.builder().ofNamedCsvRecord(out.resolve("results.csv"))) {
            for (NamedCsvRecord row : csv) {
                rows.put(row.getField("name"), row.getFieldsAsMap());
            }
        }
        return rows;
    }

    /** Cells as the CSV has them, except that numbers may be written otherwise. */
    private static void assertSame(Map<String, String> expected, Row found, String name) {
        assertEquals(List.copyOf(expected.keySet()), List.of(found.schema().fieldNames()));
        for (Map.Entry<String, String> cell : expected.entrySet()) {
            Object value = found.getAs(cell.getKey());
            String where = name + ", " + cell.getKey();
            if (value instanceof Double number) {
                assertEquals(Double.valueOf(cell.getValue()), number, where);
            } else {
                assertEquals(cell.getValue(), value == null ? "" : value, where);
            }
        }
    }

    @Test
    void sparkGivesTheRowsOfSort() throws IOException, InterruptedException {
        Path list = folder.resolve("list.csv");
        List<Row> table = sameSpectra(list);
        String spectra = folder.resolve("spectra.parquet").toString();
        String results = folder.resolve("results.parquet").toString();
        spark.createDataFrame(table, schema(new CandidateListReader().read(LIST).columns()))
                .repartition(4)
                .write()
                .parquet(spectra);
        SparkSurvey.results(spark.read().parquet(spectra)).write().parquet(results);
        Map<String, Map<String, String>> expected = sorted(list);
        List<Row> found = spark.read().parquet(results).collectAsList();
        assertEquals(41, expected.size());
        assertEquals(expected.size(), found.size());
        for (Row row : found) {
            String name = row.getAs("name");
            assertSame(expected.get(name), row, name);
        }
    }

    @Test
    void aRowThatCannotBeUsedSaysWhy() {
        List<Row> table =
                List.of(
                        RowFactory.create(
                                "Short", "vacuum", new double[] {1, 2}, new double[] {1}, null),
                        RowFactory.create(
                                "Word", "water", new double[] {1, 2}, new double[] {1, 1}, null),
                        RowFactory.create("Half", "vacuum", null, new double[] {1, 1}, null),
                        withoutSpectrum(List.of("Nothing", "")));
        Map<String, String> reasons = new TreeMap<>();
        Dataset<Row> spectra = spark.createDataFrame(table, schema(List.of("name", "medium")));
        for (Row row : SparkSurvey.results(spectra).collectAsList()) {
            assertEquals("failed", row.getAs("status"), row.toString());
            reasons.put(row.getAs("name"), row.getAs("reason"));
        }
        assertEquals(4, reasons.size());
        assertTrue(reasons.get("Short").contains("2 wavelengths, 1 fluxes"), reasons.get("Short"));
        assertTrue(
                reasons.get("Word").startsWith("row of Word, column medium: 'water'; expected"),
                reasons.get("Word"));
        assertTrue(
                reasons.get("Half").contains("no array in column wavelength_micron"),
                reasons.get("Half"));
        assertTrue(reasons.get("Nothing").contains("two magnitudes"), reasons.get("Nothing"));
    }

    @Test
    void aTableWithoutTheColumnsIsRefused() {
        Dataset<Row> named =
                spark.createDataFrame(
                        List.of(RowFactory.create("A")),
                        DataTypes.createStructType(
                                List.of(
                                        DataTypes.createStructField(
                                                "name", DataTypes.StringType, true))));
        String message =
                assertThrows(IllegalArgumentException.class, () -> SparkSurvey.results(named))
                        .getMessage();
        assertTrue(message.contains("no column wavelength_micron among name"), message);
    }
}
