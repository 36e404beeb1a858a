package emberline.demo;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * The relative opacity of every component of the model on the fine wavelength grid, read from
 * {@code opacities.csv}. The line forest of a band that no spectrograph here resolves is a fixed
 * random texture, the same for every object.
 */
final class Opacities {

    private final ModelGrid grid;
    private final Map<String, double[]> byComponent;

    private Opacities(ModelGrid grid, Map<String, double[]> byComponent) {
        this.grid = grid;
        this.byComponent = byComponent;
    }

    /**
     * Reads the shapes and evaluates them.
     *
     * @param grid where
     * @return the opacities
     */
    static Opacities on(ModelGrid grid) {
        Map<String, List<DemoTable.Row>> rows = new LinkedHashMap<>();
        for (DemoTable.Row row : DemoTable.named("opacities.csv").rows()) {
            rows.computeIfAbsent(row.text("component"), name -> new ArrayList<>()).add(row);
        }
        Map<String, double[]> byComponent = new LinkedHashMap<>();
        rows.forEach((name, parts) -> byComponent.put(name, sum(grid, name, parts)));
        return new Opacities(grid, byComponent);
    }

    private static double[] sum(ModelGrid grid, String component, List<DemoTable.Row> parts) {
        double[] sum = new double[grid.size()];
        for (DemoTable.Row part : parts) {
            OpacityShape shape = OpacityShape.valueOf(part.text("shape"));
            double weight = part.number("weight");
            double a = part.number("a");
            double b = part.number("b", 0);
            double c = part.number("c", 0);
            double d = part.number("d", 0);
            for (int i = 0; i < sum.length; i++) {
                sum[i] += weight * shape.at(grid.micron(i), a, b, c, d);
            }
        }
        double roughness = parts.get(0).number("roughness");
        if (roughness > 0) {
            double[] forest = LineForest.of(component, grid.size(), roughness);
            for (int i = 0; i < sum.length; i++) {
                sum[i] *= forest[i];
            }
        }
        return sum;
    }

    /** The names of the components in the order of the file. */
    Set<String> components() {
        return byComponent.keySet();
    }

    /**
     * Takes the opacity of a component, times a strength, from a logarithmic flux.
     *
     * @param component its name
     * @param strength optical depth at the peak; negative for emission
     * @param logFlux natural logarithm of the flux on the grid; changed in place
     * @throws IllegalStateException if there is no such component
     */
    void absorb(String component, double strength, double[] logFlux) {
        double[] opacity = byComponent.get(component);
        if (opacity == null) {
            throw new IllegalStateException(
                    "component "
                            + component
                            + " stands in no row of opacities.csv: expected one of "
                            + byComponent.keySet());
        }
        for (int i = 0; i < logFlux.length; i++) {
            logFlux[i] -= strength * opacity[i];
        }
    }

    /** The grid of the opacities. */
    ModelGrid grid() {
        return grid;
    }
}
