package emberline.reports.attach;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.reports.attach.ResultColumn.Content;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The schema of the JSON of an object (JSON Schema 2020-12): the columns of the results table, made
 * from their definitions, and the parts that a table cannot hold.
 */
public final class ObjectSchema {

    /** Name of the file that holds the schema. */
    public static final String FILE = "emberline-object.schema.json";

    private static final String PARTS = "/emberline/reports/attach/object-parts.json";

    private ObjectSchema() {}

    /**
     * The schema.
     *
     * @return one JSON object over several lines, with a line end
     */
    public static String text() {
        Map<String, Object> properties = new LinkedHashMap<>();
        for (ResultColumn column : ResultColumns.standard()) {
            Map<String, Object> property = new LinkedHashMap<>();
            property.put(
                    "type",
                    column.content() == Content.NUMBER ? List.of("number", "null") : "string");
            property.put(
                    "description",
                    column.description()
                            + (column.unit().isEmpty() ? "" : " (" + column.unit() + ")"));
            properties.put(column.name(), property);
        }
        List<String> required = new ArrayList<>(properties.keySet());
        properties.putAll(parts());
        Map<String, Object> schema = new LinkedHashMap<>();
        schema.put("$schema", "https://json-schema.org/draft/2020-12/schema");
        schema.put("title", "The result of an object");
        schema.put("type", "object");
        schema.put("required", required);
        schema.put("properties", properties);
        return JsonText.of(schema);
    }

    private static Map<String, Object> parts() {
        try (InputStream stream = ObjectSchema.class.getResourceAsStream(PARTS)) {
            if (stream == null) {
                throw new FileNotFoundException(
                        PARTS + ": not on the class path; install the product anew");
            }
            return JSON.std.mapFrom(stream);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
