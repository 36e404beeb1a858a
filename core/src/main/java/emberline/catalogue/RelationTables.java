package emberline.catalogue;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Reads relations. */
final class RelationTables {

    private static final int HIGHEST_POWER = 6;

    private final KnownSources sources;
    private final KnownIds features;
    private final KnownIds ids;

    RelationTables(KnownSources sources, KnownIds features, KnownIds ids) {
        this.sources = sources;
        this.features = features;
        this.ids = ids;
    }

    /** Two words for a truth. */
    private enum YesNo {
        YES,
        NO
    }

    List<Relation> read(CatalogueTables tables) throws InvalidCatalogueException {
        List<Relation> relations = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.RELATIONS)) {
            relations.add(relation(row));
        }
        return relations;
    }

    private Relation relation(CatalogueRow row) throws InvalidCatalogueException {
        Source source = sources.of(row);
        String id = ids.add(row, source);
        String feature = features.named(row, "feature");
        Quantity quantity = row.word("quantity", Quantity.class);
        List<Double> coefficients = coefficients(row);
        double argumentOffset = row.numberOr("argument_offset", 0);
        double scaleOffset = row.numberOr("printed_scale_offset", 0);
        double scaleFactor = row.numberOr("printed_scale_factor", 1);
        checkOrder(row, "valid_type_min", "valid_type_max");
        checkOrder(row, "valid_index_min", "valid_index_max");
        OptionalDouble typeMin = row.optionalNumber("valid_type_min");
        OptionalDouble typeMax = row.optionalNumber("valid_type_max");
        OptionalDouble indexMin = row.optionalNumber("valid_index_min");
        OptionalDouble indexMax = row.optionalNumber("valid_index_max");
        Relation.ValidIndexBasis basis = basis(row);
        OptionalDouble rms = row.optionalPositive("rms");
        Relation.Population population =
                row.wordOr("population", Relation.Population.class, Relation.Population.ANY);
        boolean corrected =
                row.wordOr("needs_instrument_correction", YesNo.class, YesNo.NO) == YesNo.YES;
        Relation.Trial trial = trial(row);
        HowKnown howKnown = row.howKnown();
        int confidence = row.confidencePercent();
        return row.made(
                () ->
                        new Relation(
                                id,
                                feature,
                                quantity,
                                argumentOffset,
                                coefficients,
                                scaleOffset,
                                scaleFactor,
                                typeMin,
                                typeMax,
                                indexMin,
                                indexMax,
                                basis,
                                rms,
                                population,
                                corrected,
                                trial,
                                source,
                                row.textOrBlank("place"),
                                howKnown,
                                confidence,
                                row.textOrBlank("note")));
    }

    private static List<Double> coefficients(CatalogueRow row) throws InvalidCatalogueException {
        List<Double> coefficients = new ArrayList<>(List.of(row.number("c0")));
        for (int k = 1; k <= HIGHEST_POWER; k++) {
            OptionalDouble coefficient = row.optionalNumber("c" + k);
            if (coefficient.isEmpty()) {
                continue;
            }
            if (coefficients.size() != k) {
                throw row.fault(
                        "c" + coefficients.size(),
                        "is blank before c" + k,
                        "coefficients without a gap",
                        "Write 0 where a power does not occur.");
            }
            coefficients.add(coefficient.getAsDouble());
        }
        return coefficients;
    }

    private static void checkOrder(CatalogueRow row, String minColumn, String maxColumn)
            throws InvalidCatalogueException {
        OptionalDouble min = row.optionalNumber(minColumn);
        OptionalDouble max = row.optionalNumber(maxColumn);
        boolean both = min.isPresent() && max.isPresent();
        if (both && !(min.getAsDouble() < max.getAsDouble())) {
            throw row.fault(
                    maxColumn,
                    max.getAsDouble() + " with a minimum of " + min.getAsDouble(),
                    minColumn + " below " + maxColumn,
                    "Exchange the two, or correct them.");
        }
    }

    private static Relation.ValidIndexBasis basis(CatalogueRow row)
            throws InvalidCatalogueException {
        boolean ranged =
                row.optionalNumber("valid_index_min").isPresent()
                        || row.optionalNumber("valid_index_max").isPresent();
        Relation.ValidIndexBasis basis =
                row.wordOr(
                        "valid_index_basis",
                        Relation.ValidIndexBasis.class,
                        Relation.ValidIndexBasis.NONE);
        if (ranged == (basis == Relation.ValidIndexBasis.NONE)) {
            throw row.fault(
                    "valid_index_basis",
                    basis + (ranged ? " with a range" : " without a range"),
                    ranged ? "PRINTED or DERIVED" : "NONE or a blank cell",
                    "Say how the range of the index is known.");
        }
        return basis;
    }

    private static Relation.Trial trial(CatalogueRow row) throws InvalidCatalogueException {
        return new Relation.Trial(
                row.wordOr("verdict", Relation.Verdict.class, Relation.Verdict.NOT_TESTED),
                count(row, "n_field"),
                row.optionalNumber("bias_field"),
                row.optionalNumber("scatter_field"),
                count(row, "n_vlg"),
                row.optionalNumber("bias_vlg"));
    }

    private static int count(CatalogueRow row, String column) throws InvalidCatalogueException {
        return row.textOrBlank(column).isEmpty()
                ? 0
                : row.wholeNumber(column, 0, Integer.MAX_VALUE);
    }
}
