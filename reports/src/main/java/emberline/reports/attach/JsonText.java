package emberline.reports.attach;

import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;

/**
 * JSON as this product writes it: two levels on lines of their own, what lies deeper on one line;
 * line feeds on every system; numbers with the digits of the tables, {@code null} where there is no
 * number, never NaN.
 */
final class JsonText {

    private static final JSON WRITER =
            JSON.std.with(JSON.Feature.WRITE_NULL_PROPERTIES).with(new Layout());

    private JsonText() {}

    /** The text of maps, lists, strings and numbers, with a line end. */
    static String of(Object value) {
        try {
            return WRITER.asString(value) + "\n";
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Printed digits as a number; null where they are empty. */
    static BigDecimal number(String digits) {
        return digits.isEmpty() ? null : new BigDecimal(digits);
    }

    /** Breaks lines on the outer levels only. */
    private static final class Layout extends DefaultPrettyPrinter {

        private static final long serialVersionUID = 1L;
        private static final int LEVELS_ON_LINES = 2;

        Layout() {
            DefaultIndenter lines = new DefaultIndenter("  ", "\n");
            _objectIndenter = lines;
            _arrayIndenter = lines;
        }

        @Override
        public DefaultPrettyPrinter createInstance() {
            return new Layout();
        }

        private boolean isDeep() {
            return _nesting > LEVELS_ON_LINES;
        }

        @Override
        public void beforeObjectEntries(JsonGenerator generator) throws IOException {
            if (!isDeep()) {
                super.beforeObjectEntries(generator);
            }
        }

        @Override
        public void writeObjectFieldValueSeparator(JsonGenerator generator) throws IOException {
            generator.writeRaw(": ");
        }

        @Override
        public void writeObjectEntrySeparator(JsonGenerator generator) throws IOException {
            if (isDeep()) {
                generator.writeRaw(", ");
            } else {
                super.writeObjectEntrySeparator(generator);
            }
        }

        @Override
        public void writeEndObject(JsonGenerator generator, int entries) throws IOException {
            if (isDeep()) {
                _nesting--;
                generator.writeRaw('}');
            } else {
                super.writeEndObject(generator, entries);
            }
        }

        @Override
        public void beforeArrayValues(JsonGenerator generator) throws IOException {
            if (!isDeep()) {
                super.beforeArrayValues(generator);
            }
        }

        @Override
        public void writeArrayValueSeparator(JsonGenerator generator) throws IOException {
            if (isDeep()) {
                generator.writeRaw(", ");
            } else {
                super.writeArrayValueSeparator(generator);
            }
        }

        @Override
        public void writeEndArray(JsonGenerator generator, int values) throws IOException {
            if (isDeep()) {
                _nesting--;
                generator.writeRaw(']');
            } else {
                super.writeEndArray(generator, values);
            }
        }
    }
}
