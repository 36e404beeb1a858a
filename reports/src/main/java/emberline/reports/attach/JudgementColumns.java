package emberline.reports.attach;

import emberline.judge.Estimate;
import emberline.judge.Judgement;
import emberline.judge.Kinematics;
import emberline.reports.attach.ResultColumn.Content;
import emberline.spectrum.MagnitudeBand;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;

/** The columns of the results table that a judgement fills; empty where there is none. */
final class JudgementColumns {

    /** Mass of the Sun in masses of Jupiter (nominal values of IAU 2015, resolution B3). */
    private static final double JUPITERS_PER_SUN = 1047.57;

    private JudgementColumns() {}

    /** The columns in their order. */
    static List<ResultColumn> all() {
        List<ResultColumn> columns = new ArrayList<>();
        addDecision(columns);
        addMassAndAge(columns);
        addProperties(columns);
        addDistance(columns);
        addSteps(columns);
        return columns;
    }

    private static void addDecision(List<ResultColumn> columns) {
        columns.add(
                text(
                                "decision",
                                "substellar, stellar or undecided: the same verdict at 0.070, 0.072 and"
                                        + " 0.075 solar masses",
                                j -> j.decision().word())
                        .withUcd("src.class"));
        columns.add(
                share(
                        "p_substellar",
                        "probability of a mass below 0.072 solar masses",
                        j -> j.limits().pSubstellar()));
        columns.add(
                share(
                        "p_substellar_070",
                        "probability of a mass below 0.070 solar masses",
                        j -> j.limits().pSubstellarLow()));
        columns.add(
                share(
                        "p_substellar_075",
                        "probability of a mass below 0.075 solar masses",
                        j -> j.limits().pSubstellarHigh()));
        columns.add(
                share(
                        "p_below_13mjup",
                        "probability of a mass below 13 Jupiter masses, the deuterium-burning"
                                + " limit",
                        j -> j.limits().pPlanetaryMass()));
        columns.add(share("p_young", "probability of an age below 150 Myr", j -> j.age().pYoung()));
    }

    private static void addMassAndAge(List<ResultColumn> columns) {
        interval(
                columns,
                "age_myr",
                "Myr",
                "time.age",
                "age",
                j -> Optional.of(j.age().ageMyr()),
                3);
        interval(
                columns,
                "mass_mjup",
                "Mjup",
                "phys.mass",
                "mass",
                j -> Optional.of(j.massMsun().times(JUPITERS_PER_SUN)),
                3);
        interval(
                columns,
                "mass_msun",
                "Msun",
                "phys.mass",
                "mass",
                j -> Optional.of(j.massMsun()),
                3);
    }

    private static void addProperties(List<ResultColumn> columns) {
        value(
                columns,
                "teff_k",
                "K",
                "phys.temperature.effective",
                "effective temperature by type",
                j -> j.properties().teffK(),
                0);
        value(
                columns,
                "log_l_lsun",
                "",
                "phys.luminosity",
                "log10 of the luminosity (solar): from the parallax where there is one, else by"
                        + " type",
                j -> j.properties().logL(),
                3);
        value(
                columns,
                "m_bol",
                "mag",
                "phys.magAbs.bol",
                "absolute bolometric magnitude",
                j -> j.properties().mBol(),
                2);
        value(
                columns,
                "logg_cgs",
                "",
                "phys.gravity",
                "log10 of the surface gravity (cm/s2) from the grids",
                j -> Optional.of(j.properties().logG()),
                2);
        value(
                columns,
                "radius_rsun",
                "Rsun",
                "phys.size.radius",
                "radius from the grids",
                j -> Optional.of(j.properties().radiusRsun()),
                4);
    }

