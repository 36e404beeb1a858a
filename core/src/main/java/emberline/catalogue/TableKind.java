package emberline.catalogue;

import java.util.List;

/** The kinds of table, where they lie and which columns they have. */
enum TableKind {
    SOURCES("sources.csv", "key,authors,year", "journal,volume,page,title,doi"),
    FEATURES(
            "features/*.csv",
            "id,symbol,kind,form,species,band,medium,window_unit,source,how_known,"
                    + "confidence_percent,sense,purpose",
            "statistic,min_resolving_power,max_resolving_power,smooth_to_resolving_power,place,"
                    + "note"),
    WINDOWS("windows/*.csv", "feature,role,low,high", "weight,exponent"),
    PARTS("parts/*.csv", "feature,role,part", "coefficient"),
    RELATIONS(
            "relations/*.csv",
            "id,feature,quantity,c0,source,how_known,confidence_percent",
            "argument_offset,c1,c2,c3,c4,c5,c6,printed_scale_offset,printed_scale_factor,"
                    + "valid_type_min,valid_type_max,valid_index_min,valid_index_max,"
                    + "valid_index_basis,rms,population,needs_instrument_correction,verdict,n_field,"
                    + "bias_field,scatter_field,n_vlg,bias_vlg,place,note"),
    GRAVITY(
            "gravity/*.csv",
            "feature,type_number,intermediate,very_low,low_gravity_if,source,how_known,"
                    + "confidence_percent",
            "note"),
    BOUNDARIES(
            "boundaries/*.csv",
            "feature,type_number,low,high,source,how_known,confidence_percent",
            "note"),
    PAIRS(
            "pairs/*.csv",
            "plane,x,y,point,x_value,y_value,pair_side,side_how_known,source,how_known,"
                    + "confidence_percent",
            "note"),
    METALLICITY(
            "metallicity/*.csv",
            "feature,metallicity_class,above,up_to,source,how_known,confidence_percent",
            "note"),
    ACTIVITY(
            "activity/*.csv",
            "quantity,value,source,how_known,confidence_percent",
            "type_number,error,note"),
    LINES(
            "lines.csv",
            "species,wavelength,unit,medium,purpose,source,how_known,confidence_percent",
            "place,note"),
    TELLURIC(
            "telluric.csv",
            "cause,strength,low_micron,high_micron,source,how_known,confidence_percent",
            "note"),
    BANDS(
            "bands.csv",
            "species,low_micron,high_micron,type_min,type_max,source,how_known,confidence_percent",
            "head_micron,note");

    private static final String ANY_TABLE = "*.csv";

    private final String place;
    private final String required;
    private final String optional;

    TableKind(String place, String required, String optional) {
        this.place = place;
        this.required = required;
        this.optional = optional;
    }

    /** The name of the table, or its folder and {@code *.csv}. */
    String place() {
        return place;
    }

    /** Columns that a table of this kind must have. */
    List<String> required() {
        return List.of(required.split(",", -1));
    }

    /** Columns that a table of this kind may have; one that is missing counts as blank. */
    List<String> optional() {
        return List.of(optional.split(",", -1));
    }

    /** Whether a file is a table of this kind. */
    boolean holds(String file) {
        if (!place.endsWith(ANY_TABLE)) {
            return file.equals(place);
        }
        String folder = place.substring(0, place.length() - ANY_TABLE.length());
        return file.startsWith(folder)
                && file.endsWith(".csv")
                && file.indexOf('/', folder.length()) < 0;
    }
}
