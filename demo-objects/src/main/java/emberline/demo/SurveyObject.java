package emberline.demo;

import java.util.List;
import java.util.OptionalDouble;

/**
 * One object of the invented survey: what it truly is, where it stands and how bright it is.
 *
 * @param name its invented name
 * @param recipe how its spectrum is made; empty for a single cool dwarf
 * @param typeNumber its type, M0 = 0; empty where it has none on the scale of cool dwarfs
 * @param gravity {@code FLD-G}, {@code INT-G}, {@code VL-G}, or empty for what is no dwarf
 * @param lithium optical depth of the Li I line
 * @param avMag reddening in front of it, A_V (mag)
 * @param row its row in {@code objects.csv}
 */
record SurveyObject(
        String name,
        String recipe,
        OptionalDouble typeNumber,
        String gravity,
        double lithium,
        double avMag,
        DemoTable.Row row) {

    /** All objects in the order of {@code objects.csv}. */
    static List<SurveyObject> all() {
        return DemoTable.named("objects.csv").rows().stream().map(SurveyObject::of).toList();
    }

    private static SurveyObject of(DemoTable.Row row) {
        OptionalDouble type =
                row.isBlank("type_number")
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(row.number("type_number"));
        return new SurveyObject(
                row.text("name"),
                row.text("recipe"),
                type,
                row.text("gravity"),
                row.number("lithium", 0),
                row.number("av_mag", 0),
                row);
    }

    /** A field dwarf without a place in the survey, for tests: nothing but type and gravity. */
    static SurveyObject dwarf(double typeNumber, String gravity) {
        return new SurveyObject("", "", OptionalDouble.of(typeNumber), gravity, 0, 0, null);
    }

    /** Whether it is a single cool dwarf. */
    boolean isDwarf() {
        return recipe.isEmpty();
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
