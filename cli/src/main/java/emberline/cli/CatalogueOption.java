package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.InvalidCatalogueException;
import emberline.read.Checksum;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.stream.Stream;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** The option that adds the user's own definitions to the product's. */
final class CatalogueOption {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Option(
            names = "--catalogue",
            paramLabel = "DIR",
            description = "Folder with definitions of your own, in the product's format.")
    private Path folder;

    /** The product's catalogue, with the user's definitions if there are any. */
    FeatureCatalogue load() {
        FeatureCatalogue standard = FeatureCatalogue.standard();
        if (folder == null) {
            return standard;
        }
        try {
            return standard.with(folder);
        } catch (InvalidCatalogueException e) {
            throw new ParameterException(spec.commandLine(), "--catalogue: " + e.getMessage());
        }
    }

    /** Checksum of the files of the user's definitions; empty where there are none. */
    String sha256() throws IOException {
        if (folder == null) {
            return "";
        }
        try (Stream<Path> files = Files.walk(folder)) {
            MessageDigest digest = Checksum.sha256();
            for (Path file : files.filter(Files::isRegularFile).sorted().toList()) {
                digest.update((folder.relativize(file) + "\n").getBytes(StandardCharsets.UTF_8));
                digest.update(Files.readAllBytes(file));
            }
            return HexFormat.of().formatHex(digest.digest());
        }
    }
}
