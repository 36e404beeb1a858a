package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The catalogue of the product, tested as data. */
class StandardCatalogueTest {

    /** Below this a number is too doubtful to ship. */
    private static final int CONFIDENCE_FLOOR_PERCENT = 60;

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();

    /** A change of these numbers is a change of the product and must be meant. */
    @Test
    void holdsWhatItHeldBefore() {
        assertEquals(232, catalogue.features().size());
        assertEquals(62, catalogue.relations().size());
        assertEquals(53, catalogue.relations(Quantity.SPECTRAL_TYPE).size());
        assertEquals(3, catalogue.relations(Quantity.SOLAR_TIO5).size());
        assertEquals(2, catalogue.relations(Quantity.SUBDWARF_CAH1_LIMIT).size());
        assertEquals(4, catalogue.relations(Quantity.IRON_ABUNDANCE).size());
        assertEquals(37, catalogue.gravityThresholds().size());
        assertEquals(96, catalogue.typeBoundaries().size());
        assertEquals(6, catalogue.pairPlanes().size());
        assertEquals(8, catalogue.metallicityClasses().size());
        assertEquals(56, catalogue.sources().size());
        assertEquals(22, catalogue.activityFactors().size());
        assertEquals(40, catalogue.restLines().size());
        assertEquals(24, catalogue.telluricRegions().size());
        assertEquals(31, catalogue.molecularBands().size());
    }

    /** The list of tables and the tables agree, in both directions. */
    @Test
    void listsEveryTable() throws IOException, URISyntaxException {
        Path root = resources();
        Set<String> found;
        try (Stream<Path> walk = Files.walk(root)) {
            found =
                    walk.map(file -> root.relativize(file).toString().replace('\\', '/'))
                            .filter(file -> file.endsWith(".csv") && !file.equals("files.csv"))
                            .collect(Collectors.toCollection(TreeSet::new));
        }
        assertEquals(List.copyOf(found), new ResourceTables().files());
        for (String file : found) {
            assertTrue(
                    Stream.of(TableKind.values()).anyMatch(kind -> kind.holds(file)),
                    file + " is read by nothing");
        }
    }

    /** One paper, one set of tables: a row stands in the table of its source. */
    @Test
    void rowsStandInTheTableOfTheirPaper() throws InvalidCatalogueException {
        for (TableKind kind : List.of(TableKind.FEATURES, TableKind.RELATIONS, TableKind.GRAVITY)) {
            for (CatalogueRow row : CatalogueTable.read(new ResourceTables(), kind)) {
                assertTrue(row.file().endsWith("/" + row.text("source") + ".csv"), row.where());
            }
        }
        for (TableKind kind : List.of(TableKind.WINDOWS, TableKind.PARTS)) {
            for (CatalogueRow row : CatalogueTable.read(new ResourceTables(), kind)) {
                String paper = row.text("feature").replaceFirst("/.*", "");
                assertTrue(row.file().endsWith("/" + paper + ".csv"), row.where());
            }
        }
    }

    @Test
    void namesEveryColumnInTheSchema() throws IOException, URISyntaxException {
        String schema = Files.readString(resources().resolve("SCHEMA.md"), StandardCharsets.UTF_8);
        for (TableKind kind : TableKind.values()) {
            assertTrue(schema.contains("`" + kind.place() + "`"), kind.place());
            Stream.concat(kind.required().stream(), kind.optional().stream())
                    .filter(column -> !column.matches("c[0-9]"))
                    .forEach(column -> assertTrue(schema.contains("`" + column + "`"), column));
        }
        for (Class<? extends Enum<?>> list :
                List.of(
                        Form.class,
                        Role.class,
                        PartRole.class,
                        HowKnown.class,
                        Band.class,
                        Sense.class,
                        Purpose.class,
                        Quantity.class,
                        Relation.Population.class,
                        Relation.Verdict.class,
                        TelluricRegion.Strength.class,
                        MetallicityClass.Name.class,
                        ActivityFactor.Quantity.class)) {
            for (Enum<?> word : list.getEnumConstants()) {
                assertTrue(schema.contains(word.name()), word.name());
            }
        }
    }

    @Test
    void usesEverySource() {
        Set<Source> used = new HashSet<>();
        catalogue.features().forEach(x -> used.add(x.source()));
        catalogue.relations().forEach(x -> used.add(x.source()));
        catalogue.gravityThresholds().forEach(x -> used.add(x.source()));
        catalogue.typeBoundaries().forEach(x -> used.add(x.source()));
        catalogue.pairPlanes().forEach(x -> used.add(x.source()));
        catalogue.metallicityClasses().forEach(x -> used.add(x.source()));
        catalogue.activityFactors().forEach(x -> used.add(x.source()));
        catalogue.restLines().forEach(x -> used.add(x.source()));
        catalogue.telluricRegions().forEach(x -> used.add(x.source()));
        catalogue.molecularBands().forEach(x -> used.add(x.source()));
        assertEquals(Set.copyOf(catalogue.sources()), used);
    }

