package emberline.reports.paint;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;

/**
 * Makes drawing possible on a machine without a screen, without fonts and without fontconfig: Java
 * refuses even a font file of our own where it finds no font of the system. Before any drawing
 * class is loaded, a font of the product is written to a temporary folder together with a table
 * that gives it for every logical font, and the system property {@value #TABLE_PROPERTY} is set to
 * that table. On systems other than Linux, and where the property is set already, nothing is done.
 */
public final class HeadlessFonts {

    private static final String TABLE_PROPERTY = "sun.awt.fontconfig";
    private static final String HEADLESS_PROPERTY = "java.awt.headless";
    private static final String FAMILY = "DejaVu Sans Condensed";
    private static final List<String> LOGICAL =
            List.of("serif", "sansserif", "monospaced", "dialog", "dialoginput");
    private static final List<String> STYLES = List.of("plain", "bold", "italic", "bolditalic");

    private HeadlessFonts() {}

    /**
     * Sets the system properties, once. Call it before any other class of {@code java.awt} is used.
     *
     * @throws UncheckedIOException if the temporary folder cannot be written to
     */
    public static synchronized void prepare() {
        if (System.getProperty(HEADLESS_PROPERTY) == null) {
            System.setProperty(HEADLESS_PROPERTY, "true");
        }
        boolean linux =
                System.getProperty("os.name", "").toLowerCase(Locale.ROOT).contains("linux");
        if (!linux || System.getProperty(TABLE_PROPERTY) != null) {
            return;
        }
        try {
            Path folder = Files.createTempDirectory("emberline-fonts");
            Path font = folder.resolve("DejaVuSansCondensed.ttf");
            try (InputStream stream = Face.SANS.open()) {
                Files.copy(stream, font);
            }
            Path table = folder.resolve("fontconfig.properties");
            Files.writeString(table, table(font), StandardCharsets.ISO_8859_1);
            folder.toFile().deleteOnExit();
            font.toFile().deleteOnExit();
            table.toFile().deleteOnExit();
            System.setProperty(TABLE_PROPERTY, table.toString());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static String table(Path font) {
        StringBuilder text = new StringBuilder("version=1\nsequence.allfonts=default\n");
        for (String logical : LOGICAL) {
            for (String style : STYLES) {
                text.append(logical)
                        .append('.')
                        .append(style)
                        .append(".default=")
                        .append(FAMILY)
                        .append('\n');
            }
        }
        return text.append("filename.")
                .append(FAMILY.replace(' ', '_'))
                .append('=')
                .append(font)
                .append('\n')
                .toString();
    }
}
