package emberline.measure;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.Form;
import emberline.catalogue.Part;
import emberline.catalogue.Relation;
import emberline.catalogue.Role;
import emberline.catalogue.Statistic;
import emberline.catalogue.Window;
import emberline.measure.Formula.Continuum;
import emberline.measure.WindowFunctional.Over;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Function;

/**
 * The formulas of the features that apply to a spectrum, over one sorted list of window functionals
 * that they share.
 */
final class FormulaBook {

    private static final List<Role> SIDES =
            List.of(Role.CONTINUUM_1, Role.CONTINUUM_2, Role.CONTINUUM_3, Role.CONTINUUM_4);
    private static final List<Over> MOMENTS =
            List.of(
                    Over.INTEGRAL,
                    Over.FIRST_MOMENT,
                    Over.SECOND_MOMENT,
                    Over.THIRD_MOMENT,
                    Over.FOURTH_MOMENT);

    private final FeatureCatalogue catalogue;
    private final Function<Feature, OptionalDouble> smoothing;
    private final Map<WindowFunctional, Integer> rows = new LinkedHashMap<>();
    private final Map<String, Formula> formulas = new LinkedHashMap<>();

    private FormulaBook(FeatureCatalogue catalogue, Function<Feature, OptionalDouble> smoothing) {
        this.catalogue = catalogue;
        this.smoothing = smoothing;
    }

    /**
     * Writes the formulas of features.
     *
     * @param catalogue where relations of composite features are looked up
     * @param features those that apply; a composite is left out unless all its parts are there
     * @param smoothing the resolving power to which the spectrum is smoothed for a feature
     * @return the book
     */
    static FormulaBook of(
            FeatureCatalogue catalogue,
            List<Feature> features,
            Function<Feature, OptionalDouble> smoothing) {
        FormulaBook book = new FormulaBook(catalogue, smoothing);
        Set<WindowFunctional> needed = new LinkedHashSet<>();
        for (Feature feature : features) {
            needed.addAll(book.functionals(feature));
        }
        List<WindowFunctional> sorted = new ArrayList<>(needed);
        sorted.sort(
                Comparator.comparingDouble((WindowFunctional f) -> f.window().lowMicron())
                        .thenComparingDouble(f -> f.window().highMicron()));
        for (WindowFunctional functional : sorted) {
            book.rows.put(functional, book.rows.size());
        }
        for (Feature feature : features) {
            if (feature.parts().isEmpty()) {
                book.formulas.put(feature.id(), book.simple(feature));
            }
        }
        book.composeAll(features);
        return book;
    }

    /** Composites may be made of composites, so they are written until no more can be. */
    private void composeAll(List<Feature> features) {
        boolean grew = true;
        while (grew) {
            grew = false;
            for (Feature feature : features) {
                if (!formulas.containsKey(feature.id())) {
                    Optional<Formula> formula = composite(feature);
                    formula.ifPresent(written -> formulas.put(feature.id(), written));
                    grew |= formula.isPresent();
                }
            }
        }
    }

    /** The functionals in the order of their rows. */
    List<WindowFunctional> functionals() {
        return List.copyOf(rows.keySet());
    }

    /** The formula of a feature, if it applies. */
    Optional<Formula> formula(String id) {
        return Optional.ofNullable(formulas.get(id));
    }

    private List<WindowFunctional> functionals(Feature feature) {
        List<WindowFunctional> needed = new ArrayList<>();
        for (FeatureWindow part : feature.windows()) {
            if (isLineIntegral(feature, part.role())) {
                MOMENTS.forEach(
                        over ->
                                needed.add(
                                        new WindowFunctional(
                                                part.window(), smoothing.apply(feature), over)));
            } else {
                needed.add(mean(feature, part.window()));
            }
        }
        return needed;
    }

    private static boolean isLineIntegral(Feature feature, Role role) {
        return role == Role.LINE && feature.form().isEquivalentWidth();
    }

    private WindowFunctional mean(Feature feature, Window window) {
        Over over = feature.statistic() == Statistic.MEDIAN ? Over.MEDIAN : Over.MEAN;
        return new WindowFunctional(window, smoothing.apply(feature), over);
    }

    private int row(Feature feature, Window window) {
        return rows.get(mean(feature, window));
    }

    private Continuum sum(Feature feature, Role... roles) {
        List<FeatureWindow> terms = new ArrayList<>();
        for (Role role : roles) {
            terms.addAll(feature.windows(role));
        }
        return new Continuum(
                terms.stream().mapToInt(term -> row(feature, term.window())).toArray(),
                terms.stream().mapToDouble(FeatureWindow::weight).toArray());
    }

