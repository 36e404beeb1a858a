package emberline.judge;

import emberline.spectrum.MagnitudeBand;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/** All relations of {@code relations.csv}: quantity, band and sequence name one. */
final class PropertyRelations {

    /** What a relation gives. */
    enum Quantity {
        /** Effective temperature (K) by type. */
        TEFF,
        /** log10 of the luminosity (solar) by type. */
        LOG_L,
        /** Absolute magnitude by type. */
        ABS_MAG,
        /** Bolometric correction (mag) by type. */
        BC,
        /** log10 of the luminosity (solar) by absolute magnitude. */
        LOG_L_FROM_MAG
    }

    private static final int COEFFICIENTS = 8;

    private final Map<Quantity, Map<String, Map<Sequence, TypeRelation>>> relations =
            new EnumMap<>(Quantity.class);

    PropertyRelations() {
        JudgeTable.rows(
                "relations.csv",
                row -> {
                    double[] coefficients = new double[COEFFICIENTS];
                    for (int k = 0; k < COEFFICIENTS; k++) {
                        coefficients[k] = JudgeTable.number(row, "c" + k, 0);
                    }
                    int last = COEFFICIENTS;
                    while (last > 1 && coefficients[last - 1] == 0) {
                        last--;
                    }
                    TypeRelation.Piece piece =
                            new TypeRelation.Piece(
                                    JudgeTable.number(row, "low"),
                                    JudgeTable.number(row, "high"),
                                    JudgeTable.number(row, "x0"),
                                    Arrays.copyOf(coefficients, last),
                                    JudgeTable.number(row, "rms"));
                    Sequence sequence = Sequence.valueOf(row.getField("sequence"));
                    relations
                            .computeIfAbsent(
                                    Quantity.valueOf(row.getField("quantity")),
                                    q -> new HashMap<>())
                            .computeIfAbsent(
                                    row.getField("band"), band -> new EnumMap<>(Sequence.class))
                            .computeIfAbsent(sequence, one -> new TypeRelation())
                            .add(piece);
                    return sequence;
                });
    }

    private Optional<TypeRelation> find(Quantity quantity, String band, Sequence sequence) {
        return Optional.ofNullable(relations.get(quantity).get(band))
                .map(bySequence -> bySequence.get(sequence));
    }

    /** A relation without a band at a type, the field's where the sequence has none there. */
    Optional<TypeRelation> at(Quantity quantity, Sequence sequence, double x) {
        return at(quantity, "", sequence, x);
    }

    /** A relation of a band at a type or magnitude, the field's where the sequence has none. */
    Optional<TypeRelation> at(Quantity quantity, MagnitudeBand band, Sequence sequence, double x) {
        return at(quantity, band.name(), sequence, x);
    }

    private Optional<TypeRelation> at(Quantity quantity, String band, Sequence sequence, double x) {
        Optional<TypeRelation> own = find(quantity, band, sequence).filter(r -> r.covers(x));
        return own.isPresent()
                ? own
                : find(quantity, band, Sequence.FIELD).filter(r -> r.covers(x));
    }
}
