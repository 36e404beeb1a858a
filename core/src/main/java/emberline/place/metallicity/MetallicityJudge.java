package emberline.place.metallicity;

import emberline.catalogue.Band;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Form;
import emberline.catalogue.MetallicityClass;
import emberline.catalogue.MetallicityClass.Name;
import emberline.catalogue.Quantity;
import emberline.catalogue.Relation;
import emberline.measure.Measurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.spectrum.Finding;
import emberline.spectrum.SpectralType;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Judges the metallicity class from zeta: how far TiO5 falls short of that of solar-metallicity
 * dwarfs with the same CaH2 + CaH3 (Lépine et al. 2007 and later recalibrations). Every
 * recalibration of the catalogue is read; those that print limits of the classes enter the class,
 * each over the range of CaH2 + CaH3 for which its solar curve is printed. A subdwarf class stands
 * only where CaH1 is as low as in subdwarfs too (Gizis 1997, Zhang et al. 2019).
 */
public final class MetallicityJudge {

    private static final int DRAWS = 2000;
    private static final String CAH1 = "reid1995/cah1";
    private static final Set<Band> NEAR_INFRARED = EnumSet.of(Band.J, Band.H, Band.K);
    private static final String TIO5 = "reid1995/tio5";

    /** K5 (subclass): before it TiO is too weak. */
    private static final double FIRST_TYPE = -2;

    /** M9.5 (subclass): L dwarfs lose TiO to dust and would pass as subdwarfs. */
    private static final double END_OF_TYPES = 9.75;

    /** A class less probable than this is marked unsure: one sigma. */
    private static final double SURE = 0.68;

    private static final String VALID_RANGE =
            "K5 to M9, if the object is a dwarf; at M2 and earlier zeta tells metallicities apart to"
                    + " no better than 0.5 dex";

    private static final String NO_HINT =
            "no hint available: subdwarfs have a suppressed K band, a flat H band and strong FeH for"
                    + " their H2O, but no limits in numbers are published";

    private final FeatureCatalogue catalogue;
    private final List<Feature> zetas;

    /**
     * A judge.
     *
     * @param catalogue recalibrations, classes and limits; the one with which was measured
     */
    public MetallicityJudge(FeatureCatalogue catalogue) {
        this.catalogue = catalogue;
        this.zetas =
                catalogue.features().stream()
                        .filter(f -> f.form() == Form.METALLICITY_SHORTFALL)
                        .toList();
    }

    /**
     * Judges an object.
     *
     * @param measurements its features
     * @param type its type; empty where it has none
     * @param seed start of the random draws; the same seed gives the same verdict
     * @return the class with what it rests on, or the reason why there is none
     */
    public MetallicityVerdict judge(
            Measurements measurements, Optional<SpectralType> type, long seed) {
        List<ZetaReading> readings =
                zetas.stream().map(zeta -> reading(zeta, measurements, seed)).toList();
        String hint = coversNearInfrared(measurements) ? NO_HINT : "";
        Map<Name, Double> probabilities = mean(readings);
        Optional<Name> likeliest =
                probabilities.entrySet().stream()
                        .max(Map.Entry.comparingByValue())
                        .map(Map.Entry::getKey);
        String reason = whyNot(readings, type);
        if (reason.isBlank() && likeliest.isPresent() && likeliest.get() != Name.DWARF) {
            reason = whyNoSubdwarf(measurements, likeliest.get());
        }
        return reason.isBlank()
                ? new MetallicityVerdict(likeliest, "", probabilities, readings, hint, VALID_RANGE)
                : new MetallicityVerdict(
                        Optional.empty(), reason, Map.of(), readings, hint, VALID_RANGE);
    }

    private static boolean coversNearInfrared(Measurements measurements) {
        return measurements.all().stream()
                .filter(m -> NEAR_INFRARED.contains(m.feature().band()))
                .anyMatch(m -> m.result() instanceof Measured);
    }

    private ZetaReading reading(Feature zeta, Measurements measurements, long seed) {
        Measurement value =
                measurements
                        .of(zeta.id())
                        .map(m -> m.result())
                        .orElseThrow(
                                () ->
                                        new IllegalArgumentException(
                                                zeta.id()
                                                        + ": expected it among the measurements"));
        List<MetallicityClass> classes = classes(zeta);
        if (!(value instanceof Measured measured)) {
            Measurement.NotMeasured why = (Measurement.NotMeasured) value;
            String reason = why.why().words() + ": " + why.detail();
            return new ZetaReading(zeta, value, Optional.empty(), Map.of(), reason);
        }
        Optional<Name> name = classOf(classes, measured.value());
        String reason = whyUnused(zeta, classes, measurements);
        Map<Name, Double> probabilities =
                reason.isBlank() ? shares(zeta, classes, measurements, seed) : Map.of();
        if (reason.isBlank() && probabilities.isEmpty()) {
            reason = "most draws have no zeta: the solar curve is lost in the noise";
        }
        return new ZetaReading(zeta, value, name, probabilities, reason);
    }

    private List<MetallicityClass> classes(Feature zeta) {
        return catalogue.metallicityClasses().stream()
                .filter(one -> one.feature().equals(zeta.id()))
                .toList();
    }

    private static Optional<Name> classOf(List<MetallicityClass> classes, double zeta) {
        return classes.stream()
                .filter(one -> one.contains(zeta))
                .map(MetallicityClass::name)
                .findFirst();
    }

