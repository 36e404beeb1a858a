package emberline.place.pair;

import emberline.read.ProductTable;
import java.util.List;

/**
 * How a paper counts its criteria.
 *
 * @param source key of the paper
 * @param leastTypeNumber earliest composite type for which the criteria are printed
 * @param greatestTypeNumber latest one
 * @param candidateFrom number of criteria that make a candidate
 * @param weakFrom number of criteria that make a weak candidate
 */
record PairScheme(
        String source,
        double leastTypeNumber,
        double greatestTypeNumber,
        int candidateFrom,
        int weakFrom) {

    private static final String RESOURCE = "/emberline/place/pair/schemes.csv";

    /** The schemes of the resource. */
    static List<PairScheme> standard() {
        return ProductTable.at(RESOURCE).rows().stream()
                .map(
                        row ->
                                new PairScheme(
                                        row.getField("source"),
                                        Double.parseDouble(row.getField("least_type_number")),
                                        Double.parseDouble(row.getField("greatest_type_number")),
                                        Integer.parseInt(row.getField("candidate_from")),
                                        Integer.parseInt(row.getField("weak_from"))))
                .toList();
    }
}
