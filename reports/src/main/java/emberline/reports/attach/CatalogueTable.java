package emberline.reports.attach;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.GravityThreshold;
import emberline.catalogue.GravityThreshold.LowGravityIf;
import emberline.catalogue.Part;
import emberline.catalogue.Relation;
import emberline.catalogue.Source;
import emberline.catalogue.Window;
import emberline.spectrum.SpectralType;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/** The catalogue as a table, and one definition in full. */
public final class CatalogueTable {

    private static final List<String> HEADER =
            List.of(
                    "id",
                    "symbol",
                    "species",
                    "band",
                    "form",
                    "low_micron",
                    "high_micron",
                    "min_resolving_power",
                    "source",
                    "how_known",
                    "confidence_percent");

    private CatalogueTable() {}

    /**
     * The table of definitions.
     *
     * @param features the definitions in the order of the table
     * @param format how it is printed
     * @return the printed table, with a line end
     */
    public static String print(List<Feature> features, TableFormat format) {
        AlignedTable table = new AlignedTable(HEADER);
        features.forEach(feature -> table.add(row(feature)));
        return table.print(format);
    }

    private static List<String> row(Feature feature) {
        return List.of(
                feature.id(),
                feature.symbol(),
                feature.species(),
                feature.band().name(),
                feature.form().name().toLowerCase(Locale.ROOT),
                feature.span().map(Window::lowMicron).map(CatalogueTable::micron).orElse(""),
                feature.span().map(Window::highMicron).map(CatalogueTable::micron).orElse(""),
                whole(feature.minResolvingPower()),
                feature.source().key(),
                feature.howKnown().name().toLowerCase(Locale.ROOT),
                Integer.toString(feature.confidencePercent()));
    }

    private static String micron(double wavelengthMicron) {
        return String.format(Locale.ROOT, "%.5f", wavelengthMicron);
    }

    private static String whole(OptionalDouble value) {
        return value.isPresent() ? String.format(Locale.ROOT, "%.0f", value.getAsDouble()) : "";
    }

    /**
     * One definition with its windows, source, relations and thresholds.
     *
     * @param feature the definition
     * @param catalogue where its relations and thresholds stand
     * @return text of several lines, with a line end
     */
    public static String printOne(Feature feature, FeatureCatalogue catalogue) {
        StringBuilder text = new StringBuilder();
        line(text, feature.id(), feature.symbol() + ", " + feature.species());
        line(text, "  form", feature.form().name().toLowerCase(Locale.ROOT));
        line(text, "  source", cite(feature.source(), feature.place()));
        line(
                text,
                "  how known",
                words(feature.howKnown()) + ", " + feature.confidencePercent() + "% sure");
        line(
                text,
                "  printed in",
                feature.printedMedium().word() + (feature.mediumStated() ? "" : " (not stated)"));
        if (feature.minResolvingPower().isPresent()) {
            line(text, "  needs R", whole(feature.minResolvingPower()));
        }
        if (feature.smoothToResolvingPower().isPresent()) {
            line(text, "  smoothed to R", whole(feature.smoothToResolvingPower()));
        }
        for (FeatureWindow part : feature.windows()) {
            line(text, "  " + part.role().name().toLowerCase(Locale.ROOT), window(part));
        }
        for (Part part : feature.parts()) {
            line(text, "  " + part.role().name().toLowerCase(Locale.ROOT), part.feature());
        }
        relations(text, feature, catalogue);
        thresholds(text, feature, catalogue);
        if (!feature.note().isBlank()) {
            line(text, "  note", feature.note());
        }
        return text.toString();
    }

    private static String window(FeatureWindow part) {
        String text =
                micron(part.window().lowMicron())
                        + " to "
                        + micron(part.window().highMicron())
                        + " micron, vacuum";
        if (part.weight() != 1) {
            text += ", weight " + part.weight();
        }
        return part.exponent() == 1 ? text : text + ", exponent " + part.exponent();
    }

    private static void relations(StringBuilder text, Feature feature, FeatureCatalogue catalogue) {
        for (Relation relation : catalogue.relations()) {
            if (relation.feature().equals(feature.id())) {
                line(text, "  relation", relation.id() + ", " + words(relation.quantity()));
            }
        }
    }

    /**
     * One relation with its coefficients, ranges and source.
     *
     * @param relation the relation
     * @return text of several lines, with a line end
     */
    public static String printOne(Relation relation) {
        StringBuilder text = new StringBuilder();
        line(text, relation.id(), words(relation.quantity()) + " from " + relation.feature());
        String argument = relation.argumentOffset() == 0 ? "x" : "x - " + relation.argumentOffset();
        line(
                text,
                "  coefficients",
                relation.coefficients() + ", ascending powers of " + argument + ", as printed");
        if (relation.printedScaleOffset() != 0 || relation.printedScaleFactor() != 1) {
            line(
                    text,
                    "  common scale",
                    relation.printedScaleOffset()
                            + " + "
                            + relation.printedScaleFactor()
                            + " times the printed value");
        }
        line(text, "  index range", range(relation.validIndexMin(), relation.validIndexMax()));
        line(text, "  type range", range(relation.validTypeMin(), relation.validTypeMax()));
        line(
                text,
                "  rms",
                relation.rms().isPresent() ? "" + relation.rms().getAsDouble() : "not printed");
        line(text, "  made for", words(relation.population()) + " objects");
        line(text, "  on known types", words(relation.verdict()));
        line(text, "  source", cite(relation.source(), relation.place()));
        line(
                text,
                "  how known",
                words(relation.howKnown()) + ", " + relation.confidencePercent() + "% sure");
        if (!relation.note().isBlank()) {
            line(text, "  note", relation.note());
        }
        return text.toString();
    }

    private static String range(OptionalDouble low, OptionalDouble high) {
        return (low.isPresent() ? "" + low.getAsDouble() : "open")
                + " to "
                + (high.isPresent() ? "" + high.getAsDouble() : "open");
    }

    private static String words(Enum<?> constant) {
        return constant.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }

    private static void thresholds(
            StringBuilder text, Feature feature, FeatureCatalogue catalogue) {
        List<GravityThreshold> scored =
                catalogue.gravityThresholds().stream()
                        .filter(threshold -> threshold.feature().equals(feature.id()))
                        .toList();
        for (GravityThreshold limit : scored) {
            line(
                    text,
                    "  gravity at " + new SpectralType(limit.typeNumber()).code(),
                    String.format(
                            Locale.ROOT,
                            "INT-G %s, VL-G %s (%s)",
                            side(limit, limit.intermediate()),
                            side(limit, limit.veryLow()),
                            limit.source().key()));
        }
    }

    private static String side(GravityThreshold limit, double value) {
        String sign = limit.lowGravityIf() == LowGravityIf.BELOW ? "<= " : ">= ";
        return sign + String.format(Locale.ROOT, "%.3f", value);
    }

    private static String cite(Source source, String place) {
        return source.cite() + (place.isBlank() ? "" : ", " + place);
    }

    private static void line(StringBuilder text, String name, String value) {
        text.append(String.format(Locale.ROOT, "%-22s%s%n", name, value).replace("\r", ""));
    }
}
