package emberline.demo;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.BinaryOperator;

/**
 * The light of an invented object above the atmosphere: a smooth continuum times the transmission
 * exp(-tau) of every band and line. For a cool dwarf the strengths follow from type and gravity;
 * other objects change or replace them by a recipe.
 */
final class SkyModel {

    /** Second radiation constant (micron K), CODATA 2018. */
    private static final double C2_MICRON_KELVIN = 14387.768775;

    /**
     * Interstellar extinction at one micron, A(1 micron) / A_V, with the slope 1.61 towards the
     * infrared: Cardelli, Clayton and Mathis (1989, ApJ 345, 245), from memory.
     */
    private static final double EXTINCTION_AT_ONE_MICRON = 0.404;

    private static final double EXTINCTION_SLOPE = 1.61;

    /** The word of a recipe that changes a dwarf of the type of the object. */
    private static final String OWN_TYPE = "own";

    private static final double MAG_TO_DEPTH = 0.4 * StrictMath.log(10);

    private final ModelGrid grid = new ModelGrid();
    private final Opacities opacities = Opacities.on(grid);
    private final Strengths strengths = Strengths.standard();

    /** The wavelength grid of the fluxes. */
    ModelGrid grid() {
        return grid;
    }

    /** The strengths the dwarfs are made of. */
    Strengths strengths() {
        return strengths;
    }

    /**
     * The flux of an object.
     *
     * @param object what it is
     * @return flux per unit wavelength on the grid, on an arbitrary scale
     */
    double[] flux(SurveyObject object) {
        if (object.pairTypeNumber().isEmpty()) {
            return fluxOfOne(object);
        }
        double[] sum = inAbsoluteUnits(object, object.typeNumber().orElseThrow());
        double[] other = inAbsoluteUnits(object, object.pairTypeNumber().getAsDouble());
        for (int i = 0; i < sum.length; i++) {
            sum[i] += other[i];
        }
        return sum;
    }

    /** One of a pair, so bright as its type is at ten parsec (erg/s/cm2/A). */
    private double[] inAbsoluteUnits(SurveyObject pair, double type) {
        return JBand.scaled(
                fluxOfOne(pair.component(type)),
                grid,
                AbsoluteMagnitudes.of(type, pair.gravity(), "j_mag"));
    }

    private double[] fluxOfOne(SurveyObject object) {
        Map<String, Double> ingredients = ingredients(object);
        double temperature = ingredients.remove(Strengths.TEMPERATURE);
        double[] logFlux = new double[grid.size()];
        for (int i = 0; i < logFlux.length; i++) {
            logFlux[i] = logPlanck(grid.micron(i), temperature);
            logFlux[i] -=
                    MAG_TO_DEPTH
                            * object.avMag()
                            * EXTINCTION_AT_ONE_MICRON
                            * StrictMath.pow(grid.micron(i), -EXTINCTION_SLOPE);
        }
        ingredients.forEach((component, depth) -> opacities.absorb(component, depth, logFlux));
        double[] flux = new double[logFlux.length];
        for (int i = 0; i < flux.length; i++) {
            flux[i] = StrictMath.exp(logFlux[i]);
        }
        return flux;
    }

    /** The natural logarithm of the Planck function per unit wavelength, up to a constant. */
    private static double logPlanck(double micron, double kelvin) {
        double x = C2_MICRON_KELVIN / (micron * kelvin);
        double reference = C2_MICRON_KELVIN / kelvin;
        return -5 * StrictMath.log(micron)
                - StrictMath.log(StrictMath.expm1(x))
                + StrictMath.log(StrictMath.expm1(reference));
    }

    /** The strength of every component of an object, the temperature among them. */
    private Map<String, Double> ingredients(SurveyObject object) {
        Map<String, Double> ingredients = new LinkedHashMap<>();
        if (object.isDwarf()) {
            addDwarf(object.typeNumber().orElseThrow(), object.lowGravity(), ingredients);
            ingredients.put("li_0.67", object.lithium());
            return ingredients;
        }
        for (DemoTable.Row row : DemoTable.named("recipes.csv").rows()) {
            if (row.text("recipe").equals(object.recipe())) {
                if (ingredients.isEmpty() && row.text("base_type").equals(OWN_TYPE)) {
                    addDwarf(object.typeNumber().orElseThrow(), 0, ingredients);
                }
                ingredients.merge(
                        row.text("component"), row.number("value"), change(row.text("how")));
            }
        }
        if (ingredients.isEmpty()) {
            throw new IllegalStateException(
                    object.name()
                            + ": recipe "
                            + object.recipe()
                            + " stands in no row of recipes.csv: add it there");
        }
        return ingredients;
    }

    private static BinaryOperator<Double> change(String how) {
        return switch (how) {
            case "TIMES" -> (strength, value) -> strength * value;
            case "PLUS" -> Double::sum;
            case "SET" -> (strength, value) -> value;
            default ->
                    throw new IllegalStateException(
                            "recipes.csv, column how: found "
                                    + how
                                    + ", expected TIMES, PLUS or SET");
        };
    }

    private void addDwarf(double type, double lowGravity, Map<String, Double> ingredients) {
        for (String component : strengths.components()) {
            ingredients.put(component, strengths.of(component, type, lowGravity));
        }
    }
}
