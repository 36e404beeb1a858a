package emberline.reports.chart;

import java.util.Arrays;

/**
 * A line through points, with a band about it where one is given. A point whose height is not
 * finite breaks the line. A value: arrays are copied in.
 */
public final class Curve implements Layer {

    private final double[] x;
    private final double[] y;
    private final double[] low;
    private final double[] high;
    private final Tone tone;
    private final double ceiling;

    private Curve(double[] x, double[] y, double[] low, double[] high, Tone tone, double ceiling) {
        this.x = x;
        this.y = y;
        this.low = low;
        this.high = high;
        this.tone = tone;
        this.ceiling = ceiling;
    }

    /**
     * A line without a band.
     *
     * @param x horizontal values, increasing
     * @param y heights, as many
     * @param tone what it means
     * @return the line
     */
    public static Curve line(double[] x, double[] y, Tone tone) {
        return withBand(x, y, y, y, tone);
    }

    /**
     * A line with a band.
     *
     * @param x horizontal values, increasing
     * @param y heights, as many
     * @param low lower edge of the band, as many
     * @param high upper edge of the band, as many
     * @param tone what it means
     * @return the line
     * @throws IllegalArgumentException if the lengths differ
     */
    public static Curve withBand(double[] x, double[] y, double[] low, double[] high, Tone tone) {
        if (y.length != x.length || low.length != x.length || high.length != x.length) {
            throw new IllegalArgumentException("curve: expected arrays of one length");
        }
        return new Curve(
                x.clone(), y.clone(), low.clone(), high.clone(), tone, Double.POSITIVE_INFINITY);
    }

    /**
     * This curve, drawn only up to a height, so that spikes do not run into labels.
     *
     * @param height vertical value above which nothing is drawn
     * @return a new curve with the same points
     */
    public Curve upTo(double height) {
        return new Curve(x, y, low, high, tone, height);
    }

    /**
     * The height above which nothing is drawn.
     *
     * @return vertical value; infinite where there is no limit
     */
    public double ceiling() {
        return ceiling;
    }

    /**
     * The number of points.
     *
     * @return 0 or more
     */
    public int size() {
        return x.length;
    }

    /**
     * The place of a point.
     *
     * @param point index from 0
     * @return horizontal value
     */
    public double x(int point) {
        return x[point];
    }

    /**
     * The height of a point.
     *
     * @param point index from 0
     * @return vertical value; not finite where the line breaks
     */
    public double y(int point) {
        return y[point];
    }

    /**
     * The lower edge of the band at a point.
     *
     * @param point index from 0
     * @return vertical value
     */
    public double low(int point) {
        return low[point];
    }

    /**
     * The upper edge of the band at a point.
     *
     * @param point index from 0
     * @return vertical value
     */
    public double high(int point) {
        return high[point];
    }

    /**
     * What the line means.
     *
     * @return its tone
     */
    public Tone tone() {
        return tone;
    }

    /**
     * Whether there is a band about the line.
     *
     * @return true if the band has any height
     */
    public boolean hasBand() {
        return !Arrays.equals(low, high);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Curve that
                && tone == that.tone
                && ceiling == that.ceiling
                && Arrays.equals(x, that.x)
                && Arrays.equals(y, that.y)
                && Arrays.equals(low, that.low)
                && Arrays.equals(high, that.high);
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(x) + Arrays.hashCode(y);
    }
}
