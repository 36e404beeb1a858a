package emberline.read;

import java.io.Closeable;
import java.util.List;
import java.util.Optional;

/**
 * The rows of a candidate list one by one, so that memory does not grow with the list. Not for use
 * by several threads at once.
 */
public interface CandidateRows extends Closeable {

    /**
     * The columns of the list.
     *
     * @return names in their order; known ones in lower case, others as written
     */
    List<String> columns();

    /**
     * The next row.
     *
     * @return the row, usable or not; empty after the last
     * @throws UnreadableListException if the list cannot be read on; its message says what to do
     */
    Optional<ListedCandidate> next() throws UnreadableListException;

    @Override
    void close() throws UnreadableListException;
}
