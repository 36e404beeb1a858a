package emberline.place;

import emberline.place.calibrated.CalibratedType;
import emberline.place.kind.Kin;
import emberline.place.kind.KindVerdict;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairVerdict;
import emberline.place.photometric.PhotometricType;
import emberline.place.reddening.ReddeningFit;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Where an object stands: its kind, type, gravity, metallicity and activity with what they rest on.
 *
 * @param type the adopted type; empty where none could be given, or the object is no late dwarf
 * @param typeReason why there is no type; empty where there is one
 * @param published the first witness: the published relations
 * @param calibrated the second witness: the loci of spectra of known type
 * @param reddening type and extinction fitted together, where that was asked for
 * @param gravity the gravity class
 * @param metallicity the metallicity class
 * @param activity the activity by H alpha
 * @param kind what kind of object it is
 * @param kin the reference objects nearest to it, the nearest first
 * @param pair whether it may be an unresolved pair
 * @param photometric what its colours say; empty where they were not looked at
 * @param findings what the observer should know about the placement
 */
public record Placement(
        Optional<TypeEstimate> type,
        String typeReason,
        PublishedType published,
        CalibratedType calibrated,
        Optional<ReddeningFit> reddening,
        GravityVerdict gravity,
        MetallicityVerdict metallicity,
        Activity activity,
        KindVerdict kind,
        List<Kin> kin,
        PairVerdict pair,
        Optional<PhotometricType> photometric,
        List<Finding> findings) {

    /** Copies the lists. */
    public Placement {
        kin = List.copyOf(kin);
        findings = List.copyOf(findings);
    }

    /**
     * The placement of an object whose type is known from elsewhere, without a spectrum.
     *
     * @param type its type
     * @param gravity its gravity class
     * @param reason why nothing else is known
     * @return a placement with these alone
     */
    public static Placement known(TypeEstimate type, GravityVerdict gravity, String reason) {
        return new Placement(
                Optional.of(type),
                "",
                new PublishedType(Optional.empty(), reason, List.of(), List.of()),
                CalibratedType.none(reason),
                Optional.empty(),
                gravity,
                new MetallicityVerdict(Optional.empty(), reason, Map.of(), List.of(), "", ""),
                new Activity(Optional.empty(), List.of(), reason),
                KindVerdict.notJudged(reason),
                List.of(),
                PairVerdict.notJudged(reason),
                Optional.empty(),
                List.of());
    }

    /**
     * The placement of an object without a spectrum by its colours.
     *
     * @param byColours what they say
     * @return type, or the reason why there is none, and kind; nothing else
     */
    public static Placement byColours(PhotometricType byColours) {
        String reason = "no spectrum: colours alone do not tell this";
        return new Placement(
                byColours.type(),
                byColours.reason(),
                new PublishedType(Optional.empty(), reason, List.of(), List.of()),
                CalibratedType.none(reason),
                Optional.empty(),
                GravityVerdict.notJudged(reason, List.of()),
                new MetallicityVerdict(Optional.empty(), reason, Map.of(), List.of(), "", ""),
                new Activity(Optional.empty(), List.of(), reason),
                byColours.kind(),
                List.of(),
                PairVerdict.notJudged(reason),
                Optional.of(byColours),
                byColours.findings());
    }

    /**
     * This placement with what the colours say beside the spectrum.
     *
     * @param byColours what they say; its findings are not taken over
     * @return the same placement with that
     */
    public Placement with(PhotometricType byColours) {
        return new Placement(
                type,
                typeReason,
                published,
                calibrated,
                reddening,
                gravity,
                metallicity,
                activity,
                kind,
                kin,
                pair,
                Optional.of(byColours),
                findings);
    }

    /**
     * This placement with another second witness.
     *
     * @param other what the calibrated witness says
     * @return the same placement with that
     */
    public Placement with(CalibratedType other) {
        return new Placement(
                type,
                typeReason,
                published,
                other,
                reddening,
                gravity,
                metallicity,
                activity,
                kind,
                kin,
                pair,
                photometric,
                findings);
    }
}
