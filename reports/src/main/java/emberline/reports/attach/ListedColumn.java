package emberline.reports.attach;

import emberline.reports.attach.ResultColumn.Content;
import java.util.Map;

/**
 * Columns that are carried over from a candidate list, as listed. Of those that the program reads
 * itself, unit and meaning are known.
 */
final class ListedColumn {

    private static final String MAGNITUDE = "apparent magnitude in ";

    private static final Map<String, Known> KNOWN =
            Map.ofEntries(
                    Map.entry("spectrum", new Known("", "meta.ref", "paths of the spectra")),
                    Map.entry("medium", new Known("", "meta.code", "medium of the wavelengths")),
                    Map.entry("ra_deg", new Known("deg", "pos.eq.ra", "right ascension")),
                    Map.entry("dec_deg", new Known("deg", "pos.eq.dec", "declination")),
                    Map.entry("parallax_mas", new Known("mas", "pos.parallax", "parallax")),
                    Map.entry(
                            "parallax_mas_err",
                            new Known("mas", "stat.error;pos.parallax", "error of the parallax")),
                    Map.entry(
                            "pmra_masyr",
                            new Known(
                                    "mas/yr",
                                    "pos.pm;pos.eq.ra",
                                    "proper motion in right ascension times cos declination")),
                    Map.entry(
                            "pmdec_masyr",
                            new Known(
                                    "mas/yr", "pos.pm;pos.eq.dec", "proper motion in declination")),
                    Map.entry(
                            "pmra_masyr_err",
                            new Known(
                                    "mas/yr",
                                    "stat.error;pos.pm;pos.eq.ra",
                                    "error of pmra_masyr")),
                    Map.entry(
                            "pmdec_masyr_err",
                            new Known(
                                    "mas/yr",
                                    "stat.error;pos.pm;pos.eq.dec",
                                    "error of pmdec_masyr")),
                    Map.entry(
                            "rv_kms_err",
                            new Known("km/s", "stat.error;spect.dopplerVeloc", "error of rv_kms")),
                    Map.entry(
                            "resolution",
                            new Known("", "spect.resolution", "resolving power as listed")),
                    Map.entry(
                            "y_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.NIR", "error of y_mag")),
                    Map.entry(
                            "w1_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.3-4um", "error of w1_mag")),
                    Map.entry(
                            "w2_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.4-8um", "error of w2_mag")),
                    Map.entry("rv_kms", new Known("km/s", "spect.dopplerVeloc", "radial velocity")),
                    Map.entry("y_mag", new Known("mag", "phot.mag;em.IR.NIR", MAGNITUDE + "Y")),
                    Map.entry("j_mag", new Known("mag", "phot.mag;em.IR.J", MAGNITUDE + "J")),
                    Map.entry("h_mag", new Known("mag", "phot.mag;em.IR.H", MAGNITUDE + "H")),
                    Map.entry("k_mag", new Known("mag", "phot.mag;em.IR.K", MAGNITUDE + "K")),
                    Map.entry(
                            "j_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.J", "error of j_mag")),
                    Map.entry(
                            "h_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.H", "error of h_mag")),
                    Map.entry(
                            "k_mag_err",
                            new Known("mag", "stat.error;phot.mag;em.IR.K", "error of k_mag")),
                    Map.entry("w1_mag", new Known("mag", "phot.mag;em.IR.3-4um", MAGNITUDE + "W1")),
                    Map.entry("w2_mag", new Known("mag", "phot.mag;em.IR.4-8um", MAGNITUDE + "W2")),
                    Map.entry("known_type", new Known("", "src.spType", "type as listed")),
                    Map.entry(
                            "known_gravity",
                            new Known("", "src.class;phys.gravity", "gravity class as listed")),
                    Map.entry("known_kind", new Known("", "src.class", "kind as listed")));

    private ListedColumn() {}

    private record Known(String unit, String ucd, String description) {}

    /**
     * A column of a list.
     *
     * @param listed its name in the list
     * @param name its name in the results
     */
    static ResultColumn of(String listed, String name) {
        Known known = KNOWN.getOrDefault(listed, new Known("", "", ""));
        String description =
                (known.description().isEmpty() ? "" : known.description() + "; ")
                        + "column "
                        + listed
                        + " of the candidate list, as listed";
        return new ResultColumn(
                name,
                known.unit(),
                known.ucd(),
                description,
                Content.TEXT,
                result -> result.candidate().cells().getOrDefault(listed, ""));
    }
}
