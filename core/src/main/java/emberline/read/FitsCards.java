package emberline.read;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * The cards of a FITS header as bytes, in which single values can be changed. It knows values on
 * one card only; anything finer is left to the FITS library.
 */
final class FitsCards {

    static final int BLOCK = 2880;
    private static final int CARD = 80;
    private static final int KEY = 8;
    private static final int VALUE_END = 30;

    private final byte[] bytes;
    private final Map<String, Integer> places;

    private FitsCards(byte[] bytes, Map<String, Integer> places) {
        this.bytes = bytes;
        this.places = places;
    }

    /** Cards from whole blocks that hold the END card. */
    static FitsCards of(byte[] blocks) {
        byte[] bytes = blocks.clone();
        Map<String, Integer> places = new HashMap<>();
        for (int at = 0; at + CARD <= bytes.length; at += CARD) {
            String key = new String(bytes, at, KEY, StandardCharsets.ISO_8859_1).trim();
            if (key.equals("END")) {
                break;
            }
            if (bytes[at + KEY] == '=') {
                places.putIfAbsent(key, at);
            }
        }
        return new FitsCards(bytes, places);
    }

    /** Whether a block holds the END card. */
    static boolean holdsEnd(byte[] block) {
        for (int at = 0; at + CARD <= block.length; at += CARD) {
            if (block[at] == 'E'
                    && block[at + 1] == 'N'
                    && block[at + 2] == 'D'
                    && block[at + 3] == ' ') {
                return true;
            }
        }
        return false;
    }

    /** A text value without its quotes, or a number as written; empty where there is none. */
    Optional<String> text(String key) {
        Integer at = places.get(key);
        if (at == null) {
            return Optional.empty();
        }
        String value = new String(bytes, at + 10, CARD - 10, StandardCharsets.ISO_8859_1);
        String trimmed = value.stripLeading();
        if (trimmed.startsWith("'")) {
            int end = trimmed.indexOf('\'', 1);
            while (end > 0 && end + 1 < trimmed.length() && trimmed.charAt(end + 1) == '\'') {
                end = trimmed.indexOf('\'', end + 2);
            }
            String inside = trimmed.substring(1, end < 0 ? trimmed.length() : end);
            return Optional.of(inside.replace("''", "'").trim()).filter(text -> !text.isEmpty());
        }
        int comment = value.indexOf('/');
        String plain = (comment < 0 ? value : value.substring(0, comment)).trim();
        return Optional.of(plain).filter(text -> !text.isEmpty());
    }

    /** A whole number; the other where there is none. */
    long number(String key, long other) {
        Optional<Double> number = text(key).flatMap(Keywords::number);
        return number.isPresent() ? (long) number.get().doubleValue() : other;
    }

    /** A copy with a whole number in place of a value that is there already. */
    FitsCards with(String key, long value) {
        Integer at = places.get(key);
        if (at == null) {
            return this;
        }
        byte[] changed = bytes.clone();
        Arrays.fill(changed, at + 10, at + CARD, (byte) ' ');
        byte[] digits =
                String.format(Locale.ROOT, "%20d", value).getBytes(StandardCharsets.US_ASCII);
        System.arraycopy(digits, 0, changed, at + VALUE_END - digits.length, digits.length);
        return new FitsCards(changed, places);
    }

    /** A copy without a card. */
    FitsCards without(String key) {
        Integer at = places.get(key);
        if (at == null) {
            return this;
        }
        byte[] changed = bytes.clone();
        Arrays.fill(changed, at, at + CARD, (byte) ' ');
        Map<String, Integer> others = new HashMap<>(places);
        others.remove(key);
        return new FitsCards(changed, others);
    }

    /** A copy with more cards before the END card; texts get quotes. */
    FitsCards plus(Map<String, Object> more) {
        StringBuilder cards = new StringBuilder();
        more.forEach(
                (key, value) ->
                        cards.append(
                                String.format(
                                        Locale.ROOT,
                                        "%-80s",
                                        String.format(
                                                Locale.ROOT,
                                                value instanceof String
                                                        ? "%-8s= '%s'"
                                                        : "%-8s= %20s",
                                                key,
                                                value))));
        int end = endOfCards();
        byte[] added = cards.toString().getBytes(StandardCharsets.ISO_8859_1);
        int length = (end + added.length + CARD + BLOCK - 1) / BLOCK * BLOCK;
        byte[] longer = new byte[length];
        Arrays.fill(longer, (byte) ' ');
        System.arraycopy(bytes, 0, longer, 0, end);
        System.arraycopy(added, 0, longer, end, added.length);
        System.arraycopy(
                "END".getBytes(StandardCharsets.US_ASCII), 0, longer, end + added.length, 3);
        return of(longer);
    }

    private int endOfCards() {
        for (int at = 0; at + CARD <= bytes.length; at += CARD) {
            String key = new String(bytes, at, KEY, StandardCharsets.ISO_8859_1);
            if (key.equals("END     ")) {
                return at;
            }
        }
        return bytes.length;
    }

    /** A copy of the bytes, whole blocks. */
    byte[] bytes() {
        return bytes.clone();
    }

    /** The size of the data as declared (bytes, without filling). */
    double dataBytes() {
        long axes = number("NAXIS", 0);
        double size = axes <= 0 ? 0 : 1;
        for (int i = 1; i <= axes && i <= 999; i++) {
            size *= Math.max(0, number("NAXIS" + i, 0));
        }
        double heap = Math.max(0, number("PCOUNT", 0));
        double groups = Math.max(1, number("GCOUNT", 1));
        return axes <= 0 ? 0 : Math.abs(number("BITPIX", 8)) / 8.0 * groups * (heap + size);
    }

    /** Whether this is a table. */
    boolean isTable() {
        String kind = text("XTENSION").orElse("");
        return kind.equals("BINTABLE") && !text("ZIMAGE").orElse("F").equals("T");
    }

    /** Whether this is an image with data. */
    boolean isImage() {
        return text("XTENSION").orElse("IMAGE").equals("IMAGE") && dataBytes() > 0;
    }
}
