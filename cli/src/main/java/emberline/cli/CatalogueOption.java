package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.InvalidCatalogueException;
import java.nio.file.Path;
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
}
