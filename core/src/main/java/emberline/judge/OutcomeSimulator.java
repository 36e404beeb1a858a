package emberline.judge;

import java.util.Optional;

/**
 * What further observations could show, given the present posterior: for each cell of mass and age
 * with its probability the outcomes it would give, added up by kind.
 */
final class OutcomeSimulator {

    private static final double NEGLIGIBLE = 1e-9;
    private static final int CLASSES = GravityOrder.COUNT;
    private static final double TYPE_BIN = 10;
    private static final int LOG_L_PER_BIN = 4;
    private static final double PARALLAX_DEX = 0.87;
    private static final double MEMBER_AGE_MYR = 200;

    private final NodePosterior posterior;
    private final NodeTable table;
    private final EvidenceCurves curves;
    private final TypeMix mix;
    private final Kinds kinds;
    private final AgeEvidence age;
    private final LithiumEvidence lithium;
    private final JudgeNumbers numbers;

    OutcomeSimulator(
            NodePosterior posterior,
            EvidenceCurves curves,
            TypeMix mix,
            AgeEvidence age,
            LithiumEvidence lithium,
            JudgeNumbers numbers) {
        this.posterior = posterior;
        this.table = posterior.table();
        this.curves = curves;
        this.mix = mix;
        this.kinds = new Kinds(numbers);
        this.age = age;
        this.lithium = lithium;
        this.numbers = numbers;
    }

    /** Gets every cell with some probability. */
    private interface Visitor {
        void visit(int a, int m, double p, double[] ofKind);
    }

    private void visit(double[][] joint, Visitor visitor) {
        for (int a = 0; a < table.ages(); a++) {
            for (int m = posterior.first(a); m < posterior.end(a); m++) {
                double p = posterior.probability(a, m);
                if (p > NEGLIGIBLE) {
                    visitor.visit(a, m, p, joint[kinds.of(table, a, m)]);
                }
            }
        }
    }

    /** Outcomes: line seen or not, in a spectrum good enough. */
    OutcomeTable lithium() {
        double[][] joint = new double[Kinds.COUNT][2];
        double chance = lithium.chance(mix, LithiumTest.unknown());
        double type = mix.meanType();
        visit(
                joint,
                (a, m, p, of) -> {
                    double here = chance * lithium.youngFactor(type, table.ageMyr(a));
                    double seen = lithium.seen(table.lithiumLeft(a, m), here, true);
                    of[0] += p * seen;
                    of[1] += p * (1 - seen);
                });
        return new OutcomeTable(joint);
    }

    /** Outcomes: the gravity class, right with some probability. */
    OutcomeTable gravity(double accuracy) {
        double[][] joint = new double[Kinds.COUNT][CLASSES];
        double[] known = new double[CLASSES];
        for (int g = 0; g < CLASSES; g++) {
            known[g] = curves.counts(Piece.GRAVITY) ? mix.evidence(g) : 1;
        }
        double[][] shares = new double[table.ages()][];
        for (int a = 0; a < shares.length; a++) {
            double[] share = age.classShares(table.ageMyr(a));
            double sum = 0;
            for (int g = 0; g < CLASSES; g++) {
                share[g] *= known[g];
                sum += share[g];
            }
            double[] seen = new double[CLASSES];
            for (int g = 0; g < CLASSES; g++) {
                for (int o = 0; o < CLASSES; o++) {
                    seen[o] +=
                            share[g] / sum * (o == g ? accuracy : (1 - accuracy) / (CLASSES - 1));
                }
            }
            shares[a] = seen;
        }
        visit(
                joint,
                (a, m, p, of) -> {
                    for (int o = 0; o < CLASSES; o++) {
                        of[o] += p * shares[a][o];
                    }
                });
        return new OutcomeTable(joint);
    }

    /** Outcomes: log L with the error of a parallax, in bins. */
    OutcomeTable parallax(double relativeError) {
        int bins = NodeTable.LOG_L_SIZE / LOG_L_PER_BIN + 1;
        double[][] sharp = new double[Kinds.COUNT][bins];
        visit(sharp, (a, m, p, of) -> of[(int) (table.logLPlace(a, m) / LOG_L_PER_BIN)] += p);
        double sigmaDex = Math.hypot(numbers.of("luminosity-floor"), PARALLAX_DEX * relativeError);
        double sigma = sigmaDex / (NodeTable.LOG_L_STEP * LOG_L_PER_BIN);
        return new OutcomeTable(blurred(sharp, sigma));
    }

    private static double[][] blurred(double[][] sharp, double sigma) {
        int reach = (int) Math.ceil(4 * sigma);
        double[] kernel = new double[2 * reach + 1];
        double sum = 0;
        for (int i = 0; i < kernel.length; i++) {
            double off = (i - reach) / sigma;
            kernel[i] = Math.exp(-off * off / 2);
            sum += kernel[i];
        }
        double[][] soft = new double[sharp.length][sharp[0].length + 2 * reach];
        for (int k = 0; k < sharp.length; k++) {
            for (int i = 0; i < sharp[k].length; i++) {
                for (int j = 0; sharp[k][i] > 0 && j < kernel.length; j++) {
                    soft[k][i + j] += sharp[k][i] * kernel[j] / sum;
                }
            }
        }
        return soft;
    }

    /** Outcomes: the type in bins of one subclass, as half a subclass of error gives it. */
    OutcomeTable type(TypeKernel kernel) {
        double[][][] curve =
                new double[TypeKernel.SEQUENCES.length][Kinds.COUNT][NodeTable.TEFF_SIZE];
        for (int a = 0; a < table.ages(); a++) {
            EvidenceCurves.AtAge here = curves.new AtAge(table.ageMyr(a));
            double[] factor = new double[Piece.COUNT];
            double[] weight = {1 - here.youngSequence(), here.youngSequence()};
            for (int m = posterior.first(a); m < posterior.end(a); m++) {
                double p = posterior.probability(a, m);
                if (p <= NEGLIGIBLE) {
                    continue;
                }
                here.fill(table, a, m, factor);
                double place = table.teffPlace(a, m);
                int low = (int) place;
                int kind = kinds.of(table, a, m);
                for (int s = 0; s < weight.length; s++) {
                    double share = p * weight[s] / factor[Piece.TYPE.order()];
                    curve[s][kind][low] += share * (1 - (place - low));
                    curve[s][kind][low + 1] += share * (place - low);
                }
            }
        }
        double[][] joint = new double[Kinds.COUNT][(int) (TypeAxis.SIZE / TYPE_BIN) + 1];
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            for (int s = 0; mix.type(n) > 0 && s < TypeKernel.SEQUENCES.length; s++) {
                for (int k = 0; k < Kinds.COUNT; k++) {
                    joint[k][(int) (n / TYPE_BIN)] += mix.type(n) * kernel.sum(s, n, curve[s][k]);
                }
            }
        }
        return new OutcomeTable(joint);
    }

    /** Outcomes: the velocity is that of a known young group, or not. */
    Optional<OutcomeTable> velocity() {
        if (curves.kinematics().isEmpty() || curves.kinematics().get().space().isPresent()) {
            return Optional.empty();
        }
        double[][] joint = new double[Kinds.COUNT][2];
        double member = numbers.of("member-share");
        double chance = numbers.of("member-false");
        visit(
                joint,
                (a, m, p, of) -> {
                    double here = table.ageMyr(a) < MEMBER_AGE_MYR ? member : chance;
                    of[0] += p * here;
                    of[1] += p * (1 - here);
                });
        return Optional.of(new OutcomeTable(joint));
    }
}
