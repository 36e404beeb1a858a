package emberline.place.kind;

import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;

/**
 * A random forest as flat arrays: per node the feature, the threshold and the two children, or the
 * distribution over kinds at a leaf.
 */
final class Forest implements KindLearner<Forest> {

    /** Kinds that a forest tells apart: all but {@link ObjectKind#UNLIKE_KNOWN}. */
    static final int KINDS = ObjectKind.values().length - 1;

    private static final double BYTE = 255;

    private final int[] columns;
    private final float[] fill;
    private final float[] trainingShares;
    private final float sharpness;
    private final int[] roots;
    private final byte[] splits;
    private final float[] thresholds;
    private final int[] children;
    private final byte[] leaves;

    /**
     * A forest.
     *
     * @param columns positions of its features in {@link KindFeatures}
     * @param fill what stands for a feature that was not measured
     * @param trainingShares share of each kind among what it learned from
     * @param sharpness exponent of the calibrated probabilities
     * @param nodes the nodes of all trees
     */
    Forest(int[] columns, float[] fill, float[] trainingShares, float sharpness, Nodes nodes) {
        this.columns = columns;
        this.fill = fill;
        this.trainingShares = trainingShares;
        this.sharpness = sharpness;
        this.roots = nodes.roots();
        this.splits = nodes.splits();
        this.thresholds = nodes.thresholds();
        this.children = nodes.children();
        this.leaves = nodes.leaves();
    }

    /**
     * The nodes of all trees. A node with split -1 is a leaf; its threshold is not used and its
     * child is the start of its distribution in {@code leaves}. The right child follows the left
     * one... the left child of node n is {@code children[n]}, the right one {@code children[n] +
     * 1}.
     */
    @SuppressWarnings("ArrayRecordComponent") // never compared
    record Nodes(int[] roots, byte[] splits, float[] thresholds, int[] children, byte[] leaves) {}

    /** These trees with another exponent of the probabilities. */
    @Override
    public Forest withSharpness(float exponent) {
        return new Forest(
                columns,
                fill,
                trainingShares,
                exponent,
                new Nodes(roots, splits, thresholds, children, leaves));
    }

    /**
     * Probabilities of the kinds for equal prior probabilities of those that the forest knows; 0
     * for kinds that it never saw.
     */
    @Override
    public double[] probabilities(double[] values) {
        double[] x = new double[columns.length];
        for (int k = 0; k < columns.length; k++) {
            double value = values[columns[k]];
            x[k] = Double.isNaN(value) ? fill[k] : value;
        }
        double[] sum = new double[KINDS];
        for (int root : roots) {
            int node = root;
            while (splits[node] >= 0) {
                node = x[splits[node]] <= thresholds[node] ? children[node] : children[node] + 1;
            }
            for (int kind = 0; kind < KINDS; kind++) {
                sum[kind] += (leaves[children[node] + kind] & 0xff) / BYTE;
            }
        }
        return calibrated(sum);
    }

    private double[] calibrated(double[] sum) {
        for (int kind = 0; kind < KINDS; kind++) {
            sum[kind] =
                    trainingShares[kind] > 0
                            ? (sum[kind] / roots.length + LEAST) / trainingShares[kind]
                            : 0;
        }
        Shares.sharpen(sum, sharpness);
        return sum;
    }

    /** No kind is ever excluded. */
    private static final double LEAST = 1e-3;

    void write(DataOutputStream out) throws IOException {
        out.writeInt(columns.length);
        for (int k = 0; k < columns.length; k++) {
            out.writeInt(columns[k]);
            out.writeFloat(fill[k]);
        }
        for (float share : trainingShares) {
            out.writeFloat(share);
        }
        out.writeFloat(sharpness);
        out.writeInt(roots.length);
        for (int root : roots) {
            out.writeInt(root);
        }
        out.writeInt(splits.length);
        out.write(splits);
        for (int node = 0; node < splits.length; node++) {
            if (splits[node] >= 0) {
                out.writeFloat(thresholds[node]);
            }
        }
        for (int child : children) {
            out.writeInt(child);
        }
        out.writeInt(leaves.length);
        out.write(leaves);
    }

    static Forest read(DataInputStream in) throws IOException {
        int[] columns = new int[in.readInt()];
        float[] fill = new float[columns.length];
        for (int k = 0; k < columns.length; k++) {
            columns[k] = in.readInt();
            fill[k] = in.readFloat();
        }
        float[] shares = NumberBlocks.floats(in, KINDS);
        float sharpness = in.readFloat();
        int[] roots = NumberBlocks.ints(in, in.readInt());
        byte[] splits = new byte[in.readInt()];
        in.readFully(splits);
        float[] thresholds = thresholds(splits, in);
        int[] children = NumberBlocks.ints(in, splits.length);
        byte[] leaves = new byte[in.readInt()];
        in.readFully(leaves);
        return new Forest(
                columns,
                fill,
                shares,
                sharpness,
                new Nodes(roots, splits, thresholds, children, leaves));
    }

    /** Thresholds stand in the file for nodes that split, one after the other. */
    private static float[] thresholds(byte[] splits, DataInputStream in) throws IOException {
        int splitting = 0;
        for (byte split : splits) {
            splitting += split >= 0 ? 1 : 0;
        }
        float[] written = NumberBlocks.floats(in, splitting);
        float[] thresholds = new float[splits.length];
        int next = 0;
        for (int node = 0; node < splits.length; node++) {
            if (splits[node] >= 0) {
                thresholds[node] = written[next++];
            }
        }
        return thresholds;
    }
}
