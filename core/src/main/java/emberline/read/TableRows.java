package emberline.read;

import java.io.Closeable;
import java.util.Iterator;
import java.util.List;
import java.util.Optional;

/** A candidate list as a table of text that is read row by row. Not for several threads at once. */
interface TableRows extends Closeable {

    /** The names of the columns as written. */
    List<String> columns();

    /**
     * The cells of the next row, as many as the file has there, which may differ from the columns;
     * empty after the last row.
     */
    Optional<List<String>> next() throws UnreadableListException;

    @Override
    void close() throws UnreadableListException;

    /** Rows that are held already. */
    static TableRows of(List<String> columns, List<List<String>> rows) {
        Iterator<List<String>> iterator = rows.iterator();
        return new TableRows() {
            @Override
            public List<String> columns() {
                return columns;
            }

            @Override
            public Optional<List<String>> next() {
                return iterator.hasNext() ? Optional.of(iterator.next()) : Optional.empty();
            }

            @Override
            public void close() {}
        };
    }
}
