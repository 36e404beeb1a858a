package emberline.place.reference;

import emberline.measure.Measurement.Measured;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One spectrum of known kind.
 *
 * @param object name of the spectrum as listed
 * @param group name of the object; spectra of one object share it, so that a test never learns from
 *     the object it is tested on
 * @param typeNumber published type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30); empty where it has none on
 *     this scale
 * @param gravity published gravity class: {@code FLD-G}, {@code INT-G}, {@code VL-G}, {@code young}
 *     or blank
 * @param kind what it is, as listed: {@code dwarf}, {@code giant}, {@code early}, {@code carbon},
 *     {@code reddened}, {@code extragalactic}, ...
 * @param tier how far its label and its data can be trusted, the best first: A, B, C; other words
 *     for what is not a single late dwarf
 * @param source the data set and, through its manifest, the papers of the label
 * @param resolvingPower resolving power of the spectrum
 * @param signalToNoise median signal-to-noise a pixel in the band that is covered best; empty where
 *     it is not known
 * @param features values with errors by feature id; features that were not measured are absent
 */
public record ReferenceRow(
        String object,
        String group,
        OptionalDouble typeNumber,
        String gravity,
        String kind,
        String tier,
        String source,
        double resolvingPower,
        OptionalDouble signalToNoise,
        Map<String, Measured> features) {

    /** Copies the map. */
    public ReferenceRow {
        features = Collections.unmodifiableMap(new LinkedHashMap<>(features));
    }

    /**
     * The value of a feature.
     *
     * @param id feature id
     * @return value and error, or empty where it was not measured
     */
    public Optional<Measured> feature(String id) {
        return Optional.ofNullable(features.get(id));
    }
}
