package emberline.catalogue;

import java.util.OptionalDouble;

/**
 * The approximate extent of a molecular band, for labels on plots; not for measuring.
 *
 * @param species the molecule, e.g. {@code TiO}
 * @param extent where the band takes light away (micron, vacuum)
 * @param headMicron the band head (micron, vacuum); empty where there is none or it is not known
 * @param typeMin earliest type (subclass) in which the band is seen
 * @param typeMax latest type (subclass) in which the band is seen
 * @param source where the extent comes from
 * @param howKnown how it reached this catalogue
 * @param confidencePercent how sure it is, 0 to 100
 * @param note a remark; may be blank
 */
public record MolecularBand(
        String species,
        Window extent,
        OptionalDouble headMicron,
        double typeMin,
        double typeMax,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** Checks that the head lies in the extent and that the types are in order. */
    public MolecularBand {
        double head = headMicron.orElse(extent.lowMicron());
        if (!(head >= extent.lowMicron() && head <= extent.highMicron())) {
            throw new IllegalArgumentException(
                    species + " band: expected the head within the extent, not " + head);
        }
        if (!(typeMin <= typeMax)) {
            throw new IllegalArgumentException(species + " band: expected type_min up to type_max");
        }
    }
}
