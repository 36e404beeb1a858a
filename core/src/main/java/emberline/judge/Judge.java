package emberline.judge;

import emberline.catalogue.Source;
import emberline.judge.PropertyRelations.Quantity;
import emberline.place.TypeEstimate;
import emberline.spectrum.Finding;
import emberline.spectrum.MagnitudeBand;
import emberline.spectrum.RecentlyUsed;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Judges objects: physical properties, age, mass, and whether the mass is below the
 * hydrogen-burning limit. Tables are read and laid on nodes once, when a judge is made. Safe for
 * use by several threads.
 */
public final class Judge {

    /** Fineness of the grids that only show how far models differ. */
    private static final double COARSE = 0.5;

    /** So many stated ages are kept laid out: objects of one group share theirs. */
    private static final int STATED_AGES = 16;

    private static final EvolutionGrid.Name MAIN = EvolutionGrid.Name.MERGED;

    private final Judging judging;
    private final JudgeNumbers numbers = JudgeNumbers.standard();
    private final PropertyRelations relations = new PropertyRelations();
    private final TypeKernel kernel = new TypeKernel(relations);
    private final AgeEvidence age = new AgeEvidence(numbers);
    private final LithiumEvidence lithium = new LithiumEvidence(numbers);
    private final PropertyFinder properties = new PropertyFinder(relations);
    private final DistanceFinder distances = new DistanceFinder(relations, numbers);
    private final LuminosityFinder luminosities = new LuminosityFinder(relations, numbers);
    private final NextSteps nextSteps = new NextSteps(kernel, lithium);
    private final SideQuestions sideQuestions = new SideQuestions(numbers, age, nextSteps);
    private final Map<EvolutionGrid.Name, EvolutionGrid> grids = EvolutionGrid.all();
    private final Map<EvolutionGrid.Name, NodeTable> openTables;
    private final RecentlyUsed<AgeStatement, Map<EvolutionGrid.Name, NodeTable>> statedTables =
            new RecentlyUsed<>(STATED_AGES);
    private final int fineness;

    /**
     * A judge.
     *
     * @param judging thresholds, age and aims
     */
    public Judge(Judging judging) {
        this(judging, 1);
    }

    /** A judge whose steps of mass and age are finer by a whole factor. */
    Judge(Judging judging, int fineness) {
        this.judging = judging;
        this.fineness = fineness;
        this.openTables = tables(AgeStatement.none());
    }

    private Map<EvolutionGrid.Name, NodeTable> tables(AgeStatement stated) {
        Map<EvolutionGrid.Name, NodeTable> tables = new EnumMap<>(EvolutionGrid.Name.class);
        grids.forEach(
                (name, grid) ->
                        tables.put(
                                name,
                                new NodeTable(
                                        grid,
                                        grids.get(MAIN),
                                        stated,
                                        numbers,
                                        name == MAIN ? fineness : COARSE * fineness)));
        return tables;
    }

    /**
     * The papers behind the numbers of judging.
     *
     * @return all of them
     */
    public static List<Source> sources() {
        return JudgeSources.all();
    }

    /**
     * The papers behind the numbers that one judgement rests on: grids, limits, the relations of
     * the types that it may have, and the tables of the evidence that counted.
     *
     * @param judgement the judgement
     * @param type the type of the object; empty where it is not known
     * @return papers in the order of their keys
     */
    public static List<Source> sources(Judgement judgement, Optional<TypeEstimate> type) {
        return JudgeSources.of(judgement, type);
    }

    /**
     * Judges an object.
     *
     * @param given what is known of it; an age stated there goes before that of the settings
     * @return the judgement
     * @throws IllegalStateException if no mass and age of the grids fits
     */
    public Judgement judge(Evidence given) {
        Evidence evidence =
                given.age().isEmpty() && judging.age().isPresent()
                        ? given.withAge(judging.age().get())
                        : given;
        TypeMix mix = new TypeMix(evidence);
        Optional<DistanceEstimate> distance = distances.find(evidence, mix);
        Optional<Kinematics> kinematics =
                distance.flatMap(d -> Kinematics.of(evidence.astrometry(), d));
        Optional<LuminosityFinder.Measured> luminosity =
                distances.byParallax(evidence.astrometry())
                        ? luminosities.find(evidence, distance.orElseThrow())
                        : Optional.empty();
        EvidenceCurves curves =
                new EvidenceCurves(
                        evidence,
                        mix,
                        kernel,
                        age,
                        lithium,
                        luminosity.map(this::curvesOf),
                        distance,
                        kinematics);
        Map<EvolutionGrid.Name, NodeTable> tables = tablesFor(evidence);
        NodePosterior open = new NodePosterior(openTables.get(MAIN), curves, numbers);
        NodePosterior posterior =
                evidence.age().isPresent()
                        ? new NodePosterior(tables.get(MAIN), curves, numbers)
                        : open;
        return assemble(
                evidence,
                mix,
                curves,
                new Found(distance, kinematics, luminosity),
                open,
                posterior,
                comparisons(tables, curves));
    }

    private record Found(
            Optional<DistanceEstimate> distance,
            Optional<Kinematics> kinematics,
            Optional<LuminosityFinder.Measured> luminosity) {}

    private double[][] curvesOf(LuminosityFinder.Measured measured) {
        double[][] curves = new double[TypeKernel.SEQUENCES.length][];
        for (int s = 0; s < curves.length; s++) {
            curves[s] = luminosities.curve(measured.on(TypeKernel.SEQUENCES[s]));
        }
        return curves;
    }

    private Map<EvolutionGrid.Name, NodeTable> tablesFor(Evidence evidence) {
        if (evidence.age().isEmpty()) {
            return openTables;
        }
        AgeStatement stated = evidence.age().get();
        return statedTables.get(stated).orElseGet(() -> statedTables.keep(stated, tables(stated)));
    }

