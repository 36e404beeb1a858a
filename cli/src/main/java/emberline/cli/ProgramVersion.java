package emberline.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;
import picocli.CommandLine.IVersionProvider;

/** The version of the program, as built. */
final class ProgramVersion implements IVersionProvider {

    /** The version number, e.g. {@code 0.1.0}. */
    static String number() {
        Properties properties = new Properties();
        try (InputStream stream =
                ProgramVersion.class.getResourceAsStream("/emberline/cli/version.properties")) {
            properties.load(stream);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return properties.getProperty("version");
    }

    @Override
    public String[] getVersion() {
        return new String[] {"emberline " + number()};
    }
}
