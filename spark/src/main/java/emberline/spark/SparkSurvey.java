package emberline.spark;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.ListedCandidate;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.ReddeningMode;
import emberline.survey.SurveySettings;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import org.apache.spark.api.java.function.MapPartitionsFunction;
import org.apache.spark.sql.Column;
import org.apache.spark.sql.Dataset;
import org.apache.spark.sql.Encoders;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.expressions.Window;
import org.apache.spark.sql.functions;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructField;
import org.apache.spark.sql.types.StructType;
import org.apache.spark.storage.StorageLevel;

/**
 * Takes a table of spectra through the chain on Spark and gives the columns of the results table, a
 * row for each row, with the settings that {@code sort} has where no option is given. Each worker
 * makes its chain once a partition; nothing is shared.
 *
 * <p>As a program: two arguments, the table of spectra (Parquet) and where the results go.
 */
public final class SparkSurvey {

    private static final String SCORE = "score";
    private static final String NUMBER = "emberline_row";

    private SparkSurvey() {}

    /**
     * Runs as a Spark application.
     *
     * @param arguments the table of spectra (Parquet) and the folder of the results (Parquet)
     * @throws IllegalArgumentException if there are not two arguments, or the table has not the
     *     columns that {@link #results} needs
     */
    public static void main(String[] arguments) {
        if (arguments.length != 2) {
            throw new IllegalArgumentException(
                    "found " + arguments.length + " arguments: expected SPECTRA.parquet RESULTS");
        }
        try (SparkSession spark = SparkSession.builder().appName("emberline").getOrCreate()) {
            results(spark.read().parquet(arguments[0])).write().parquet(arguments[1]);
        }
    }

    /**
     * The results of a table of spectra. They are kept on the disks of the workers until the
     * session ends, since the rank of an object is known only when all are judged.
     *
     * @param spectra a row for each object: {@code name} (once each), arrays {@code
     *     wavelength_micron}, {@code flux}, perhaps {@code sigma}, and whatever a candidate list
     *     may hold; an object whose arrays are null is typed by its colours
     * @return the standard columns of the results table, then those of the list, in no order of
     *     rows; numbers as doubles, nothing as null; objects of equal score are ranked by name
     * @throws IllegalArgumentException if a column is missing or is no array of numbers
     */
    public static Dataset<Row> results(Dataset<Row> spectra) {
        SpectrumRow.check(spectra.schema());
        List<String> listed = new ArrayList<>(SpectrumRow.listColumns(spectra.schema()));
        MapPartitionsFunction<Row, Row> work = rows -> partition(rows, listed);
        return ranked(spectra.mapPartitions(work, Encoders.row(schema(listed))));
    }

    private static StructType schema(List<String> listed) {
        List<StructField> fields = new ArrayList<>();
        for (ResultColumn column : ResultColumns.forList(listed)) {
            fields.add(
                    DataTypes.createStructField(
                            column.name(),
                            column.content() == ResultColumn.Content.NUMBER
                                    ? DataTypes.DoubleType
                                    : DataTypes.StringType,
                            true));
        }
        return DataTypes.createStructType(fields);
    }

    /** Fills the rank; only name and score of each object meet in one place. */
    private static Dataset<Row> ranked(Dataset<Row> results) {
        Column[] columns =
                List.of(results.columns()).stream()
                        .map(name -> functions.col("`" + name + "`"))
                        .toArray(Column[]::new);
        Dataset<Row> numbered =
                results.withColumn(NUMBER, functions.monotonically_increasing_id())
                        .persist(StorageLevel.DISK_ONLY());
        Column place =
                functions
                        .row_number()
                        .over(
                                Window.orderBy(
                                        functions.col(SCORE).desc_nulls_last(),
                                        functions.col("name")));
        Dataset<Row> ranks =
                numbered.select(NUMBER, "name", SCORE)
                        .withColumn(ResultColumns.RANK, place.cast(DataTypes.DoubleType))
                        .select(NUMBER, ResultColumns.RANK);
        return numbered.drop(ResultColumns.RANK).join(ranks, NUMBER).select(columns);
    }

    private static Iterator<Row> partition(Iterator<Row> rows, List<String> listed) {
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults().withReddening(ReddeningMode.CALLED_FOR));
        List<ResultColumn> columns = ResultColumns.forList(listed);
        return new Iterator<>() {
            @Override
            public boolean hasNext() {
                return rows.hasNext();
            }

            @Override
            public Row next() {
                return cells(result(chain, rows.next()), columns);
            }
        };
    }

    private static ObjectResult result(Chain chain, Row row) {
        ListedCandidate listed = SpectrumRow.candidate(row);
        return listed.problem()
                .map(problem -> Chain.failed(listed.candidate(), problem))
                .orElseGet(
                        () ->
                                chain.run(
                                        listed.candidate(),
                                        address -> SpectrumRow.observation(row)));
    }

    private static Row cells(ObjectResult result, List<ResultColumn> columns) {
        Object[] cells = new Object[columns.size()];
        for (int i = 0; i < cells.length; i++) {
            String text = columns.get(i).text(result);
            if (text.isEmpty()) {
                cells[i] = null;
            } else if (columns.get(i).content() == ResultColumn.Content.NUMBER) {
                cells[i] = Double.valueOf(text);
            } else {
                cells[i] = text;
            }
        }
        return RowFactory.create(cells);
    }
}
