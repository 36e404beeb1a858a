package emberline.reports.attach;

import emberline.catalogue.Feature;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement;
import emberline.measure.Measurements;
import emberline.measure.Measurements.Interval68;
import emberline.place.GravityScore;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.TypeEstimate;
import emberline.place.reddening.ReddeningFit;
import emberline.prepare.BandSignal;
import emberline.prepare.NoiseModel;
import emberline.prepare.Quality;
import emberline.reports.attach.ResultColumn.Content;
import emberline.spectrum.Finding;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Everything that is known of one object as JSON. The keys of the outer level are the columns of
 * the results table, followed by the parts that a table cannot hold; numbers carry the digits of
 * the table. The same result gives the same bytes.
 */
public final class ObjectJson {

    /** Intervals come from draws where the signal is low; any fixed start will do. */
    private static final long INTERVAL_SEED = 1;

    private ObjectJson() {}

    /**
     * The result of an object as JSON.
     *
     * @param result the result of an object
     * @return one JSON object over several lines, with a line end
     */
    public static String text(ObjectResult result) {
        return JsonText.of(map(result));
    }

    /** The content of the outer level in its order. */
    static Map<String, Object> map(ObjectResult result) {
        Map<String, Object> map = columns(result);
        map.put("list", result.candidate().cells());
        map.put("findings", result.findings().stream().map(ObjectJson::finding).toList());
        map.put(
                "reddening",
                result.placement()
                        .flatMap(Placement::reddening)
                        .map(fit -> (Object) reddening(fit))
                        .orElse(null));
        map.put("type_reason", result.placement().map(Placement::typeReason).orElse(""));
        map.put("kinds", result.placement().map(KindJson::kinds).orElse(Map.of()));
        map.put("kind_reason", result.placement().map(p -> p.kind().reason()).orElse(""));
        map.put("kin", result.placement().map(KindJson::kin).orElse(List.of()));
        map.put("pair_reason", result.placement().map(p -> p.pair().reason()).orElse(""));
        map.put("pair_criteria", result.placement().map(KindJson::criteria).orElse(List.of()));
        map.put(
                "standards",
                result.standards().map(v -> (Object) StandardsJson.map(v)).orElse(null));
        map.put("published_scheme", result.placement().map(p -> p.published().scheme()).orElse(""));
        map.put(
                "calibrated",
                result.placement()
                        .map(p -> (Object) CalibratedJson.map(p.calibrated()))
                        .orElse(null));
        map.put(
                "photometric",
                result.placement()
                        .flatMap(Placement::photometric)
                        .map(p -> (Object) PhotometricJson.map(p))
                        .orElse(null));
        map.put("gravity_reason", result.placement().map(p -> p.gravity().reason()).orElse(""));
        map.put("relations", result.placement().map(ObjectJson::relations).orElse(List.of()));
        map.put("gravity_scores", result.placement().map(ObjectJson::scores).orElse(List.of()));
        result.placement().ifPresent(p -> map.putAll(MetallicityJson.of(p.metallicity())));
        map.put(
                "activity",
                result.placement().map(p -> (Object) LineJson.activity(p.activity())).orElse(null));
        map.put(
                "judgement",
                result.judgement().map(j -> (Object) JudgementJson.map(j)).orElse(null));
        map.put("features", result.best().map(ObjectJson::features).orElse(List.of()));
        boolean several = result.spectra().size() > 1;
        map.put(
                "spectra",
                result.spectra().stream()
                        .map(one -> several ? oneOfSeveral(one) : spectrum(one))
                        .toList());
        return map;
    }

    /** The columns of the results table: numbers as numbers, null where there is none. */
    static Map<String, Object> columns(ObjectResult result) {
        Map<String, Object> map = new LinkedHashMap<>();
        for (ResultColumn column : ResultColumns.standard()) {
            String text = column.text(result);
            map.put(
                    column.name(),
                    column.content() == Content.NUMBER ? JsonText.number(text) : text);
        }
        return map;
    }

