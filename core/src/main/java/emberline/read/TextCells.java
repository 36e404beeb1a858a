package emberline.read;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The cells of one line of a text table as ranges of bytes without blanks around them. Lines with
 * quotes go through the CSV library; all others are cut where the separator stands.
 */
final class TextCells {

    /** The separator for "any number of blanks". */
    static final char BLANKS = ' ';

    private byte[] bytes;
    private int[] from = new int[8];
    private int[] to = new int[8];
    private int count;

    /** Cuts a line into cells. */
    void cut(byte[] content, int start, int end, char separator) {
        bytes = content;
        count = 0;
        if (separator == BLANKS) {
            cutAtBlanks(start, end);
        } else if (indexOf(content, start, end, '"') >= 0) {
            cutQuoted(content, start, end, separator);
        } else {
            cutAt(start, end, separator);
        }
    }

    int count() {
        return count;
    }

    DecimalText.Cell kind(int cell) {
        return DecimalText.kind(bytes, from[cell], to[cell]);
    }

    double number(int cell) {
        return DecimalText.parse(bytes, from[cell], to[cell]);
    }

    String text(int cell) {
        return decode(bytes, from[cell], to[cell]);
    }

    List<String> texts() {
        List<String> texts = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            texts.add(text(i));
        }
        return texts;
    }

    /** Decodes UTF-8, or Latin-1 where the bytes are no UTF-8. */
    static String decode(byte[] bytes, int from, int to) {
        try {
            return StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(ByteBuffer.wrap(bytes, from, to - from))
                    .toString();
        } catch (CharacterCodingException e) {
            return new String(bytes, from, to - from, StandardCharsets.ISO_8859_1);
        }
    }

    static int indexOf(byte[] bytes, int from, int to, char c) {
        for (int i = from; i < to; i++) {
            if (bytes[i] == c) {
                return i;
            }
        }
        return -1;
    }

    private void cutAtBlanks(int start, int end) {
        int i = start;
        while (i < end) {
            while (i < end && bytes[i] <= ' ' && bytes[i] >= 0) {
                i++;
            }
            int first = i;
            while (i < end && !(bytes[i] <= ' ' && bytes[i] >= 0)) {
                i++;
            }
            if (i > first) {
                add(first, i);
            }
        }
    }

    private void cutAt(int start, int end, char separator) {
        int first = start;
        for (int i = start; i <= end; i++) {
            if (i == end || bytes[i] == separator) {
                addTrimmed(first, i);
                first = i + 1;
            }
        }
    }

    private void cutQuoted(byte[] content, int start, int end, char separator) {
        String line = decode(content, start, end);
        try {
            List<String> fields =
                    CsvReader.builder()
                            .fieldSeparator(separator)
                            .trimWhitespacesAroundQuotes(true)
                            .ofSingleCsvRecord(line)
                            .getFields();
            bytes = String.join("\n", fields).getBytes(StandardCharsets.UTF_8);
            cutAt(0, bytes.length, '\n');
        } catch (CsvParseException e) {
            cutAt(start, end, separator);
        }
    }

    private void addTrimmed(int first, int end) {
        int a = first;
        int b = end;
        while (a < b && bytes[a] <= ' ' && bytes[a] >= 0) {
            a++;
        }
        while (b > a && bytes[b - 1] <= ' ' && bytes[b - 1] >= 0) {
            b--;
        }
        add(a, b);
    }

    private void add(int first, int end) {
        if (count == from.length) {
            from = Arrays.copyOf(from, count * 2);
            to = Arrays.copyOf(to, count * 2);
        }
        from[count] = first;
        to[count++] = end;
    }
}
