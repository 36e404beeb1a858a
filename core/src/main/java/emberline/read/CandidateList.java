package emberline.read;

import java.nio.file.Path;
import java.util.List;

/**
 * A candidate list as read: every row of the file, in its order.
 *
 * @param file path of the list; paths of spectra are relative to its folder
 * @param columns names of the columns in their order; known ones in lower case, others as written
 * @param rows one for each row of the list, usable or not
 */
public record CandidateList(Path file, List<String> columns, List<ListedCandidate> rows) {

    /** Copies the lists. */
    public CandidateList {
        columns = List.copyOf(columns);
        rows = List.copyOf(rows);
    }
}
