package emberline.measure.line;

import emberline.spectrum.Spectrum;
import java.util.List;

/**
 * A first velocity from all lines together: the one at which unresolved lines at their places
 * explain most. Each line counts by its likelihood ratio against a straight continuum with the
 * noise left free, n/2 ln(S0 / S1), with S the weighted sums of squares; one line counts no more
 * than {@value #MOST}, so that a single strong feature elsewhere cannot lead.
 */
final class StartVelocity {

    /** Velocities are searched up to this (km/s). */
    static final double SEARCHED_KMS = 500;

    private static final double MOST = 15;

    /** Step of the search in resolution elements. */
    private static final double STEP = 1.0 / 8;

    private StartVelocity() {}

    /** The velocity of the best match (km/s); 0 where there are no lines. */
    static double find(Spectrum spectrum, List<FittingLine> lines) {
        double best = 0;
        double most = 0;
        double step = lines.isEmpty() ? SEARCHED_KMS : STEP * lines.get(0).elementKms();
        int steps = (int) Math.ceil(SEARCHED_KMS / step);
        for (int k = -steps; k <= steps; k++) {
            double sum = 0;
            for (FittingLine line : lines) {
                sum += LineSegment.of(spectrum, line, k * step).map(s -> gain(s, line)).orElse(0.0);
            }
            if (sum > most) {
                most = sum;
                best = k * step;
            }
        }
        return best;
    }

    /** How much a line in the middle of a segment explains. */
    private static double gain(LineSegment segment, FittingLine line) {
        int size = segment.size();
        double middle = (segment.kms(0) - line.halfWindowKms() * segment.place(0));
        double[] profile = new double[size];
        for (int i = 0; i < size; i++) {
            double z = (segment.kms(i) - middle) / line.instrumentSigmaKms();
            profile[i] = Math.exp(-z * z / 2);
        }
        double[] shape = withoutLine(segment, profile);
        double[] flux = withoutLine(segment, segment.fluxes());
        double shapeShape = product(segment, shape, shape);
        double shapeFlux = product(segment, shape, flux);
        double before = product(segment, flux, flux);
        double explained = shapeFlux * shapeFlux / shapeShape;
        boolean emits = shapeFlux > 0;
        if (!(before > explained) || emits != line.emits()) {
            return 0;
        }
        return Math.min(MOST, size / 2.0 * Math.log(before / (before - explained)));
    }

    /** Values less their weighted straight line over the segment. */
    private static double[] withoutLine(LineSegment segment, double[] values) {
        double sum = 0;
        double sumX = 0;
        double sumY = 0;
        for (int i = 0; i < values.length; i++) {
            sum += segment.weight(i);
            sumX += segment.weight(i) * segment.place(i);
            sumY += segment.weight(i) * values[i];
        }
        double meanX = sumX / sum;
        double meanY = sumY / sum;
        double sumXx = 0;
        double sumXy = 0;
        for (int i = 0; i < values.length; i++) {
            double x = segment.place(i) - meanX;
            sumXx += segment.weight(i) * x * x;
            sumXy += segment.weight(i) * x * (values[i] - meanY);
        }
        double[] rest = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            rest[i] = values[i] - meanY - sumXy / sumXx * (segment.place(i) - meanX);
        }
        return rest;
    }

    private static double product(LineSegment segment, double[] a, double[] b) {
        double sum = 0;
        for (int i = 0; i < a.length; i++) {
            sum += segment.weight(i) * a[i] * b[i];
        }
        return sum;
    }
}
