package emberline.judge;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;

/**
 * A published grid of evolution: effective temperature, luminosity, gravity and lithium by mass and
 * age, for solar metallicity. Interpolated by monotone cubics, first in log mass, then in log age.
 */
public final class EvolutionGrid {

    /** Which grid. */
    public enum Name {
        /** Tracks of 2015 where they exist, the dust-free grid of 2003 below. */
        MERGED("BHAC15 with COND03 below"),
        /** Dust-free atmospheres. */
        COND03("COND03"),
        /** Dusty atmospheres, the dust-free grid where its table ends. */
        DUSTY00("DUSTY00");

        private final String label;

        Name(String label) {
            this.label = label;
        }

        /**
         * The grid in words.
         *
         * @return a short label
         */
        public String label() {
            return label;
        }
    }

    /** What a grid gives. */
    enum Column {
        /** log10 of the effective temperature (K). */
        LOG_TEFF,
        /** log10 of the luminosity (solar). */
        LOG_L,
        /** log10 of the surface gravity (cm/s2). */
        LOG_G,
        /** log10 of minus the natural logarithm of the part of lithium left; see the constants. */
        LITHIUM
    }

    /** Least and greatest value of the lithium column: 99.9% left, and none. */
    private static final double LITHIUM_FULL = -3;

    private static final double LITHIUM_NONE = 1.5;

    private final double[] logAgeMyr;
    private final double[] logMassMsun;
    private final Map<Column, double[][]> cells;

    private EvolutionGrid(double[] logAgeMyr, double[] logMassMsun, Map<Column, double[][]> cells) {
        this.logAgeMyr = logAgeMyr;
        this.logMassMsun = logMassMsun;
        this.cells = cells;
    }

    /** Reads all grids of the product. */
    static Map<Name, EvolutionGrid> all() {
        Map<Name, NavigableMap<Double, NavigableMap<Double, Map<Column, Double>>>> tables =
                new EnumMap<>(Name.class);
        JudgeTable.rows(
                "evolution.csv",
                row -> {
                    Map<Column, Double> values = new EnumMap<>(Column.class);
                    values.put(Column.LOG_TEFF, Math.log10(JudgeTable.number(row, "teff_k")));
                    values.put(Column.LOG_L, JudgeTable.number(row, "log_l"));
                    values.put(Column.LOG_G, JudgeTable.number(row, "log_g"));
                    values.put(Column.LITHIUM, depletion(JudgeTable.number(row, "lithium", 1)));
                    return tables.computeIfAbsent(
                                    Name.valueOf(row.getField("grid")), n -> new TreeMap<>())
                            .computeIfAbsent(
                                    Math.log10(JudgeTable.number(row, "age_myr")),
                                    a -> new TreeMap<>())
                            .put(Math.log10(JudgeTable.number(row, "mass_msun")), values);
                });
        Map<Name, EvolutionGrid> grids = new EnumMap<>(Name.class);
        tables.forEach((name, table) -> grids.put(name, of(table)));
        return grids;
    }

    private static EvolutionGrid of(
            NavigableMap<Double, NavigableMap<Double, Map<Column, Double>>> table) {
        double[] ages = table.keySet().stream().mapToDouble(a -> a).toArray();
        double[] masses =
                table.firstEntry().getValue().keySet().stream().mapToDouble(m -> m).toArray();
        Map<Column, double[][]> cells = new EnumMap<>(Column.class);
        for (Column column : Column.values()) {
            double[][] values = new double[ages.length][masses.length];
            for (int a = 0; a < ages.length; a++) {
                if (table.get(ages[a]).size() != masses.length) {
                    throw new IllegalStateException(
                            "evolution.csv: expected the same masses at every age of a grid");
                }
                for (int m = 0; m < masses.length; m++) {
                    values[a][m] = table.get(ages[a]).get(masses[m]).get(column);
                }
            }
            cells.put(column, values);
        }
        return new EvolutionGrid(ages, masses, cells);
    }

    private static double depletion(double left) {
        double depth = Math.log10(-Math.log(Math.min(1 - 1e-12, Math.max(left, 1e-30))));
        return Math.min(LITHIUM_NONE, Math.max(LITHIUM_FULL, depth));
    }

    /** The part of lithium left (0 to 1) from a value of the lithium column. */
    static double lithiumLeft(double depth) {
        return depth <= LITHIUM_FULL ? 1 : Math.exp(-Math.pow(10, depth));
    }

    /** The same grid with every second age left out, to see how well it interpolates. */
    EvolutionGrid thinned() {
        int[] kept =
                java.util.stream.IntStream.range(0, logAgeMyr.length)
                        .filter(a -> a % 2 == 0 || a == logAgeMyr.length - 1)
                        .toArray();
        Map<Column, double[][]> some = new EnumMap<>(Column.class);
        cells.forEach(
                (column, all) ->
                        some.put(
                                column,
                                Arrays.stream(kept)
                                        .mapToObj(a -> all[a])
                                        .toArray(double[][]::new)));
        return new EvolutionGrid(
                Arrays.stream(kept).mapToDouble(a -> logAgeMyr[a]).toArray(), logMassMsun, some);
    }

    /**
     * A column on nodes of masses and ages.
     *
     * @param column what
     * @param ages log10 of ages (Myr)
     * @param masses log10 of masses (solar)
     * @return values by age, then mass
     */
    double[][] on(Column column, double[] ages, double[] masses) {
        double[][] given = cells.get(column);
        double[][] byMass = new double[logAgeMyr.length][masses.length];
        for (int a = 0; a < logAgeMyr.length; a++) {
            MonotoneCurve curve = new MonotoneCurve(logMassMsun, given[a]);
            for (int m = 0; m < masses.length; m++) {
                byMass[a][m] = curve.at(masses[m]);
            }
        }
        double[][] values = new double[ages.length][masses.length];
        for (int m = 0; m < masses.length; m++) {
            int mass = m;
            MonotoneCurve curve =
                    new MonotoneCurve(
                            logAgeMyr,
                            Arrays.stream(byMass).mapToDouble(row -> row[mass]).toArray());
            for (int a = 0; a < ages.length; a++) {
                values[a][m] = curve.at(ages[a]);
            }
        }
        return values;
    }

    /** Ages of the table, log10 of Myr. */
    double[] logAgeMyr() {
        return logAgeMyr.clone();
    }

    /** Masses of the table, log10 of solar masses. */
    double[] logMassMsun() {
        return logMassMsun.clone();
    }
}
