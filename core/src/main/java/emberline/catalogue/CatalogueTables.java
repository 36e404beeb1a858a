package emberline.catalogue;

import java.io.IOException;
import java.util.List;

/** A set of tables to load: the product's own, or a user's folder. */
interface CatalogueTables {

    /** The names of the tables relative to the root, with forward slashes, sorted. */
    List<String> files();

    /** A table, read as UTF-8. */
    String text(String file) throws IOException;

    /** What to call a table, or the root for a blank name, in a message. */
    String label(String file);
}
