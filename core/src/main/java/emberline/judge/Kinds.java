package emberline.judge;

/**
 * The kinds of objects that questions part: four ranges of mass about the hydrogen-burning limits,
 * young or not, cool or not.
 */
final class Kinds {

    /** Number of kinds. */
    static final int COUNT = 16;

    private static final int MASSES = 4;
    private static final int YOUNG = 4;
    private static final int COOL = 8;

    private final double low;
    private final double middle;
    private final double high;
    private final double youngMyr;
    private final double coolK;

    Kinds(JudgeNumbers numbers) {
        this.low = numbers.of("hydrogen-limit-low");
        this.middle = numbers.of("hydrogen-limit");
        this.high = numbers.of("hydrogen-limit-high");
        this.youngMyr = numbers.of("young-age");
        this.coolK = numbers.of("cool-teff");
    }

    /** The kind of a cell. */
    int of(NodeTable table, int a, int m) {
        double mass = table.mass(m);
        int kind = mass < low ? 0 : mass < middle ? 1 : mass < high ? 2 : 3;
        kind += table.ageMyr(a) < youngMyr ? YOUNG : 0;
        return kind + (table.teff(a, m) < coolK ? COOL : 0);
    }

    /** Whether a question is answered with yes, by kind. */
    static boolean[] yes(Aim aim) {
        boolean[] yes = new boolean[COUNT];
        for (int k = 0; k < COUNT; k++) {
            yes[k] =
                    switch (aim) {
                        case SUBSTELLAR -> k % MASSES < 2;
                        case YOUNG -> (k & YOUNG) != 0;
                        case COOLEST -> (k & COOL) != 0;
                        case METAL_POOR, NEARBY, PAIRS -> false;
                    };
        }
        return yes;
    }

    /** The verdict on a question by the probabilities of the kinds: substellar stands for yes. */
    static Decision verdict(Aim aim, double[] share, Judging judging) {
        if (aim == Aim.SUBSTELLAR) {
            double below = 0;
            double upTo = 0;
            for (int k = 0; k < COUNT; k++) {
                below += k % MASSES == 0 ? share[k] : 0;
                upTo += k % MASSES <= 2 ? share[k] : 0;
            }
            return Limits.decide(below, upTo, judging);
        }
        boolean[] yes = yes(aim);
        double p = 0;
        for (int k = 0; k < COUNT; k++) {
            p += yes[k] ? share[k] : 0;
        }
        return Limits.decide(p, p, judging);
    }
}
