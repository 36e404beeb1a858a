package emberline.judge;

import emberline.spectrum.MagnitudeBand;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;

/**
 * Physical properties.
 *
 * @param teffK effective temperature (K) by type, with scatter of the relation and posterior of the
 *     type; empty off the relations
 * @param logL log10 of the luminosity (solar): measured where a parallax allows, else by type;
 *     empty off the relations
 * @param logLMethod {@code parallax and BAND} or {@code spectral type}; blank where empty
 * @param logG log10 of the surface gravity (cm/s2) from the grids, by the posterior of mass and age
 * @param radiusRsun radius (solar), likewise
 * @param absoluteMagnitudes absolute magnitudes by band: measured where a parallax allows, else by
 *     type, field and low-gravity sequences apart
 * @param bolometricCorrections bolometric magnitude minus absolute magnitude, by band and type
 * @param distance the distance; empty where neither parallax nor a magnitude is known
 * @param kinematics motion in the Galaxy; empty where the proper motion or distance is not known
 */
public record Properties(
        Optional<Estimate> teffK,
        Optional<Estimate> logL,
        String logLMethod,
        Estimate logG,
        Estimate radiusRsun,
        Map<MagnitudeBand, Estimate> absoluteMagnitudes,
        Map<MagnitudeBand, Estimate> bolometricCorrections,
        Optional<DistanceEstimate> distance,
        Optional<Kinematics> kinematics) {

    /** Bolometric magnitude of the Sun as used in all relations here. */
    public static final double SOLAR_M_BOL = 4.74;

    /** Copies the maps. */
    public Properties {
        absoluteMagnitudes = copy(absoluteMagnitudes);
        bolometricCorrections = copy(bolometricCorrections);
    }

    private static Map<MagnitudeBand, Estimate> copy(Map<MagnitudeBand, Estimate> map) {
        Map<MagnitudeBand, Estimate> sorted = new EnumMap<>(MagnitudeBand.class);
        sorted.putAll(map);
        return java.util.Collections.unmodifiableMap(sorted);
    }

    /**
     * Absolute bolometric magnitude: 4.74 - 2.5 log L.
     *
     * @return mag with its intervals, or empty where the luminosity is not known
     */
    public Optional<Estimate> mBol() {
        return logL.map(
                l ->
                        new Estimate(
                                bol(l.median()),
                                bol(l.hi68()),
                                bol(l.lo68()),
                                bol(l.hi95()),
                                bol(l.lo95())));
    }

    private static double bol(double logL) {
        return SOLAR_M_BOL - 2.5 * logL;
    }
}
