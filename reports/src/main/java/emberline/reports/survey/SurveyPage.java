package emberline.reports.survey;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.survey.ObjectResult;
import java.io.Closeable;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.io.Writer;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.regex.Matcher;

/**
 * The survey page: one HTML file with a table of all objects that can be sorted and filtered,
 * thumbnails of the spectra, a histogram of the types, and links to the reports and the JSON files
 * beside it. It needs no network. Fed object by object in the order of the list, of which each
 * leaves one line in a temporary file; the page appears when it is closed. Not for use by several
 * threads at once.
 */
public final class SurveyPage implements Closeable {

    /** Columns of the results table that go into the page under their own names. */
    private static final List<String> TAKEN =
            List.of(
                    "name",
                    "status",
                    "reason",
                    "type",
                    "type_number",
                    "type_sigma",
                    "type_lo95",
                    "type_hi95",
                    "gravity",
                    "snr",
                    "resolution",
                    "findings");

    private static final List<ResultColumn> COLUMNS =
            ResultColumns.standard().stream().filter(c -> TAKEN.contains(c.name())).toList();

    private final AtomicFile file;
    private final Writer writer;
    private final String end;
    private boolean empty = true;
    private boolean failed;

    private SurveyPage(AtomicFile file, Writer writer, String end) {
        this.file = file;
        this.writer = writer;
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
        filled = put(filled, "@SCRIPT@", resource("survey.js"));
        int data = filled.indexOf("@DATA@");
        AtomicFile file = AtomicFile.beside(target);
        Writer writer = Files.newBufferedWriter(file.temporary(), StandardCharsets.UTF_8);
        SurveyPage page = new SurveyPage(file, writer, filled.substring(data + "@DATA@".length()));
        List<String> keys = new ArrayList<>(COLUMNS.stream().map(ResultColumn::name).toList());
        keys.addAll(List.of("p_gravity", "listed", "file", "report", "spark"));
        page.append(filled.substring(0, data));
        page.append("{\"keys\":" + json(keys) + ",\"rows\":[");
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
        List<Object> cells = new ArrayList<>();
        for (ResultColumn column : COLUMNS) {
            String text = column.text(result);
            boolean number = column.content() == ResultColumn.Content.NUMBER;
            cells.add(!number ? text : text.isEmpty() ? null : new BigDecimal(text));
        }
        cells.add(share(result));
        String type = result.candidate().text("known_type").orElse("");
        String gravity = result.candidate().text("known_gravity").orElse("");
        cells.add((type + " " + gravity).strip());
        cells.add(stem);
        cells.add(hasReport);
        cells.add(result.leading().map(s -> Sparkline.of(s.prepared().spectrum())).orElse(""));
        append((empty ? "\n" : ",\n") + json(cells));
        empty = false;
    }

    /** The probability of the gravity class that was given, to two decimals. */
    private static Object share(ObjectResult result) {
        GravityVerdict verdict = result.placement().map(Placement::gravity).orElse(null);
        if (verdict == null || verdict.gravityClass().isEmpty()) {
            return null;
        }
        OptionalDouble share = verdict.pOfClass();
        return share.isPresent() ? Math.round(100 * share.getAsDouble()) / 100.0 : null;
    }

    /** Gives the page up: when it is closed the former page stays. */
    public void abandon() {
        failed = true;
    }

    /**
     * Ends the page and puts it in its place.
     *
     * @throws IOException if it cannot be written or moved
     */
    @Override
    public void close() throws IOException {
        try (writer) {
            if (!failed) {
                append("\n]}" + end);
            }
        } catch (IOException e) {
            failed = true;
            throw e;
        } finally {
            if (failed) {
                file.discard();
            }
        }
        if (!failed) {
            file.commit();
        }
    }

    private void append(String text) throws IOException {
        try {
            writer.write(text);
        } catch (IOException e) {
            failed = true;
            throw e;
        }
    }

    /** JSON that may stand in a script element: no sign in it can end the element. */
    private static String json(Object value) throws IOException {
        return JSON.std
                .asString(value)
                .replace("<", "\\u003c")
                .replace(">", "\\u003e")
                .replace("&", "\\u0026")
                .replace("\u2028", "\\u2028")
                .replace("\u2029", "\\u2029");
    }

    private static String escaped(String text) {
        return text.replace("&", "&amp;")
                .replace("<", "&lt;")
                .replace(">", "&gt;")
                .replace("\"", "&quot;")
                .replace("@", "&#64;");
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
