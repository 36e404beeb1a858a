package emberline.reports.chart;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.RestLine;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The surroundings of atomic lines that tell gravity, age or activity, where a spectrum covers them
 * and resolves them: one small chart for each group of neighbouring lines of one atom.
 */
public final class LineInset {

    /** Least resolving power, so that a line is told from the bands about it. */
    private static final double LEAST_RESOLVING_POWER = 600;

    private static final int LEAST_PIXELS = 16;
    private static final double LEAST_COVERED = 0.9;

    /** Room on either side of the lines as a share of the wavelength. */
    private static final double ROOM = 0.007;

    /** Lines of one atom closer than this share of the wavelength stand in one chart. */
    private static final double NEAR = 0.009;

    /** The groups in the order in which they are wanted, by atom and wavelength (micron). */
    private static final List<Wanted> WANTED =
            List.of(
                    new Wanted("Li I", 0.671, "Li I"),
                    new Wanted("H I", 0.656, "H\u03b1"),
                    new Wanted("Na I", 0.819, "Na I"),
                    new Wanted("K I", 1.174, "K I"),
                    new Wanted("K I", 1.248, "K I"),
                    new Wanted("K I", 0.768, "K I"));

    private record Wanted(String species, double micron, String name) {}

    private LineInset() {}

    /**
     * The charts that an object allows.
     *
     * @param result the result of an object
     * @param catalogue the rest wavelengths
     * @param most the most charts
     * @return charts in the order of wavelength; empty where no spectrum resolves a line
     */
    public static List<Chart> of(ObjectResult result, FeatureCatalogue catalogue, int most) {
        List<Chart> charts = new ArrayList<>();
        for (Wanted wanted : WANTED) {
            if (charts.size() < most) {
                chart(result, catalogue, wanted).ifPresent(charts::add);
            }
        }
        charts.sort(Comparator.comparingDouble(chart -> chart.x().low()));
        return charts;
    }

    private static Optional<Chart> chart(
            ObjectResult result, FeatureCatalogue catalogue, Wanted wanted) {
        double[] lines =
                catalogue.restLines().stream()
                        .filter(line -> line.species().equals(wanted.species()))
                        .mapToDouble(RestLine::vacuumMicron)
                        .filter(w -> Math.abs(w / wanted.micron() - 1) < NEAR / 2)
                        .sorted()
                        .toArray();
        if (lines.length == 0) {
            return Optional.empty();
        }
        double low = lines[0] * (1 - ROOM);
        double high = lines[lines.length - 1] * (1 + ROOM);
        return result.spectra().stream()
                .filter(s -> s.prepared().resolvingPower().value() >= LEAST_RESOLVING_POWER)
                .sorted(
                        Comparator.comparingDouble(
                                (SpectrumResult s) -> -s.prepared().resolvingPower().value()))
                .map(s -> s.prepared().spectrum())
                .filter(s -> covers(s, low, high))
                .findFirst()
                .map(s -> draw(s, wanted.name(), lines, low, high));
    }

    private static boolean covers(Spectrum spectrum, double low, double high) {
        int pixels = 0;
        double covered = 0;
        int end = spectrum.firstAtOrAbove(high);
        for (int i = spectrum.firstAtOrAbove(low); i < end; i++) {
            if (spectrum.isGood(i)) {
                pixels++;
                covered += spectrum.highEdgeMicron(i) - spectrum.lowEdgeMicron(i);
            }
        }
        return pixels >= LEAST_PIXELS && covered >= LEAST_COVERED * (high - low);
    }

    private static Chart draw(
            Spectrum spectrum, String name, double[] lines, double low, double high) {
        int from = spectrum.firstAtOrAbove(low);
        int to = spectrum.firstAtOrAbove(high);
        List<double[]> points = new ArrayList<>();
        double sum = 0;
        int count = 0;
        for (int i = from; i < to; i++) {
            if (spectrum.isGood(i)) {
                sum += spectrum.flux(i);
                count++;
            }
        }
        double unit = sum > 0 ? sum / count : 1;
        for (int i = from; i < to; i++) {
            boolean good = spectrum.isGood(i);
            double flux = good ? spectrum.flux(i) / unit : Double.NaN;
            double sigma = good ? spectrum.fluxSigma(i) / unit : Double.NaN;
            points.add(
                    new double[] {spectrum.wavelengthMicron(i), flux, flux - sigma, flux + sigma});
        }
        double[] flux =
                points.stream().mapToDouble(p -> p[1]).filter(Double::isFinite).sorted().toArray();
        double bottom = flux[(int) (0.01 * (flux.length - 1))];
        double top = flux[(int) (0.99 * (flux.length - 1))];
        double room = Math.max(0.05, 0.15 * (top - bottom));
        bottom -= room;
        top += room;
        List<Layer> layers = new ArrayList<>();
        for (double line : lines) {
            layers.add(new Layer.Segment(line, bottom, line, top, Tone.LINE, true));
        }
        layers.add(
                Curve.withBand(
                        column(points, 0),
                        column(points, 1),
                        column(points, 2),
                        column(points, 3),
                        Tone.SPECTRUM));
        return new Chart(
                name,
                new Axis("", "", low, high, Ticks.round(low, high, 3)),
                new Axis("", "", bottom, top, Ticks.round(bottom, top, 3)),
                layers);
    }

    private static double[] column(List<double[]> points, int column) {
        return points.stream().mapToDouble(point -> point[column]).toArray();
    }
}
