package emberline.reports.attach;

import emberline.place.TypeEstimate;
import emberline.place.standard.PairFit;
import emberline.place.standard.StandardMatch;
import emberline.place.standard.StandardVerdict;
import emberline.reports.attach.ResultColumn.Content;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** The columns of the results table that say what the comparison with standards gave. */
final class StandardColumns {

    private StandardColumns() {}

    static List<ResultColumn> all() {
        List<ResultColumn> columns = new ArrayList<>();
        columns.add(
                text(
                        "standard_type",
                        "src.spType",
                        "type by the observer's standards that fit best; empty without standards",
                        r -> type(r).map(TypeText::code)));
        columns.add(
                number(
                        "standard_type_sigma",
                        "stat.error;src.spType",
                        "subclass",
                        "one-sigma error of the type by standards",
                        r -> type(r).map(t -> Digits.type(t.sigmaSubclass()))));
        columns.add(
                text(
                        "best_standard",
                        "meta.id",
                        "the standard that fits best over all ranges together",
                        r -> best(r).map(m -> m.first().name())));
        columns.add(
                number(
                        "best_standard_chi2",
                        "stat.fit.chi2",
                        "",
                        "its reduced chi-square",
                        r -> best(r).map(m -> Digits.fixed(m.reducedChiSquare(), 2))));
        addPair(columns);
        return List.copyOf(columns);
    }

    private static void addPair(List<ResultColumn> columns) {
        columns.add(
                text(
                        "pair_standards",
                        "meta.code;src.class",
                        "whether the sum of two standards fits better than a single one: candidate,"
                                + " unsure (better, but not known to be rarer among single objects"
                                + " than 1 in 20) or none",
                        r -> pair(r).map(fit -> fit.outcome().word())));
        columns.add(
                text(
                        "pair_standards_types",
                        "src.spType",
                        "the types of the best sum",
                        r -> pair(r).map(fit -> StandardsText.types(fit.pair()))));
        columns.add(
                number(
                        "pair_standards_f_test",
                        "stat.probability",
                        "",
                        "confidence by the F test that the sum fits better",
                        r -> pair(r).map(fit -> Digits.probability(fit.confidence()))));
        columns.add(
                number(
                        "pair_standards_false_alarm",
                        "stat.probability",
                        "",
                        "share of single standards that a sum of the others improves as much",
                        r -> pair(r).flatMap(StandardColumns::falseAlarm)));
    }

    private static Optional<String> falseAlarm(PairFit fit) {
        return fit.pFalseAlarm().isPresent()
                ? Optional.of(Digits.probability(fit.pFalseAlarm().getAsDouble()))
                : Optional.empty();
    }

    private static ResultColumn text(
            String name,
            String ucd,
            String description,
            Function<ObjectResult, Optional<String>> take) {
        return column(name, "", description, Content.TEXT, take).withUcd(ucd);
    }

    private static ResultColumn number(
            String name,
            String ucd,
            String unit,
            String description,
            Function<ObjectResult, Optional<String>> take) {
        return column(name, unit, description, Content.NUMBER, take).withUcd(ucd);
    }

    private static ResultColumn column(
            String name,
            String unit,
            String description,
            Content content,
            Function<ObjectResult, Optional<String>> take) {
        return new ResultColumn(
                name, unit, description, content, result -> take.apply(result).orElse(""));
    }

    private static Optional<TypeEstimate> type(ObjectResult result) {
        return result.standards().flatMap(StandardVerdict::type);
    }

    private static Optional<StandardMatch> best(ObjectResult result) {
        return result.standards().flatMap(verdict -> verdict.best().stream().findFirst());
    }

    private static Optional<PairFit> pair(ObjectResult result) {
        return result.standards().flatMap(StandardVerdict::pair);
    }
}
