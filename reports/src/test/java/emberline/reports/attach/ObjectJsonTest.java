package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
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

class ObjectJsonTest {

    @TempDir private Path folder;

    @Test
    void jsonIsReadBackWithTheNumbersOfTheTable() throws IOException {
        ObjectResult result = Samples.lDwarf();
        Map<String, Object> map = JSON.std.mapFrom(ObjectJson.text(result));
        for (ResultColumn column : ResultColumns.standard()) {
            assertTrue(map.containsKey(column.name()), column.name());
        }
        ResultColumn number = column("type_number");
        assertEquals(Double.parseDouble(number.text(result)), map.get("type_number"));
        List<?> features = (List<?>) map.get("features");
        assertEquals(Samples.CATALOGUE.features().size(), features.size());
        for (Object feature : features) {
            Map<?, ?> cells = (Map<?, ?>) feature;
            boolean measured = cells.get("value") != null;
            assertEquals(measured, cells.get("sigma") != null);
            assertEquals(measured, cells.get("why").toString().isEmpty(), cells.toString());
        }
        Map<?, ?> spectrum = (Map<?, ?>) ((List<?>) map.get("spectra")).get(0);
        assertEquals(Samples.SHA256, spectrum.get("sha256"));
        assertEquals("given", spectrum.get("resolution_basis"));
    }

    /** An invented spectrum of low resolution: no velocity, and the reason stands in its place. */
    @Test
    void linesVelocityAndActivityHaveTheirKeys() throws IOException {
        Map<String, Object> map = JSON.std.mapFrom(ObjectJson.text(Samples.lDwarf()));
        Map<?, ?> activity = (Map<?, ?>) map.get("activity");
        assertEquals("H alpha was not measured", activity.get("reason"));
        assertEquals(List.of(), activity.get("levels"));
        Map<?, ?> spectrum = (Map<?, ?>) ((List<?>) map.get("spectra")).get(0);
        Map<?, ?> velocity = (Map<?, ?>) spectrum.get("velocity");
        assertNull(velocity.get("kms"));
        assertTrue(velocity.get("reason").toString().startsWith("too coarse: "));
        for (Object line : (List<?>) spectrum.get("lines")) {
            Map<?, ?> cells = (Map<?, ?>) line;
            assertEquals(
                    "not seen".equals(cells.get("detection")), cells.get("limit_3sigma") != null);
        }
    }

    @Test
    void aFailedObjectHasEveryKeyAndNoNumbers() throws IOException {
        String text = ObjectJson.text(Samples.failed("x", "line 3: no number"));
        Map<String, Object> map = JSON.std.mapFrom(text);
        assertEquals("failed", map.get("status"));
        assertEquals("line 3: no number", map.get("reason"));
        assertTrue(map.containsKey("type_number"));
        assertNull(map.get("type_number"));
        assertFalse(text.contains("NaN"));
    }

    @Test
    void theSameResultGivesTheSameBytes() {
        assertEquals(ObjectJson.text(Samples.tDwarf()), ObjectJson.text(Samples.tDwarf()));
    }

    @Test
    void aRunCountsItsObjectsAndNamesItsInputs() throws IOException {
        Path file = folder.resolve("run.json");
        Map<String, Long> counts = new LinkedHashMap<>();
        counts.put("measured", 1L);
        counts.put("failed", 1L);
        RunJson.Facts facts = new RunJson.Facts("0.1.0", Map.of("medium", "air"), 7, "ab12", "");
        try (RunJson run = RunJson.open(file, facts, counts)) {
            for (String input : RunJson.inputs(Samples.lDwarf())) {
                run.add(input);
            }
        }
        Map<String, Object> map = JSON.std.mapFrom(Files.readString(file));
        assertEquals(2, map.get("objects"));
        assertEquals(Map.of("measured", 1, "failed", 1), map.get("objects_by_status"));
        Map<?, ?> input = (Map<?, ?>) ((List<?>) map.get("inputs")).get(0);
        assertEquals(Samples.SHA256, input.get("sha256"));
    }

    private static ResultColumn column(String name) {
        return ResultColumns.standard().stream()
                .filter(column -> column.name().equals(name))
                .findFirst()
                .orElseThrow();
    }
}
