package emberline.reports.paint;

import java.awt.Font;
import java.awt.FontFormatException;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;

/** The fonts of reports: faces of DejaVu, from a dependency of the product. */
public enum Face {
    /** For figures, tables and labels. */
    SANS("DejaVuSansCondensed.ttf"),
    /** For headings. */
    SANS_BOLD("DejaVuSansCondensed-Bold.ttf"),
    /** For remarks. */
    SANS_ITALIC("DejaVuSansCondensed-Oblique.ttf"),
    /** For running text. */
    SERIF("DejaVuSerifCondensed.ttf"),
    /** For names and titles. */
    SERIF_BOLD("DejaVuSerifCondensed-Bold.ttf");

    private static final String FOLDER = "/net/sf/jasperreports/fonts/dejavu/";

    private final String file;

    Face(String file) {
        this.file = file;
    }

    /**
     * The font file.
     *
     * @return a stream of the bytes of a TrueType font; the caller closes it
     * @throws IOException if the product is damaged
     */
    public InputStream open() throws IOException {
        InputStream stream = Face.class.getResourceAsStream(FOLDER + file);
        if (stream == null) {
            throw new FileNotFoundException(
                    FOLDER
                            + file
                            + ": not on the class path; expected the jar jasperreports-fonts in the"
                            + " lib folder. Install the product anew");
        }
        return stream;
    }

    /**
     * The font for drawing.
     *
     * @return the font at one point
     * @throws UncheckedIOException if the product is damaged
     */
    public Font awt() {
        HeadlessFonts.prepare();
        try (InputStream stream = open()) {
            return Font.createFont(Font.TRUETYPE_FONT, stream);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (FontFormatException e) {
            throw new UncheckedIOException(new IOException(FOLDER + file, e));
        }
    }
}