    private String whyUnused(
            Feature zeta, List<MetallicityClass> classes, Measurements measurements) {
        if (classes.isEmpty()) {
            return "shown only: the paper first brings the indices to its own instrument";
        }
        Relation curve = catalogue.solarCurve(zeta).orElseThrow();
        double sum = measurements.measured(curve.feature()).orElseThrow().value();
        double low = curve.validIndexMin().orElse(Double.NEGATIVE_INFINITY);
        double high = curve.validIndexMax().orElse(latestPrintedEnd());
        return sum >= low && sum <= high
                ? ""
                : String.format(
                        Locale.ROOT,
                        "CaH2 + CaH3 = %.3f lies outside the range of the solar curve%s %.2f",
                        sum,
                        sum > high ? ", which ends at" : ", which begins at",
                        sum > high ? high : low);
    }

    /** Where the solar curves that print a range end; beyond it TiO is too weak for any of them. */
    private double latestPrintedEnd() {
        return catalogue.relations(Quantity.SOLAR_TIO5).stream()
                .filter(curve -> curve.validIndexMax().isPresent())
                .mapToDouble(curve -> curve.validIndexMax().getAsDouble())
                .max()
                .orElse(Double.POSITIVE_INFINITY);
    }

    /** Shares of the classes under the pixel noise; draws without a value are left out. */
    private static Map<Name, Double> shares(
            Feature zeta, List<MetallicityClass> classes, Measurements measurements, long seed) {
        Map<Name, Integer> counts = new EnumMap<>(Name.class);
        int drawn = 0;
        for (double value : measurements.draws(List.of(zeta.id()), DRAWS, seed)[0]) {
            Optional<Name> name = classOf(classes, value);
            if (name.isPresent()) {
                counts.merge(name.get(), 1, Integer::sum);
                drawn++;
            }
        }
        Map<Name, Double> shares = new EnumMap<>(Name.class);
        if (2 * drawn > DRAWS) {
            for (Name name : Name.values()) {
                shares.put(name, counts.getOrDefault(name, 0) / (double) drawn);
            }
        }
        return shares;
    }

    private static Map<Name, Double> mean(List<ZetaReading> readings) {
        List<ZetaReading> used = readings.stream().filter(ZetaReading::isUsed).toList();
        Map<Name, Double> mean = new EnumMap<>(Name.class);
        for (ZetaReading reading : used) {
            reading.probabilities()
                    .forEach((name, share) -> mean.merge(name, share / used.size(), Double::sum));
        }
        return mean;
    }

    private static String whyNot(List<ZetaReading> readings, Optional<SpectralType> type) {
        if (readings.isEmpty()) {
            return "the catalogue has no zeta";
        }
        if (readings.stream().noneMatch(r -> r.zeta() instanceof Measured)) {
            return "the optical bands of TiO and CaH (0.68 to 0.72 micron) were not all measured";
        }
        if (readings.stream().noneMatch(ZetaReading::isUsed)) {
            return "zeta does not apply: " + readings.get(0).reason();
        }
        if (type.isEmpty()) {
            return "no type, and L dwarfs look like subdwarfs in these indices";
        }
        double number = type.get().number();
        return number >= FIRST_TYPE && number < END_OF_TYPES
                ? ""
                : "type "
                        + type.get().code()
                        + " lies outside K5 to M9, to which zeta speaks: in L dwarfs dust, not"
                        + " metallicity, weakens TiO";
    }

    /** Why a class below that of dwarfs does not stand; blank where it does. */
    private String whyNoSubdwarf(Measurements measurements, Name name) {
        Optional<Measured> cah1 = measurements.measured(CAH1);
        Optional<Measured> tio5 = measurements.measured(TIO5);
        String zetaSays = "zeta says " + name.prefix() + "M";
        if (cah1.isEmpty() || tio5.isEmpty()) {
            return zetaSays + ", but CaH1, which must be low in a subdwarf, was not measured";
        }
        double tio = tio5.get().value();
        String tooHigh =
                catalogue.relations(Quantity.SUBDWARF_CAH1_LIMIT).stream()
                        .filter(limit -> limit.covers(tio))
                        .filter(limit -> !(cah1.get().value() < limit.value(tio)))
                        .map(
                                limit ->
                                        String.format(
                                                Locale.ROOT,
                                                "%.3f (%s)",
                                                limit.value(tio),
                                                limit.source().shortCite()))
                        .collect(Collectors.joining(", "));
        return tooHigh.isEmpty()
                ? ""
                : String.format(
                        Locale.ROOT,
                        "%s, but CaH1 = %.3f is not below the limit of subdwarfs, %s",
                        zetaSays,
                        cah1.get().value(),
                        tooHigh);
    }

    /**
     * What the observer should know about a verdict.
     *
     * @param verdict a verdict
     * @return findings; none for a dwarf or where nothing was judged
     */
    public static List<Finding> findings(MetallicityVerdict verdict) {
        List<Finding> findings = new ArrayList<>();
        if (verdict.adopted().isEmpty()) {
            return findings;
        }
        Name adopted = verdict.adopted().get();
        if (adopted != Name.DWARF) {
            findings.add(
                    Finding.caution(
                            "subdwarf",
                            "TiO is weak for CaH as in subdwarfs ("
                                    + adopted.prefix()
                                    + "M): the type relations, made for dwarfs of the field, do not"
                                    + " hold; published types of subdwarfs rest on CaH2 + CaH3"));
        }
        long classes =
                verdict.readings().stream()
                        .filter(ZetaReading::isUsed)
                        .map(ZetaReading::metallicityClass)
                        .distinct()
                        .count();
        if (classes > 1 || verdict.probabilities().getOrDefault(adopted, 0.0) < SURE) {
            findings.add(
                    Finding.caution(
                            "metallicity-class-unsure",
                            "the recalibrations of zeta or the noise leave another metallicity"
                                    + " class open"));
        }
        return findings;
    }
}
