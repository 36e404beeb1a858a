package emberline.catalogue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reads what classes are decided by: gravity limits, type ranges, pair planes, metallicity,
 * activity.
 */
final class CriterionTables {

    /** The word for the spectral type on the abscissa of a plane. */
    private static final String TYPE = "TYPE";

    private final CatalogueTables tables;
    private final KnownSources sources;
    private final KnownIds features;

    CriterionTables(CatalogueTables tables, KnownSources sources, KnownIds features) {
        this.tables = tables;
        this.sources = sources;
        this.features = features;
    }

    List<GravityThreshold> gravityThresholds() throws InvalidCatalogueException {
        List<GravityThreshold> thresholds = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.GRAVITY)) {
            String feature = features.named(row, "feature");
            double type = row.number("type_number");
            double intermediate = row.number("intermediate");
            double veryLow = row.number("very_low");
            GravityThreshold.LowGravityIf side =
                    row.word("low_gravity_if", GravityThreshold.LowGravityIf.class);
            Source source = sources.of(row);
            HowKnown howKnown = row.howKnown();
            int confidence = row.confidencePercent();
            thresholds.add(
                    row.made(
                            () ->
                                    new GravityThreshold(
                                            feature,
                                            type,
                                            intermediate,
                                            veryLow,
                                            side,
                                            source,
                                            howKnown,
                                            confidence,
                                            row.textOrBlank("note"))));
        }
        return thresholds;
    }

    List<TypeBoundary> typeBoundaries() throws InvalidCatalogueException {
        List<TypeBoundary> boundaries = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.BOUNDARIES)) {
            String feature = features.named(row, "feature");
            double type = row.number("type_number");
            OptionalDouble low = row.optionalNumber("low");
            OptionalDouble high = row.optionalNumber("high");
            Source source = sources.of(row);
            HowKnown howKnown = row.howKnown();
            int confidence = row.confidencePercent();
            boundaries.add(
                    row.made(
                            () ->
                                    new TypeBoundary(
                                            feature,
                                            type,
                                            low,
                                            high,
                                            source,
                                            howKnown,
                                            confidence,
                                            row.textOrBlank("note"))));
        }
        return boundaries;
    }

    List<MetallicityClass> metallicityClasses() throws InvalidCatalogueException {
        List<MetallicityClass> classes = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.METALLICITY)) {
            MetallicityClass.Name name = row.word("metallicity_class", MetallicityClass.Name.class);
            String feature = features.named(row, "feature");
            OptionalDouble above = row.optionalNumber("above");
            OptionalDouble upTo = row.optionalNumber("up_to");
            Source source = sources.of(row);
            HowKnown howKnown = row.howKnown();
            int confidence = row.confidencePercent();
            classes.add(
                    row.made(
                            () ->
                                    new MetallicityClass(
                                            name,
                                            feature,
                                            above,
                                            upTo,
                                            source,
                                            howKnown,
                                            confidence,
                                            row.textOrBlank("note"))));
        }
        return classes;
    }

    List<ActivityFactor> activityFactors() throws InvalidCatalogueException {
        List<ActivityFactor> factors = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.ACTIVITY)) {
            ActivityFactor.Quantity quantity = row.word("quantity", ActivityFactor.Quantity.class);
            OptionalDouble type = row.optionalNumber("type_number");
            double value = row.number("value");
            OptionalDouble error = row.optionalPositive("error");
            Source source = sources.of(row);
            HowKnown howKnown = row.howKnown();
            int confidence = row.confidencePercent();
            factors.add(
                    row.made(
                            () ->
                                    new ActivityFactor(
                                            quantity,
                                            type,
                                            value,
                                            error,
                                            source,
                                            howKnown,
                                            confidence,
                                            row.textOrBlank("note"))));
        }
        return factors;
    }

    List<PairPlane> pairPlanes() throws InvalidCatalogueException {
        Map<String, List<CatalogueRow>> rowsByPlane = new LinkedHashMap<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.PAIRS)) {
            String plane = sources.of(row).key() + " " + row.wholeNumber("plane", 1, 9999);
            rowsByPlane.computeIfAbsent(plane, key -> new ArrayList<>()).add(row);
        }
        List<PairPlane> planes = new ArrayList<>();
        for (List<CatalogueRow> rows : rowsByPlane.values()) {
            planes.add(plane(rows));
        }
        return planes;
    }

    /** A plane of its vertices; the first row says the rest, the others must repeat it. */
    private PairPlane plane(List<CatalogueRow> rows) throws InvalidCatalogueException {
        CatalogueRow first = rows.get(0);
        List<PairPlane.Vertex> limit = new ArrayList<>();
        for (CatalogueRow row : rows) {
            checkVertex(row, first, limit.size() + 1);
            limit.add(new PairPlane.Vertex(row.number("x_value"), row.number("y_value")));
        }
        Source source = sources.of(first);
        int number = first.wholeNumber("plane", 1, 9999);
        Optional<String> x =
                first.text("x").equals(TYPE)
                        ? Optional.empty()
                        : Optional.of(features.named(first, "x"));
        String y = features.named(first, "y");
        PairPlane.Side side = first.word("pair_side", PairPlane.Side.class);
        HowKnown sideHowKnown = first.word("side_how_known", HowKnown.class);
        HowKnown howKnown = first.howKnown();
        int confidence = first.confidencePercent();
        return first.made(
                () ->
                        new PairPlane(
                                source,
                                number,
                                x,
                                y,
                                limit,
                                side,
                                sideHowKnown,
                                howKnown,
                                confidence,
                                first.textOrBlank("note")));
    }

    private static void checkVertex(CatalogueRow row, CatalogueRow first, int point)
            throws InvalidCatalogueException {
        row.wholeNumber("point", point, point);
        for (String column : List.of("x", "y", "pair_side")) {
            if (!row.text(column).equals(first.text(column))) {
                throw row.fault(
                        column,
                        "'" + row.text(column) + "'",
                        "'" + first.text(column) + "' as in line " + first.line(),
                        "Give every vertex of a plane the same quantities and side.");
            }
        }
    }
}
