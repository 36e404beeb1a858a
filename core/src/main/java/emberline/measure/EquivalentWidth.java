package emberline.measure;

import java.util.Arrays;
import java.util.List;

/**
 * The equivalent width of a line: the integral of 1 - F / C over its window, positive in
 * absorption, where C is a straight line through the means of side windows.
 *
 * <p>With x from -1 to 1 over the window and C = c0 (1 + s x), the integral of F / C is the sum
 * over k of (-s)^k M_k / c0, where M_k is the k-th moment of F. The sum is taken to k = 4; the rest
 * is below s^5 of the window, and {@link #STEEPEST} keeps that below 0.3%.
 */
final class EquivalentWidth implements Formula {

    /** The steepest continuum that is accepted: relative change over half the window. */
    static final double STEEPEST = 0.3;

    private static final double ANGSTROM_PER_MICRON = 1e4;

    private final double widthMicron;
    private final int[] rows;
    private final int moments;
    private final double[] atCentre;
    private final double[] perHalfWidth;

    /**
     * An equivalent width.
     *
     * @param widthMicron width of the line window (micron)
     * @param momentRows rows of the moments 0, 1, 2, ... of the line window
     * @param sideRows rows of the means of the side windows
     * @param atCentre what each side contributes to the continuum at the centre of the line
     * @param perHalfWidth what each side contributes to the change of the continuum over half the
     *     line window
     */
    EquivalentWidth(
            double widthMicron,
            int[] momentRows,
            int[] sideRows,
            double[] atCentre,
            double[] perHalfWidth) {
        this.widthMicron = widthMicron;
        this.moments = momentRows.length;
        this.rows = Arrays.copyOf(momentRows, momentRows.length + sideRows.length);
        System.arraycopy(sideRows, 0, rows, moments, sideRows.length);
        this.atCentre = atCentre;
        this.perHalfWidth = perHalfWidth;
    }

    @Override
    public int[] rows() {
        return rows;
    }

    @Override
    public double value(double[] y) {
        double centre = 0;
        double change = 0;
        for (int side = 0; side < atCentre.length; side++) {
            double mean = y[rows[moments + side]];
            centre += atCentre[side] * mean;
            change += perHalfWidth[side] * mean;
        }
        double slope = change / centre;
        if (!(Math.abs(slope) <= STEEPEST)) {
            return Double.NaN;
        }
        double integral = 0;
        double power = 1;
        for (int k = 0; k < moments; k++) {
            integral += power * y[rows[k]];
            power *= -slope;
        }
        return ANGSTROM_PER_MICRON * (widthMicron - integral / centre);
    }

    @Override
    public double[] gradient(double[] y) {
        double centre = 0;
        double change = 0;
        for (int side = 0; side < atCentre.length; side++) {
            double mean = y[rows[moments + side]];
            centre += atCentre[side] * mean;
            change += perHalfWidth[side] * mean;
        }
        double slope = change / centre;
        double[] gradient = new double[rows.length];
        double integral = 0;
        double bySlope = 0;
        double power = 1;
        double powerBelow = 0;
        for (int k = 0; k < moments; k++) {
            gradient[k] = -ANGSTROM_PER_MICRON * power / centre;
            integral += power * y[rows[k]];
            bySlope -= k * powerBelow * y[rows[k]];
            powerBelow = power;
            power *= -slope;
        }
        double byCentre = (integral + bySlope * slope) / (centre * centre);
        double byChange = -bySlope / (centre * centre);
        for (int side = 0; side < atCentre.length; side++) {
            gradient[moments + side] =
                    ANGSTROM_PER_MICRON
                            * (byCentre * atCentre[side] + byChange * perHalfWidth[side]);
        }
        return gradient;
    }

    @Override
    public void values(double[][] draws, int count, double[] out) {
        int[] sides = Arrays.copyOfRange(rows, moments, rows.length);
        double[] centre = new double[count];
        double[] slope = new double[count];
        new Continuum(sides, atCentre).values(draws, count, centre);
        new Continuum(sides, perHalfWidth).values(draws, count, slope);
        double[] integral = new double[count];
        for (int n = 0; n < count; n++) {
            slope[n] /= centre[n];
        }
        for (int k = moments - 1; k >= 0; k--) {
            double[] moment = draws[rows[k]];
            for (int n = 0; n < count; n++) {
                integral[n] = moment[n] - slope[n] * integral[n];
            }
        }
        for (int n = 0; n < count; n++) {
            out[n] = ANGSTROM_PER_MICRON * (widthMicron - integral[n] / centre[n]);
        }
        for (int n = 0; n < count; n++) {
            if (!(Math.abs(slope[n]) <= STEEPEST)) {
                out[n] = Double.NaN;
            }
        }
    }

    @Override
    public List<Continuum> continua() {
        return List.of(new Continuum(Arrays.copyOfRange(rows, moments, rows.length), atCentre));
    }
}
