package emberline.reports.survey;

import emberline.reports.attach.AtomicText;
import emberline.survey.ObjectResult;
import emberline.survey.verdict.VerdictCall;
import java.io.Closeable;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;

/**
 * The survey page: one HTML file with a table of all objects that can be sorted and filtered,
 * thumbnails of the spectra, a histogram of the types, diagrams and a map whose points select rows,
 * a form for the observer's own verdict, and links to the reports and the JSON files beside it. It
 * needs no network. Fed object by object in the order of the list, of which each leaves one line in
 * a temporary file; the page appears when it is closed. Not for use by several threads at once.
 */
public final class SurveyPage implements Closeable {

    /** The parts of the script in their order. */
    private static final List<String> SCRIPTS =
            List.of("objects.js", "verdicts.js", "charts.js", "table.js", "page.js");

    private final AtomicText written;
    private final String end;
    private final PageMap map = new PageMap();

    /** Sentences that many rows share, by their number. */
    private final Map<String, Integer> texts = new LinkedHashMap<>();

    private boolean empty = true;

    private SurveyPage(AtomicText written, String end) {
        this.written = written;
        this.end = end;
    }

    /**
     * Opens a page.
     *
     * @param target where the page will stand; the folders {@code reports} and {@code objects} are
     *     expected beside it
     * @param title what the page is called, for instance the name of the candidate list
     * @param programVersion version that stands in the page
     * @return a page to which objects can be added
     * @throws IOException if the folder cannot be written to
     */
    public static SurveyPage open(Path target, String title, String programVersion)
            throws IOException {
        String template = resource("survey.html");
        String filled =
                put(put(template, "@TITLE@", escaped(title)), "@VERSION@", escaped(programVersion));
        filled = put(filled, "@STYLE@", resource("survey.css"));
        StringBuilder script = new StringBuilder();
        for (String part : SCRIPTS) {
            script.append(resource(part));
        }
        filled = put(filled, "@SCRIPT@", script.toString());
        int data = filled.indexOf("@DATA@");
        SurveyPage page =
                new SurveyPage(AtomicText.open(target), filled.substring(data + "@DATA@".length()));
        page.written.append(filled.substring(0, data));
        page.written.append(
                "{\"keys\":"
                        + PageJson.of(SurveyRow.pageKeys())
                        + ",\"quantities\":"
                        + PageJson.of(Quantities.titles())
                        + ",\"calls\":"
                        + PageJson.of(
                                Arrays.stream(VerdictCall.values()).map(VerdictCall::word).toList())
                        + ",\"rows\":[");
        return page;
    }

    /**
     * Adds an object.
     *
     * @param result its result
     * @param stem name of its files without folder and ending
     * @param hasReport whether there is a PDF
     * @throws IOException if it cannot be written
     */
    public void add(ObjectResult result, String stem, boolean hasReport) throws IOException {
        add(SurveyRow.of(result, stem, hasReport));
    }

    /**
     * Adds an object of which the row is there already.
     *
     * @param row its row
     * @throws IOException if it cannot be written
     */
    public void add(SurveyRow row) throws IOException {
        List<Integer> numbers =
                row.cautions().stream()
                        .map(text -> texts.computeIfAbsent(text, t -> texts.size()))
                        .toList();
        written.append((empty ? "\n" : ",\n") + row.text(numbers));
        map.add(row);
        empty = false;
    }

    /** Gives the page up: when it is closed the former page stays. */
    public void abandon() {
        written.abandon();
    }

    /**
     * Ends the page and puts it in its place.
     *
     * @throws IOException if it cannot be written or moved
     */
    @Override
    public void close() throws IOException {
        try (written) {
            if (!written.isGivenUp()) {
                written.append(tail());
            }
        }
    }

    private String tail() {
        try {
            return "\n],\"texts\":"
                    + PageJson.of(texts.keySet())
                    + ",\"map\":"
                    + map.json()
                    + "}"
                    + end;
        } catch (RuntimeException e) {
            written.abandon();
            throw e;
        }
    }

    private static String escaped(String text) {
        return text.replace("&", "&amp;")
                .replace("<", "&lt;")
                .replace(">", "&gt;")
                .replace("\"", "&quot;")
                .replace("@", "&#64;")
                .replaceAll("[\\x{2028}\\x{2029}]", " ");
    }

    private static String put(String text, String mark, String content) {
        return text.replaceAll(mark, Matcher.quoteReplacement(content));
    }

    private static String resource(String name) throws IOException {
        try (InputStream stream = SurveyPage.class.getResourceAsStream(name)) {
            if (stream == null) {
                throw new FileNotFoundException(
                        name + ": not on the class path; install the product anew");
            }
            return new String(stream.readAllBytes(), StandardCharsets.UTF_8).replace("\r\n", "\n");
        }
    }
}
