package emberline.catalogue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Reads the table of sources and looks up the source of a row. */
final class KnownSources {

    private final Map<String, Source> byKey;
    private final List<Source> added;

    private KnownSources(Map<String, Source> byKey, List<Source> added) {
        this.byKey = byKey;
        this.added = added;
    }

    static KnownSources of(List<CatalogueRow> rows, List<Source> before)
            throws InvalidCatalogueException {
        Map<String, Source> byKey = new LinkedHashMap<>();
        before.forEach(source -> byKey.put(source.key(), source));
        List<Source> added = new ArrayList<>();
        for (CatalogueRow row : rows) {
            Source source = source(row);
            if (byKey.put(source.key(), source) != null) {
                throw row.fault(
                        "key",
                        "source '" + source.key() + "' exists already",
                        "a new key",
                        "Add a letter after the year, or leave the row out and use the source.");
            }
            added.add(source);
        }
        return new KnownSources(byKey, added);
    }

    private static Source source(CatalogueRow row) throws InvalidCatalogueException {
        String key = row.text("key");
        String authors = row.text("authors");
        int year = row.wholeNumber("year", 1800, 2199);
        return row.made(
                () ->
                        new Source(
                                key,
                                authors,
                                year,
                                row.textOrBlank("journal"),
                                row.textOrBlank("volume"),
                                row.textOrBlank("page"),
                                row.textOrBlank("title"),
                                row.textOrBlank("doi")));
    }

    /** The sources that the table adds. */
    List<Source> added() {
        return List.copyOf(added);
    }

    /** The source that a row names in its column {@code source}. */
    Source of(CatalogueRow row) throws InvalidCatalogueException {
        String key = row.text("source");
        Source source = byKey.get(key);
        if (source == null) {
            throw row.fault(
                    "source",
                    "unknown source '" + key + "'",
                    "a key of sources.csv",
                    "Add the paper to sources.csv, or correct the key.");
        }
        return source;
    }
}
