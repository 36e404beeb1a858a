package emberline.judge;

import emberline.judge.EvolutionGrid.Column;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A grid of evolution on cells of mass and age, with the prior of each: number of objects by mass
 * times density of the age. Edges of cells lie on the limits, so that no cell is cut by one.
 */
final class NodeTable {

    /** Least mass (solar). */
    static final double LEAST_MASS = 0.002;

    /** Greatest mass (solar). */
    static final double GREATEST_MASS = 0.2;

    /** Cooler nodes count at this temperature (K). */
    static final double FIRST_TEFF = 150;

    /** Step of the axis of temperatures (K). */
    static final double TEFF_STEP = 10;

    /** Points of the axis of temperatures. */
    static final int TEFF_SIZE = 361;

    /** First point of the axis of log L. */
    static final double FIRST_LOG_L = -9;

    /** Step of the axis of log L (dex). */
    static final double LOG_L_STEP = 0.02;

    /** Points of the axis of log L. */
    static final int LOG_L_SIZE = 401;

    /** Cells by segment between the limits, and cells of age, at the usual fineness. */
    private static final int[] CELLS = {36, 60, 40, 5, 7, 40, 50};

    private static final int AGE_CELLS = 72;
    private static final double DECADES_OF_AGE = 3;
    private static final int LEAST_AGE_CELLS = 24;
    private static final double SOLAR_LOG_G = 4.438;

    private final double[] massEdges;
    private final double[] ageEdges;
    private final double[] massCentre;
    private final double[] ageCentre;
    private final double[] massWeight;
    private final double[] ageWeight;
    private final double[][] teff;
    private final double[][] logL;
    private final double[][] logG;
    private final double[][] lithiumLeft;
    private final double[][] teffPlace;
    private final double[][] logLPlace;
    private final double[][] radius;

    /**
     * A table.
     *
     * @param grid the grid for temperature, luminosity and gravity
     * @param forLithium the grid for lithium
     * @param age what is stated about the age
     * @param numbers limits and slopes of the mass function
     * @param fineness 1 as usual; 2 halves every step; 0.5 doubles it
     */
    NodeTable(
            EvolutionGrid grid,
            EvolutionGrid forLithium,
            AgeStatement age,
            JudgeNumbers numbers,
            double fineness) {
        this.massEdges = massEdges(numbers, fineness);
        double range = Math.log10(age.highMyr() / age.lowMyr()) / DECADES_OF_AGE;
        int ageCells = (int) Math.max(LEAST_AGE_CELLS, Math.round(AGE_CELLS * range));
        this.ageEdges =
                ageEdges(age, numbers.of("young-age"), (int) Math.round(ageCells * fineness));
        this.massCentre = centres(massEdges);
        this.ageCentre = centres(ageEdges);
        MassFunction function = new MassFunction(numbers);
        this.massWeight = new double[massEdges.length - 1];
        double[] logMass = new double[massWeight.length];
        for (int m = 0; m < massWeight.length; m++) {
            massWeight[m] = function.between(massEdges[m], massEdges[m + 1]);
            logMass[m] = Math.log10(mass(m));
        }
        this.ageWeight = new double[ageEdges.length - 1];
        double[] logAge = new double[ageWeight.length];
        for (int a = 0; a < ageWeight.length; a++) {
            ageWeight[a] = age.density(ageMyr(a)) * (ageEdges[a + 1] - ageEdges[a]);
            logAge[a] = Math.log10(ageMyr(a));
        }
        this.teff = grid.on(Column.LOG_TEFF, logAge, logMass);
        this.logL = grid.on(Column.LOG_L, logAge, logMass);
        this.logG = grid.on(Column.LOG_G, logAge, logMass);
        this.lithiumLeft = forLithium.on(Column.LITHIUM, logAge, logMass);
        this.teffPlace = new double[ageWeight.length][massWeight.length];
        this.logLPlace = new double[ageWeight.length][massWeight.length];
        this.radius = new double[ageWeight.length][massWeight.length];
        for (int a = 0; a < logAge.length; a++) {
            for (int m = 0; m < logMass.length; m++) {
                teff[a][m] = Math.pow(10, teff[a][m]);
                lithiumLeft[a][m] = EvolutionGrid.lithiumLeft(lithiumLeft[a][m]);
                teffPlace[a][m] = place(teff[a][m], FIRST_TEFF, TEFF_STEP, TEFF_SIZE);
                logLPlace[a][m] = place(logL[a][m], FIRST_LOG_L, LOG_L_STEP, LOG_L_SIZE);
                radius[a][m] = Math.sqrt(mass(m) * Math.pow(10, SOLAR_LOG_G - logG[a][m]));
            }
        }
    }

