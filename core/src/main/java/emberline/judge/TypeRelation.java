package emberline.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/** A relation in pieces, each a polynomial with its scatter and its source. */
final class TypeRelation {

    /** One piece, good from {@code low} to {@code high}. */
    record Piece(
            double low, double high, double origin, double[] coefficients, double rms, String source) {

        double at(double x) {
            double value = 0;
            for (int k = coefficients.length - 1; k >= 0; k--) {
                value = value * (x - origin) + coefficients[k];
            }
            return value;
        }
    }

    private final List<Piece> pieces = new ArrayList<>();

    void add(Piece piece) {
        pieces.add(piece);
    }

    private Piece piece(double x) {
        for (Piece piece : pieces) {
            if (x >= piece.low() && x <= piece.high()) {
                return piece;
            }
        }
        throw new IllegalArgumentException("no piece of the relation covers " + x);
    }

    boolean covers(double x) {
        return pieces.stream().anyMatch(piece -> x >= piece.low() && x <= piece.high());
    }

    /** The value; only where it covers. */
    double at(double x) {
        return piece(x).at(x);
    }

    /** One-sigma scatter about it; only where it covers. */
    double rms(double x) {
        return piece(x).rms();
    }

    /** Keys of the sources of its pieces. */
    Set<String> sources() {
        Set<String> keys = new TreeSet<>();
        pieces.forEach(piece -> keys.add(piece.source()));
        return keys;
    }
}
