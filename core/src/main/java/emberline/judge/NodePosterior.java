package emberline.judge;

/**
 * The posterior on the cells of a table, and the sums from which a ledger is made: by substellar or
 * not and by young or not, after each piece of evidence, and with each piece left out. The type
 * rules most cells out, so for each age it is kept which masses are possible.
 */
final class NodePosterior {

    /** Kinds of cells: bit 0 is set below the hydrogen limit, bit 1 below the young age. */
    static final int KINDS = 4;

    private static final int PIECES = Piece.COUNT;

    private final NodeTable table;
    private final double[][] weight;

    /** For each age the first cell of mass with some weight, and the one after the last. */
    private final int[] first;

    private final int[] end;
    private final double[] youngSequence;
    private final double[][] after = new double[PIECES + 1][KINDS];
    private final double[][] without = new double[PIECES][KINDS];
    private double total;

    NodePosterior(NodeTable table, EvidenceCurves curves, JudgeNumbers numbers) {
        this.table = table;
        this.weight = new double[table.ages()][table.masses()];
        this.first = new int[table.ages()];
        this.end = new int[table.ages()];
        this.youngSequence = new double[table.ages()];
        double limit = numbers.of("hydrogen-limit");
        double young = numbers.of("young-age");
        double[] factor = new double[PIECES];
        double[] suffix = new double[PIECES + 1];
        for (int a = 0; a < table.ages(); a++) {
            EvidenceCurves.AtAge here = curves.new AtAge(table.ageMyr(a));
            youngSequence[a] = here.youngSequence();
            int youngBit = table.ageMyr(a) < young ? 2 : 0;
            for (int m = 0; m < table.masses(); m++) {
                int kind = youngBit + (table.mass(m) < limit ? 1 : 0);
                double prior = table.ageWeight(a) * table.massWeight(m);
                after[0][kind] += prior;
                here.fill(table, a, m, factor);
                if (factor[Piece.TYPE.order()] == 0 || prior == 0) {
                    continue;
                }
                weight[a][m] = add(kind, prior, factor, suffix);
                total += weight[a][m];
                first[a] = end[a] == 0 ? m : first[a];
                end[a] = m + 1;
            }
        }
        if (!(total > 0)) {
            throw new IllegalStateException("no mass and age of the grids fits the evidence");
        }
        normalise();
    }

    private double add(int kind, double prior, double[] factor, double[] suffix) {
        suffix[PIECES] = 1;
        for (int k = PIECES - 1; k >= 0; k--) {
            suffix[k] = suffix[k + 1] * factor[k];
        }
        double sofar = prior;
        for (int k = 0; k < PIECES; k++) {
            without[k][kind] += sofar * suffix[k + 1];
            sofar *= factor[k];
            after[k + 1][kind] += sofar;
        }
        return sofar;
    }

    private void normalise() {
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                weight[a][m] /= total;
            }
        }
    }

    NodeTable table() {
        return table;
    }

    /** The first cell of mass that has some probability at an age. */
    int first(int a) {
        return first[a];
    }

    /** The cell of mass after the last that has some probability at an age. */
    int end(int a) {
        return end[a];
    }

    /** Probability of a cell. */
    double probability(int a, int m) {
        return weight[a][m];
    }

    /** Part of the posterior that lies on the sequence of young objects. */
    double onYoungSequence() {
        double sum = 0;
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                sum += weight[a][m] * youngSequence[a];
            }
        }
        return sum;
    }

    /** Probability of a mass below a limit on which an edge of the cells lies. */
    double below(double massMsun) {
        double sum = 0;
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a] && table.mass(m) < massMsun; m++) {
                sum += weight[a][m];
            }
        }
        return Math.min(1, sum);
    }

    /** Probability of an effective temperature below a limit (K). */
    double cooler(double limitK) {
        double sum = 0;
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                sum += table.teff(a, m) < limitK ? weight[a][m] : 0;
            }
        }
        return Math.min(1, sum);
    }

    /** Probability of each age cell. */
    double[] byAge() {
        double[] sum = new double[table.ages()];
        for (int a = 0; a < sum.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                sum[a] += weight[a][m];
            }
        }
        return sum;
    }

    /** Probability of each mass cell. */
    double[] byMass() {
        double[] sum = new double[table.masses()];
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                sum[m] += weight[a][m];
            }
        }
        return sum;
    }

    /** Weights by kind after the first {@code pieces} of evidence; 0 gives the prior. */
    double[] after(int pieces) {
        return after[pieces].clone();
    }

    /** Weights by kind with all evidence but one piece. */
    double[] without(Piece piece) {
        return without[piece.order()].clone();
    }

    /** Quantiles of a quantity of the cells, spread over bins of an axis. */
    Estimate estimate(Quantity quantity, double low, double high, int bins) {
        double[] sum = new double[bins];
        double[] edges = new double[bins + 1];
        for (int i = 0; i <= bins; i++) {
            edges[i] = low + (high - low) * i / bins;
        }
        for (int a = 0; a < weight.length; a++) {
            for (int m = first[a]; m < end[a]; m++) {
                if (weight[a][m] > 0) {
                    double place = (quantity.of(table, a, m) - low) / (high - low) * bins;
                    sum[(int) Math.min(bins - 1.0, Math.max(0, place))] += weight[a][m];
                }
            }
        }
        return Estimate.of(edges, sum);
    }

    /** A quantity of a cell. */
    @FunctionalInterface
    interface Quantity {
        double of(NodeTable table, int a, int m);
    }
}
