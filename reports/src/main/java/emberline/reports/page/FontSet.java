package emberline.reports.page;

import de.rototor.pdfbox.graphics2d.PdfBoxGraphics2DFontTextDrawer;
import emberline.reports.paint.Face;
import java.awt.Font;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.Map;
import org.apache.fontbox.ttf.CmapLookup;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.pdmodel.font.PDType0Font;

/** The fonts of one document: widths of texts, and which characters can be written. */
final class FontSet {

    /** Stands for a character that the fonts do not have. */
    private static final char MISSING = '\u25A1';

    private final Map<Face, PDFont> fonts = new EnumMap<>(Face.class);
    private final Map<Face, CmapLookup> glyphs = new EnumMap<>(Face.class);

    /** Widths of single characters, in thousandths of the size, once they are asked for. */
    private final Map<Face, Map<Integer, Float>> widths = new EnumMap<>(Face.class);

    FontSet(PDDocument document, Map<Face, TrueTypeFont> files) throws IOException {
        for (Map.Entry<Face, TrueTypeFont> file : files.entrySet()) {
            fonts.put(file.getKey(), PDType0Font.load(document, file.getValue(), true));
            glyphs.put(file.getKey(), file.getValue().getUnicodeCmapLookup());
            widths.put(file.getKey(), new HashMap<>());
        }
    }

    PDFont font(Face face) {
        return fonts.get(face);
    }

    /** Lets charts write their labels as text in these fonts. */
    PdfBoxGraphics2DFontTextDrawer textDrawer(Map<Face, Font> drawn) {
        PdfBoxGraphics2DFontTextDrawer drawer = new PdfBoxGraphics2DFontTextDrawer();
        drawn.forEach((face, font) -> drawer.registerFont(font.getFontName(), fonts.get(face)));
        return drawer;
    }

    /**
     * The text as the font can write it: blanks for control characters, a box for what it lacks.
     */
    String clean(Face face, String text) {
        CmapLookup known = glyphs.get(face);
        StringBuilder clean = new StringBuilder(text.length());
        text.codePoints()
                .forEach(
                        sign -> {
                            if (Character.isWhitespace(sign) || Character.isISOControl(sign)) {
                                clean.append(' ');
                            } else if (Character.getType(sign) != Character.FORMAT) {
                                boolean missing = known.getGlyphId(sign) == 0;
                                clean.appendCodePoint(missing ? MISSING : sign);
                            }
                        });
        return clean.toString();
    }

    /** The width of a text that the font can write (point): its characters stand side by side. */
    float width(Face face, String text, float sizePoint) {
        Map<Integer, Float> ofFace = widths.get(face);
        float sum = 0;
        for (int i = 0; i < text.length(); ) {
            int sign = text.codePointAt(i);
            Float width = ofFace.get(sign);
            if (width == null) {
                width = measured(face, sign);
                ofFace.put(sign, width);
            }
            sum += width;
            i += Character.charCount(sign);
        }
        return sum / 1000 * sizePoint;
    }

    private float measured(Face face, int sign) {
        try {
            return fonts.get(face).getStringWidth(Character.toString(sign));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
