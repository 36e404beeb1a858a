package emberline.reports.note;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import emberline.catalogue.Source;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import emberline.reports.attach.ObjectSchema;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumn.Content;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.ResultTable;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.io.StringReader;
import java.net.URL;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import javax.xml.transform.stream.StreamSource;
import javax.xml.validation.SchemaFactory;
import javax.xml.validation.Validator;
import org.jbibtex.BibTeXEntry;
import org.jbibtex.BibTeXParser;
import org.jbibtex.Key;
import org.jbibtex.ParseException;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;
import uk.ac.starlink.ecsv.EcsvTableBuilder;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StoragePolicy;
import uk.ac.starlink.table.TableBuilder;
import uk.ac.starlink.table.formats.MrtTableBuilder;
import uk.ac.starlink.util.FileDataSource;
import uk.ac.starlink.votable.VOTableBuilder;

class AttachmentsTest {

    /** A name that every format has to take care of. */
    private static final String NASTY =
            "=SUM(A1), \"50%\" & <b> a_b #1 {x} ~ ^ \\ $ \u03b1 \u00e9 \u4e2d\nline two";

    private static final List<String> LISTED = List.of("name", "parallax_mas", "ra_deg", "remark");

    @TempDir private static Path folder;

    private static List<ResultColumn> columns;
    private static List<ObjectResult> objects;
    private static List<List<String>> expected;

    @BeforeAll
    static void write() throws IOException {
        columns = ResultColumns.forList(LISTED);
        ObjectResult listed =
                Samples.judged(
                        Samples.object(
                                NASTY,
                                Map.of(
                                        "parallax_mas", "109.60",
                                        "ra_deg", "58.8470",
                                        "remark", "-x, \"quoted\""),
                                List.of(Samples.spectrum(0.8, 2.45, 600, Bands.L_DWARF, 60, 3)),
                                120));
        objects =
                List.of(
                        listed,
                        Samples.judged(Samples.lDwarf()),
                        Samples.judged(Samples.tDwarf()),
                        Samples.failed("gone", "no such file: 'a,b'"));
        expected =
                objects.stream().map(o -> columns.stream().map(c -> c.text(o)).toList()).toList();
        Attachments.Run run =
                new Attachments.Run("list.csv", "0.1.0", Map.of("prior", "volume"), 7);
        try (Attachments attachments = Attachments.open(folder, columns, Samples.CATALOGUE, run)) {
            for (ObjectResult object : objects) {
                attachments.add(object);
            }
            attachments.complete();
        }
        try (ResultTable table = ResultTable.open(folder.resolve("results.csv"), columns)) {
            for (ObjectResult object : objects) {
                table.write(object);
            }
        }
    }

    private static String text(String file) throws IOException {
        return Files.readString(folder.resolve(file));
    }

