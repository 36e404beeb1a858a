package emberline.measure.line;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Kind;
import emberline.measure.Measurements;
import emberline.measure.Site;
import emberline.prepare.PreparedSpectrum;
import java.util.List;

/** Reports what the lines of a spectrum say. Safe for use by several threads. */
public final class LineReporter {

    private final VelocityFinder velocities;

    /**
     * A reporter.
     *
     * @param catalogue where the lines at rest and the telluric regions are looked up
     * @param site from where the objects were observed
     */
    public LineReporter(FeatureCatalogue catalogue, Site site) {
        this.velocities = new VelocityFinder(catalogue, site);
    }

    /**
     * Reports on a spectrum.
     *
     * @param prepared the spectrum
     * @param measurements what was measured on it
     * @return its lines and its radial velocity
     */
    public LineReport report(PreparedSpectrum prepared, Measurements measurements) {
        List<LineMeasurement> lines =
                measurements.all().stream()
                        .filter(m -> m.feature().kind() == Kind.EQUIVALENT_WIDTH)
                        .map(m -> LineMeasurement.of(m.feature(), m.result()))
                        .toList();
        return new LineReport(lines, velocities.find(prepared));
    }
}
