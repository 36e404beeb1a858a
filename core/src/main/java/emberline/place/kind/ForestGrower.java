package emberline.place.kind;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.LongStream;
import smile.base.cart.CART;
import smile.base.cart.DecisionNode;
import smile.base.cart.InternalNode;
import smile.base.cart.Node;
import smile.base.cart.SplitRule;
import smile.classification.RandomForest;
import smile.data.DataFrame;
import smile.data.Tuple;
import smile.data.formula.Formula;
import smile.data.type.StructType;
import smile.data.vector.IntVector;

/** Grows the forest of one coverage with Smile and lays its trees out flat. */
final class ForestGrower {

    /** Seeds must all be above 1, or the forest depends on the number of threads. */
    private static final long FIRST_SEED = 1000;

    private static final int MOST_NODES = 80;
    private static final int LEAF = 4;
    private static final int BISECTIONS = 64;

    private final KindFeatures features;
    private final int trees;

    ForestGrower(KindFeatures features, int trees) {
        this.features = features;
        this.trees = trees;
    }

    /** A forest with uncalibrated probabilities. */
    Forest grow(Coverage coverage, List<TrainingRow> rows) {
        List<TrainingRow> chosen = TrainingSample.of(rows);
        int[] columns = coverage.columns(features);
        float[] fill = fill(columns, chosen);
        ObjectKind[] present =
                chosen.stream()
                        .map(TrainingRow::kind)
                        .distinct()
                        .sorted()
                        .toArray(ObjectKind[]::new);
        int[] labels =
                chosen.stream()
                        .mapToInt(row -> Arrays.asList(present).indexOf(row.kind()))
                        .toArray();
        String[] names = new String[columns.length];
        double[][] data = new double[chosen.size()][columns.length];
        for (int k = 0; k < columns.length; k++) {
            names[k] = "f" + k;
            for (int i = 0; i < data.length; i++) {
                double value = chosen.get(i).vector().values()[columns[k]];
                // thresholds are kept as float, so the values must be floats too
                data[i][k] = (float) (Double.isNaN(value) ? fill[k] : value);
            }
        }
        DataFrame frame = DataFrame.of(data, names).merge(IntVector.of("kind", labels));
        RandomForest forest =
                RandomForest.fit(
                        Formula.lhs("kind"),
                        frame,
                        trees,
                        (int) Math.max(3, Math.sqrt(columns.length) * 1.5),
                        SplitRule.GINI,
                        20,
                        MOST_NODES,
                        LEAF,
                        1.0,
                        null,
                        LongStream.range(FIRST_SEED, FIRST_SEED + trees));
        float[] shares = new float[Forest.KINDS];
        for (TrainingRow row : chosen) {
            shares[row.kind().position()] += 1f / chosen.size();
        }
        return new Forest(columns, fill, shares, 1, new Flattening(present, data).of(forest));
    }

    private static float[] fill(int[] columns, List<TrainingRow> rows) {
        float[] fill = new float[columns.length];
        for (int k = 0; k < columns.length; k++) {
            int column = columns[k];
            double[] values =
                    rows.stream()
                            .mapToDouble(row -> row.vector().values()[column])
                            .filter(v -> !Double.isNaN(v))
                            .sorted()
                            .toArray();
            fill[k] = values.length == 0 ? 0 : (float) values[values.length / 2];
        }
        return fill;
    }

    /** Lays trees out in arrays. Thresholds are found by bisection; Smile does not show them. */
    private static final class Flattening {

        private final ObjectKind[] present;
        private final double[] low;
        private final double[] high;
        private final List<Integer> roots = new ArrayList<>();
        private final List<Byte> splits = new ArrayList<>();
        private final List<Float> thresholds = new ArrayList<>();
        private final List<Integer> children = new ArrayList<>();
        private final List<Byte> leaves = new ArrayList<>();

        Flattening(ObjectKind[] present, double[][] data) {
            this.present = present;
            this.low = data[0].clone();
            this.high = data[0].clone();
            for (double[] row : data) {
                for (int k = 0; k < row.length; k++) {
                    low[k] = Math.min(low[k], row[k]);
                    high[k] = Math.max(high[k], row[k]);
                }
            }
        }

        Forest.Nodes of(RandomForest forest) {
            for (CART tree : forest.trees()) {
                int root = room();
                roots.add(root);
                lay(tree.root(), root, tree);
            }
            float[] limits = new float[thresholds.size()];
            byte[] features = new byte[limits.length];
            byte[] shares = new byte[leaves.size()];
            for (int k = 0; k < limits.length; k++) {
                limits[k] = thresholds.get(k);
                features[k] = splits.get(k);
            }
            for (int k = 0; k < shares.length; k++) {
                shares[k] = leaves.get(k);
            }
            return new Forest.Nodes(
                    roots.stream().mapToInt(Integer::intValue).toArray(),
                    features,
                    limits,
                    children.stream().mapToInt(Integer::intValue).toArray(),
                    shares);
        }

        private int room() {
            splits.add((byte) -1);
            thresholds.add(0f);
            children.add(0);
            return splits.size() - 1;
        }

        private void lay(Node node, int at, CART tree) {
            if (node instanceof InternalNode inner) {
                splits.set(at, (byte) inner.feature());
                thresholds.set(at, threshold(inner));
                int left = room();
                room();
                children.set(at, left);
                lay(inner.trueChild(), left, tree);
                lay(inner.falseChild(), left + 1, tree);
                return;
            }
            int[] count = ((DecisionNode) node).count();
            int sum = Arrays.stream(count).sum();
            byte[] shares = new byte[Forest.KINDS];
            for (int k = 0; k < present.length; k++) {
                shares[present[k].position()] = (byte) Math.round(255.0 * count[k] / sum);
            }
            children.set(at, leaves.size());
            for (byte share : shares) {
                leaves.add(share);
            }
        }

        private float threshold(InternalNode node) {
            double yes = low[node.feature()] - 1;
            double no = high[node.feature()] + 1;
            for (int k = 0; k < BISECTIONS; k++) {
                double middle = 0.5 * (yes + no);
                if (node.branch(new OneValue(node.feature(), middle))) {
                    yes = middle;
                } else {
                    no = middle;
                }
            }
            return (float) yes;
        }
    }

    /** A row of which one value is asked. */
    private record OneValue(int feature, double value) implements Tuple {

        @Override
        public StructType schema() {
            throw new UnsupportedOperationException("only values are asked");
        }

        @Override
        public Object get(int i) {
            return getDouble(i);
        }

        @Override
        public double getDouble(int i) {
            if (i != feature) {
                throw new IllegalArgumentException("feature " + i + ": expected " + feature);
            }
            return value;
        }
    }
}