    private static double place(double value, double first, double step, int size) {
        return Math.min(size - 1.001, Math.max(0, (value - first) / step));
    }

    private static double[] centres(double[] edges) {
        double[] centres = new double[edges.length - 1];
        for (int i = 0; i < centres.length; i++) {
            centres[i] = Math.sqrt(edges[i] * edges[i + 1]);
        }
        return centres;
    }

    private static double[] massEdges(JudgeNumbers numbers, double fineness) {
        double[] ends = {
            LEAST_MASS,
            numbers.of("deuterium-limit"),
            numbers.of("mass-slope-break"),
            numbers.of("hydrogen-limit-low"),
            numbers.of("hydrogen-limit"),
            numbers.of("hydrogen-limit-high"),
            0.1,
            GREATEST_MASS
        };
        List<Double> edges = new ArrayList<>();
        for (int s = 0; s < CELLS.length; s++) {
            double[] steps =
                    logSteps(
                            ends[s],
                            ends[s + 1],
                            Math.max(2, (int) Math.round(CELLS[s] * fineness)));
            for (int i = 0; i < steps.length - 1; i++) {
                edges.add(steps[i]);
            }
        }
        edges.add(GREATEST_MASS);
        return edges.stream().mapToDouble(e -> e).toArray();
    }

    /** Even in log age, with an edge on the age up to which an object is called young. */
    private static double[] ageEdges(AgeStatement age, double youngMyr, int cells) {
        double low = age.lowMyr();
        double high = age.highMyr();
        if (youngMyr <= low || youngMyr >= high) {
            return logSteps(low, high, cells);
        }
        double part = Math.log(youngMyr / low) / Math.log(high / low);
        int below = Math.min(cells - 1, Math.max(1, (int) Math.round(cells * part)));
        double[] edges = Arrays.copyOf(logSteps(low, youngMyr, below), cells + 1);
        double[] above = logSteps(youngMyr, high, cells - below);
        System.arraycopy(above, 0, edges, below, above.length);
        return edges;
    }

    private static double[] logSteps(double low, double high, int cells) {
        double[] edges = new double[cells + 1];
        for (int i = 0; i <= cells; i++) {
            edges[i] = low * Math.pow(high / low, i / (double) cells);
        }
        edges[cells] = high;
        return edges;
    }

    int masses() {
        return massWeight.length;
    }

    int ages() {
        return ageWeight.length;
    }

    /** Geometric centre of a cell (solar). */
    double mass(int m) {
        return massCentre[m];
    }

    /** Geometric centre of a cell (Myr). */
    double ageMyr(int a) {
        return ageCentre[a];
    }

    double[] massEdges() {
        return massEdges.clone();
    }

    double[] ageEdgesMyr() {
        return ageEdges.clone();
    }

    double massWeight(int m) {
        return massWeight[m];
    }

    double ageWeight(int a) {
        return ageWeight[a];
    }

    /** Effective temperature (K). */
    double teff(int a, int m) {
        return teff[a][m];
    }

    /** Place on the axis of temperatures, within its ends. */
    double teffPlace(int a, int m) {
        return teffPlace[a][m];
    }

    /** log10 of the luminosity (solar). */
    double logL(int a, int m) {
        return logL[a][m];
    }

    /** Place on the axis of log L, within its ends. */
    double logLPlace(int a, int m) {
        return logLPlace[a][m];
    }

    /** log10 of the surface gravity (cm/s2). */
    double logG(int a, int m) {
        return logG[a][m];
    }

    /** Radius (solar) from mass and gravity. */
    double radius(int a, int m) {
        return radius[a][m];
    }

    /** Part of the lithium left, 0 to 1. */
    double lithiumLeft(int a, int m) {
        return lithiumLeft[a][m];
    }

    /** The value of a curve given on one of the axes, linear between its points. */
    static double along(double[] curve, double place) {
        int low = (int) place;
        return curve[low] + (place - low) * (curve[low + 1] - curve[low]);
    }
}
