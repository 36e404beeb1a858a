package emberline.measure;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** Measurements with chosen values, of which no two share pixels and none can be drawn. */
public final class GivenMeasurements {

    private GivenMeasurements() {}

    /**
     * Measurements in which only some features have a value.
     *
     * @param values value by feature
     * @param sigma one-sigma error of each
     * @return every feature of the standard catalogue
     */
    public static Measurements of(Map<String, Double> values, double sigma) {
        Map<String, MeasuredEntry> entries = new LinkedHashMap<>();
        for (Feature feature : FeatureCatalogue.standard().features()) {
            Double value = values.get(feature.id());
            Measurement result =
                    value == null
                            ? new NotMeasured(Measurement.Why.NOT_COVERED, "given none")
                            : new Measured(value, sigma);
            FeatureMeasurement measurement =
                    new FeatureMeasurement(feature, result, 1, 100, 0, OptionalDouble.empty());
            entries.put(feature.id(), new MeasuredEntry(measurement, List.of(), 1));
        }
        return new Measurements(entries);
    }
}
