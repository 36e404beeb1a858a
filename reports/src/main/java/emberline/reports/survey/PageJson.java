package emberline.reports.survey;

import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.io.UncheckedIOException;

/** JSON that may stand in a script element: no sign in it can end the element or a line. */
final class PageJson {

    private PageJson() {}

    /** The text of maps, lists, strings and numbers. */
    static String of(Object value) {
        try {
            return JSON.std
                    .asString(value)
                    .replace("<", "\\u003c")
                    .replace(">", "\\u003e")
                    .replace("&", "\\u0026")
                    .replace("\u2028", "\\u2028")
                    .replace("\u2029", "\\u2029");
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
