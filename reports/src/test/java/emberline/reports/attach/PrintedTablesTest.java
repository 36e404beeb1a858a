package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.reports.Samples;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class PrintedTablesTest {

    private final ObjectResult dwarf = Samples.lDwarf();
    private final ObjectResult failed = Samples.failed("x\u001b[31m", "no such file");

    @Test
    void placementsAlignInText() {
        String text = PlacementTable.print(List.of(dwarf, failed), TableFormat.TEXT);
        List<String> lines = text.lines().toList();
        assertEquals(lines.get(0).indexOf("status"), lines.get(1).indexOf("measured"));
        assertTrue(text.contains(": no such file\n"), text);
        assertFalse(text.contains("\u001b"), "control characters reach the terminal");
    }

    @Test
    void placementsAsCsvHaveTheColumnsOfTheResults() {
        NamedCsvRecord row =
                CsvReader.builder()
                        .ofNamedCsvRecord(PlacementTable.print(List.of(dwarf), TableFormat.CSV))
                        .stream()
                        .findFirst()
                        .orElseThrow();
        assertEquals(ResultColumns.standard().size(), row.getFieldCount());
        assertEquals("Ember 12", row.getField("name"));
    }

    @Test
    void oneObjectIsAnObjectAndTwoAreAnArray() throws IOException {
        Map<String, Object> one =
                JSON.std.mapFrom(PlacementTable.print(List.of(dwarf), TableFormat.JSON));
        assertEquals("Ember 12", one.get("name"));
        assertFalse(one.containsKey("features"));
        List<Object> two =
                JSON.std.listFrom(PlacementTable.print(List.of(dwarf, failed), TableFormat.JSON));
        assertEquals(2, two.size());
    }

    @Test
    void measurementsListWhatWasMeasuredAndCountTheRest() throws IOException {
        String text = MeasurementTable.print(List.of(dwarf, failed), TableFormat.TEXT);
        assertTrue(text.contains("allers2007/h2o"), text);
        assertTrue(text.contains("not covered"), text);
        assertTrue(text.contains("no such file"), text);
        long rows =
                CsvReader.builder()
                        .ofNamedCsvRecord(MeasurementTable.print(List.of(dwarf), TableFormat.CSV))
                        .stream()
                        .count();
        assertEquals(Samples.CATALOGUE.features().size(), rows);
        Map<String, Object> json =
                JSON.std.mapFrom(MeasurementTable.print(List.of(dwarf), TableFormat.JSON));
        assertEquals(rows, ((List<?>) json.get("features")).size());
    }
}
