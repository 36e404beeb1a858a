package emberline.judge;

import java.util.ArrayList;
import java.util.List;

/** A relation in pieces, each a polynomial with its scatter and its source. */
final class TypeRelation {

    /** One piece, good from {@code low} to {@code high}. */
    static final class Piece {
        private final double low;
        private final double high;
        private final double origin;
        private final double[] coefficients;
        private final double rms;

        Piece(double low, double high, double origin, double[] coefficients, double rms) {
            this.low = low;
            this.high = high;
            this.origin = origin;
            this.coefficients = coefficients.clone();
            this.rms = rms;
        }

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
            if (x >= piece.low && x <= piece.high) {
                return piece;
            }
        }
        throw new IllegalArgumentException("no piece of the relation covers " + x);
    }

    boolean covers(double x) {
        for (Piece piece : pieces) {
            if (x >= piece.low && x <= piece.high) {
                return true;
            }
        }
        return false;
    }

    /** The value; only where it covers. */
    double at(double x) {
        return piece(x).at(x);
    }

    /** One-sigma scatter about it; only where it covers. */
    double rms(double x) {
        return piece(x).rms;
    }
}
