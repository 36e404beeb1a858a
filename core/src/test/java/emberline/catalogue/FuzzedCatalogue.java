package emberline.catalogue;

import java.io.FileNotFoundException;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.NavigableMap;
import java.util.TreeMap;

/** Any text as the tables of a user: a catalogue or the declared exception. */
public final class FuzzedCatalogue {

    private static final CatalogueContent STANDARD = standard();

    private FuzzedCatalogue() {}

    private static CatalogueContent standard() {
        try {
            return CatalogueLoader.load(new ResourceTables(), CatalogueContent.empty());
        } catch (InvalidCatalogueException e) {
            throw new IllegalStateException(e);
        }
    }

    /** Loads tables, each of which begins with a line {@code == NAME}. */
    public static void tables(byte[] input) {
        NavigableMap<String, String> tables = new TreeMap<>();
        for (String part : new String(input, StandardCharsets.UTF_8).split("(?m)^== ", -1)) {
            int end = part.indexOf('\n');
            if (end > 0) {
                tables.put(part.substring(0, end).trim(), part.substring(end + 1));
            }
        }
        try {
            CatalogueLoader.load(new Tables(tables), STANDARD);
        } catch (InvalidCatalogueException e) {
            if (e.getMessage().isBlank()) {
                throw new AssertionError("a failure without words", e);
            }
        }
    }

    private record Tables(NavigableMap<String, String> texts) implements CatalogueTables {

        @Override
        public List<String> files() {
            return List.copyOf(texts.keySet());
        }

        @Override
        public String text(String file) throws IOException {
            String text = texts.get(file);
            if (text == null) {
                throw new FileNotFoundException(file);
            }
            return text;
        }

        @Override
        public String label(String file) {
            return "fuzzed " + file;
        }
    }
}
