package emberline.read;

import java.util.List;

/**
 * A candidate list as a table of text.
 *
 * @param columns names as written
 * @param rows cells of each row, as many as the file has there, which may differ from the columns
 */
record ListTable(List<String> columns, List<List<String>> rows) {}