    /** Every line of BibTeX is closed and no two entries share a key. */
    @Test
    void givesSoundBibtex() {
        Set<String> keys = new HashSet<>();
        for (Source source : catalogue.sources()) {
            assertTrue(keys.add(source.key()));
            String entry = source.bibtex();
            assertTrue(entry.startsWith("@") && entry.endsWith("\n}\n"), entry);
            assertEquals(
                    entry.chars().filter(c -> c == '{').count(),
                    entry.chars().filter(c -> c == '}').count(),
                    entry);
            assertFalse(entry.matches("(?s).*[^\\\\]&.*"), entry);
        }
    }

    @Test
    void idsAreUniqueWithoutCase() {
        Set<String> ids = new HashSet<>();
        catalogue.features().forEach(f -> assertTrue(ids.add(f.id().toLowerCase(Locale.ROOT))));
        ids.clear();
        catalogue.relations().forEach(r -> assertTrue(ids.add(r.id().toLowerCase(Locale.ROOT))));
    }

    @Test
    void noPaperHasTheSameDefinitionTwice() {
        Set<List<Object>> seen = new HashSet<>();
        for (Feature f : catalogue.features()) {
            List<Object> definition =
                    List.of(f.source().key(), f.form(), f.statistic(), f.windows(), f.parts());
            assertTrue(seen.add(definition), f.id());
        }
    }

    /** Nothing unfinished: no status column, no number that is too doubtful, none that failed. */
    @Test
    void holdsOnlyWhatCanBeUsed() {
        for (TableKind kind : TableKind.values()) {
            assertFalse(kind.required().contains("status") || kind.optional().contains("status"));
        }
        assertEquals(
                Set.of(
                        "READ_IN_SOURCE",
                        "QUOTED_ELSEWHERE",
                        "CROSS_CHECKED",
                        "DERIVED",
                        "FROM_MEMORY"),
                Stream.of(HowKnown.values()).map(Enum::name).collect(Collectors.toSet()));
        Stream.of(
                        catalogue.features().stream().map(Feature::confidencePercent),
                        catalogue.relations().stream().map(Relation::confidencePercent),
                        catalogue.gravityThresholds().stream()
                                .map(GravityThreshold::confidencePercent),
                        catalogue.typeBoundaries().stream().map(TypeBoundary::confidencePercent),
                        catalogue.pairPlanes().stream().map(PairPlane::confidencePercent),
                        catalogue.metallicityClasses().stream()
                                .map(MetallicityClass::confidencePercent),
                        catalogue.activityFactors().stream().map(ActivityFactor::confidencePercent),
                        catalogue.restLines().stream().map(RestLine::confidencePercent),
                        catalogue.telluricRegions().stream().map(TelluricRegion::confidencePercent),
                        catalogue.molecularBands().stream().map(MolecularBand::confidencePercent))
                .flatMap(percent -> percent)
                .forEach(percent -> assertTrue(percent >= CONFIDENCE_FLOOR_PERCENT));
        for (Relation relation : catalogue.relations()) {
            assertFalse(relation.verdict() == Relation.Verdict.REFUTED, relation.id());
        }
    }

    /** Definitions and relations known to be doubtful stay out. */
    @Test
    void leavesOutWhatIsDoubtful() {
        for (String id :
                List.of(
                        "mclean2003/z-feh",
                        "slesnick2004/feh",
                        "riddick2007/r3",
                        "zhang2018/omega-d",
                        "schlieder2012/ew_na8200",
                        "rojasayala2012/ew_cai_2.26")) {
            assertTrue(catalogue.feature(id).isEmpty(), id);
        }
        for (Relation relation : catalogue.relations()) {
            assertFalse(relation.id().equals("lepine2013/vo1"));
            assertFalse(relation.id().equals("unattributed2013/tio5-solar"));
        }
    }

    /** A relation that needs care says why; the one for subdwarfs is marked as such. */
    @Test
    void cautionComesWithANote() {
        for (Relation relation : catalogue.relations()) {
            if (relation.verdict() == Relation.Verdict.CAUTION) {
                assertTrue(relation.note().contains("field dwarfs"), relation.id());
            }
        }
        List<String> forSubdwarfs =
                catalogue.relations().stream()
                        .filter(r -> r.population() == Relation.Population.SUBDWARF)
                        .map(Relation::id)
                        .toList();
        assertEquals(List.of("lepine2007/cah2+cah3"), forSubdwarfs);
    }

