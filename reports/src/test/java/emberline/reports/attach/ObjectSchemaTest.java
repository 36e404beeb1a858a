package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import com.networknt.schema.InputFormat;
import com.networknt.schema.JsonSchema;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.SpecVersion;
import emberline.reports.RealSpectra;
import emberline.reports.Samples;
import emberline.reports.page.StandardsReportTest;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

class ObjectSchemaTest {

    private static final JsonSchema SCHEMA =
            JsonSchemaFactory.getInstance(SpecVersion.VersionFlag.V202012)
                    .getSchema(ObjectSchema.text());

    private static void assertValid(ObjectResult object) throws IOException {
        String json = ObjectJson.text(object);
        assertEquals(Set.of(), SCHEMA.validate(json, InputFormat.JSON));
        Map<?, ?> described = (Map<?, ?>) JSON.std.mapFrom(ObjectSchema.text()).get("properties");
        Set<String> undescribed = new TreeSet<>(JSON.std.mapFrom(json).keySet());
        undescribed.removeIf(described::containsKey);
        assertEquals(Set.of(), undescribed, "keys that the schema does not describe");
    }

    @Test
    void realOutputFollowsTheSchema() throws IOException {
        for (ObjectResult object :
                List.of(
                        Samples.lDwarf(),
                        Samples.judged(Samples.lDwarf()),
                        StandardsReportTest.compared(),
                        Samples.judged(Samples.tDwarf()),
                        Samples.failed("x", "gone"))) {
            assertValid(object);
        }
    }

    @Test
    void theOutputForRealSpectraFollowsTheSchema() throws IOException {
        assumeTrue(
                RealSpectra.present(),
                "no folder shared/spectra beside the project: real spectra are not tried");
        var rows = RealSpectra.rows();
        for (String name :
                List.of(
                        "HD 70138",
                        "SDSS composite of 16 stars",
                        "WISE J154151.65-225024.9",
                        "2MASS J01415823-4633574")) {
            assertValid(Samples.judged(RealSpectra.object(rows.get(name))));
        }
    }

    @Test
    void theSchemaRefusesWhatIsWrong() throws IOException {
        String json = ObjectJson.text(Samples.lDwarf());
        List<String> broken = new ArrayList<>();
        broken.add(json.replaceFirst("\"type_number\": [0-9.]+", "\"type_number\": \"L3\""));
        broken.add(json.replaceFirst("\"status\": ", "\"state\": "));
        broken.add(json.replaceFirst("\"severity\": \"note\"", "\"severity\": \"grave\""));
        for (String each : broken) {
            assertFalse(each.equals(json));
            assertTrue(!SCHEMA.validate(each, InputFormat.JSON).isEmpty(), each);
        }
    }
}
