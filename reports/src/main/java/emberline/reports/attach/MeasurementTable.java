package emberline.reports.attach;

import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.NotMeasured;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** The features of one or several objects as a table: one row an object and feature. */
public final class MeasurementTable {

    private static final List<String> HEADER =
            List.of(
                    "name",
                    "feature",
                    "value",
                    "sigma",
                    "unit",
                    "coverage",
                    "smoothed_to",
                    "why",
                    "detail");

    private MeasurementTable() {}

    /**
     * The table.
     *
     * @param results the results of objects in the order of the table
     * @param format how it is printed; as text, what could not be measured is counted by reason and
     *     not listed, and an object without measurements has a line that says why
     * @return the printed table, with a line end
     */
    public static String print(List<ObjectResult> results, TableFormat format) {
        return switch (format) {
            case TEXT -> text(results);
            case CSV -> csv(results);
            case JSON -> json(results);
        };
    }

    private static String csv(List<ObjectResult> results) {
        AlignedTable table = new AlignedTable(HEADER);
        for (ObjectResult result : results) {
            for (FeatureMeasurement measurement : all(result)) {
                table.add(row(result, measurement));
            }
        }
        return table.csv();
    }

    private static String text(List<ObjectResult> results) {
        StringBuilder text = new StringBuilder();
        for (ObjectResult result : results) {
            AlignedTable table = new AlignedTable(HEADER.subList(0, 7));
            Map<String, Integer> missing = new LinkedHashMap<>();
            for (FeatureMeasurement measurement : all(result)) {
                if (measurement.result() instanceof NotMeasured reason) {
                    missing.merge(reason.why().words(), 1, Integer::sum);
                } else {
                    table.add(row(result, measurement).subList(0, 7));
                }
            }
            if (!table.isEmpty()) {
                text.append(table.text());
            }
            text.append(summary(result, missing));
        }
        return text.toString();
    }

    private static String summary(ObjectResult result, Map<String, Integer> missing) {
        if (result.best().isEmpty()) {
            return AlignedTable.printable(result.candidate().name() + ": " + result.reason())
                    + "\n";
        }
        if (missing.isEmpty()) {
            return "";
        }
        List<String> parts = new ArrayList<>();
        missing.forEach((why, count) -> parts.add(count + " " + why));
        String line =
                result.candidate().name()
                        + ": not measured: "
                        + String.join(", ", parts)
                        + " (csv and json list them)";
        return AlignedTable.printable(line) + "\n";
    }

    private static String json(List<ObjectResult> results) {
        List<Map<String, Object>> objects = new ArrayList<>();
        for (ObjectResult result : results) {
            Map<String, Object> map = new LinkedHashMap<>();
            map.put("name", result.candidate().name());
            map.put("status", result.status().word());
            map.put("reason", result.reason());
            map.put("findings", result.findings().stream().map(ObjectJson::finding).toList());
            map.put("features", result.best().map(ObjectJson::features).orElse(List.of()));
            objects.add(map);
        }
        return JsonText.of(objects.size() == 1 ? objects.get(0) : objects);
    }

    private static List<FeatureMeasurement> all(ObjectResult result) {
        return result.best().map(best -> best.all()).orElse(List.of());
    }

    private static List<String> row(ObjectResult result, FeatureMeasurement measurement) {
        OptionalDouble smoothed = measurement.smoothedToResolvingPower();
        return List.of(
                result.candidate().name(),
                measurement.feature().id(),
                measurement
                        .result()
                        .fold(v -> Digits.feature(measurement.feature(), v.value()), n -> ""),
                measurement
                        .result()
                        .fold(v -> Digits.feature(measurement.feature(), v.oneSigma()), n -> ""),
                FeatureText.unit(measurement.feature()),
                Digits.fixed(measurement.coverage(), 3),
                smoothed.isPresent() ? Digits.significant(smoothed.getAsDouble()) : "",
                measurement.result().fold(v -> "", n -> n.why().words()),
                measurement.result().fold(v -> "", NotMeasured::detail));
    }
}
