package emberline.reports.attach;

import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.kind.ObjectKind;
import emberline.place.pair.PairVerdict;
import emberline.place.photometric.PhotometricType;
import emberline.place.reddening.ReddeningFit;
import emberline.prepare.BandSignal;
import emberline.reports.attach.ResultColumn.Content;
import emberline.spectrum.Finding;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;

/** The columns of the results table in their order. */
public final class ResultColumns {

    private static final List<ResultColumn> STANDARD = standardColumns();

    private ResultColumns() {}

    /** The column that is filled once all objects of a survey are known. */
    public static final String RANK = "rank";

    /**
     * The columns that every results table has.
     *
     * @return columns in their order, {@code name} first
     */
    public static List<ResultColumn> standard() {
        return STANDARD;
    }

    /**
     * The columns of a results table for a candidate list: the standard ones, then those of the
     * list, as listed. The column {@code name} is not repeated; a column of the list whose name is
     * one of the standard ones gets {@code list_} before it.
     *
     * @param listColumns names of the columns of the list in their order
     * @return columns in their order; their names are unique
     */
    public static List<ResultColumn> forList(List<String> listColumns) {
        List<ResultColumn> columns = new ArrayList<>(STANDARD);
        Set<String> taken = STANDARD.stream().map(ResultColumn::name).collect(Collectors.toSet());
        Set<String> seen = new HashSet<>();
        for (String listed : listColumns) {
            if (listed.equals("name") || !seen.add(listed)) {
                continue;
            }
            String name = listed;
            while (!taken.add(name)) {
                name = "list_" + name;
            }
            columns.add(ListedColumn.of(listed, name));
        }
        return List.copyOf(columns);
    }

    private static List<ResultColumn> standardColumns() {
        List<ResultColumn> columns = new ArrayList<>();
        columns.add(
                text("name", "name of the object as listed", r -> r.candidate().name())
                        .withUcd("meta.id;meta.main"));
        columns.add(
                text(
                                "status",
                                "how far the object came: measured, partial, photometric or failed",
                                r -> r.status().word())
                        .withUcd("meta.code.status"));
        columns.add(
                text("reason", "why it came no further", ObjectResult::reason)
                        .withUcd("meta.note"));
        addKind(columns);
        addType(columns);
        columns.add(
                text(
                                "published_type",
                                "type by the published relations alone, combined",
                                r -> published(r).map(TypeText::code).orElse(""))
                        .withUcd("src.spType"));
        columns.add(
                number(
                                "published_type_sigma",
                                "subclass",
                                "one-sigma error of the type by the published relations",
                                r ->
                                        published(r)
                                                .map(t -> Digits.type(t.sigmaSubclass()))
                                                .orElse(""))
                        .withUcd("stat.error;src.spType"));
        addGravity(columns);
        addKindShares(columns);
        addColours(columns);
        addReddening(columns);
        addMetallicity(columns);
        addPair(columns);
        columns.addAll(StandardColumns.all());
        addSpectrum(columns);
        columns.add(
                text(
                                "findings",
                                "codes of the findings, each once, separated by blanks",
                                r ->
                                        r.findings().stream()
                                                .map(Finding::code)
                                                .distinct()
                                                .collect(Collectors.joining(" ")))
                        .withUcd("meta.code"));
        columns.addAll(JudgementColumns.all());
        columns.add(rank());
        columns.addAll(VerdictColumns.all(columns));
        return List.copyOf(columns);
    }

    /** Empty here: only a whole survey gives its objects a place. */
    private static ResultColumn rank() {
        return number(
                        RANK,
                        "",
                        "place of the object when the survey is ordered by score, from 1;"
                                + " in the tables and on the page of a survey only",
                        result -> "")
                .withUcd("stat.value");
    }

    private static void addKind(List<ResultColumn> columns) {
        columns.add(
                text(
                                "kind",
                                "most probable kind of object; empty where it is not judged",
                                r ->
                                        r.placement()
                                                .flatMap(p -> p.kind().kind())
                                                .map(ObjectKind::label)
                                                .orElse(""))
                        .withUcd("src.class"));
    }

    private static void addKindShares(List<ResultColumn> columns) {
        columns.add(
                placementShare(
                        "p_late_dwarf",
                        "probability of a late dwarf",
                        p -> p.kind().probability(ObjectKind.LATE_DWARF)));
        columns.add(
                placementShare(
                        "p_giant",
                        "probability of a giant",
                        p -> p.kind().probability(ObjectKind.GIANT)));
    }

