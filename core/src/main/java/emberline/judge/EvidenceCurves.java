package emberline.judge;

import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;

/**
 * The evidence of one object as curves over temperature, luminosity and age, ready to be looked up
 * at the nodes of any grid.
 */
final class EvidenceCurves {

    /** Row of the curves for types without gravity classes. */
    private static final int NO_CLASS = GravityOrder.COUNT;

    private final Map<Piece, Boolean> counts = new EnumMap<>(Piece.class);
    private final double[][] typeAlone =
            new double[TypeKernel.SEQUENCES.length][NodeTable.TEFF_SIZE];
    private final double[][][] typeAndClass =
            new double[NO_CLASS + 1][TypeKernel.SEQUENCES.length][NodeTable.TEFF_SIZE];
    private final double[][] luminosity = new double[TypeKernel.SEQUENCES.length][];
    private final Evidence evidence;
    private final AgeEvidence age;
    private final LithiumEvidence lithium;
    private final double meanType;
    private final double lithiumChance;
    private final Optional<Kinematics> kinematics;
    private final double velocityError;

    /** Temperatures, as points of their axis, at which some type is possible: from, up to. */
    private int fromTeff = NodeTable.TEFF_SIZE;

    private int toTeff;

    EvidenceCurves(
            Evidence evidence,
            TypeMix mix,
            TypeKernel kernel,
            AgeEvidence age,
            LithiumEvidence lithium,
            Optional<double[][]> luminosityCurves,
            Optional<DistanceEstimate> distance,
            Optional<Kinematics> kinematics) {
        this.evidence = evidence;
        this.age = age;
        this.lithium = lithium;
        this.meanType = mix.meanType();
        this.kinematics = kinematics;
        this.velocityError = distance.map(DistanceEstimate::relativeSigma).orElse(0.0);
        this.lithiumChance = lithium.chance(mix, evidence.lithium());
        for (int s = 0; s < TypeKernel.SEQUENCES.length; s++) {
            fillTypes(mix, kernel, s);
            luminosity[s] = luminosityCurves.isPresent() ? luminosityCurves.get()[s] : null;
        }
        boolean stated = evidence.age().isPresent();
        counts.put(Piece.TYPE, true);
        counts.put(Piece.LUMINOSITY, luminosityCurves.isPresent());
        counts.put(Piece.AGE, stated);
        counts.put(Piece.GRAVITY, mix.gravityCounts() && !stated);
        counts.put(Piece.LITHIUM, evidence.lithium().outcome() != LithiumTest.Outcome.UNKNOWN);
        counts.put(Piece.HALPHA, age.halphaCounts(evidence.halpha(), meanType) && !stated);
        counts.put(Piece.VELOCITY, kinematics.isPresent() && !stated);
    }

    private void fillTypes(TypeMix mix, TypeKernel kernel, int s) {
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            if (mix.type(n) == 0) {
                continue;
            }
            kernel.add(s, n, mix.type(n), typeAlone[s]);
            kernel.add(s, n, mix.withoutClass(n), typeAndClass[NO_CLASS][s]);
            for (int g = 0; g < NO_CLASS; g++) {
                kernel.add(s, n, mix.evidence(n, g), typeAndClass[g][s]);
            }
        }
        for (int i = 0; i < NodeTable.TEFF_SIZE; i++) {
            if (typeAlone[s][i] > 0) {
                fromTeff = Math.min(fromTeff, i);
                toTeff = Math.max(toTeff, i + 1);
            }
        }
    }

    /** Whether a piece is there and counts. */
    boolean counts(Piece piece) {
        return counts.get(piece);
    }

    Evidence evidence() {
        return evidence;
    }

    double lithiumChance() {
        return lithiumChance;
    }

    Optional<Kinematics> kinematics() {
        return kinematics;
    }

    /** The curves at one age. */
    final class AtAge {
        private final double[] type = new double[NodeTable.TEFF_SIZE];
        private final double[] withClass = new double[NodeTable.TEFF_SIZE];
        private final double[] luminous;
        private final boolean gravityCounts = counts(Piece.GRAVITY);
        private final boolean lithiumCounts = counts(Piece.LITHIUM);
        private final double youngSequence;
        private final double halpha;
        private final double velocity;
        private final double chance;

        AtAge(double ageMyr) {
            double[] shares = age.classShares(ageMyr);
            double young = AgeEvidence.youngSequence(shares);
            this.youngSequence = young;
            double[] weight = {1 - young, young};
            for (int s = 0; s < weight.length; s++) {
                addTypes(typeAlone[s], weight[s], type);
                addTypes(typeAndClass[NO_CLASS][s], weight[s], withClass);
                for (int g = 0; g < NO_CLASS; g++) {
                    addTypes(typeAndClass[g][s], weight[s] * shares[g], withClass);
                }
            }
            this.luminous = counts(Piece.LUMINOSITY) ? new double[NodeTable.LOG_L_SIZE] : null;
            for (int s = 0; luminous != null && s < weight.length; s++) {
                add(luminosity[s], weight[s], luminous, 0, luminous.length);
            }
            this.halpha =
                    counts(Piece.HALPHA) ? age.halpha(evidence.halpha(), meanType, ageMyr) : 1;
            this.velocity =
                    counts(Piece.VELOCITY)
                            ? age.velocity(
                                    kinematics.orElseThrow().vtanKms(),
                                    velocityError,
                                    meanType,
                                    ageMyr)
                            : 1;
            this.chance = lithiumChance * lithium.youngFactor(meanType, ageMyr);
        }

        private void addTypes(double[] curve, double weight, double[] to) {
            add(curve, weight, to, fromTeff, toTeff);
        }

        private void add(double[] curve, double weight, double[] to, int from, int end) {
            if (weight > 0) {
                for (int i = from; i < end; i++) {
                    to[i] += weight * curve[i];
                }
            }
        }

        /** Part of the objects of this age that lie on the sequence of young objects. */
        double youngSequence() {
            return youngSequence;
        }

        /**
         * The likelihood of each piece at a node, in their order; 1 where it does not count. Where
         * the type rules the node out, that of the type alone.
         */
        void fill(NodeTable table, int a, int m, double[] factor) {
            double place = table.teffPlace(a, m);
            boolean possible = place > fromTeff - 1 && place < toTeff;
            double typeHere = possible ? NodeTable.along(type, place) : 0;
            factor[Piece.TYPE.order()] = typeHere;
            if (typeHere == 0) {
                return;
            }
            factor[Piece.GRAVITY.order()] =
                    gravityCounts ? NodeTable.along(withClass, place) / typeHere : 1;
            factor[Piece.LUMINOSITY.order()] =
                    luminous == null ? 1 : NodeTable.along(luminous, table.logLPlace(a, m));
            factor[Piece.LITHIUM.order()] = lithiumCounts ? ofLithium(table.lithiumLeft(a, m)) : 1;
            factor[Piece.AGE.order()] = 1; // stands in the weights of the table
            factor[Piece.HALPHA.order()] = halpha;
            factor[Piece.VELOCITY.order()] = velocity;
        }

        private double ofLithium(double left) {
            double seen = lithium.seen(left, chance, evidence.lithium().measured());
            return evidence.lithium().outcome() == LithiumTest.Outcome.SEEN ? seen : 1 - seen;
        }
    }
}
