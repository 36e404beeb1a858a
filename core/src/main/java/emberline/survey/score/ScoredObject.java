package emberline.survey.score;

import emberline.catalogue.MetallicityClass;
import emberline.place.GravityClass;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.kind.ObjectKind;
import emberline.prepare.BandSignal;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.SpectralType;
import emberline.survey.KnownGravity;
import emberline.survey.ObjectGroup;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import emberline.survey.Status;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One object of a list of known objects: what is known of it and what was found. Holds no pixels,
 * so that a long list can be kept.
 *
 * @param name its name as listed
 * @param group the name that spectra of the same object share
 * @param dataset where its spectrum is from; may be blank
 * @param tier how far its label can be trusted, as listed; may be blank
 * @param known what is listed
 * @param found what the product says
 * @param resolvingPower resolving power of its best spectrum; empty where none was read
 * @param signalToNoise median signal-to-noise per pixel of its best spectrum; empty where not known
 * @param status how far it came through the chain
 * @param reason why it came no further; blank where it is measured
 * @param findings codes of its findings, each once
 */
public record ScoredObject(
        String name,
        String group,
        String dataset,
        String tier,
        Known known,
        Found found,
        OptionalDouble resolvingPower,
        OptionalDouble signalToNoise,
        Status status,
        String reason,
        List<String> findings) {

    /** The word for a single late dwarf or an earlier one in lists of known objects. */
    public static final String DWARF = "dwarf";

    /** Kinds of known objects that are, or hold, a dwarf. */
    private static final List<String> WITH_DWARF =
            List.of(DWARF, "subdwarf", "pair", "reddened dwarf");

    /** From here on a dwarf is late (subclass). */
    private static final double FIRST_LATE = 4;

    /** The scale of types (subclass). */
    private static final double FIRST = -9;

    private static final double END = 40;

    /** Copies the list. */
    public ScoredObject {
        findings = List.copyOf(findings);
    }

    /**
     * What is known of an object.
     *
     * @param kind its kind as listed; {@code dwarf} where the list says nothing
     * @param typeNumber its type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30); empty where not on this scale
     * @param gravity its gravity class as listed; may be blank
     * @param metallicity its metallicity class; empty where not known
     */
    public record Known(
            String kind,
            OptionalDouble typeNumber,
            String gravity,
            Optional<MetallicityClass.Name> metallicity) {

        static Known of(Candidate candidate) {
            OptionalDouble number = typeNumber(candidate);
            String kind = candidate.text("known_kind").orElse(DWARF);
            return new Known(
                    kind,
                    number,
                    KnownGravity.of(candidate),
                    KnownMetallicity.of(candidate, kind, number.isPresent()));
        }

        /** The number of the list, or of its type code; what lies off the scale does not count. */
        private static OptionalDouble typeNumber(Candidate candidate) {
            OptionalDouble listed = candidate.number("known_type_number");
            if (listed.isPresent()) {
                double number = listed.getAsDouble();
                return number >= FIRST && number < END ? listed : OptionalDouble.empty();
            }
            Optional<SpectralType> parsed =
                    candidate.text("known_type").flatMap(SpectralType::parse);
            return parsed.isPresent()
                    ? OptionalDouble.of(parsed.get().number())
                    : OptionalDouble.empty();
        }

        /** Whether it is, or holds, a dwarf of M4 or later, or one of unknown type. */
        boolean isLateDwarf() {
            return holdsDwarf() && typeNumber.orElse(FIRST_LATE) >= FIRST_LATE;
        }

        boolean holdsDwarf() {
            return WITH_DWARF.contains(kind);
        }
    }

    /**
     * What the product says.
     *
     * @param type the adopted type
     * @param gravity the gravity class
     * @param kind the kind in words; blank where it is not judged
     * @param metallicity the metallicity class
     */
    public record Found(
            Optional<TypeEstimate> type,
            Optional<GravityClass> gravity,
            String kind,
            Optional<MetallicityClass.Name> metallicity) {}

    /**
     * The object of a result.
     *
     * @param result its result
     * @return what is known of it beside what was found
     */
    public static ScoredObject of(ObjectResult result) {
        Candidate candidate = result.candidate();
        Optional<SpectrumResult> best = result.leading();
        Optional<Placement> placement = result.placement();
        return new ScoredObject(
                candidate.name(),
                ObjectGroup.of(candidate),
                candidate.text("dataset").orElse(""),
                candidate.text("tier").orElse(""),
                Known.of(candidate),
                new Found(
                        placement.flatMap(Placement::type),
                        placement.flatMap(p -> p.gravity().gravityClass()),
                        placement.flatMap(p -> p.kind().kind()).map(ObjectKind::label).orElse(""),
                        placement.flatMap(p -> p.metallicity().adopted())),
                best.isPresent()
                        ? OptionalDouble.of(best.get().prepared().resolvingPower().value())
                        : OptionalDouble.empty(),
                best.isPresent() ? signal(best.get()) : OptionalDouble.empty(),
                result.status(),
                result.reason(),
                result.findings().stream().map(Finding::code).distinct().toList());
    }

    private static OptionalDouble signal(SpectrumResult spectrum) {
        Optional<BandSignal> best = BandSignal.best(spectrum.prepared().spectrum());
        return best.isPresent()
                ? OptionalDouble.of(best.get().medianSignalToNoise())
                : OptionalDouble.empty();
    }

    /**
     * Whether its type counts in the scores: a single dwarf of known type.
     *
     * @return true if it does, whether a type was found or not
     */
    public boolean countsForTypes() {
        return known.kind().equals(DWARF) && known.typeNumber().isPresent();
    }

    /**
     * The type that was found less the one that is known.
     *
     * @return difference (subclass); empty where one of them is missing
     */
    public OptionalDouble difference() {
        return known.typeNumber().isPresent() && found.type().isPresent()
                ? OptionalDouble.of(
                        found.type().get().typeNumber() - known.typeNumber().getAsDouble())
                : OptionalDouble.empty();
    }

    /**
     * The difference in units of the one-sigma error of the type that was found.
     *
     * @return difference over sigma; empty where there is no difference
     */
    public OptionalDouble pull() {
        OptionalDouble difference = difference();
        return difference.isPresent()
                ? OptionalDouble.of(
                        difference.getAsDouble() / found.type().orElseThrow().sigmaSubclass())
                : OptionalDouble.empty();
    }
}