    private static void addPair(List<ResultColumn> columns) {
        columns.add(
                text(
                                "pair",
                                "case for an unresolved pair: candidate, weak or none; empty where it is"
                                        + " not judged",
                                r ->
                                        r.placement()
                                                .flatMap(p -> p.pair().strength())
                                                .map(PairVerdict.Strength::word)
                                                .orElse(""))
                        .withUcd("meta.code.multip"));
        columns.add(
                placementShare(
                        "p_pair",
                        "probability, under noise, that enough criteria for a candidate are met",
                        p -> p.pair().pPair()));
    }

    private static void addType(List<ResultColumn> columns) {
        columns.add(
                text(
                                "type",
                                "adopted spectral type; one colon where its error exceeds one subclass,"
                                        + " two where it exceeds two",
                                r -> adopted(r).map(TypeText::code).orElse(""))
                        .withUcd("src.spType"));
        columns.add(
                typeNumber(
                        "type_number",
                        "src.spType",
                        "adopted type on the scale M0 = 0, L0 = 10, T0 = 20, Y0 = 30",
                        TypeEstimate::typeNumber));
        columns.add(
                typeNumber(
                        "type_sigma",
                        "stat.error;src.spType",
                        "one-sigma error of the adopted type",
                        TypeEstimate::sigmaSubclass));
        columns.add(
                typeNumber(
                        "type_lo68",
                        "src.spType;stat.min",
                        "lower end of the 68% interval",
                        TypeEstimate::lo68));
        columns.add(
                typeNumber(
                        "type_hi68",
                        "src.spType;stat.max",
                        "upper end of the 68% interval",
                        TypeEstimate::hi68));
        columns.add(
                typeNumber(
                        "type_lo95",
                        "src.spType;stat.min",
                        "lower end of the 95% interval",
                        TypeEstimate::lo95));
        columns.add(
                typeNumber(
                        "type_hi95",
                        "src.spType;stat.max",
                        "upper end of the 95% interval",
                        TypeEstimate::hi95));
    }

    private static void addColours(List<ResultColumn> columns) {
        columns.add(
                text(
                                "photometric_type",
                                "type by the colours alone; empty where there are none or the object is"
                                        + " hardly a late dwarf by them",
                                r ->
                                        colours(r)
                                                .flatMap(PhotometricType::type)
                                                .map(TypeText::code)
                                                .orElse(""))
                        .withUcd("src.spType"));
        columns.add(
                number(
                                "photometric_type_sigma",
                                "subclass",
                                "one-sigma error of the type by the colours",
                                r ->
                                        colours(r)
                                                .flatMap(PhotometricType::type)
                                                .map(t -> Digits.type(t.sigmaSubclass()))
                                                .orElse(""))
                        .withUcd("stat.error;src.spType"));
        columns.add(
                number(
                                "photometric_chi2",
                                "",
                                "reduced chi-square of the colours at the template that fits best; empty"
                                        + " where no freedom is left",
                                r -> {
                                    OptionalDouble reduced =
                                            colours(r)
                                                    .map(PhotometricType::reducedChiSquare)
                                                    .orElse(OptionalDouble.empty());
                                    return reduced.isPresent()
                                            ? Digits.fixed(reduced.getAsDouble(), 2)
                                            : "";
                                })
                        .withUcd("stat.fit.chi2"));
        columns.add(
                number(
                                "spectrum_gain_bits",
                                "",
                                "bits that a spectrum is expected to add to the colours, on kind and type;"
                                        + " ranks objects without one, the largest first",
                                r ->
                                        r.spectra().isEmpty()
                                                ? colours(r)
                                                        .map(
                                                                c ->
                                                                        Digits.fixed(
                                                                                c
                                                                                        .spectrumGainBits(),
                                                                                2))
                                                        .orElse("")
                                                : "")
                        .withUcd("stat.value"));
    }

    private static Optional<PhotometricType> colours(ObjectResult result) {
        return result.placement().flatMap(Placement::photometric);
    }

    private static void addReddening(List<ResultColumn> columns) {
        columns.add(
                reddening(
                        "a_v",
                        "phys.absorption;em.opt.V",
                        "extinction in V fitted with the type",
                        ReddeningFit::avMag));
        columns.add(
                reddening(
                        "a_v_lo68",
                        "phys.absorption;stat.min",
                        "lower end of the 68% interval of a_v",
                        ReddeningFit::lo68Mag));
        columns.add(
                reddening(
                        "a_v_hi68",
                        "phys.absorption;stat.max",
                        "upper end of the 68% interval of a_v",
                        ReddeningFit::hi68Mag));
    }

