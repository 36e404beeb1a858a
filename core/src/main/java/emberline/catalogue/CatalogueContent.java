package emberline.catalogue;

import java.util.List;
import java.util.stream.Stream;

/** The lists that make a catalogue. */
record CatalogueContent(
        List<Source> sources,
        List<Feature> features,
        List<Relation> relations,
        List<GravityThreshold> gravityThresholds,
        List<TypeBoundary> typeBoundaries,
        List<PairPlane> pairPlanes,
        List<MetallicityClass> metallicityClasses,
        List<ActivityFactor> activityFactors,
        List<RestLine> restLines,
        List<TelluricRegion> telluricRegions,
        List<MolecularBand> molecularBands) {

    /** Copies the lists. */
    CatalogueContent {
        sources = List.copyOf(sources);
        features = List.copyOf(features);
        relations = List.copyOf(relations);
        gravityThresholds = List.copyOf(gravityThresholds);
        typeBoundaries = List.copyOf(typeBoundaries);
        pairPlanes = List.copyOf(pairPlanes);
        metallicityClasses = List.copyOf(metallicityClasses);
        activityFactors = List.copyOf(activityFactors);
        restLines = List.copyOf(restLines);
        telluricRegions = List.copyOf(telluricRegions);
        molecularBands = List.copyOf(molecularBands);
    }

    /** A content of empty lists. */
    static CatalogueContent empty() {
        return new CatalogueContent(
                List.of(), List.of(), List.of(), List.of(), List.of(), List.of(), List.of(),
                List.of(), List.of(), List.of(), List.of());
    }

    /** One list after another. */
    static <T> List<T> joined(List<T> first, List<T> second) {
        return Stream.concat(first.stream(), second.stream()).toList();
    }
}
