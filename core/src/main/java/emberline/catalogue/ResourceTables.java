package emberline.catalogue;

import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** The tables that ship with the product; {@code files.csv} lists them, as a jar cannot. */
final class ResourceTables implements CatalogueTables {

    private static final String LIST = "files.csv";

    private final List<String> files;

    ResourceTables() throws InvalidCatalogueException {
        files =
                CatalogueTable.read(this, LIST, List.of("file"), List.of()).stream()
                        .map(row -> row.textOrBlank("file"))
                        .toList();
    }

    @Override
    public List<String> files() {
        return files;
    }

    @Override
    public String text(String file) throws IOException {
        try (InputStream stream = ResourceTables.class.getResourceAsStream(file)) {
            if (stream == null) {
                throw new FileNotFoundException(label(file) + ": no such resource");
            }
            return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    @Override
    public String label(String file) {
        return file.isEmpty() ? "product catalogue" : "product catalogue " + file;
    }
}
