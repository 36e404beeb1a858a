package emberline.cli;

import emberline.catalogue.Band;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Relation;
import emberline.catalogue.RestLine;
import emberline.reports.attach.CatalogueTable;
import emberline.reports.attach.RestLineTable;
import emberline.reports.attach.TableFormat;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code catalogue}: lists the definitions, or prints one. */
@Command(
        name = "catalogue",
        description =
                "Lists the definitions of bands and lines with their sources, or the rest"
                        + " wavelengths of lines, or prints one definition in full.",
        mixinStandardHelpOptions = true)
final class CatalogueCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private CatalogueOption catalogueOption;

    @Parameters(
            paramLabel = "ID",
            arity = "0..1",
            description = "One definition or relation in full, e.g. reid1995/tio5.")
    private String id;

    @Option(
            names = "--band",
            paramLabel = "BAND",
            description = "Only definitions of this band: ${COMPLETION-CANDIDATES}.")
    private Band band;

    @Option(
            names = "--molecule",
            paramLabel = "SPECIES",
            description = "Only definitions of this molecule or atom, e.g. H2O, K.")
    private String molecule;

    @Option(
            names = "--lines",
            description = "The rest wavelengths of atomic lines instead of definitions.")
    private boolean lines;

    @Option(
            names = "--format",
            paramLabel = "text|csv|json",
            defaultValue = "text",
            description = "Form of the table (default ${DEFAULT-VALUE}).")
    private TableFormat format;

    @Override
    public Integer call() {
        FeatureCatalogue catalogue = catalogueOption.load();
        if (id != null && (band != null || molecule != null || lines)) {
            throw new ParameterException(
                    spec.commandLine(),
                    "an id stands for itself: expected no --band, --molecule or --lines");
        }
        if (lines) {
            spec.commandLine().getOut().print(RestLineTable.print(restLines(catalogue), format));
        } else if (id != null) {
            spec.commandLine().getOut().print(one(catalogue));
        } else {
            spec.commandLine().getOut().print(CatalogueTable.print(chosen(catalogue), format));
        }
        spec.commandLine().getOut().flush();
        return ExitCode.DONE;
    }

    /** What is printed of one definition or relation. */
    private String one(FeatureCatalogue catalogue) {
        String wanted = id.toLowerCase(Locale.ROOT);
        Optional<Feature> feature = catalogue.feature(wanted);
        Optional<Relation> relation =
                catalogue.relations().stream().filter(r -> r.id().equals(wanted)).findFirst();
        if (feature.isPresent() && format != TableFormat.TEXT) {
            return CatalogueTable.print(List.of(feature.get()), format);
        }
        if (feature.isEmpty() && relation.isEmpty()) {
            throw new ParameterException(
                    spec.commandLine(),
                    "no definition or relation "
                            + id
                            + ": expected an id as 'catalogue' lists them"
                            + nearest(catalogue));
        }
        return feature.map(f -> CatalogueTable.printOne(f, catalogue)).orElse("")
                + relation.map(CatalogueTable::printOne).orElse("");
    }

    /** Definitions with the same symbol in other papers, as a suggestion. */
    private String nearest(FeatureCatalogue catalogue) {
        String symbol = id.substring(id.lastIndexOf('/') + 1).toLowerCase(Locale.ROOT);
        List<String> similar =
                catalogue.features().stream()
                        .map(Feature::id)
                        .filter(known -> known.contains(symbol))
                        .limit(4)
                        .toList();
        return similar.isEmpty() ? "" : ", perhaps " + String.join(" or ", similar);
    }

    /** The lines of the catalogue, or those of an element in any ionisation. */
    private List<RestLine> restLines(FeatureCatalogue catalogue) {
        if (band != null) {
            throw new ParameterException(
                    spec.commandLine(), "lines belong to no band: expected no --band with --lines");
        }
        List<RestLine> chosen =
                catalogue.restLines().stream()
                        .filter(line -> molecule == null || isOf(line.species(), molecule))
                        .toList();
        if (chosen.isEmpty()) {
            throw new ParameterException(
                    spec.commandLine(),
                    "no line of "
                            + molecule
                            + ": expected one of "
                            + catalogue.restLines().stream()
                                    .map(RestLine::species)
                                    .distinct()
                                    .sorted()
                                    .toList());
        }
        return chosen;
    }

    /** Whether a species such as {@code K I} is the one asked for, with or without its stage. */
    private static boolean isOf(String species, String asked) {
        return species.equalsIgnoreCase(asked)
                || species.substring(0, species.indexOf(' ')).equalsIgnoreCase(asked);
    }

    private List<Feature> chosen(FeatureCatalogue catalogue) {
        List<Feature> chosen =
                catalogue.features().stream()
                        .filter(feature -> band == null || feature.band() == band)
                        .filter(
                                feature ->
                                        molecule == null
                                                || feature.species().equalsIgnoreCase(molecule))
                        .toList();
        if (chosen.isEmpty()) {
            throw new ParameterException(
                    spec.commandLine(),
                    "no definition of "
                            + (molecule == null ? "any species" : molecule)
                            + (band == null ? "" : " in band " + band)
                            + ": expected one of "
                            + catalogue.features().stream()
                                    .map(Feature::species)
                                    .distinct()
                                    .sorted()
                                    .toList());
        }
        return chosen;
    }
}
