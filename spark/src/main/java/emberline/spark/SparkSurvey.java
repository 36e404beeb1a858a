package emberline.spark;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import org.apache.spark.api.java.function.MapPartitionsFunction;
import org.apache.spark.sql.Dataset;
import org.apache.spark.sql.Encoders;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructField;
import org.apache.spark.sql.types.StructType;

/**
 * Takes a table of spectra through the chain on Spark and gives the standard columns of the results
 * table, a row for each row. Each worker makes its chain once a partition; nothing is shared.
 *
 * <p>As a program: two arguments, the table of spectra (Parquet) and where the results go.
 */
public final class SparkSurvey {

    private SparkSurvey() {}

    /**
     * Runs as a Spark application.
     *
     * @param arguments the table of spectra (Parquet) and the folder of the results (Parquet)
     * @throws IllegalArgumentException if there are not two arguments
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
     * The results of a table of spectra.
     *
     * @param spectra a row for each object: {@code name}, arrays {@code wavelength_micron}, {@code
     *     flux}, perhaps {@code sigma}, and whatever a candidate list may hold
     * @return the standard columns of the results table; numbers as doubles
     */
    public static Dataset<Row> results(Dataset<Row> spectra) {
        MapPartitionsFunction<Row, Row> work = SparkSurvey::partition;
        return spectra.mapPartitions(work, Encoders.row(schema()));
    }

    private static StructType schema() {
        List<StructField> fields = new ArrayList<>();
        for (ResultColumn column : ResultColumns.standard()) {
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

    private static Iterator<Row> partition(Iterator<Row> rows) {
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        return new Iterator<>() {
            @Override
            public boolean hasNext() {
                return rows.hasNext();
            }

            @Override
            public Row next() {
                Row row = rows.next();
                return cells(
                        chain.run(
                                SpectrumRow.candidate(row),
                                address -> SpectrumRow.observation(row)));
            }
        };
    }

    private static Row cells(ObjectResult result) {
        List<ResultColumn> columns = ResultColumns.standard();
        Object[] cells = new Object[columns.size()];
        for (int i = 0; i < cells.length; i++) {
            String text = columns.get(i).text(result);
            if (columns.get(i).content() == ResultColumn.Content.NUMBER) {
                cells[i] = text.isEmpty() ? null : Double.valueOf(text);
            } else {
                cells[i] = text;
            }
        }
        return RowFactory.create(cells);
    }
}
