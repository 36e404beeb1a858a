package emberline.reports.survey;

import emberline.measure.Measurement.Measured;
import emberline.spectrum.Candidate;
import emberline.survey.ObjectResult;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** What the diagrams of the page can show beside the columns of the table. */
final class Quantities {

    private static final int DECIMALS = 3;

    private static final List<Index> INDICES =
            List.of(
                    new Index("H-cont", "allers2013/h-cont"),
                    new Index("FeH (z)", "allers2013/feh_z"),
                    new Index("VO (z)", "allers2013/vo_z"),
                    new Index("K I (J)", "allers2013/ki_j"),
                    new Index("H2O (J)", "burgasser2006/h2o-j"),
                    new Index("H2O (H)", "burgasser2006/h2o-h"),
                    new Index("CH4 (J)", "burgasser2006/ch4-j"),
                    new Index("CH4 (H)", "burgasser2006/ch4-h"),
                    new Index("CH4 (K)", "burgasser2006/ch4-k"));

    private static final List<Colour> COLOURS =
            List.of(
                    new Colour("J \u2212 H", "j_mag", "h_mag"),
                    new Colour("H \u2212 K", "h_mag", "k_mag"),
                    new Colour("J \u2212 K", "j_mag", "k_mag"),
                    new Colour("W1 \u2212 W2", "w1_mag", "w2_mag"));

    private Quantities() {}

    /** An index of the catalogue. */
    private record Index(String title, String feature) {}

    /** A difference of two listed magnitudes. */
    private record Colour(String title, String first, String second) {

        Object of(Candidate candidate) {
            OptionalDouble a = candidate.number(first);
            OptionalDouble b = candidate.number(second);
            return a.isPresent() && b.isPresent()
                    ? rounded(a.getAsDouble() - b.getAsDouble())
                    : null;
        }
    }

    /** Titles in the order of the values: each with its definition, for those who hover. */
    static List<List<String>> titles() {
        List<List<String>> titles = new ArrayList<>();
        INDICES.forEach(i -> titles.add(List.of(i.title(), "index " + i.feature())));
        COLOURS.forEach(
                c ->
                        titles.add(
                                List.of(
                                        c.title(),
                                        "listed "
                                                + c.first()
                                                + " \u2212 "
                                                + c.second()
                                                + " (mag)")));
        return titles;
    }

    /** The values of an object; null where there is none. */
    static List<Object> of(ObjectResult result) {
        List<Object> values = new ArrayList<>();
        for (Index index : INDICES) {
            values.add(
                    result.best()
                            .flatMap(best -> best.measured(index.feature()))
                            .map(Measured::value)
                            .map(Quantities::rounded)
                            .orElse(null));
        }
        COLOURS.forEach(colour -> values.add(colour.of(result.candidate())));
        return values;
    }

    private static BigDecimal rounded(double value) {
        return BigDecimal.valueOf(value)
                .setScale(DECIMALS, RoundingMode.HALF_EVEN)
                .stripTrailingZeros();
    }
}
