package emberline.reports.paint;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Properties;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class HeadlessFontsTest {

    @Test
    void theTableGivesAFontFileForEveryLogicalFont() throws IOException {
        assumeTrue(System.getProperty("os.name").contains("Linux"), "for Linux only");
        HeadlessFonts.prepare();
        Path table = Path.of(System.getProperty("sun.awt.fontconfig"));
        Properties properties = new Properties();
        try (InputStream stream = Files.newInputStream(table)) {
            properties.load(stream);
        }
        String family = properties.getProperty("dialog.bolditalic.default");
        String file = properties.getProperty("filename." + family.replace(' ', '_'));
        assertTrue(Files.size(Path.of(file)) > 100_000, file);
        String before = System.getProperty("sun.awt.fontconfig");
        HeadlessFonts.prepare();
        assertEquals(before, System.getProperty("sun.awt.fontconfig"));
    }

    @ParameterizedTest
    @EnumSource(Face.class)
    void everyFaceIsThereWithTheSignsOfTheTrade(Face face) {
        assertEquals(-1, face.awt().canDisplayUpTo("µ±Åλα₂₄⊕−–…·²"));
    }
}