    private List<GridComparison> comparisons(
            Map<EvolutionGrid.Name, NodeTable> tables, EvidenceCurves curves) {
        List<GridComparison> found = new ArrayList<>();
        tables.forEach(
                (name, table) -> {
                    if (name != MAIN) {
                        NodePosterior other = new NodePosterior(table, curves, numbers);
                        found.add(
                                new GridComparison(
                                        name,
                                        other.below(numbers.of("hydrogen-limit")),
                                        Estimate.of(table.massEdges(), other.byMass()).median()));
                    }
                });
        return found;
    }

    private Judgement assemble(
            Evidence evidence,
            TypeMix mix,
            EvidenceCurves curves,
            Found found,
            NodePosterior open,
            NodePosterior posterior,
            List<GridComparison> others) {
        Limits limits = Limits.of(posterior, numbers, judging);
        AgeResult aged =
                AgeResult.of(
                        posterior,
                        evidence.age().orElseGet(AgeStatement::none),
                        numbers.of("young-age"));
        Estimate mass = Estimate.of(posterior.table().massEdges(), posterior.byMass());
        double poor =
                sideQuestions.metalPoor(
                        evidence, found.kinematics(), found.distance(), mix.meanType());
        OutcomeSimulator simulator =
                new OutcomeSimulator(posterior, curves, mix, age, lithium, numbers);
        List<NextStep> steps = new ArrayList<>(nextSteps.of(simulator, curves, mix, judging));
        double pair = sideQuestions.pair(evidence);
        steps.addAll(sideQuestions.steps(poor, pair, found.distance(), evidence, mix, judging));
        List<NextStep> sorted = NextSteps.sorted(steps, judging);
        LedgerMaker ledgers = new LedgerMaker(open, posterior, curves);
        Properties physical = physical(evidence, mix, posterior, found);
        Map<Aim, Double> claims = claims(limits, aged, posterior, poor, found.distance());
        claims.put(Aim.PAIRS, pair);
        return new Judgement(
                limits,
                mass,
                aged,
                physical,
                ledgers.of("mass below 0.072 solar masses", 1),
                ledgers.of("age below 150 Myr", 2),
                others,
                sorted,
                Priorities.of(claims, sorted, judging),
                new MassAgePlane(posterior),
                findings(evidence, mix, found, physical, limits, others, poor));
    }

    private Map<Aim, Double> claims(
            Limits limits,
            AgeResult aged,
            NodePosterior posterior,
            double metalPoor,
            Optional<DistanceEstimate> distance) {
        Map<Aim, Double> claims = new EnumMap<>(Aim.class);
        claims.put(Aim.SUBSTELLAR, limits.pSubstellar());
        claims.put(Aim.YOUNG, aged.pYoung());
        claims.put(Aim.COOLEST, posterior.cooler(numbers.of("cool-teff")));
        claims.put(Aim.METAL_POOR, metalPoor);
        sideQuestions.nearby(distance).ifPresent(p -> claims.put(Aim.NEARBY, p));
        return claims;
    }

    private Properties physical(
            Evidence evidence, TypeMix mix, NodePosterior posterior, Found found) {
        double young = posterior.onYoungSequence();
        Map<MagnitudeBand, Estimate> absolute = properties.absoluteMagnitudes(mix);
        if (distances.byParallax(evidence.astrometry())) {
            DistanceEstimate distance = found.distance().orElseThrow();
            double distanceMag = 5 / Math.log(10) * distance.relativeSigma();
            double modulus = 5 * Math.log10(distance.pc().median() / 10);
            evidence.photometry()
                    .forEach(
                            (band, magnitude) ->
                                    absolute.put(
                                            band,
                                            Estimate.normal(
                                                    magnitude.mag() - modulus,
                                                    Math.hypot(
                                                            magnitude.sigmaMag(), distanceMag))));
        }
        Optional<Estimate> byType = properties.byType(Quantity.LOG_L, mix, young);
        Optional<Estimate> measured =
                found.luminosity().map(m -> PropertyFinder.measured(m, young));
        String method =
                found.luminosity()
                        .map(m -> "parallax and " + m.band().label())
                        .orElse(byType.isPresent() ? "spectral type" : "");
        return new Properties(
                properties.byType(Quantity.TEFF, mix, young),
                measured.isPresent() ? measured : byType,
                method,
                posterior.estimate(NodeTable::logG, 2.5, 5.75, 650),
                posterior.estimate(NodeTable::radius, 0.05, 0.65, 1200),
                absolute,
                properties.bolometricCorrections(mix, young),
                found.distance(),
                found.kinematics());
    }

    private List<Finding> findings(
            Evidence evidence,
            TypeMix mix,
            Found found,
            Properties physical,
            Limits limits,
            List<GridComparison> others,
            double metalPoor) {
        JudgeFindings findings = new JudgeFindings(judging);
        findings.offRelations(TypeAxis.outside(evidence.type()));
        findings.lateOrEarly(mix.meanType());
        findings.grids(limits, others);
        findings.metalPoor(metalPoor);
        found.luminosity()
                .ifPresent(
                        m ->
                                properties
                                        .byType(Quantity.LOG_L, mix, 0)
                                        .ifPresent(
                                                type ->
                                                        findings.luminosity(
                                                                physical.logL().orElseThrow(),
                                                                type)));
        findings.lithium(evidence.lithium(), lithium.chance(mix, evidence.lithium()));
        found.kinematics().ifPresent(findings::motion);
        findings.parallax(evidence, distances.byParallax(evidence.astrometry()));
        return findings.list();
    }
}
