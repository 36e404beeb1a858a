package emberline.catalogue;

import java.util.List;

/** Reads a set of tables on top of a catalogue that is loaded already. */
final class CatalogueLoader {

    private CatalogueLoader() {}

    /** The content before, with that of the tables added. */
    static CatalogueContent load(CatalogueTables tables, CatalogueContent before)
            throws InvalidCatalogueException {
        KnownSources sources =
                KnownSources.of(CatalogueTable.read(tables, TableKind.SOURCES), before.sources());
        KnownIds featureIds = new KnownIds("feature");
        before.features().forEach(feature -> featureIds.addLoaded(feature.id()));
        KnownIds relationIds = new KnownIds("relation");
        before.relations().forEach(relation -> relationIds.addLoaded(relation.id()));

        List<Feature> features =
                CatalogueContent.joined(
                        before.features(), new FeatureTables(sources, featureIds).read(tables));
        List<Relation> relations =
                CatalogueContent.joined(
                        before.relations(),
                        new RelationTables(sources, featureIds, relationIds).read(tables));
        CatalogueLinks.check(tables.label(""), features, relations);
        CriterionTables criteria = new CriterionTables(tables, sources, featureIds);
        MarkTables marks = new MarkTables(tables, sources);
        return new CatalogueContent(
                CatalogueContent.joined(before.sources(), sources.added()),
                features,
                relations,
                CatalogueContent.joined(before.gravityThresholds(), criteria.gravityThresholds()),
                CatalogueContent.joined(before.typeBoundaries(), criteria.typeBoundaries()),
                CatalogueContent.joined(before.pairPlanes(), criteria.pairPlanes()),
                CatalogueContent.joined(before.metallicityClasses(), criteria.metallicityClasses()),
                CatalogueContent.joined(before.activityFactors(), criteria.activityFactors()),
                CatalogueContent.joined(before.restLines(), marks.restLines()),
                CatalogueContent.joined(before.telluricRegions(), marks.telluricRegions()),
                CatalogueContent.joined(before.molecularBands(), marks.molecularBands()));
    }
}
