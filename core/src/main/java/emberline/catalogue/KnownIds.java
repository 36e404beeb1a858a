package emberline.catalogue;

import java.util.HashMap;
import java.util.Locale;
import java.util.Map;

/** Holds the ids of one kind of row: unique without regard to case, and made as they should be. */
final class KnownIds {

    private final String kind;
    private final Map<String, String> whereByLowerId = new HashMap<>();

    /** Starts without ids; the kind is "feature" or "relation". */
    KnownIds(String kind) {
        this.kind = kind;
    }

    /** Takes an id of a catalogue that is loaded already. */
    void addLoaded(String id) {
        whereByLowerId.put(id.toLowerCase(Locale.ROOT), "the catalogue loaded before");
    }

    /** Takes the id of a row. */
    String add(CatalogueRow row, Source source) throws InvalidCatalogueException {
        String id = row.text("id");
        if (!id.matches("[a-z0-9]+/[a-z0-9._+-]+") || !id.startsWith(source.key() + "/")) {
            throw row.fault(
                    "id",
                    "'" + id + "'",
                    "the source key, a slash and a name in lower case, such as "
                            + source.key()
                            + "/tio5",
                    "Rename it here and where it is used.");
        }
        String before = whereByLowerId.put(id.toLowerCase(Locale.ROOT), row.where());
        if (before != null) {
            throw row.fault(
                    "id",
                    kind + " '" + id + "' exists already in " + before,
                    "an id that is unique without regard to case",
                    "Choose another name after the slash.");
        }
        return id;
    }

    /** The id of this kind that a row names in a column. */
    String named(CatalogueRow row, String column) throws InvalidCatalogueException {
        String id = row.text(column);
        if (!whereByLowerId.containsKey(id)) {
            throw row.fault(
                    column,
                    "unknown " + kind + " '" + id + "'",
                    "the id of a " + kind + " of this catalogue",
                    "Correct the id, or add the " + kind + ".");
        }
        return id;
    }
}