    private static ResultColumn reddening(
            String name, String ucd, String description, ToDoubleFunction<ReddeningFit> part) {
        return number(
                        name,
                        "mag",
                        description,
                        r ->
                                r.placement()
                                        .flatMap(Placement::reddening)
                                        .map(fit -> Digits.type(part.applyAsDouble(fit)))
                                        .orElse(""))
                .withUcd(ucd);
    }

    private static void addSpectrum(List<ResultColumn> columns) {
        columns.add(
                number(
                                "snr",
                                "",
                                "median signal-to-noise per pixel in the band that is covered best",
                                r ->
                                        r.leading()
                                                .flatMap(s -> BandSignal.best(s.quality().bands()))
                                                .map(s -> Digits.signal(s.medianSignalToNoise()))
                                                .orElse(""))
                        .withUcd("stat.snr"));
        columns.add(
                text(
                                "quality",
                                "grade of the best spectrum: good, usable, poor or unusable",
                                r -> r.leading().map(s -> s.quality().grade().word()).orElse(""))
                        .withUcd("meta.code.qual"));
        columns.add(
                number(
                                "resolution",
                                "",
                                "resolving power of the spectrum with the highest signal-to-noise",
                                r ->
                                        r.leading()
                                                .map(s -> s.prepared().resolvingPower().value())
                                                .map(Digits::significant)
                                                .orElse(""))
                        .withUcd("spect.resolution"));
    }

    private static void addGravity(List<ResultColumn> columns) {
        columns.add(
                text(
                                "gravity",
                                "most probable gravity class: FLD-G, INT-G or VL-G; empty where it is not"
                                        + " judged",
                                r ->
                                        r.placement()
                                                .flatMap(p -> p.gravity().gravityClass())
                                                .map(g -> g.label())
                                                .orElse(""))
                        .withUcd("src.class;phys.gravity"));
        columns.add(
                placementShare("p_fldg", "probability of FLD-G", p -> p.gravity().pFieldGravity()));
        columns.add(
                placementShare(
                        "p_intg", "probability of INT-G", p -> p.gravity().pIntermediateGravity()));
        columns.add(
                placementShare("p_vlg", "probability of VL-G", p -> p.gravity().pVeryLowGravity()));
        columns.add(
                text(
                                "published_gravity",
                                "gravity class by the published scores, the type taken as known",
                                r ->
                                        r.placement()
                                                .flatMap(p -> p.gravity().byScores())
                                                .map(g -> g.label())
                                                .orElse(""))
                        .withUcd("src.class;phys.gravity"));
    }

    private static void addMetallicity(List<ResultColumn> columns) {
        columns.add(
                text(
                                "metallicity",
                                "metallicity class by zeta, if the object is a dwarf: d, sd, esd or usd;"
                                        + " empty where it is not judged",
                                r ->
                                        r.placement()
                                                .flatMap(p -> p.metallicity().adopted())
                                                .map(name -> name.prefix())
                                                .orElse(""))
                        .withUcd("src.class;phys.abund.Z"));
        columns.add(
                placementShare(
                        "p_subdwarf",
                        "probability of sd, esd or usd together",
                        p -> p.metallicity().pSubdwarf()));
    }

    private static Optional<TypeEstimate> adopted(ObjectResult result) {
        return result.placement().flatMap(Placement::type);
    }

    private static Optional<TypeEstimate> published(ObjectResult result) {
        return result.placement().flatMap(placement -> placement.published().type());
    }

    private static ResultColumn text(
            String name, String description, Function<ObjectResult, String> take) {
        return new ResultColumn(name, "", description, Content.TEXT, take);
    }

    private static ResultColumn number(
            String name, String unit, String description, Function<ObjectResult, String> take) {
        return new ResultColumn(name, unit, description, Content.NUMBER, take);
    }

    private static ResultColumn typeNumber(
            String name, String ucd, String description, ToDoubleFunction<TypeEstimate> part) {
        return number(
                        name,
                        "subclass",
                        description,
                        r -> adopted(r).map(t -> Digits.type(part.applyAsDouble(t))).orElse(""))
                .withUcd(ucd);
    }

    private static ResultColumn placementShare(
            String name, String description, Function<Placement, OptionalDouble> share) {
        return number(
                        name,
                        "",
                        description,
                        r -> {
                            OptionalDouble value =
                                    r.placement().map(share).orElse(OptionalDouble.empty());
                            return value.isPresent() ? Digits.probability(value.getAsDouble()) : "";
                        })
                .withUcd("stat.probability");
    }
}
