package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.reports.Samples;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ResultTableTest {

    @TempDir private Path folder;

    @Test
    void firstColumnsAreThoseOfTheContract() {
        String expected =
                "name,status,reason,kind,type,type_number,type_sigma,type_lo68,type_hi68,type_lo95,"
                        + "type_hi95,published_type,published_type_sigma,gravity,p_fldg,p_intg,"
                        + "p_vlg,published_gravity,a_v,a_v_lo68,a_v_hi68,metallicity,"
                        + "p_subdwarf,snr,quality,resolution,findings";
        List<String> names = ResultColumns.standard().stream().map(ResultColumn::name).toList();
        assertTrue(String.join(",", names).startsWith(expected + ","), names.toString());
    }

    @Test
    void listColumnsFollowAndCollisionsAreRenamed() {
        List<String> names =
                ResultColumns.forList(List.of("name", "kind", "list_kind", "known_type", "kind"))
                        .stream()
                        .map(ResultColumn::name)
                        .toList();
        assertEquals(
                List.of("list_kind", "list_list_kind", "known_type"),
                names.subList(ResultColumns.standard().size(), names.size()));
    }

    @Test
    void rowsCarryRoundedNumbersAndListCells() throws IOException {
        ObjectResult l = Samples.lDwarf();
        Map<String, String> cells = new LinkedHashMap<>();
        cells.put("name", "=A1+B1");
        cells.put("dec", "-12:30:05.2");
        cells.put("note", "-see \"paper\", p. 2");
        ObjectResult odd =
                Samples.object(
                        "=A1+B1", cells, List.of(l.spectra().get(0).prepared().spectrum()), 120);
        Path file = folder.resolve("results.csv");
        try (ResultTable table =
                ResultTable.open(file, ResultColumns.forList(List.copyOf(cells.keySet())))) {
            table.write(odd);
            table.write(Samples.failed("b", "no such file"));
        }
        List<NamedCsvRecord> rows = read(file);
        NamedCsvRecord row = rows.get(0);
        assertEquals("'=A1+B1", row.getField("name"));
        assertEquals("-12:30:05.2", row.getField("dec"));
        assertEquals("'-see \"paper\", p. 2", row.getField("note"));
        double number = odd.placement().orElseThrow().type().orElseThrow().typeNumber();
        assertTrue(row.getField("type_number").matches("\\d+\\.\\d\\d"));
        assertEquals(number, Double.parseDouble(row.getField("type_number")), 0.005);
        assertEquals(
                odd.placement().orElseThrow().type().orElseThrow().code(), row.getField("type"));
        assertEquals("medium-assumed", row.getField("findings").split(" ", -1)[0]);
        assertEquals("failed", rows.get(1).getField("status"));
        assertEquals("no such file", rows.get(1).getField("reason"));
        assertEquals("", rows.get(1).getField("type_number"));
        assertFalse(Files.readString(file).contains("\r"));
        assertFalse(Files.readString(file).contains("NaN"));
    }

    @Test
    void theFileAppearsOnlyWhenClosed() throws IOException {
        Path file = folder.resolve("results.csv");
        Files.writeString(file, "former");
        ResultTable table = ResultTable.open(file, ResultColumns.standard());
        table.write(Samples.failed("b", "no such file"));
        assertEquals("former", Files.readString(file));
        table.close();
        assertTrue(Files.readString(file).startsWith("name,status"));
        try (var left = Files.list(folder)) {
            assertEquals(List.of(file), left.toList());
        }
    }

    @Test
    void anAbandonedTableLeavesTheFormerFile() throws IOException {
        Path file = folder.resolve("results.csv");
        Files.writeString(file, "former");
        try (ResultTable table = ResultTable.open(file, ResultColumns.standard())) {
            table.abandon();
        }
        assertEquals("former", Files.readString(file));
        try (var left = Files.list(folder)) {
            assertEquals(List.of(file), left.toList());
        }
    }

    @Test
    void digitsDoNotDependOnTheLanguageAndHaveNoNegativeZero() {
        assertEquals("0.00", Digits.type(-0.001));
        assertEquals("1234.5", Digits.significant(1234.4999));
        assertEquals("12000", Digits.significant(12000));
        assertEquals("0.125", Digits.probability(0.125));
    }

    private static List<NamedCsvRecord> read(Path file) throws IOException {
        try (CsvReader<NamedCsvRecord> csv = CsvReader.builder().ofNamedCsvRecord(file)) {
            return csv.stream().toList();
        }
    }
}
