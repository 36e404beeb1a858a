package emberline.demo;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;

/**
 * Writes the invented survey into a folder: {@code candidates.csv}, {@code truth.csv} and the
 * spectra beside them. Everything in it is made up: no object, place or measurement is real. What
 * comes out depends on nothing but the tables of this module, so that two runs give the same bytes.
 *
 * <p>Call with one argument, the folder, e.g. {@code demo-objects/survey}; it is made if it is not
 * there, and files of the same names are replaced. To add an object, add a row to {@code
 * objects.csv} and one to {@code observations.csv}.
 */
public final class MakeSurvey {

    private MakeSurvey() {}

    /**
     * Writes the survey.
     *
     * @param arguments the folder, nothing else
     * @throws IOException if a file cannot be written
     * @throws IllegalArgumentException if there is not exactly one argument
     */
    public static void main(String[] arguments) throws IOException {
        if (arguments.length != 1) {
            throw new IllegalArgumentException(
                    "found " + arguments.length + " arguments: expected one, the folder to write");
        }
        write(Path.of(arguments[0]));
    }

    /**
     * Writes the survey.
     *
     * @param folder where to
     * @throws IOException if a file cannot be written
     */
    public static void write(Path folder) throws IOException {
        Files.createDirectories(folder.resolve(SurveyMaker.SPECTRA));
        for (Map.Entry<String, byte[]> file : new SurveyMaker().files().entrySet()) {
            Files.write(folder.resolve(file.getKey()), file.getValue());
        }
    }
}
