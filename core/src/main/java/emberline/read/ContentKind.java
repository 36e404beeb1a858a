package emberline.read;

import java.nio.charset.StandardCharsets;
import java.util.Locale;

/** What kind of file some bytes are, told by their first bytes, never by the name of the file. */
enum ContentKind {
    FITS("a FITS file", true),
    VOTABLE("a VOTable", true),
    ECSV("an ECSV table", true),
    TEXT("plain text", true),
    PNG("a PNG picture", false),
    JPEG("a JPEG picture", false),
    GIF("a GIF picture", false),
    TIFF("a TIFF picture", false),
    PDF("a PDF document", false),
    ZIP("a ZIP archive (or an office document)", false),
    GZIP("a gzip file within a gzip file", false),
    BZIP2("a bzip2 archive", false),
    XZ("an xz archive", false),
    HDF5("an HDF5 file", false),
    NUMPY("a NumPy array file", false),
    PARQUET("a Parquet file", false),
    HTML("a web page (HTML)", false),
    XML("an XML document that is no VOTable", false),
    JSON("a JSON document", false),
    POSTSCRIPT("a PostScript document", false),
    WIDE_TEXT("text in UTF-16", false),
    BINARY("binary data of an unknown kind", false);

    private static final int LOOK = 4096;

    private final String words;
    private final boolean known;

    ContentKind(String words, boolean known) {
        this.words = words;
        this.known = known;
    }

    /** The kind in words with an article, to stand in a message. */
    String words() {
        return words;
    }

    /** Whether spectra and lists can be read from this kind. */
    boolean known() {
        return known;
    }

    /** Tells the kind of some unpacked content that is not empty. */
    static ContentKind of(byte[] content) {
        String head =
                new String(content, 0, Math.min(content.length, LOOK), StandardCharsets.ISO_8859_1);
        ContentKind byMagic = byMagic(head);
        if (byMagic != null) {
            return byMagic;
        }
        String text = head.startsWith("\u00ef\u00bb\u00bf") ? head.substring(3) : head;
        String start = text.stripLeading();
        if (start.startsWith("<")) {
            return markup(start.toLowerCase(Locale.ROOT));
        }
        if (start.matches("(?s)# *%ECSV.*")) {
            return ECSV;
        }
        if (start.startsWith("{") || start.matches("(?s)\\[\\s*[\\[{].*")) {
            return JSON;
        }
        return looksLikeText(head) ? TEXT : BINARY;
    }

    private static ContentKind byMagic(String head) {
        for (Magic magic : Magic.values()) {
            if (head.startsWith(magic.start)) {
                return magic.kind;
            }
        }
        return null;
    }

    private static ContentKind markup(String start) {
        if (start.matches("(?s).*<([a-z0-9_.-]+:)?votable[\\s>].*")
                || start.matches("(?s).*<!doctype\\s+votable.*")) {
            return VOTABLE;
        }
        return start.contains("<html") || start.contains("<!doctype html") ? HTML : XML;
    }

    private static boolean looksLikeText(String head) {
        int control = 0;
        for (int i = 0; i < head.length(); i++) {
            char c = head.charAt(i);
            if (c == 0) {
                return false;
            }
            if (c < ' ' && c != '\n' && c != '\r' && c != '\t' && c != '\f') {
                control++;
            }
        }
        return control * 50 <= head.length();
    }

    /** The first bytes by which kinds are known, as their makers define them. */
    private enum Magic {
        FITS_START("SIMPLE  =", FITS),
        PNG_START("\u0089PNG", PNG),
        JPEG_START("\u00ff\u00d8\u00ff", JPEG),
        GIF_START("GIF8", GIF),
        TIFF_LITTLE("II*\0", TIFF),
        TIFF_BIG("MM\0*", TIFF),
        PDF_START("%PDF", PDF),
        ZIP_START("PK\u0003\u0004", ZIP),
        ZIP_EMPTY("PK\u0005\u0006", ZIP),
        GZIP_START("\u001f\u008b", GZIP),
        BZIP2_START("BZh", BZIP2),
        XZ_START("\u00fd7zXZ", XZ),
        HDF5_START("\u0089HDF", HDF5),
        NUMPY_START("\u0093NUMPY", NUMPY),
        PARQUET_START("PAR1", PARQUET),
        POSTSCRIPT_START("%!PS", POSTSCRIPT),
        UTF16_LITTLE("\u00ff\u00fe", WIDE_TEXT),
        UTF16_BIG("\u00fe\u00ff", WIDE_TEXT);

        private final String start;
        private final ContentKind kind;

        Magic(String start, ContentKind kind) {
            this.start = start;
            this.kind = kind;
        }
    }
}