    private static Map<String, Object> reddening(ReddeningFit fit) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("a_v", JsonText.number(Digits.type(fit.avMag())));
        map.put("a_v_lo68", JsonText.number(Digits.type(fit.lo68Mag())));
        map.put("a_v_hi68", JsonText.number(Digits.type(fit.hi68Mag())));
        map.put("a_v_lo95", JsonText.number(Digits.type(fit.lo95Mag())));
        map.put("a_v_hi95", JsonText.number(Digits.type(fit.hi95Mag())));
        map.put("log_gain", JsonText.number(Digits.fixed(fit.logGain(), 2)));
        return map;
    }

    static Map<String, Object> finding(Finding finding) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("severity", word(finding.severity()));
        map.put("code", finding.code());
        map.put("text", finding.text());
        return map;
    }

    private static List<Map<String, Object>> relations(Placement placement) {
        List<Map<String, Object>> relations = new ArrayList<>();
        for (RelationEstimate estimate : placement.published().estimates()) {
            Map<String, Object> map = new LinkedHashMap<>();
            map.put("relation", estimate.relation().id());
            map.put("feature", estimate.relation().feature());
            map.put("source", estimate.relation().source().cite());
            Optional<TypeEstimate> type = estimate.type();
            map.put("type", type.map(TypeText::code).orElse(""));
            map.put("type_number", number(type.map(t -> Digits.type(t.typeNumber()))));
            map.put("type_sigma", number(type.map(t -> Digits.type(t.sigmaSubclass()))));
            map.put("use", word(estimate.use()));
            map.put("reason", estimate.reason());
            relations.add(map);
        }
        return relations;
    }

    private static List<Map<String, Object>> scores(Placement placement) {
        List<Map<String, Object>> scores = new ArrayList<>();
        for (GravityScore score : placement.gravity().scores()) {
            Map<String, Object> map = new LinkedHashMap<>();
            map.put("feature", score.feature().id());
            map.put("value", value(score.feature(), score.index()));
            map.put("sigma", sigma(score.feature(), score.index()));
            map.put("score", score.score().isPresent() ? score.score().getAsInt() : null);
            map.put("intermediate_limit", limit(score, score.intermediateThreshold()));
            map.put("very_low_limit", limit(score, score.veryLowThreshold()));
            map.put("low_gravity_if", score.lowGravityIfBelow() ? "below" : "above");
            map.put("reason", score.reason());
            scores.add(map);
        }
        return scores;
    }

    private static Object limit(GravityScore score, OptionalDouble limit) {
        return limit.isPresent()
                ? JsonText.number(Digits.feature(score.feature(), limit.getAsDouble()))
                : null;
    }

    /** Every feature of an object. */
    static List<Map<String, Object>> features(Measurements measurements) {
        Map<String, Interval68> intervals = measurements.intervals68(INTERVAL_SEED);
        return measurements.all().stream()
                .map(
                        measurement ->
                                feature(
                                        measurement,
                                        Optional.ofNullable(
                                                intervals.get(measurement.feature().id()))))
                .toList();
    }

    /** One feature: its value with its error, or why there is none. */
    private static Map<String, Object> feature(
            FeatureMeasurement measurement, Optional<Interval68> interval) {
        Feature feature = measurement.feature();
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("feature", feature.id());
        map.put("value", value(feature, measurement.result()));
        map.put("sigma", sigma(feature, measurement.result()));
        map.put("lo68", number(interval.map(i -> Digits.feature(feature, i.low()))));
        map.put("hi68", number(interval.map(i -> Digits.feature(feature, i.high()))));
        map.put("unit", FeatureText.unit(measurement.feature()));
        map.put("coverage", JsonText.number(Digits.fixed(measurement.coverage(), 3)));
        map.put("telluric_share", JsonText.number(Digits.fixed(measurement.telluricShare(), 3)));
        OptionalDouble smoothed = measurement.smoothedToResolvingPower();
        map.put(
                "smoothed_to",
                smoothed.isPresent()
                        ? JsonText.number(Digits.significant(smoothed.getAsDouble()))
                        : null);
        map.put("why", measurement.result().fold(v -> "", n -> n.why().words()));
        map.put("detail", measurement.result().fold(v -> "", Measurement.NotMeasured::detail));
        return map;
    }

    /** A spectrum beside others: the type by it alone and its own measurements come with it. */
    private static Map<String, Object> oneOfSeveral(SpectrumResult result) {
        Map<String, Object> map = spectrum(result);
        map.put("type_alone", result.typeAlone().map(TypeText::code).orElse(""));
        map.put(
                "type_alone_number",
                number(result.typeAlone().map(t -> Digits.type(t.typeNumber()))));
        map.put(
                "type_alone_sigma",
                number(result.typeAlone().map(t -> Digits.type(t.sigmaSubclass()))));
        map.put("features", features(result.measurements()));
        return map;
    }

    private static Map<String, Object> spectrum(SpectrumResult result) {
        Spectrum spectrum = result.prepared().spectrum();
        NoiseModel noise = result.prepared().noise();
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("path", result.path());
        map.put("format", result.format());
        map.put("sha256", result.sha256());
        map.put("low_micron", JsonText.number(Digits.fixed(spectrum.wavelengthMicron(0), 5)));
        map.put(
                "high_micron",
                JsonText.number(Digits.fixed(spectrum.wavelengthMicron(spectrum.size() - 1), 5)));
        map.put("pixels", spectrum.size());
        Optional<BandSignal> signal = BandSignal.best(result.quality().bands());
        map.put("snr", number(signal.map(s -> Digits.signal(s.medianSignalToNoise()))));
        map.put("snr_band", signal.map(s -> word(s.range())).orElse(""));
        map.put("quality", quality(result.quality()));
        map.put(
                "resolution",
                JsonText.number(Digits.significant(result.prepared().resolvingPower().value())));
        map.put("resolution_basis", word(result.prepared().resolvingPower().basis()));
        map.put("noise_estimated", noise.estimated());
        map.put("noise_scale", JsonText.number(Digits.significant(noise.scale())));
        map.put("noise_lag1", JsonText.number(Digits.fixed(noise.lag1(), 3)));
        map.put("noise_lag2", JsonText.number(Digits.fixed(noise.lag2(), 3)));
        map.put("lines", LineJson.lines(result.lines()));
        map.put("velocity", LineJson.velocity(result.lines().velocity()));
        return map;
    }

    private static Map<String, Object> quality(Quality quality) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("grade", quality.grade().word());
        map.put("reason", quality.reason());
        List<Map<String, Object>> bands = new ArrayList<>();
        for (BandSignal signal : quality.bands()) {
            Map<String, Object> band = new LinkedHashMap<>();
            band.put("band", word(signal.range()));
            band.put("coverage", JsonText.number(Digits.fixed(signal.coverage(), 3)));
            band.put("snr", JsonText.number(Digits.signal(signal.medianSignalToNoise())));
            bands.add(band);
        }
        map.put("bands", bands);
        return map;
    }

    private static Object value(Feature feature, Measurement result) {
        return JsonText.number(result.fold(v -> Digits.feature(feature, v.value()), n -> ""));
    }

    private static Object sigma(Feature feature, Measurement result) {
        return JsonText.number(result.fold(v -> Digits.feature(feature, v.oneSigma()), n -> ""));
    }

    private static Object number(Optional<String> digits) {
        return JsonText.number(digits.orElse(""));
    }

    static String word(Enum<?> constant) {
        return constant.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
