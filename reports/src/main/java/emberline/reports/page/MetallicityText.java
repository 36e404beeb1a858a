package emberline.reports.page;

import emberline.catalogue.MetallicityClass;
import emberline.measure.Measurement.Measured;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.metallicity.ZetaReading;
import emberline.reports.attach.Digits;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** What the detail page says of the metallicity class: a sentence a recalibration. */
final class MetallicityText {

    private MetallicityText() {}

    static List<String> of(MetallicityVerdict verdict) {
        List<String> lines = new ArrayList<>();
        lines.add(
                verdict.adopted()
                        .map(
                                name ->
                                        "Class "
                                                + name.prefix()
                                                + "M: "
                                                + shares(verdict.probabilities())
                                                + ".")
                        .orElse("No class: " + verdict.reason() + "."));
        for (ZetaReading reading : verdict.readings()) {
            if (reading.zeta() instanceof Measured zeta) {
                lines.add(reading(reading, zeta));
            }
        }
        if (!verdict.hint().isBlank()) {
            lines.add("Near infrared: " + verdict.hint() + ".");
        }
        lines.add("Holds for " + verdict.validRange() + ".");
        return lines;
    }

    private static String reading(ZetaReading reading, Measured zeta) {
        return "zeta of "
                + reading.feature().source().shortCite()
                + ": "
                + Digits.fixed(zeta.value(), 3).replace('-', '\u2212')
                + " ± "
                + Digits.fixed(zeta.oneSigma(), 3)
                + reading.metallicityClass().map(name -> ", " + name.prefix() + "M").orElse("")
                + (reading.isUsed() ? "" : "; " + reading.reason())
                + ".";
    }

    private static String shares(Map<MetallicityClass.Name, Double> probabilities) {
        return probabilities.entrySet().stream()
                .map(e -> "P(" + e.getKey().prefix() + ") " + Digits.fixed(e.getValue(), 2))
                .collect(Collectors.joining(", "));
    }
}
