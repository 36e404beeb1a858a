package emberline.judge;

/**
 * The age of an object.
 *
 * @param ageMyr the age (Myr) with its intervals
 * @param pYoung probability of an age below 150 Myr
 * @param prior what was taken before the object was looked at
 * @param informationBits how much the evidence moved it from the prior (bit)
 */
public record AgeResult(
        Estimate ageMyr, double pYoung, AgeStatement prior, double informationBits) {

    private static final double SAYS_SOMETHING_BITS = 0.1;

    static AgeResult of(NodePosterior posterior, AgeStatement prior, double youngMyr) {
        NodeTable table = posterior.table();
        double[] after = posterior.byAge();
        double all = 0;
        for (int a = 0; a < after.length; a++) {
            all += table.ageWeight(a);
        }
        double bits = 0;
        double young = 0;
        double[] edges = table.ageEdgesMyr();
        for (int a = 0; a < after.length; a++) {
            if (after[a] > 0) {
                bits += after[a] * Math.log(after[a] * all / table.ageWeight(a)) / Math.log(2);
            }
            double part = (youngMyr - edges[a]) / (edges[a + 1] - edges[a]);
            young += after[a] * Math.min(1, Math.max(0, part));
        }
        return new AgeResult(
                Estimate.of(edges, after), Math.min(1, young), prior, Math.max(0, bits));
    }

    /**
     * Whether the evidence tells anything of the age beyond the prior.
     *
     * @return false where the intervals are those of the prior
     */
    public boolean isTold() {
        return informationBits >= SAYS_SOMETHING_BITS;
    }
}
