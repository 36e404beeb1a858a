package emberline.catalogue;

import emberline.spectrum.Medium;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** Reads features with their windows and parts. */
final class FeatureTables {

    private final KnownSources sources;
    private final KnownIds ids;

    FeatureTables(KnownSources sources, KnownIds ids) {
        this.sources = sources;
        this.ids = ids;
    }

    /** The word for the printed medium. */
    private enum PrintedMedium {
        AIR,
        VACUUM,
        UNSTATED
    }

    List<Feature> read(CatalogueTables tables) throws InvalidCatalogueException {
        Map<String, CatalogueRow> rows = new LinkedHashMap<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.FEATURES)) {
            rows.put(ids.add(row, sources.of(row)), row);
        }
        Map<String, List<FeatureWindow>> windows = windows(tables, rows);
        Map<String, List<Part>> parts = parts(tables, rows);
        List<Feature> features = new ArrayList<>();
        for (Map.Entry<String, CatalogueRow> entry : rows.entrySet()) {
            String id = entry.getKey();
            features.add(
                    feature(
                            id,
                            entry.getValue(),
                            windows.getOrDefault(id, List.of()),
                            parts.getOrDefault(id, List.of())));
        }
        return features;
    }

    private Map<String, List<FeatureWindow>> windows(
            CatalogueTables tables, Map<String, CatalogueRow> features)
            throws InvalidCatalogueException {
        Map<String, List<FeatureWindow>> windows = new LinkedHashMap<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.WINDOWS)) {
            CatalogueRow feature = owner(row, features);
            windows.computeIfAbsent(row.text("feature"), id -> new ArrayList<>())
                    .add(window(row, feature));
        }
        return windows;
    }

    private static FeatureWindow window(CatalogueRow row, CatalogueRow feature)
            throws InvalidCatalogueException {
        Form form = feature.word("form", Form.class);
        checkUse(row, "weight", form, Form.RATIO_OF_WEIGHTED_SUMS);
        checkUse(row, "exponent", form, Form.PRODUCT_OF_POWERS);
        Role role = row.word("role", Role.class);
        Wavelengths.Unit unit = feature.word("window_unit", Wavelengths.Unit.class);
        Window window = Wavelengths.window(row, "low", "high", unit, medium(feature));
        double weight = row.numberOr("weight", 1);
        double exponent = row.numberOr("exponent", 1);
        return row.made(() -> new FeatureWindow(role, window, weight, exponent));
    }

    /** A weight, exponent or coefficient must stand where the form uses it, and nowhere else. */
    private static void checkUse(CatalogueRow row, String column, Form form, Form user)
            throws InvalidCatalogueException {
        boolean given = !row.textOrBlank(column).isEmpty();
        if (given && form != user) {
            throw row.fault(
                    column,
                    "is given",
                    "a blank cell: " + form + " does not use it",
                    "Clear the cell, or use the form " + user + ".");
        }
        if (!given && form == user) {
            throw row.fault(column, "is blank", "a number: " + form + " uses it", "Fill it in.");
        }
    }

    private Map<String, List<Part>> parts(
            CatalogueTables tables, Map<String, CatalogueRow> features)
            throws InvalidCatalogueException {
        Map<String, List<Part>> parts = new LinkedHashMap<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.PARTS)) {
            Form form = owner(row, features).word("form", Form.class);
            checkUse(row, "coefficient", form, Form.LINEAR_COMBINATION_OF_FEATURES);
            PartRole role = row.word("role", PartRole.class);
            String part = ids.named(row, "part");
            double coefficient = row.numberOr("coefficient", 1);
            parts.computeIfAbsent(row.text("feature"), id -> new ArrayList<>())
                    .add(row.made(() -> new Part(role, part, coefficient)));
        }
        return parts;
    }

    /** The row of the feature that a window or part belongs to. */
    private static CatalogueRow owner(CatalogueRow row, Map<String, CatalogueRow> features)
            throws InvalidCatalogueException {
        CatalogueRow feature = features.get(row.text("feature"));
        if (feature == null) {
            throw row.fault(
                    "feature",
                    "unknown feature '" + row.text("feature") + "'",
                    "the id of a feature of the same set of tables",
                    "Correct the id, or add the feature to features/.");
        }
        return feature;
    }

    private Feature feature(
            String id, CatalogueRow row, List<FeatureWindow> windows, List<Part> parts)
            throws InvalidCatalogueException {
        Form form = row.word("form", Form.class);
        checkForm(row, form, windows, parts);
        Source source = sources.of(row);
        String symbol = row.text("symbol");
        Kind kind = row.word("kind", Kind.class);
        String species = row.text("species");
        Statistic statistic = row.wordOr("statistic", Statistic.class, Statistic.MEAN);
        Band band = row.word("band", Band.class);
        OptionalDouble least = row.optionalPositive("min_resolving_power");
        OptionalDouble most = row.optionalPositive("max_resolving_power");
        OptionalDouble smooth = row.optionalPositive("smooth_to_resolving_power");
        HowKnown howKnown = row.howKnown();
        int confidence = row.confidencePercent();
        Sense sense = row.word("sense", Sense.class);
        Purpose purpose = row.word("purpose", Purpose.class);
        Medium medium = medium(row);
        boolean stated = row.word("medium", PrintedMedium.class) != PrintedMedium.UNSTATED;
        return row.made(
                () ->
                        new Feature(
                                id,
                                symbol,
                                kind,
                                form,
                                statistic,
                                species,
                                band,
                                medium,
                                stated,
                                least,
                                most,
                                smooth,
                                source,
                                row.textOrBlank("place"),
                                howKnown,
                                confidence,
                                sense,
                                purpose,
                                row.textOrBlank("note"),
                                windows,
                                parts));
    }

    private static void checkForm(
            CatalogueRow row, Form form, List<FeatureWindow> windows, List<Part> parts)
            throws InvalidCatalogueException {
        String complaint = FormRules.complaint(form, windows, parts).orElse("");
        if (!complaint.isEmpty()) {
            throw row.fault(
                    "form",
                    "feature '" + row.text("id") + "' of form " + form + " " + complaint,
                    "the windows or parts of the form",
                    "Correct its rows in windows/ or parts/, or the form.");
        }
        boolean width = row.word("kind", Kind.class) == Kind.EQUIVALENT_WIDTH;
        if (!form.isMadeOfFeatures() && width != form.isEquivalentWidth()) {
            throw row.fault(
                    "kind",
                    row.text("kind") + " with the form " + form,
                    form.isEquivalentWidth() ? "EQUIVALENT_WIDTH" : "BAND_INDEX",
                    "Correct the kind or the form.");
        }
        boolean noUnit = row.word("window_unit", Wavelengths.Unit.class) == Wavelengths.Unit.NONE;
        if (noUnit != form.isMadeOfFeatures()) {
            throw row.fault(
                    "window_unit",
                    row.text("window_unit") + " with the form " + form,
                    form.isMadeOfFeatures() ? "NONE" : "MICRON or ANGSTROM",
                    "Correct the unit or the form.");
        }
    }

    private static Medium medium(CatalogueRow feature) throws InvalidCatalogueException {
        return feature.word("medium", PrintedMedium.class) == PrintedMedium.AIR
                ? Medium.AIR
                : Medium.VACUUM;
    }
}
