package emberline.read;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.BufferedInputStream;
import java.io.BufferedReader;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Iterator;
import java.util.List;
import java.util.Optional;
import java.util.zip.GZIPInputStream;

/**
 * The rows of a CSV file, packed by gzip or not, one by one: memory does not grow with the file. A
 * first pass over the file finds its encoding (UTF-8, or Latin-1 where the bytes are no UTF-8), the
 * separator, and whether every quote is closed.
 */
final class CsvRows implements TableRows {

    private static final int MOST_CELL_CHARS = 1 << 20;
    private static final int BUFFER = 1 << 16;

    private final String name;
    private final CsvReader<CsvRecord> reader;
    private final Iterator<CsvRecord> records;
    private final boolean oddQuotes;
    private List<String> columns = List.of();

    private CsvRows(String name, CsvReader<CsvRecord> reader, boolean oddQuotes) {
        this.name = name;
        this.reader = reader;
        this.records = reader.iterator();
        this.oddQuotes = oddQuotes;
    }

    /** Gives the unpacked bytes from the first on, as often as it is asked. */
    @FunctionalInterface
    private interface Bytes {
        InputStream open() throws IOException;
    }

    /** Opens a file, which is never held as a whole. */
    static CsvRows open(Path file) throws UnreadableSpectrumException, UnreadableListException {
        return FileContent.reading(
                        file,
                        () -> Optional.of(opened(FileContent.name(file), () -> unpacked(file))))
                .orElseThrow()
                .withColumns();
    }

    /** Opens what is held already. */
    static CsvRows open(FileContent content) throws UnreadableListException {
        try {
            return opened(content.name(), () -> new ByteArrayInputStream(content.bytes()))
                    .withColumns();
        } catch (UnreadableListException e) {
            throw e;
        } catch (IOException e) {
            throw new IllegalStateException("bytes in memory can be read", e);
        }
    }

    private static CsvRows opened(String name, Bytes bytes) throws IOException {
        Look look = Look.at(bytes);
        CsvReader<CsvRecord> reader =
                CsvReader.builder()
                        .fieldSeparator(look.separator())
                        .commentStrategy(CommentStrategy.SKIP)
                        .allowExtraFields(true)
                        .allowMissingFields(true)
                        .trimWhitespacesAroundQuotes(true)
                        .maxBufferSize(MOST_CELL_CHARS * 16)
                        .ofCsvRecord(text(bytes, look.charset()));
        return new CsvRows(name, reader, look.quotes() % 2 == 1);
    }

    /** The bytes of a file, unpacked where they were packed by gzip. */
    static InputStream unpacked(Path file) throws IOException {
        InputStream raw = new BufferedInputStream(Files.newInputStream(file), BUFFER);
        try {
            raw.mark(2);
            boolean packed = raw.read() == 0x1f && raw.read() == 0x8b;
            raw.reset();
            return packed ? new GZIPInputStream(raw, BUFFER) : raw;
        } catch (IOException e) {
            raw.close();
            throw e;
        }
    }

    private static Reader text(Bytes bytes, Charset charset) throws IOException {
        BufferedReader reader =
                new BufferedReader(
                        new InputStreamReader(bytes.open(), charset.newDecoder()), BUFFER);
        reader.mark(1);
        if (reader.read() != '\ufeff') {
            reader.reset();
        }
        return reader;
    }

    /** Reads the line of names. */
    private CsvRows withColumns() throws UnreadableListException {
        for (Optional<List<String>> row = next(); row.isPresent(); row = next()) {
            if (!row.get().stream().allMatch(String::isEmpty)) {
                columns = row.get();
                break;
            }
        }
        return this;
    }

    @Override
    public List<String> columns() {
        return columns;
    }

    @Override
    public Optional<List<String>> next() throws UnreadableListException {
        try {
            if (!records.hasNext()) {
                return Optional.empty();
            }
            List<String> cells = records.next().getFields().stream().map(String::trim).toList();
            if (oddQuotes && cells.stream().anyMatch(cell -> cell.contains("\n"))) {
                throw new UnreadableListException(
                        name,
                        "a quote that is never closed",
                        "rows of cells, with each quote closed",
                        "Close the quote; the rows after it would be lost.");
            }
            return Optional.of(cells);
        } catch (CsvParseException | UncheckedIOException e) {
            throw new UnreadableListException(
                    name,
                    "no proper CSV (" + FitsReader.reason(e) + ")",
                    "rows of cells, with each quote closed",
                    "Write the list again with a spreadsheet or a table library.");
        }
    }

    @Override
    public void close() throws UnreadableListException {
        try {
            reader.close();
        } catch (IOException e) {
            throw new UnreadableListException(
                    name,
                    "the file cannot be closed (" + FitsReader.reason(e) + ")",
                    "a readable file",
                    "Check the disk or copy the file again.");
        }
    }

    /**
     * What a first pass over a file finds.
     *
     * @param charset its encoding
     * @param separator the separator that stands most often in the line of names
     * @param quotes number of quotes
     */
    private record Look(Charset charset, char separator, long quotes) {

        static Look at(Bytes bytes) throws IOException {
            try {
                return at(bytes, StandardCharsets.UTF_8);
            } catch (CharacterCodingException e) {
                return at(bytes, StandardCharsets.ISO_8859_1);
            }
        }

        private static Look at(Bytes bytes, Charset charset) throws IOException {
            char[] buffer = new char[BUFFER];
            StringBuilder line = new StringBuilder();
            String names = "";
            long quotes = 0;
            try (Reader text = text(bytes, charset)) {
                for (int n = text.read(buffer); n >= 0; n = text.read(buffer)) {
                    for (int i = 0; i < n; i++) {
                        quotes += buffer[i] == '"' ? 1 : 0;
                        if (names.isEmpty()) {
                            if (buffer[i] != '\n' && buffer[i] != '\r') {
                                line.append(buffer[i]);
                            } else {
                                names = namesOrNothing(line);
                                line.setLength(0);
                            }
                        }
                    }
                }
            }
            return new Look(charset, separator(names.isEmpty() ? line.toString() : names), quotes);
        }

        private static String namesOrNothing(StringBuilder line) {
            String text = line.toString();
            return text.isBlank() || text.startsWith("#") ? "" : text;
        }

        private static char separator(String names) {
            char best = ',';
            long most = 0;
            for (char candidate : new char[] {',', ';', '\t'}) {
                long count = names.chars().filter(c -> c == candidate).count();
                if (count > most) {
                    most = count;
                    best = candidate;
                }
            }
            return best;
        }
    }
}