    @Test
    void nothingElseIsLeftInTheFolder() throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            assertEquals(
                    List.of(
                            ObjectSchema.FILE,
                            "methods.txt",
                            "results.csv",
                            "results.ecsv",
                            "results.mrt",
                            "results.vot",
                            "sources.bib",
                            "table.tex"),
                    files.map(f -> f.getFileName().toString()).sorted().toList());
        }
    }

    @Test
    void ecsvHoldsTheCellsToThePrintedDigit() throws IOException {
        String body =
                text("results.ecsv")
                        .lines()
                        .filter(line -> !line.startsWith("# ") || line.startsWith("# \""))
                        .collect(Collectors.joining("\n"));
        List<List<String>> rows = csv(body);
        assertEquals(columns.stream().map(ResultColumn::name).toList(), rows.get(0));
        assertEquals(expected, rows.subList(1, rows.size()));
    }

    /** The same cells, but for the apostrophe that keeps a spreadsheet from calculating. */
    @Test
    void csvHoldsTheSameCellsMadeSafe() throws IOException {
        List<List<String>> rows = csv(text("results.csv"));
        for (int r = 0; r < expected.size(); r++) {
            for (int c = 0; c < columns.size(); c++) {
                String cell = expected.get(r).get(c);
                boolean formula = !cell.isEmpty() && "=+-@".indexOf(cell.charAt(0)) >= 0;
                boolean number = columns.get(c).content() == Content.NUMBER;
                String safe = formula && !number ? "'" + cell : cell;
                assertEquals(safe, rows.get(r + 1).get(c), columns.get(c).name());
            }
        }
        assertTrue(rows.get(1).get(0).startsWith("'=SUM"), rows.get(1).get(0));
    }

    private static List<List<String>> csv(String text) throws IOException {
        List<List<String>> rows = new ArrayList<>();
        try (CsvReader<CsvRecord> csv = CsvReader.builder().ofCsvRecord(text)) {
            csv.forEach(row -> rows.add(List.copyOf(row.getFields())));
        }
        return rows;
    }

    @Test
    void votableHoldsTheCellsToThePrintedDigit()
            throws IOException, ParserConfigurationException, SAXException {
        Element root =
                DocumentBuilderFactory.newInstance()
                        .newDocumentBuilder()
                        .parse(new InputSource(new StringReader(text("results.vot"))))
                        .getDocumentElement();
        NodeList rows = root.getElementsByTagName("TR");
        assertEquals(expected.size(), rows.getLength());
        for (int r = 0; r < rows.getLength(); r++) {
            NodeList cells = ((Element) rows.item(r)).getElementsByTagName("TD");
            for (int c = 0; c < columns.size(); c++) {
                assertEquals(
                        expected.get(r).get(c).replace('\n', ' '),
                        cells.item(c).getTextContent(),
                        columns.get(c).name());
            }
        }
    }

    /** Against the schema of VOTable 1.4 that comes with the table library. */
    @Test
    void votableIsValid() throws IOException, SAXException {
        URL schema = StarTable.class.getResource("/uk/ac/starlink/util/text/VOTable1.4.xsd");
        Validator validator =
                SchemaFactory.newInstance(XMLConstants.W3C_XML_SCHEMA_NS_URI)
                        .newSchema(schema)
                        .newValidator();
        validator.validate(new StreamSource(folder.resolve("results.vot").toFile()));
        assertTrue(text("results.vot").contains("<FIELD ID=\"type_number\" name=\"type_number\""));
        String broken = text("results.vot").replace("<FIELD ", "<FIELDS ");
        assertThrows(
                SAXException.class,
                () -> validator.validate(new StreamSource(new StringReader(broken))));
    }

    private static StarTable star(String file, TableBuilder builder) throws IOException {
        return builder.makeStarTable(
                new FileDataSource(folder.resolve(file).toFile()),
                true,
                StoragePolicy.PREFER_MEMORY);
    }

    @Test
    void aTableLibraryReadsAllOfThemAlike() throws IOException {
        StarTable votable = star("results.vot", new VOTableBuilder());
        StarTable ecsv = star("results.ecsv", new EcsvTableBuilder());
        StarTable journal = star("results.mrt", new MrtTableBuilder());
        for (StarTable table : List.of(votable, ecsv, journal)) {
            assertEquals(columns.size(), table.getColumnCount());
            StarTable random = uk.ac.starlink.table.Tables.randomTable(table);
            assertEquals(expected.size(), random.getRowCount());
            for (int c = 0; c < columns.size(); c++) {
                ResultColumn column = columns.get(c);
                assertEquals(column.name(), table.getColumnInfo(c).getName());
                if (column.content() == Content.NUMBER || column.name().equals("parallax_mas")) {
                    for (int r = 0; r < expected.size(); r++) {
                        assertNumber(expected.get(r).get(c), random.getCell(r, c), column.name());
                    }
                }
            }
        }
        for (StarTable table : List.of(votable, ecsv)) {
            for (int c = 0; c < columns.size(); c++) {
                assertEquals(columns.get(c).description(), table.getColumnInfo(c).getDescription());
            }
        }
        int mass = columns.stream().map(ResultColumn::name).toList().indexOf("mass_msun");
        assertEquals("solMass", votable.getColumnInfo(mass).getUnitString());
        assertEquals("solMass", ecsv.getColumnInfo(mass).getUnitString());
        assertEquals("solMass", journal.getColumnInfo(mass).getUnitString());
        assertEquals("phys.mass;stat.median", votable.getColumnInfo(mass).getUCD());
    }

    private static void assertNumber(String printed, Object read, String column) {
        double value = read == null ? Double.NaN : ((Number) read).doubleValue();
        if (printed.isEmpty()) {
            assertTrue(Double.isNaN(value), column + " " + read);
        } else {
            assertEquals(Double.parseDouble(printed), value, 1e-6 * Math.abs(value), column);
        }
    }

    /** Bytes as described hold the printed cells; lines of the description keep to 80 columns. */
    @Test
    void theJournalTableIsWhereItsDescriptionSays() throws IOException {
        List<String> lines = text("results.mrt").lines().toList();
        int last = lines.lastIndexOf("-".repeat(80));
        List<int[]> bytes = new ArrayList<>();
        for (String line : lines.subList(0, last)) {
            assertTrue(line.length() <= 80, line);
            if (line.matches("\\s+\\d+(-\\s*\\d+)? +[AIFE]\\d.*")) {
                String range = line.substring(0, 11).replace(" ", "");
                String[] ends = range.split("-", -1);
                bytes.add(
                        new int[] {
                            Integer.parseInt(ends[0]), Integer.parseInt(ends[ends.length - 1])
                        });
            }
        }
        assertEquals(columns.size(), bytes.size());
        for (int r = 0; r < expected.size(); r++) {
            String row = lines.get(last + 1 + r);
            for (int c = 0; c < columns.size(); c++) {
                String cell = row.substring(bytes.get(c)[0] - 1, bytes.get(c)[1]).strip();
                assertEquals(PlainAscii.of(expected.get(r).get(c)).strip(), cell);
            }
        }
    }

    @Test
    void theLatexRowsHoldThePrintedDigits() throws IOException {
        String table = text("table.tex");
        ObjectResult object = objects.get(1);
        for (String column : List.of("teff_k", "mass_msun", "p_substellar", "type_sigma")) {
            String cell =
                    columns.stream()
                            .filter(c -> c.name().equals(column))
                            .findFirst()
                            .orElseThrow()
                            .text(object);
            assertTrue(table.contains(cell), column + " " + cell);
        }
        assertTrue(table.contains("\\& \\ensuremath{<}b\\ensuremath{>} a\\_b \\#1 \\{x\\}"), table);
        assertTrue(table.contains("$^\\mathrm{"), "no note marks");
    }

    @Test
    void latexAndBibtexTakeTheFiles() throws IOException, InterruptedException {
        assumeTrue(
                isInstalled("pdflatex") && isInstalled("bibtex"),
                "no LaTeX on this machine: table.tex and sources.bib are not compiled");
        Path work = Files.createDirectory(folder.resolve("latex"));
        Files.copy(folder.resolve("table.tex"), work.resolve("table.tex"));
        Files.copy(folder.resolve("sources.bib"), work.resolve("sources.bib"));
        Files.writeString(
                work.resolve("note.tex"),
                "\\documentclass{article}\\begin{document}\\input{table}\\nocite{*}"
                        + "\\bibliographystyle{plain}\\bibliography{sources}\\end{document}\n");
        run(work, "pdflatex", "-interaction=nonstopmode", "-halt-on-error", "note.tex");
        String log = run(work, "bibtex", "note");
        assertFalse(log.contains("error"), log);
        run(work, "pdflatex", "-interaction=nonstopmode", "-halt-on-error", "note.tex");
        String bbl = Files.readString(work.resolve("note.bbl"));
        long items = bbl.lines().filter(line -> line.startsWith("\\bibitem")).count();
        assertEquals(used().papers().size(), items);
        try (Stream<Path> files = Files.walk(work)) {
            for (Path file : files.sorted(java.util.Comparator.reverseOrder()).toList()) {
                Files.delete(file);
            }
        }
    }

    /** By a parser that needs no LaTeX. */
    @Test
    void bibtexParses() throws IOException, ParseException {
        String bib = text("sources.bib");
        Map<Key, BibTeXEntry> entries =
                new BibTeXParser().parse(new StringReader(bib)).getEntries();
        assertEquals(
                used().papers().stream().map(Source::key).collect(Collectors.toSet()),
                entries.keySet().stream().map(Key::getValue).collect(Collectors.toSet()));
        for (BibTeXEntry entry : entries.values()) {
            for (Key field : List.of(BibTeXEntry.KEY_AUTHOR, BibTeXEntry.KEY_YEAR)) {
                assertFalse(
                        entry.getField(field).toUserString().isBlank(), entry.getKey().getValue());
            }
        }
        String broken = bib.replaceFirst("year = \\{", "year = ");
        assertThrows(
                ParseException.class, () -> new BibTeXParser().parse(new StringReader(broken)));
    }

    private static boolean isInstalled(String program) {
        return Stream.of(System.getenv("PATH").split(java.io.File.pathSeparator, -1))
                .anyMatch(place -> Files.isExecutable(Path.of(place, program)));
    }

    private static String run(Path work, String... command)
            throws IOException, InterruptedException {
        Process process =
                new ProcessBuilder(command)
                        .directory(work.toFile())
                        .redirectErrorStream(true)
                        .redirectOutput(work.resolve("output.txt").toFile())
                        .start();
        assertTrue(process.waitFor(60, TimeUnit.SECONDS), String.join(" ", command));
        String output =
                new String(
                        Files.readAllBytes(work.resolve("output.txt")),
                        java.nio.charset.StandardCharsets.ISO_8859_1);
        assertEquals(0, process.exitValue(), output);
        return output;
    }

    private static MethodsUsed used() {
        MethodsUsed used = new MethodsUsed(Samples.CATALOGUE);
        objects.forEach(used::add);
        return used;
    }

    @Test
    void sourcesAreThoseOfTheMethodsUsedAndNoOthers() throws IOException {
        String bib = text("sources.bib");
        List<Source> papers = used().papers();
        assertEquals(papers.size(), bib.split("\n@", -1).length - 1);
        assertTrue(bib.contains("{baraffe2015,"), "grids of a judgement");
        MethodsUsed unjudged = new MethodsUsed(Samples.CATALOGUE);
        unjudged.add(Samples.lDwarf());
        assertFalse(unjudged.bibtex().contains("baraffe2015"));
        assertFalse(unjudged.bibtex().contains("lepine2007"), "no optical spectrum");
        assertTrue(unjudged.bibtex().contains("allers2013"));
        MethodsUsed nothing = new MethodsUsed(Samples.CATALOGUE);
        nothing.add(Samples.failed("x", "gone"));
        assertEquals(List.of(), nothing.papers());
    }

    @Test
    void theMethodsTellWhatWasDone() throws IOException {
        String methods = text("methods.txt").replaceAll("\\s+", " ");
        assertTrue(methods.contains("The spectra of 3 objects were measured"), methods);
        assertTrue(methods.contains("Of 1 object no spectrum could be used"), methods);
        assertTrue(methods.contains("prior 'volume'"), methods);
        assertTrue(methods.contains("hydrogen-burning"), methods);
        assertFalse(methods.contains("extinction"), methods);
        Map<String, String> reddened = new TreeMap<>(Map.of("av_mag", "1.5", "age", "120+-8Myr"));
        String other = MethodsText.of(used(), "0.1.0", reddened, 7).replaceAll("\\s+", " ");
        assertTrue(other.contains("A_V = 1.5 mag"), other);
        assertTrue(other.contains("An age of 120+-8Myr was stated"), other);
    }
}
