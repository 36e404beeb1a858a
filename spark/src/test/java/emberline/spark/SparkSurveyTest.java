package emberline.spark;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.spectrum.Candidate;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructField;
import org.apache.spark.sql.types.StructType;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The demo survey on Spark with two threads: the same rows as without. */
class SparkSurveyTest {

    private static final Path LIST =
            Path.of(System.getProperty("emberline.root", ".."))
                    .resolve("demo-objects/survey/candidates.csv");

    @TempDir private Path folder;

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

    private static Row row(Candidate candidate, Observation spectrum) {
        List<Object> cells = new ArrayList<>(candidate.cells().values());
        cells.add(spectrum.wavelengthsMicron());
        cells.add(spectrum.fluxes());
        cells.add(spectrum.fluxSigmas().orElse(null));
        return RowFactory.create(cells.toArray());
    }

    /** What the core gives for the same arrays, without Spark. */
    private static Map<String, String> cells(ObjectResult result) {
        Map<String, String> cells = new TreeMap<>();
        for (ResultColumn column : ResultColumns.standard()) {
            String text = column.text(result);
            boolean number = column.content() == ResultColumn.Content.NUMBER && !text.isEmpty();
            cells.put(column.name(), number ? "" + Double.valueOf(text) : text);
        }
        return cells;
    }

    private static Map<String, String> cells(Row row) {
        Map<String, String> cells = new TreeMap<>();
        for (String column : row.schema().fieldNames()) {
            Object value = row.getAs(column);
            cells.put(column, value == null ? "" : value.toString());
        }
        return cells;
    }

    @Test
    void sparkGivesTheRowsOfTheListRun() throws IOException {
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        SpectrumReader reader = new SpectrumReader();
        Path beside = LIST.toAbsolutePath().getParent();
        List<Row> table = new ArrayList<>();
        Map<String, Map<String, String>> expected = new TreeMap<>();
        List<String> columns = new CandidateListReader().read(LIST).columns();
        for (ListedCandidate listed : new CandidateListReader().read(LIST).rows()) {
            Candidate candidate = listed.candidate();
            if (candidate.spectra().size() != 1) {
                continue;
            }
            Observation read = reader.read(beside, candidate.spectra().get(0));
            // What other files say beside their arrays would not be in the table.
            if (read.findings().isEmpty() && read.resolvingPower().isEmpty()) {
                table.add(row(candidate, read));
                expected.put(candidate.name(), cells(chain.run(candidate, beside)));
            }
        }
        assertTrue(table.size() >= 8, table.size() + " objects are compared");
        try (SparkSession spark =
                SparkSession.builder()
                        .master("local[2]")
                        .appName("test")
                        .config("spark.ui.enabled", "false")
                        .config("spark.sql.shuffle.partitions", "2")
                        .config("spark.driver.bindAddress", "127.0.0.1")
                        .config("spark.driver.host", "127.0.0.1")
                        .getOrCreate()) {
            String spectra = folder.resolve("spectra.parquet").toString();
            String results = folder.resolve("results.parquet").toString();
            spark.createDataFrame(table, schema(columns)).repartition(4).write().parquet(spectra);
            SparkSurvey.results(spark.read().parquet(spectra)).write().parquet(results);
            Map<String, Map<String, String>> found = new TreeMap<>();
            for (Row row : spark.read().parquet(results).collectAsList()) {
                found.put(row.getAs("name"), cells(row));
            }
            assertEquals(expected.keySet(), found.keySet());
            for (String name : expected.keySet()) {
                assertEquals(expected.get(name), found.get(name), name);
            }
        }
    }
}
