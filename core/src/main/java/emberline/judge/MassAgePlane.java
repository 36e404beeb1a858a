package emberline.judge;

/** The posterior over mass and age on a coarse grid, both in even logarithmic steps. */
public final class MassAgePlane {

    private static final int MASSES = 48;
    private static final int AGES = 36;

    private final double lowMyr;
    private final double highMyr;
    private final double[][] probability = new double[AGES][MASSES];

    MassAgePlane(NodePosterior posterior) {
        NodeTable table = posterior.table();
        double[] ages = table.ageEdgesMyr();
        this.lowMyr = ages[0];
        this.highMyr = ages[ages.length - 1];
        int[] massCell = new int[table.masses()];
        for (int m = 0; m < massCell.length; m++) {
            massCell[m] =
                    cell(table.mass(m), NodeTable.LEAST_MASS, NodeTable.GREATEST_MASS, MASSES);
        }
        for (int a = 0; a < table.ages(); a++) {
            double[] ofAge = probability[cell(table.ageMyr(a), lowMyr, highMyr, AGES)];
            for (int m = posterior.first(a); m < posterior.end(a); m++) {
                ofAge[massCell[m]] += posterior.probability(a, m);
            }
        }
    }

    private static int cell(double value, double low, double high, int cells) {
        double place = Math.log(value / low) / Math.log(high / low) * cells;
        return (int) Math.min(cells - 1.0, Math.max(0, place));
    }

    /**
     * Number of mass cells.
     *
     * @return cells from low to high mass
     */
    public int masses() {
        return MASSES;
    }

    /**
     * Number of age cells.
     *
     * @return cells from young to old
     */
    public int ages() {
        return AGES;
    }

    /**
     * Lower edge of a mass cell.
     *
     * @param mass index, up to {@link #masses()} for the last upper edge
     * @return mass (solar)
     */
    public double massEdgeMsun(int mass) {
        return NodeTable.LEAST_MASS
                * Math.pow(NodeTable.GREATEST_MASS / NodeTable.LEAST_MASS, mass / (double) MASSES);
    }

    /**
     * Lower edge of an age cell.
     *
     * @param age index, up to {@link #ages()} for the last upper edge
     * @return age (Myr)
     */
    public double ageEdgeMyr(int age) {
        return lowMyr * Math.pow(highMyr / lowMyr, age / (double) AGES);
    }

    /**
     * Probability of a cell.
     *
     * @param age index of the age cell
     * @param mass index of the mass cell
     * @return 0 to 1; all cells add up to 1
     */
    public double probability(int age, int mass) {
        return probability[age][mass];
    }
}
