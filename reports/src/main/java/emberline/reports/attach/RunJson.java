package emberline.reports.attach;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The record of a run: program version, options, seed, checksums of the list and of all spectra,
 * and how many objects had which status. It holds no times and no number of threads, so that the
 * same input gives the same bytes. The inputs are written object by object in the order of the
 * list; the file appears when it is closed. Not for use by several threads at once.
 */
public final class RunJson implements Closeable {

    private static final String NO_INPUTS = "[ ]\n}\n";

    private final AtomicText written;
    private boolean empty = true;

    private RunJson(AtomicText written) {
        this.written = written;
    }

    /**
     * What holds for the whole run.
     *
     * @param version version of the program
     * @param options the options that bear on the results, as given
     * @param seed start of all random draws
     * @param listSha256 checksum of the candidate list, hexadecimal; empty where there is no list
     * @param part which part of the list was run, such as {@code 3/10}; empty for all of it
     */
    public record Facts(
            String version,
            Map<String, String> options,
            long seed,
            String listSha256,
            String part) {

        /** Copies the options in the order of their names. */
        public Facts {
            options = Collections.unmodifiableMap(new TreeMap<>(options));
        }
    }

    /**
     * Opens a record and writes all but the inputs.
     *
     * @param target the file that will be the record; its folder exists
     * @param facts what holds for the whole run
     * @param objectsByStatus number of objects by the word of their status, all of them
     * @return a record to which inputs can be added
     * @throws IOException if the folder cannot be written to
     */
    public static RunJson open(Path target, Facts facts, Map<String, Long> objectsByStatus)
            throws IOException {
        String text = head(facts, objectsByStatus);
        RunJson json = new RunJson(AtomicText.open(target));
        json.written.append(text.substring(0, text.length() - NO_INPUTS.length()) + "[");
        return json;
    }

    private static String head(Facts facts, Map<String, Long> objectsByStatus) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("program", "emberline");
        map.put("version", facts.version());
        map.put("options", facts.options());
        map.put("seed", facts.seed());
        map.put("list_sha256", facts.listSha256());
        if (!facts.part().isEmpty()) {
            map.put("part", facts.part());
        }
        map.put("objects", objectsByStatus.values().stream().mapToLong(n -> n).sum());
        map.put("objects_by_status", objectsByStatus);
        map.put("inputs", List.of());
        String text = JsonText.of(map);
        if (!text.endsWith(NO_INPUTS)) {
            throw new IllegalStateException("the layout of JSON has changed: " + text);
        }
        return text;
    }

    /**
     * The inputs of an object: name, path and checksum of each of its spectra.
     *
     * @param result its result
     * @return one JSON object a spectrum, each on one line; nothing where none was read
     * @throws IOException if a text cannot be written as JSON
     */
    public static List<String> inputs(ObjectResult result) throws IOException {
        List<String> lines = new ArrayList<>();
        for (SpectrumResult spectrum : result.spectra()) {
            lines.add(
                    "{\"name\": "
                            + JSON.std.asString(result.candidate().name())
                            + ", \"path\": "
                            + JSON.std.asString(spectrum.path())
                            + ", \"sha256\": "
                            + JSON.std.asString(spectrum.sha256())
                            + "}");
        }
        return lines;
    }

    /**
     * Adds an input.
     *
     * @param line one of {@link #inputs}
     * @throws IOException if it cannot be written
     */
    public void add(String line) throws IOException {
        written.append((empty ? "\n    " : ",\n    ") + line);
        empty = false;
    }

    /** Gives the record up: when it is closed the former one stays. */
    public void abandon() {
        written.abandon();
    }

    @Override
    public void close() throws IOException {
        try (written) {
            if (!written.isGivenUp()) {
                written.append((empty ? " " : "\n  ") + "]\n}\n");
            }
        }
    }
}
