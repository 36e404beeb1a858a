package emberline.survey;

import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.Measured;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import emberline.prepare.BandSignal;
import emberline.spectrum.Candidate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/**
 * Makes a reference table from the results of a list with known types, gravities and kinds. Fed
 * object by object in the order of the list.
 */
public final class ReferenceMaker {

    private final List<ReferenceRow> rows = new ArrayList<>();
    private final Set<String> wanted = new TreeSet<>(ReferenceTable.standardFeatures());

    /** A maker without rows. */
    public ReferenceMaker() {}

    /**
     * Adds an object; one that could not be measured adds nothing.
     *
     * @param result its result; the list says what it is in {@code known_type_number}, {@code
     *     known_gravity}, {@code known_kind}, {@code tier}, {@code group} and {@code dataset}
     * @return the row that was added
     */
    public Optional<ReferenceRow> add(ObjectResult result) {
        if (result.best().isEmpty()) {
            return Optional.empty();
        }
        Candidate candidate = result.candidate();
        Map<String, Measured> features = new LinkedHashMap<>();
        for (FeatureMeasurement one : result.best().get().all()) {
            if (one.result() instanceof Measured value && wanted.contains(one.feature().id())) {
                features.put(one.feature().id(), value);
            }
        }
        SpectrumResult leading = result.leading().orElseThrow();
        ReferenceRow row =
                new ReferenceRow(
                        candidate.name(),
                        ObjectGroup.of(candidate),
                        candidate.number("known_type_number"),
                        KnownGravity.of(candidate),
                        candidate.text("known_kind").orElse(""),
                        candidate.text("tier").orElse(""),
                        candidate.text("dataset").orElse(""),
                        leading.prepared().resolvingPower().value(),
                        BandSignal.best(leading.quality().bands())
                                .map(best -> OptionalDouble.of(best.medianSignalToNoise()))
                                .orElse(OptionalDouble.empty()),
                        features);
        rows.add(row);
        return Optional.of(row);
    }

    /**
     * The table so far.
     *
     * @return a table with the features that the product's reference table holds
     */
    public ReferenceTable table() {
        return new ReferenceTable(List.copyOf(wanted), rows);
    }
}
