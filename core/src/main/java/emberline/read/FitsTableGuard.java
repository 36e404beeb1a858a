package emberline.read;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Checks what the header of a FITS table declares before a library makes room for it: the cells of
 * a row must fit into the row, and a shape into its cell. The size of all rows has been checked
 * against the file before.
 */
final class FitsTableGuard {

    private static final Pattern BINARY = Pattern.compile("(\\d*)([LXBIJKAEDCMPQ]).*");
    private static final Pattern ASCII = Pattern.compile("[AIFED](\\d+).*");
    private static final int MOST_FIELDS = 999;

    private FitsTableGuard() {}

    /** Returns only if the declared columns fit into the declared rows. */
    static void check(FitsUnit unit) throws UnreadableSpectrumException {
        boolean binary = !unit.text("XTENSION").orElse("").equals("TABLE");
        double row = unit.number("NAXIS1").orElse(0.0);
        double fields = unit.number("TFIELDS").orElse(0.0);
        if (!(row >= 1) || !(fields >= 1 && fields <= MOST_FIELDS)) {
            throw refused(unit, (long) fields + " columns in rows of " + (long) row + " bytes");
        }
        double used = 0;
        for (int i = 1; i <= fields; i++) {
            String form = unit.text("TFORM" + i).orElse("");
            double width = binary ? binaryWidth(unit, i, form) : asciiWidth(form);
            used = binary ? used + width : Math.max(used, width);
            if (!(width >= 0) || !(used <= row)) {
                throw refused(
                        unit,
                        "column "
                                + i
                                + " of form '"
                                + form
                                + "' in rows of "
                                + (long) row
                                + " bytes");
            }
        }
    }

    /** Whether any column holds arrays of variable length. */
    static boolean hasVariableArrays(FitsUnit unit) {
        for (int i = 1; i <= MOST_FIELDS; i++) {
            if (unit.text("TFORM" + i).orElse("").matches("\\d*[PQ].*")) {
                return true;
            }
        }
        return false;
    }

    private static double binaryWidth(FitsUnit unit, int field, String form) {
        Matcher matcher = BINARY.matcher(form);
        if (!matcher.matches()) {
            return Double.NaN;
        }
        double count = matcher.group(1).isEmpty() ? 1 : Double.parseDouble(matcher.group(1));
        double cells = 1;
        Optional<String> shape = unit.text("TDIM" + field);
        for (String length : shape.orElse("").replaceAll("[^0-9,]", "").split(",", -1)) {
            cells *= length.isEmpty() ? 1 : Double.parseDouble(length);
        }
        char kind = matcher.group(2).charAt(0);
        boolean pointer = kind == 'P' || kind == 'Q';
        if (shape.isPresent() && cells > count && !pointer) {
            return Double.NaN;
        }
        double width =
                switch (kind) {
                    case 'X' -> 0.125;
                    case 'I' -> 2;
                    case 'J', 'E' -> 4;
                    case 'K', 'D', 'C', 'P' -> 8;
                    case 'M', 'Q' -> 16;
                    default -> 1;
                };
        return Math.ceil(count * width);
    }

    private static double asciiWidth(String form) {
        Matcher matcher = ASCII.matcher(form);
        return matcher.matches() ? Double.parseDouble(matcher.group(1)) : Double.NaN;
    }

    private static UnreadableSpectrumException refused(FitsUnit unit, String found) {
        return new UnreadableSpectrumException(
                unit.where(),
                found,
                "columns that fit into the rows",
                "The header is damaged: fetch the file again or write it with a FITS library.");
    }
}