    private Formula simple(Feature feature) {
        return switch (feature.form()) {
            case RATIO_OF_MEANS, RATIO_OF_WEIGHTED_SUMS ->
                    new LinearRatio(sum(feature, Role.NUMERATOR), sum(feature, Role.DENOMINATOR));
            case MAGNITUDE_OF_RATIO ->
                    new Magnitude(sum(feature, Role.NUMERATOR), sum(feature, Role.DENOMINATOR));
            case NORMALISED_DIFFERENCE -> normalisedDifference(feature);
            case INTERPOLATED_CONTINUUM_OVER_LINE -> interpolatedOverLine(feature);
            case DOUBLE_RATIO, PRODUCT_OF_POWERS -> powers(feature);
            case EQUIVALENT_WIDTH_LINEAR_CONTINUUM,
                    EQUIVALENT_WIDTH_FITTED_CONTINUUM,
                    EQUIVALENT_WIDTH_MEAN_CONTINUUM ->
                    equivalentWidth(feature);
            default ->
                    throw new IllegalStateException(
                            feature.id() + ": form " + feature.form() + " has parts, not windows");
        };
    }

    private Formula normalisedDifference(Feature feature) {
        int a = row(feature, feature.windows(Role.BAND_A).get(0).window());
        int b = row(feature, feature.windows(Role.BAND_B).get(0).window());
        return new LinearRatio(
                new Continuum(new int[] {a, b}, new double[] {1, -1}),
                new Continuum(new int[] {a, b}, new double[] {0.5, 0.5}));
    }

    private Formula interpolatedOverLine(Feature feature) {
        Window line = feature.windows(Role.LINE).get(0).window();
        Window one = feature.windows(Role.CONTINUUM_1).get(0).window();
        Window two = feature.windows(Role.CONTINUUM_2).get(0).window();
        double share =
                (line.centreMicron() - one.centreMicron())
                        / (two.centreMicron() - one.centreMicron());
        return new LinearRatio(
                new Continuum(
                        new int[] {row(feature, one), row(feature, two)},
                        new double[] {1 - share, share}),
                new Continuum(new int[] {row(feature, line)}, new double[] {1}));
    }

    private Formula powers(Feature feature) {
        int size = feature.windows().size();
        int[] factors = new int[size];
        double[] exponents = new double[size];
        for (int k = 0; k < size; k++) {
            FeatureWindow part = feature.windows().get(k);
            factors[k] = row(feature, part.window());
            exponents[k] =
                    switch (part.role()) {
                        case NUMERATOR_1, DENOMINATOR_2 -> 1;
                        case DENOMINATOR_1, NUMERATOR_2 -> -1;
                        default -> part.exponent();
                    };
        }
        return new PowerProduct(factors, exponents);
    }

    private Formula equivalentWidth(Feature feature) {
        Window line = feature.windows(Role.LINE).get(0).window();
        List<Window> sides =
                SIDES.stream()
                        .flatMap(role -> feature.windows(role).stream())
                        .map(FeatureWindow::window)
                        .toList();
        int count = sides.size();
        double[] atCentre = new double[count];
        double[] perHalfWidth = new double[count];
        double middle = sides.stream().mapToDouble(Window::centreMicron).average().orElseThrow();
        double spread =
                sides.stream().mapToDouble(side -> Math.pow(side.centreMicron() - middle, 2)).sum();
        boolean level = feature.form() == Form.EQUIVALENT_WIDTH_MEAN_CONTINUUM;
        for (int k = 0; k < count; k++) {
            double slope = level ? 0 : (sides.get(k).centreMicron() - middle) / spread;
            atCentre[k] = 1.0 / count + slope * (line.centreMicron() - middle);
            perHalfWidth[k] = slope * line.widthMicron() / 2;
        }
        OptionalDouble to = smoothing.apply(feature);
        return new EquivalentWidth(
                line.widthMicron(),
                MOMENTS.stream()
                        .mapToInt(over -> rows.get(new WindowFunctional(line, to, over)))
                        .toArray(),
                sides.stream().mapToInt(side -> row(feature, side)).toArray(),
                atCentre,
                perHalfWidth);
    }

    private Optional<Formula> composite(Feature feature) {
        List<Formula> parts = new ArrayList<>();
        for (Part part : feature.parts()) {
            Formula formula = formulas.get(part.feature());
            if (formula == null) {
                return Optional.empty();
            }
            parts.add(formula);
        }
        Composite.Rule rule =
                switch (feature.form()) {
                    case SUM_OF_FEATURES, LINEAR_COMBINATION_OF_FEATURES ->
                            Composite.sum(
                                    feature.parts().stream()
                                            .mapToDouble(Part::coefficient)
                                            .toArray());
                    case RATIO_OF_FEATURES -> Composite.ratio();
                    case METALLICITY_SHORTFALL ->
                            Composite.shortfall(solarCurve(feature).coefficients());
                    default ->
                            throw new IllegalStateException(
                                    feature.id() + ": form " + feature.form() + " has no parts");
                };
        return Optional.of(new Composite(parts, rule));
    }

    private Relation solarCurve(Feature feature) {
        return catalogue
                .solarCurve(feature)
                .orElseThrow(
                        () ->
                                new IllegalStateException(
                                        feature.id() + ": expected a solar TiO5 curve"));
    }
}
