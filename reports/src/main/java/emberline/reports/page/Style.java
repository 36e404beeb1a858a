package emberline.reports.page;

import emberline.reports.paint.Face;
import java.awt.Color;

/**
 * How a text is set.
 *
 * @param face the font
 * @param sizePoint its size (point)
 * @param leadingPoint distance of its lines (point)
 * @param colour its colour
 */
record Style(Face face, float sizePoint, float leadingPoint, Color colour) {

    Style in(Color other) {
        return new Style(face, sizePoint, leadingPoint, other);
    }

    Style with(Face other) {
        return new Style(other, sizePoint, leadingPoint, colour);
    }
}
