package emberline.reports.chart;

import java.util.List;

/**
 * A chart: two axes and layers drawn over each other in their order.
 *
 * @param title words above it; may be empty
 * @param x the horizontal axis
 * @param y the vertical axis
 * @param layers what is drawn, the lowest first
 */
public record Chart(String title, Axis x, Axis y, List<Layer> layers) {

    /** Copies the list. */
    public Chart {
        layers = List.copyOf(layers);
    }

    /**
     * The layers of one kind.
     *
     * @param <L> the kind
     * @param kind the class of the kind
     * @return layers in their order
     */
    public <L extends Layer> List<L> layers(Class<L> kind) {
        return layers.stream().filter(kind::isInstance).map(kind::cast).toList();
    }
}
