package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.NavigableSet;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The ledger has the keys, the columns and the answers that the documents tell of. */
class DocumentedLedgerTest {

    private static final Pattern QUERY = Pattern.compile("^sqlite3 .*\"(SELECT [^\"]+)\"");

    @TempDir private Path folder;

    private Connection ledger() throws IOException, SQLException {
        Path list = folder.resolve("list.csv");
        Files.writeString(
                list, "name,j_mag,h_mag,k_mag,w1_mag,w2_mag\nX,15.4,14.5,13.9,13.2,12.9\n");
        Path out = folder.resolve("out");
        CommandRun run = CommandRun.of("sort", list, "--no-reports", "--no-objects", "--out", out);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        return DriverManager.getConnection("jdbc:sqlite:" + out.resolve("ledger.sqlite"));
    }

    /** The words in code style in the first cells of the table rows of a part of the chapter. */
    private static NavigableSet<String> documented(String from, String to) throws IOException {
        String text = ProjectDocuments.named("reports/README.md").text();
        String part = text.substring(text.indexOf(from), text.indexOf(to));
        NavigableSet<String> words = new TreeSet<>();
        for (String line : part.lines().filter(l -> l.startsWith("| `")).toList()) {
            Matcher word = Pattern.compile("`([a-z0-9_]+)`").matcher(line.split("\\|", -1)[1]);
            word.results().forEach(found -> words.add(found.group(1)));
        }
        return words;
    }

    private static NavigableSet<String> firstColumn(Connection ledger, String query)
            throws SQLException {
        NavigableSet<String> found = new TreeSet<>();
        try (Statement statement = ledger.createStatement();
                ResultSet rows = statement.executeQuery(query)) {
            while (rows.next()) {
                found.add(rows.getString(1));
            }
        }
        return found;
    }

    @Test
    void keysAndColumnsAreThoseOfTheChapter() throws IOException, SQLException {
        try (Connection ledger = ledger()) {
            assertEquals(
                    documented("Table `run`", "Table `object`"),
                    firstColumn(ledger, "SELECT key FROM run"));
            NavigableSet<String> columns =
                    firstColumn(ledger, "SELECT name FROM pragma_table_info('object')");
            NavigableSet<String> results =
                    ResultColumns.standard().stream()
                            .map(ResultColumn::name)
                            .collect(Collectors.toCollection(TreeSet::new));
            assertTrue(columns.containsAll(results), "" + columns);
            columns.removeAll(results);
            assertEquals(documented("Table `object`", "```sh\nsqlite3"), columns);
        }
    }

    @Test
    void everyQueryOfTheDocumentsIsAnswered() throws IOException, SQLException {
        List<String> queries = new ArrayList<>();
        for (MarkdownDocument document : ProjectDocuments.all()) {
            for (String line : document.lines()) {
                Matcher query = QUERY.matcher(line);
                if (query.find()) {
                    queries.add(query.group(1));
                }
            }
        }
        assertTrue(queries.size() > 2, "" + queries);
        try (Connection ledger = ledger()) {
            for (String query : queries) {
                assertTrue(firstColumn(ledger, query).size() <= 1, query);
            }
        }
    }
}
