package emberline.place.kind;

import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;

/**
 * A forest and a regression of one coverage, each calibrated, and the geometric mean of their
 * probabilities to the power that calibrates it.
 */
final class Blend implements KindLearner<Blend> {

    private final Forest forest;
    private final Regression regression;
    private final float sharpness;

    /**
     * A blend. Both parts must have learned from the same rows, so that they know the same kinds.
     *
     * @param forest with calibrated probabilities
     * @param regression with calibrated probabilities
     * @param sharpness exponent of the mean
     */
    Blend(Forest forest, Regression regression, float sharpness) {
        this.forest = forest;
        this.regression = regression;
        this.sharpness = sharpness;
    }

    @Override
    public Blend withSharpness(float exponent) {
        return new Blend(forest, regression, exponent);
    }

    @Override
    public double[] probabilities(double[] values) {
        double[] p = forest.probabilities(values);
        double[] other = regression.probabilities(values);
        for (int kind = 0; kind < p.length; kind++) {
            p[kind] *= other[kind];
        }
        Shares.sharpen(p, sharpness / 2);
        return p;
    }

    void write(DataOutputStream out) throws IOException {
        forest.write(out);
        regression.write(out);
        out.writeFloat(sharpness);
    }

    static Blend read(DataInputStream in) throws IOException {
        return new Blend(Forest.read(in), Regression.read(in), in.readFloat());
    }
}
