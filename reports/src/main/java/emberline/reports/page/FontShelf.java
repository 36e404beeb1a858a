package emberline.reports.page;

import emberline.reports.paint.Face;
import java.io.IOException;
import java.io.InputStream;
import java.util.EnumMap;
import java.util.Map;
import java.util.concurrent.ConcurrentLinkedQueue;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;

/**
 * Parsed font files, lent to one document at a time: a parsed font is slow to make and not safe for
 * several threads.
 */
final class FontShelf {

    private final ConcurrentLinkedQueue<Map<Face, TrueTypeFont>> free =
            new ConcurrentLinkedQueue<>();

    /** A set of fonts that nobody else uses until it is given back. */
    Map<Face, TrueTypeFont> borrow() throws IOException {
        Map<Face, TrueTypeFont> fonts = free.poll();
        if (fonts != null) {
            return fonts;
        }
        Map<Face, TrueTypeFont> parsed = new EnumMap<>(Face.class);
        for (Face face : Face.values()) {
            try (InputStream stream = face.open()) {
                TrueTypeFont font = new TTFParser().parse(new RandomAccessReadBuffer(stream));
                font.setEnableGsub(false); // ligatures are as wide as nobody measured
                parsed.put(face, font);
            }
        }
        return parsed;
    }

    void giveBack(Map<Face, TrueTypeFont> fonts) {
        free.add(fonts);
    }
}
