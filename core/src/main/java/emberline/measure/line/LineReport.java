package emberline.measure.line;

import java.util.List;
import java.util.Optional;

/**
 * What the lines of one spectrum say.
 *
 * @param lines every equivalent width of the catalogue, in its order
 * @param velocity the radial velocity from the centres of the lines
 */
public record LineReport(List<LineMeasurement> lines, RadialVelocity velocity) {

    /** Copies the list. */
    public LineReport {
        lines = List.copyOf(lines);
    }

    /**
     * The line of one feature.
     *
     * @param feature id of an equivalent width
     * @return the line, or empty where the catalogue has no such width
     */
    public Optional<LineMeasurement> of(String feature) {
        return lines.stream().filter(line -> line.feature().id().equals(feature)).findFirst();
    }
}
