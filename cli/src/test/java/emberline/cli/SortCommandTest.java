package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.function.IntFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SortCommandTest {

    @TempDir private Path folder;

    private Path list;

    @BeforeEach
    void writeOneGoodSpectrum() throws IOException {
        StringBuilder spectrum = new StringBuilder("wavelength_um,flux,sigma\n");
        for (int i = 0; i < 300; i++) {
            double micron = 0.9 + i * 0.005;
            spectrum.append(micron + "," + (1 + 0.2 * Math.sin(8 * micron)) + ",0.02\n");
        }
        Files.writeString(folder.resolve("good.csv"), spectrum);
        list = folder.resolve("list.csv");
    }

    private CommandRun sort(String rows) throws IOException {
        Files.writeString(list, rows);
        return CommandRun.of("sort", list, "--out", folder.resolve("out"), "--no-reports");
    }

    private List<String> results() throws IOException {
        return Files.readAllLines(folder.resolve("out/results.csv"));
    }

    private void assertFailedRow(String row, String... reasons) {
        assertTrue(row.contains(",failed,"), row);
        for (String reason : reasons) {
            assertTrue(row.contains(reason), row);
        }
    }

    @Test
    void theDemoSurveyRunsThrough() throws IOException {
        Path out = folder.resolve("demo");
        CommandRun run = CommandRun.of("sort", DemoRun.survey(), "--out", out, "--threads", 2);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        assertEquals("", run.out());
        List<String> rows = Files.readAllLines(out.resolve("results.csv"));
        long listed = Files.readAllLines(DemoRun.survey()).size();
        assertEquals(listed, rows.size());
        assertTrue(
                rows.get(0)
                        .startsWith(
                                "name,status,reason,kind,type,type_number,"
                                        + "type_sigma,type_lo68,"
                                        + "type_hi68,type_lo95,type_hi95,published_type,"
                                        + "published_type_sigma,gravity,p_fldg,p_intg,p_vlg"));
        assertTrue(rows.get(0).contains(",p_late_dwarf,p_giant,"), rows.get(0));
        try (Stream<Path> objects = Files.list(out.resolve("objects"));
                Stream<Path> reports = Files.list(out.resolve("reports"))) {
            assertEquals(listed - 1, objects.count());
            assertEquals(listed - 1 - DemoRun.withoutSpectrum(), reports.count());
        }
        assertTrue(Files.size(out.resolve("run.json")) > 100);
        for (String file :
                List.of("results.ecsv", "results.vot", "results.mrt", "table.tex", "sources.bib")) {
            assertTrue(Files.size(out.resolve(file)) > 1000, file);
        }
        assertTrue(
                Files.readString(out.resolve("methods.txt")).contains("Emberline"), "methods.txt");
        assertTrue(Files.size(out.resolve("survey.html")) > 1000);
    }

    /** Every way in which a row can be bad, each with what its reason must say. */
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "missing.csv | missing.csv | no such file",
                "empty.csv | empty.csv | empty",
                "picture.fits | picture.fits | PNG",
                "truncated.fits | truncated.fits | expected",
                "nan.csv | nan.csv | expected",
                "jumping.csv | jumping.csv | rise",
                "equal.csv | equal.csv | equal",
                "onepixel.csv | onepixel.csv | two pixels",
                "columns.csv | columns.csv | column",
                "unit.csv | unit.csv | unit"
            })
    void aBadSpectrumIsARowThatSaysWhy(String file, String where, String what) throws IOException {
        writeBadFiles();
        CommandRun run = sort("name,spectrum\ngood,good.csv\nbad," + file + "\nlast,good.csv\n");
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        List<String> rows = results();
        assertEquals(4, rows.size());
        assertTrue(rows.get(1).startsWith("good,"), rows.get(1));
        assertFailedRow(rows.get(2), where);
        assertTrue(
                rows.get(2).toLowerCase(Locale.ROOT).contains(what.toLowerCase(Locale.ROOT)),
                rows.get(2));
        assertTrue(rows.get(3).startsWith("last,"), rows.get(3));
        assertTrue(run.err().contains("bad: failed: "), run.err());
    }

    private void writeBadFiles() throws IOException {
        Files.createFile(folder.resolve("empty.csv"));
        Files.write(
                folder.resolve("picture.fits"),
                new byte[] {(byte) 0x89, 'P', 'N', 'G', 13, 10, 26, 10, 0, 0, 0, 13});
        String card = "SIMPLE  =                    T" + " ".repeat(50);
        String axes =
                "BITPIX  =                  -32"
                        + " ".repeat(50)
                        + "NAXIS   =                    1"
                        + " ".repeat(50)
                        + "NAXIS1  =                 4000"
                        + " ".repeat(50)
                        + "END"
                        + " ".repeat(77);
        String header = card + axes;
        Files.writeString(
                folder.resolve("truncated.fits"), header + " ".repeat(2880 - header.length()));
        write("nan.csv", "wavelength_um,flux", i -> 1 + i * 0.01 + ",NaN");
        write("jumping.csv", "wavelength_um,flux", i -> 1 + (i * 7 % 11) * 0.01 + ",1");
        write("equal.csv", "wavelength_um,flux", i -> 1 + (i == 5 ? 4 : i) * 0.01 + "," + i);
        Files.writeString(folder.resolve("onepixel.csv"), "wavelength_um,flux\n1.2,3\n");
        write("columns.csv", "wavelength_um,flux", i -> 1 + i * 0.01 + (i == 7 ? ",1,2,3" : ",1"));
        write("unit.csv", "wavelength (furlong),flux", i -> 1 + i * 0.01 + ",1");
    }

    private void write(String file, String header, IntFunction<String> row) throws IOException {
        StringBuilder text = new StringBuilder(header + "\n");
        for (int i = 0; i < 50; i++) {
            text.append(row.apply(i)).append('\n');
        }
        Files.writeString(folder.resolve(file), text);
    }

    @Test
    void aDuplicateNameKeepsBothRows() throws IOException {
        CommandRun run = sort("name,spectrum\nA,good.csv\na,good.csv\n");
        assertEquals(ExitCode.SOME_FAILED, run.code());
        assertFailedRow(results().get(2), "row 1");
    }

    @Test
    void aListWithoutTheColumnsIsRefused() throws IOException {
        CommandRun run = sort("object,file\nA,good.csv\n");
        assertEquals(ExitCode.NOTHING_READ, run.code());
        assertTrue(run.err().contains("list.csv") && run.err().contains("name"), run.err());
        assertFalse(Files.exists(folder.resolve("out/results.csv")));
    }

    @Test
    void namesNeverLeaveTheFolder() throws IOException {
        CommandRun run =
                sort("name,spectrum\n../../escape,good.csv\n/etc/x,good.csv\ncon,good.csv\n");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        try (Stream<Path> files = Files.walk(folder)) {
            assertEquals(
                    3,
                    files.filter(file -> file.toString().endsWith(".json"))
                            .filter(file -> file.getParent().endsWith("objects"))
                            .count());
        }
    }

    @Test
    void theNumberOfThreadsDoesNotChangeAByte() throws IOException {
        byte[][] tables = new byte[2][];
        for (int threads = 1; threads <= 2; threads++) {
            Path out = folder.resolve("t" + threads);
            CommandRun.of(
                    "sort", DemoRun.survey(), "--out", out, "--threads", threads, "--no-reports");
            tables[threads - 1] = Files.readAllBytes(out.resolve("results.csv"));
            assertTrue(tables[threads - 1].length > 1000);
        }
        assertArrayEquals(tables[0], tables[1]);
        assertArrayEquals(
                Files.readAllBytes(folder.resolve("t1/run.json")),
                Files.readAllBytes(folder.resolve("t2/run.json")));
    }

    @Test
    void allBadIsNothingRead() throws IOException {
        assertEquals(ExitCode.NOTHING_READ, sort("name,spectrum\nA,no.csv\nB,no.csv\n").code());
        assertEquals(3, results().size());
    }

    @Test
    void anOutputThatIsAFileIsRefused() throws IOException {
        Files.writeString(list, "name,spectrum\nA,good.csv\n");
        CommandRun run = CommandRun.of("sort", list, "--out", folder.resolve("good.csv"));
        assertEquals(ExitCode.NOT_WRITTEN, run.code());
        assertTrue(run.err().contains("--out"), run.err());
        assertFalse(Files.readString(folder.resolve("good.csv"), StandardCharsets.UTF_8).isEmpty());
    }

    @ParameterizedTest
    @CsvSource({
        "--threads, 0, at least 1",
        "--resolution, -5, positive",
        "--medium, water, medium",
        "--velocity, 40000, between",
        "--extinction-ratio, 3.1, --av",
        "--av, -2, expected 0",
        "--site, moon, site",
        "--seed, x, seed"
    })
    void wrongOptionsAreExplained(String option, String value, String word) throws IOException {
        Files.writeString(list, "name,spectrum\nA,good.csv\n");
        CommandRun run = CommandRun.of("sort", list, "--out", folder.resolve("out"), option, value);
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(run.err().contains(word), run.err());
    }
}
