package emberline.read;

import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The address of one spectrum within a FITS file that holds many: the path of the file, {@code #},
 * and {@code hdu=2}, {@code row=17} or {@code hdu=1&row=17}. HDUs count from 0 for the primary one,
 * rows from 1.
 *
 * @param file the path as written
 * @param hdu the HDU; empty for the first that has rows
 * @param row the row of its table or image; empty for all of the HDU
 */
record PackedAddress(String file, OptionalInt hdu, OptionalLong row) {

    private static final Pattern WRITTEN =
            Pattern.compile("(.+)#(?:hdu=(\\d{1,9}))?(&?)(?:row=(\\d{1,12}))?");
    private static final Pattern MEANT = Pattern.compile(".+#(hdu|row)=.*");

    /** Reads an address; empty where the text is a plain path. */
    static Optional<PackedAddress> parse(String text) throws UnreadableSpectrumException {
        if (!MEANT.matcher(text).matches()) {
            return Optional.empty();
        }
        Matcher matcher = WRITTEN.matcher(text);
        boolean proper =
                matcher.matches()
                        && (matcher.group(2) != null && matcher.group(4) != null)
                                == !matcher.group(3).isEmpty()
                        && !(matcher.group(4) != null && Long.parseLong(matcher.group(4)) == 0);
        if (!proper) {
            throw new UnreadableSpectrumException(
                    text,
                    "an address that cannot be read",
                    "FILE#hdu=H, FILE#row=R or FILE#hdu=H&row=R, with HDUs from 0 and rows from 1",
                    "Correct the address.");
        }
        return Optional.of(
                new PackedAddress(
                        matcher.group(1),
                        matcher.group(2) == null
                                ? OptionalInt.empty()
                                : OptionalInt.of(Integer.parseInt(matcher.group(2))),
                        matcher.group(4) == null
                                ? OptionalLong.empty()
                                : OptionalLong.of(Long.parseLong(matcher.group(4)))));
    }

    /** The address of an HDU or a row of it. */
    static String text(String file, int hdu, OptionalLong row) {
        return file + "#hdu=" + hdu + (row.isPresent() ? "&row=" + row.getAsLong() : "");
    }
}
