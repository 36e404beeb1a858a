package emberline.demo;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One object of the invented survey: what it truly is, where it stands and how bright it is.
 *
 * @param name its invented name
 * @param recipe how its spectrum is made; empty for a single cool dwarf
 * @param typeNumber its type, M0 = 0; empty where it has none on the scale of cool dwarfs
 * @param gravity {@code FLD-G}, {@code INT-G}, {@code VL-G}, or empty for what is no dwarf
 * @param pairTypeNumber type of an unresolved companion at the same distance; empty where single
 * @param lithium optical depth of the Li I line
 * @param avMag reddening in front of it, A_V (mag)
 * @param row its row in {@code objects.csv}
 */
record SurveyObject(
        String name,
        String recipe,
        OptionalDouble typeNumber,
        String gravity,
        OptionalDouble pairTypeNumber,
        double lithium,
        double avMag,
        DemoTable.Row row) {

    /** All objects in the order of {@code objects.csv}. */
    static List<SurveyObject> all() {
        return DemoTable.named("objects.csv").rows().stream().map(SurveyObject::of).toList();
    }

    private static SurveyObject of(DemoTable.Row row) {
        return new SurveyObject(
                row.text("name"),
                row.text("recipe"),
                optional(row, "type_number"),
                row.text("gravity"),
                optional(row, "pair_type_number"),
                row.number("lithium", 0),
                row.number("av_mag", 0),
                row);
    }

    private static OptionalDouble optional(DemoTable.Row row, String column) {
        return row.isBlank(column) ? OptionalDouble.empty() : OptionalDouble.of(row.number(column));
    }

    /** The names of the lists in the order of their objects, without the ending of a file. */
    static List<String> lists() {
        return all().stream().map(SurveyObject::list).distinct().toList();
    }

    /** A field dwarf without a place in the survey, for tests: nothing but type and gravity. */
    static SurveyObject dwarf(double typeNumber, String gravity) {
        return made("", typeNumber, gravity, 0, 0);
    }

    /**
     * An object without a place in the survey, for tests.
     *
     * @param recipe how its spectrum is made; empty for a single cool dwarf
     * @param typeNumber its type, M0 = 0
     * @param gravity its gravity class
     * @param lithium optical depth of the Li I line
     * @param avMag reddening in front of it, A_V (mag)
     * @return the object
     */
    static SurveyObject made(
            String recipe, double typeNumber, String gravity, double lithium, double avMag) {
        return new SurveyObject(
                "",
                recipe,
                OptionalDouble.of(typeNumber),
                gravity,
                OptionalDouble.empty(),
                lithium,
                avMag,
                null);
    }

    /** One of the two objects of a pair, as if it were alone. */
    SurveyObject component(double type) {
        return new SurveyObject(
                name,
                recipe,
                OptionalDouble.of(type),
                gravity,
                OptionalDouble.empty(),
                lithium,
                avMag,
                row);
    }

    /** Whether it is a cool dwarf of solar metallicity, which needs no recipe. */
    boolean isDwarf() {
        return recipe.isEmpty();
    }

    /** The class of metallicity of a cool dwarf: {@code d}, {@code sd} or {@code esd}. */
    Optional<String> metallicity() {
        return switch (recipe) {
            case "" -> Optional.of("d");
            case "sd", "esd" -> Optional.of(recipe);
            default -> Optional.empty();
        };
    }

    /** The radial velocity that its spectra hold (km/s); empty where they are at rest. */
    OptionalDouble radialVelocityKms() {
        return optional(row, "rv_kms");
    }

    /** Whether the list states its radial velocity. */
    boolean isVelocityListed() {
        return row.text("rv_listed").equals("yes");
    }

    /** The list in which it stands, without the ending of a file. */
    String list() {
        return row.isBlank("list") ? "candidates" : row.text("list");
    }

    /** 0 for field gravity, 0.5 for intermediate, 1 for very low. */
    double lowGravity() {
        return switch (gravity) {
            case "VL-G" -> 1;
            case "INT-G" -> 0.5;
            default -> 0;
        };
    }
}
