package emberline.reports.page;

import emberline.place.Placement;
import emberline.place.kind.ObjectKind;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** What cannot be told from the spectra of an object, in sentences. */
final class LimitsText {

    private static final double LITHIUM_MICRON = 0.6709;
    private static final double LITHIUM_RESOLVING_POWER = 600;
    private static final double LINES_RESOLVING_POWER = 500;

    private LimitsText() {}

    static String of(ObjectResult result) {
        List<String> sentences = new ArrayList<>();
        boolean typed = result.placement().flatMap(Placement::type).isPresent();
        sentences.add(
                typed
                        ? "The type supposes a single late dwarf of near-solar metallicity."
                        : "No type is given; what is shown of types supposes a single late dwarf.");
        result.placement().map(LimitsText::kind).ifPresent(sentences::add);
        boolean judged =
                result.placement().map(p -> p.gravity().gravityClass().isPresent()).orElse(false);
        sentences.add(
                judged
                        ? "A low-gravity class hints at youth; it gives no age, and dust and"
                                + " metallicity can mimic it."
                        : "Nothing is said of gravity, and so of youth.");
        if (!reaches(result, LITHIUM_MICRON, LITHIUM_RESOLVING_POWER)) {
            sentences.add(
                    "Lithium at 6708 Å lies outside the spectrum or is not resolved, so the"
                            + " lithium test cannot be made.");
        }
        double finest =
                result.spectra().stream()
                        .mapToDouble(s -> s.prepared().resolvingPower().value())
                        .max()
                        .orElse(0);
        if (finest < LINES_RESOLVING_POWER) {
            sentences.add("Atomic lines are blended at this resolving power.");
        }
        boolean estimated =
                result.spectra().stream().anyMatch(s -> s.prepared().noise().estimated());
        if (estimated) {
            sentences.add(
                    "The noise was estimated from the pixels; errors in the flux calibration are"
                            + " not in it.");
        }
        sentences.add(
                result.judgement().isPresent()
                        ? "Mass and age rest on evolution models and on the prior stated; models"
                                + " differ by more than their printed errors. A claim that it is"
                                + " substellar stands on the evidence shown above and no further."
                                + " The report supports expert judgement and does not replace it;"
                                + " look at the spectrum."
                        : "No mass, age or temperature follows from this page: a substellar claim"
                                + " needs further evidence. The report supports expert judgement and"
                                + " does not replace it; look at the spectrum.");
        return String.join(" ", sentences);
    }

    private static String kind(Placement placement) {
        OptionalDouble pLateDwarf = placement.kind().probability(ObjectKind.LATE_DWARF);
        return pLateDwarf.isEmpty()
                ? "The kind of object is not judged: " + placement.kind().reason() + "."
                : "The kind was judged by likeness to public spectra (late dwarf: P "
                        + FindingSentence.probability(pLateDwarf.getAsDouble())
                        + ", for about half of all candidates being late dwarfs); subdwarfs and"
                        + " unresolved pairs count as late dwarfs there.";
    }

    private static boolean reaches(ObjectResult result, double micron, double resolvingPower) {
        for (SpectrumResult each : result.spectra()) {
            Spectrum spectrum = each.prepared().spectrum();
            boolean covered =
                    spectrum.wavelengthMicron(0) < micron
                            && spectrum.wavelengthMicron(spectrum.size() - 1) > micron;
            if (covered && each.prepared().resolvingPower().value() >= resolvingPower) {
                return true;
            }
        }
        return false;
    }
}
