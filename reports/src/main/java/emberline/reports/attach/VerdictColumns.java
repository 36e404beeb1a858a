package emberline.reports.attach;

import emberline.place.GravityClass;
import emberline.reports.attach.ResultColumn.Content;
import emberline.spectrum.SpectralType;
import emberline.survey.ObjectResult;
import emberline.survey.verdict.Verdict;
import emberline.survey.verdict.VerdictCall;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import java.util.function.Function;

/**
 * The columns of the results table with an observer's verdict, and with what holds in the end: the
 * observer's word where there is one, else that of the program, whose own columns stay as they are.
 */
final class VerdictColumns {

    private VerdictColumns() {}

    /**
     * The columns in their order.
     *
     * @param program the columns of the program, {@code type, type_number, gravity, kind} and
     *     {@code decision} among them
     */
    static List<ResultColumn> all(List<ResultColumn> program) {
        List<ResultColumn> columns = new ArrayList<>();
        columns.add(
                said(
                        "verdict",
                        "what an observer calls the object: " + VerdictCall.words(),
                        v -> v.call().map(VerdictCall::word).orElse("")));
        columns.add(said("verdict_type", "spectral type by the observer", Verdict::type));
        columns.add(
                said(
                        "verdict_gravity",
                        "gravity class by the observer",
                        v -> v.gravity().map(GravityClass::label).orElse("")));
        columns.add(said("verdict_note", "note of the observer", Verdict::note));
        columns.add(held("final_kind", "kind", named(program, "kind"), Verdict::kind));
        ResultColumn type = named(program, "type");
        columns.add(held("final_type", "type", type, Verdict::type));
        columns.add(typeNumber(type, named(program, "type_number")));
        columns.add(held("final_gravity", "gravity", named(program, "gravity"), Verdict::gravity));
        columns.add(
                held("final_decision", "decision", named(program, "decision"), Verdict::decision));
        columns.add(
                text(
                        "final_by",
                        "whose word the final columns are: observer where the observer calls the"
                                + " object or gives a type or a gravity class, else program",
                        r ->
                                r.verdict().filter(VerdictColumns::isCall).isPresent()
                                        ? "observer"
                                        : "program"));
        return columns;
    }

    /** A note alone overrides nothing. */
    private static boolean isCall(Verdict verdict) {
        return verdict.call().isPresent()
                || !verdict.type().isEmpty()
                || verdict.gravity().isPresent();
    }

    private static ResultColumn named(List<ResultColumn> columns, String name) {
        return columns.stream().filter(c -> c.name().equals(name)).findFirst().orElseThrow();
    }

    private static ResultColumn said(
            String name, String description, Function<Verdict, String> take) {
        return text(
                name,
                description + "; empty where nothing is said",
                r -> r.verdict().map(take).orElse(""));
    }

    private static ResultColumn held(
            String name,
            String what,
            ResultColumn measured,
            BiFunction<Verdict, String, String> take) {
        return text(
                name,
                what + " by the observer where the verdict says or sets it aside, else by program",
                r -> {
                    String program = measured.text(r);
                    return r.verdict().map(v -> take.apply(v, program)).orElse(program);
                });
    }

    /** The number of the final type; none for a type off the scale. */
    private static ResultColumn typeNumber(ResultColumn type, ResultColumn number) {
        return new ResultColumn(
                        "final_type_number",
                        "subclass",
                        "final_type on the scale M0 = 0, L0 = 10, T0 = 20, Y0 = 30; empty where it is none"
                                + " of K, M, L, T or Y",
                        Content.NUMBER,
                        r -> {
                            String program = type.text(r);
                            String held = r.verdict().map(v -> v.type(program)).orElse(program);
                            if (r.verdict().filter(v -> !v.type().isEmpty()).isEmpty()) {
                                return held.isEmpty() ? "" : number.text(r);
                            }
                            return SpectralType.parse(held)
                                    .map(t -> Digits.type(t.number()))
                                    .orElse("");
                        })
                .withUcd("src.spType");
    }

    private static String ucd(String name) {
        if (name.endsWith("_type")) {
            return "src.spType";
        }
        return name.endsWith("_note") || name.endsWith("_by") ? "meta.note" : "src.class";
    }

    private static ResultColumn text(
            String name, String description, Function<ObjectResult, String> take) {
        return new ResultColumn(name, "", description, Content.TEXT, take).withUcd(ucd(name));
    }
}
