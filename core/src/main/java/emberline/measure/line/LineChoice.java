package emberline.measure.line;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Purpose;
import emberline.catalogue.RestLine;
import emberline.catalogue.TelluricRegion;
import emberline.measure.Site;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Which lines of the catalogue can give a velocity at some resolving power: alone in their window,
 * within the spectrum, and out of the regions that the atmosphere spoils at the site.
 */
final class LineChoice {

    /** Lines of one atom closer than this part of a resolution element are one line. */
    private static final double ONE_LINE = 0.1;

    /** Half of the interval on which a line is fitted, in resolution elements. */
    private static final double HALF_WINDOW = 2.5;

    /** A line with a neighbour closer than this (resolution elements) is a blend. */
    private static final double BLEND = 2.5;

    private final List<FittingLine> fitting = new ArrayList<>();
    private final List<LineSetAside> setAside = new ArrayList<>();

    /**
     * Chooses lines.
     *
     * @param catalogue lines at rest and telluric regions
     * @param site from where it was observed: which regions the atmosphere spoils there
     * @param spectrum the spectrum that is searched
     * @param resolvingPower its resolving power
     */
    LineChoice(FeatureCatalogue catalogue, Site site, Spectrum spectrum, double resolvingPower) {
        double element = FittingLine.elementKms(resolvingPower);
        List<FittingLine> lines = single(catalogue.restLines(), element);
        double low = spectrum.wavelengthMicron(0);
        double high = spectrum.wavelengthMicron(spectrum.size() - 1);
        for (int k = 0; k < lines.size(); k++) {
            FittingLine line = lines.get(k);
            if (line.receivedMicron(-HALF_WINDOW * element) < low
                    || line.receivedMicron(HALF_WINDOW * element) > high) {
                continue;
            }
            double neighbour = distanceKms(lines, k);
            Optional<String> telluric = telluric(catalogue, site, line);
            if (neighbour < BLEND * element) {
                setAside.add(
                        line.setAside(
                                String.format(
                                        Locale.ROOT,
                                        "blended: the nearest line is %.0f km/s away, one"
                                                + " resolution element is %.0f km/s",
                                        neighbour,
                                        element)));
            } else if (telluric.isPresent()) {
                setAside.add(line.setAside("in telluric " + telluric.get()));
            } else {
                double half = Math.min(HALF_WINDOW * element, neighbour / 2);
                fitting.add(
                        new FittingLine(
                                line.species(), line.restMicron(), line.emits(), element, half));
            }
        }
    }

    /** The lines to fit, by wavelength. */
    List<FittingLine> fitting() {
        return fitting;
    }

    /** Lines in reach that cannot be fitted. */
    List<LineSetAside> setAside() {
        return setAside;
    }

    /** Lines by wavelength, those that no spectrum of this resolving power can part as one. */
    private static List<FittingLine> single(List<RestLine> all, double element) {
        List<RestLine> sorted = new ArrayList<>(all);
        sorted.sort(Comparator.comparingDouble(RestLine::vacuumMicron));
        List<FittingLine> lines = new ArrayList<>();
        int count = 0;
        for (RestLine rest : sorted) {
            boolean emits = rest.purpose() == Purpose.ACTIVITY;
            FittingLine line =
                    new FittingLine(rest.species(), rest.vacuumMicron(), emits, element, 0);
            FittingLine last = lines.isEmpty() ? line : lines.get(lines.size() - 1);
            boolean same =
                    !lines.isEmpty()
                            && last.species().equals(rest.species())
                            && last.velocityKms(rest.vacuumMicron()) < ONE_LINE * element;
            if (same) {
                double mean = (count * last.restMicron() + rest.vacuumMicron()) / (count + 1);
                lines.set(
                        lines.size() - 1, new FittingLine(rest.species(), mean, emits, element, 0));
                count++;
            } else {
                lines.add(line);
                count = 1;
            }
        }
        return lines;
    }

    private static double distanceKms(List<FittingLine> lines, int k) {
        FittingLine line = lines.get(k);
        double nearest = Double.POSITIVE_INFINITY;
        if (k > 0) {
            nearest = -line.velocityKms(lines.get(k - 1).restMicron());
        }
        if (k < lines.size() - 1) {
            nearest = Math.min(nearest, line.velocityKms(lines.get(k + 1).restMicron()));
        }
        return nearest;
    }

    private static Optional<String> telluric(
            FeatureCatalogue catalogue, Site site, FittingLine line) {
        return catalogue.telluricRegions().stream()
                .filter(region -> site.isSpoiledBy(region.strength()))
                .filter(
                        region ->
                                region.window().lowMicron() < line.restMicron()
                                        && line.restMicron() < region.window().highMicron())
                .map(TelluricRegion::cause)
                .findFirst();
    }
}