    @Test
    void gravityFeaturesAreSmoothedToThePrismResolution() {
        Set<String> scored =
                catalogue.gravityThresholds().stream()
                        .map(GravityThreshold::feature)
                        .collect(Collectors.toSet());
        assertEquals(
                Set.of(
                        "allers2013/feh_z",
                        "allers2013/vo_z",
                        "allers2013/ki_j",
                        "allers2013/h-cont"),
                scored);
        for (Feature f : catalogue.features()) {
            OptionalDouble expected =
                    scored.contains(f.id()) ? OptionalDouble.of(130) : f.maxResolvingPower();
            assertEquals(expected, f.smoothToResolvingPower(), f.id());
        }
    }

    /** Read in Morelli et al. 2020, Table 1; the medium is vacuum, so the digits stay. */
    @Test
    void vacuumWindowsStayAsPrinted() {
        Feature potassium = catalogue.feature("morelli2020/ew_ki_1.252").orElseThrow();
        assertEquals(Medium.VACUUM, potassium.printedMedium());
        assertEquals(new Window(1.2495, 1.2540), potassium.window(Role.LINE));
        assertEquals(new Window(1.2460, 1.2490), potassium.window(Role.CONTINUUM_1));
        assertEquals(new Window(1.2560, 1.2580), potassium.window(Role.CONTINUUM_2));
    }

    /**
     * The continuum of TiO5 is 7042 to 7046 in air (quoted in a later paper); vacuum lies 1.94
     * angstrom higher there (computed apart).
     */
    @Test
    void airWindowsMoveToVacuum() {
        Window continuum =
                catalogue.feature("reid1995/tio5").orElseThrow().window(Role.DENOMINATOR);
        assertEquals(0.7042 + 1.94e-4, continuum.lowMicron(), 5e-7);
        assertEquals(0.7046 + 1.94e-4, continuum.highMicron(), 5e-7);
    }

    /** An index falls with a line above its fraction bar and rises with one below. */
    @Test
    void senseFollowsTheSideOfTheLine() {
        int checked = 0;
        for (Feature f : catalogue.features()) {
            boolean above = holdsLine(f, Role.NUMERATOR);
            boolean below = holdsLine(f, Role.DENOMINATOR);
            if (above != below && f.sense() != Sense.RISES_WITH_EMISSION) {
                Sense expected = above ? Sense.FALLS_WITH_ABSORPTION : Sense.RISES_WITH_ABSORPTION;
                assertEquals(expected, f.sense(), f.id());
                checked++;
            }
        }
        assertTrue(checked >= 20, "only " + checked + " features");
    }

    private boolean holdsLine(Feature feature, Role role) {
        return feature.windows(role).stream()
                .map(FeatureWindow::window)
                .anyMatch(
                        window ->
                                catalogue.restLines().stream()
                                        .filter(
                                                line ->
                                                        line.species()
                                                                .replaceFirst(" I+$", "")
                                                                .equals(feature.species()))
                                        .mapToDouble(RestLine::vacuumMicron)
                                        .anyMatch(
                                                micron ->
                                                        micron > window.lowMicron()
                                                                && micron < window.highMicron()));
    }

    /** Each index runs through its types without gap or overlap. */
    @Test
    void typeRangesTouch() {
        List<TypeBoundary> boundaries = catalogue.typeBoundaries();
        for (int i = 1; i < boundaries.size(); i++) {
            TypeBoundary before = boundaries.get(i - 1);
            TypeBoundary after = boundaries.get(i);
            if (before.feature().equals(after.feature())) {
                assertEquals(before.typeNumber() + 1, after.typeNumber());
                boolean rising = before.high().equals(after.low());
                boolean falling = before.low().equals(after.high());
                assertTrue(rising || falling, after.feature() + " at " + after.typeNumber());
            }
        }
    }

    /** Vacuum wavelengths of a list made apart; some of ours were measured, hence 0.05 angstrom. */
    @Test
    void linesAgreeWithAListMadeApart() throws IOException {
        int compared = 0;
        for (NamedCsvRecord row :
                TestTable.rows(emberline.spectrum.AirToVacuum.class, "lines_air_vac.csv")) {
            double vacuum = TestTable.number(row, "vacuum_angstrom");
            double nearest =
                    catalogue.restLines().stream()
                            .mapToDouble(line -> line.vacuumMicron() * 1e4)
                            .reduce(
                                    0,
                                    (a, b) -> Math.abs(a - vacuum) < Math.abs(b - vacuum) ? a : b);
            assertEquals(vacuum, nearest, 0.05, row.toString());
            compared++;
        }
        assertEquals(20, compared);
    }

    private static Path resources() throws URISyntaxException {
        return Path.of(FeatureCatalogue.class.getResource("files.csv").toURI()).getParent();
    }
}
