package emberline.catalogue;

import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * All definitions: features with their windows, published relations, criteria, lines and bands, and
 * the papers they come from. A value; make it once and hand it on.
 */
public final class FeatureCatalogue {

    private final CatalogueContent content;
    private final Map<String, Feature> featureById;

    private FeatureCatalogue(CatalogueContent content) {
        this.content = content;
        this.featureById =
                content.features().stream()
                        .collect(
                                Collectors.toUnmodifiableMap(
                                        feature -> feature.id().toLowerCase(Locale.ROOT),
                                        Function.identity()));
    }

    /**
     * The catalogue of the product. Each call reads the tables anew.
     *
     * @return the definitions that ship with the product
     * @throws UncheckedIOException if the product is damaged
     */
    public static FeatureCatalogue standard() {
        try {
            return new FeatureCatalogue(
                    CatalogueLoader.load(new ResourceTables(), CatalogueContent.empty()));
        } catch (InvalidCatalogueException e) {
            throw new UncheckedIOException(e);
        }
    }

    /**
     * This catalogue with the tables of a user added. The folder has the layout that {@code
     * SCHEMA.md} describes; each file may be missing. Its ids must be new; its parts, relations and
     * criteria may use features and sources of this catalogue.
     *
     * @param userFolder folder of the tables
     * @return a new catalogue; this one is unchanged
     * @throws InvalidCatalogueException if the folder cannot be read or a table cannot be used; the
     *     message names file, line and column
     */
    public FeatureCatalogue with(Path userFolder) throws InvalidCatalogueException {
        return new FeatureCatalogue(CatalogueLoader.load(FolderTables.of(userFolder), content));
    }

    /**
     * All features.
     *
     * @return features in the order of the tables
     */
    public List<Feature> features() {
        return content.features();
    }

    /**
     * A feature by its id.
     *
     * @param id e.g. {@code reid1995/tio5}, in any case
     * @return the feature, or empty where there is none
     */
    public Optional<Feature> feature(String id) {
        return Optional.ofNullable(featureById.get(id.toLowerCase(Locale.ROOT)));
    }

    /**
     * All relations.
     *
     * @return relations in the order of the tables
     */
    public List<Relation> relations() {
        return content.relations();
    }

    /**
     * The relations that give one quantity.
     *
     * @param quantity a quantity
     * @return relations in the order of the tables
     */
    public List<Relation> relations(Quantity quantity) {
        return content.relations().stream()
                .filter(relation -> relation.quantity() == quantity)
                .toList();
    }

    /**
     * The solar TiO5 curve of a metallicity shortfall: the relation of the same paper in the same
     * argument.
     *
     * @param shortfall a feature of this catalogue
     * @return the curve; empty where the feature has another form
     */
    public Optional<Relation> solarCurve(Feature shortfall) {
        return CatalogueLinks.solarCurve(shortfall, content.relations());
    }

    /**
     * The limits of the gravity scores.
     *
     * @return limits in the order of the tables; a type without a row is not scored
     */
    public List<GravityThreshold> gravityThresholds() {
        return content.gravityThresholds();
    }

    /**
     * The ranges of indices that subclasses take up.
     *
     * @return ranges in the order of the tables
     */
    public List<TypeBoundary> typeBoundaries() {
        return content.typeBoundaries();
    }

    /**
     * The criteria for unresolved pairs.
     *
     * @return criteria in the order of the tables
     */
    public List<PairPlane> pairPlanes() {
        return content.pairPlanes();
    }

    /**
     * The metallicity classes.
     *
     * @return classes in the order of the tables
     */
    public List<MetallicityClass> metallicityClasses() {
        return content.metallicityClasses();
    }

    /**
     * The numbers that turn the width of H alpha into an activity.
     *
     * @return numbers in the order of the tables
     */
    public List<ActivityFactor> activityFactors() {
        return content.activityFactors();
    }

    /**
     * The atomic lines.
     *
     * @return lines in the order of the table
     */
    public List<RestLine> restLines() {
        return content.restLines();
    }

    /**
     * The regions that the atmosphere of the Earth can spoil.
     *
     * @return regions in the order of the table
     */
    public List<TelluricRegion> telluricRegions() {
        return content.telluricRegions();
    }

    /**
     * The molecular bands for labels.
     *
     * @return bands in the order of the table
     */
    public List<MolecularBand> molecularBands() {
        return content.molecularBands();
    }

    /**
     * The papers.
     *
     * @return sources in the order of the table
     */
    public List<Source> sources() {
        return content.sources();
    }

    /**
     * A source by its key.
     *
     * @param key e.g. {@code reid1995}
     * @return the source, or empty where there is none
     */
    public Optional<Source> source(String key) {
        return content.sources().stream().filter(source -> source.key().equals(key)).findFirst();
    }
}