    private static void addDistance(List<ResultColumn> columns) {
        interval(
                columns,
                "distance_pc",
                "pc",
                "pos.distance",
                "distance",
                j -> j.properties().distance().map(d -> d.pc()),
                3);
        columns.add(
                text(
                                "distance_method",
                                "parallax, or photometry with the band",
                                j -> j.properties().distance().map(d -> d.method()).orElse(""))
                        .withUcd("meta.note"));
        for (MagnitudeBand band :
                List.of(MagnitudeBand.J_2MASS, MagnitudeBand.H_2MASS, MagnitudeBand.K_2MASS)) {
            String letter = band.name().substring(0, 1).toLowerCase(Locale.ROOT);
            value(
                    columns,
                    "abs_mag_" + letter,
                    "mag",
                    "phys.magAbs;em.IR." + letter.toUpperCase(Locale.ROOT),
                    "absolute magnitude in "
                            + band.label()
                            + ": measured where a parallax allows,"
                            + " else by type",
                    j -> Optional.ofNullable(j.properties().absoluteMagnitudes().get(band)),
                    2);
        }
        columns.add(
                number(
                                "vtan_kms",
                                "km/s",
                                "tangential velocity",
                                j ->
                                        j.properties()
                                                .kinematics()
                                                .map(k -> Digits.fixed(k.vtanKms(), 1)))
                        .withUcd("phys.veloc.transverse"));
        space(columns, "u_kms", "to the galactic centre", s -> s.uKms());
        space(columns, "v_kms", "along the rotation of the Galaxy", s -> s.vKms());
        space(columns, "w_kms", "to the north galactic pole", s -> s.wKms());
    }

    private static void addSteps(List<ResultColumn> columns) {
        columns.add(
                text(
                                "next_step",
                                "the further observation that tells most, if one can change the decision",
                                Judgement::nextStepWords)
                        .withUcd("meta.note"));
        columns.add(
                number(
                                "score",
                                "",
                                "place in the order of the survey by the aim: the greater, the earlier",
                                j -> Optional.of(Digits.fixed(j.priority().score(), 4)))
                        .withUcd("stat.value"));
        columns.add(
                text("priority", "what the score rests on", j -> j.priority().reason())
                        .withUcd("meta.note"));
    }

    private static void space(
            List<ResultColumn> columns,
            String name,
            String direction,
            ToDoubleFunction<Kinematics.Space> part) {
        columns.add(
                number(
                                name,
                                "km/s",
                                "velocity relative to the Sun, " + direction,
                                j ->
                                        j.properties()
                                                .kinematics()
                                                .flatMap(k -> k.space())
                                                .map(s -> Digits.fixed(part.applyAsDouble(s), 1)))
                        .withUcd("phys.veloc;pos.galactic"));
    }

    /** A value with one sigma. */
    private static void value(
            List<ResultColumn> columns,
            String name,
            String unit,
            String ucd,
            String description,
            Function<Judgement, Optional<Estimate>> take,
            int decimals) {
        columns.add(
                number(
                                name,
                                unit,
                                description,
                                j -> take.apply(j).map(e -> Digits.fixed(e.median(), decimals)))
                        .withUcd(ucd));
        String stem = name.replaceFirst("_cgs$", "");
        columns.add(
                number(
                                stem + "_sigma",
                                unit,
                                "half of the 68% interval of " + name,
                                j -> take.apply(j).map(e -> Digits.fixed(e.sigma(), decimals)))
                        .withUcd("stat.error;" + ucd));
    }

    /** A median with its 68% interval. */
    private static void interval(
            List<ResultColumn> columns,
            String name,
            String unit,
            String ucd,
            String what,
            Function<Judgement, Optional<Estimate>> take,
            int digits) {
        columns.add(
                number(
                                name,
                                unit,
                                what + ", median",
                                j -> take.apply(j).map(e -> Digits.significant(e.median(), digits)))
                        .withUcd(ucd + ";stat.median"));
        columns.add(
                number(
                                name + "_lo68",
                                unit,
                                "lower end of the 68% interval of the " + what,
                                j -> take.apply(j).map(e -> Digits.significant(e.lo68(), digits)))
                        .withUcd(ucd + ";stat.min"));
        columns.add(
                number(
                                name + "_hi68",
                                unit,
                                "upper end of the 68% interval of the " + what,
                                j -> take.apply(j).map(e -> Digits.significant(e.hi68(), digits)))
                        .withUcd(ucd + ";stat.max"));
    }

    private static ResultColumn share(
            String name, String description, ToDoubleFunction<Judgement> take) {
        return number(
                        name,
                        "",
                        description,
                        j -> Optional.of(Digits.probability(take.applyAsDouble(j))))
                .withUcd("stat.probability");
    }

    private static ResultColumn number(
            String name,
            String unit,
            String description,
            Function<Judgement, Optional<String>> take) {
        return new ResultColumn(
                name,
                unit,
                description,
                Content.NUMBER,
                result -> result.judgement().flatMap(take).orElse(""));
    }

    private static ResultColumn text(
            String name, String description, Function<Judgement, String> take) {
        return new ResultColumn(
                name,
                "",
                description,
                Content.TEXT,
                (ObjectResult result) -> result.judgement().map(take).orElse(""));
    }
}
