package emberline.place.kind;

import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import org.apache.commons.math3.util.FastMath;

/**
 * A multinomial logistic regression of the kinds on squeezed features: {@code asinh((x - m) / u)},
 * {@code x} the feature, {@code m} its median and {@code u} a part of its spread among what was
 * learned from. It is about the sign of a difference near the median and a logarithm far from it. A
 * feature that was not measured counts as the median.
 *
 * <p>Where a forest decides on one feature after the other, this weighs all of them together, such
 * as a band on one side of a line against one on its other side.
 */
final class Regression implements KindLearner<Regression> {

    /** No kind that it knows is ever excluded. */
    private static final double LEAST = 1e-3;

    private final int[] columns;
    private final float[] medians;
    private final float[] units;
    private final boolean[] known;
    private final float[] weights;
    private final float sharpness;

    /**
     * A regression.
     *
     * @param columns positions of its features in {@link KindFeatures}
     * @param medians what is subtracted from each feature
     * @param units what each difference is divided by
     * @param known which kinds it knows
     * @param weights for each feature, then for the constant, one for each kind
     * @param sharpness exponent of the calibrated probabilities
     */
    Regression(
            int[] columns,
            float[] medians,
            float[] units,
            boolean[] known,
            float[] weights,
            float sharpness) {
        this.columns = columns;
        this.medians = medians;
        this.units = units;
        this.known = known;
        this.weights = weights;
        this.sharpness = sharpness;
    }

    /** A feature squeezed; 0 where it was not measured. */
    static double squeezed(double value, float median, float unit) {
        if (Double.isNaN(value)) {
            return 0;
        }
        return FastMath.asinh((value - median) / unit);
    }

    @Override
    public Regression withSharpness(float exponent) {
        return new Regression(columns, medians, units, known, weights, exponent);
    }

    @Override
    public double[] probabilities(double[] values) {
        int kinds = Forest.KINDS;
        double[] p = new double[kinds];
        for (int kind = 0; kind < kinds; kind++) {
            p[kind] = weights[columns.length * kinds + kind];
        }
        for (int k = 0; k < columns.length; k++) {
            double x = squeezed(values[columns[k]], medians[k], units[k]);
            for (int kind = 0; kind < kinds; kind++) {
                p[kind] += weights[k * kinds + kind] * x;
            }
        }
        Shares.fromLogarithms(p, known);
        for (int kind = 0; kind < kinds; kind++) {
            p[kind] = known[kind] ? p[kind] + LEAST : 0;
        }
        Shares.sharpen(p, sharpness);
        return p;
    }

    void write(DataOutputStream out) throws IOException {
        out.writeInt(columns.length);
        for (int k = 0; k < columns.length; k++) {
            out.writeInt(columns[k]);
            out.writeFloat(medians[k]);
            out.writeFloat(units[k]);
        }
        for (boolean one : known) {
            out.writeBoolean(one);
        }
        for (float weight : weights) {
            out.writeFloat(weight);
        }
        out.writeFloat(sharpness);
    }

    static Regression read(DataInputStream in) throws IOException {
        int[] columns = new int[in.readInt()];
        float[] medians = new float[columns.length];
        float[] units = new float[columns.length];
        for (int k = 0; k < columns.length; k++) {
            columns[k] = in.readInt();
            medians[k] = in.readFloat();
            units[k] = in.readFloat();
        }
        boolean[] known = new boolean[Forest.KINDS];
        for (int kind = 0; kind < known.length; kind++) {
            known[kind] = in.readBoolean();
        }
        float[] weights = NumberBlocks.floats(in, (columns.length + 1) * Forest.KINDS);
        return new Regression(columns, medians, units, known, weights, in.readFloat());
    }
}
