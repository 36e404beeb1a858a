package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.Form;
import emberline.catalogue.Statistic;
import emberline.prepare.PreparedSpectrum;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Windows and wavelengths that are moved by one factor together measure the same. */
class ShiftedCatalogueTest {

    private static final FeatureCatalogue STANDARD = FeatureCatalogue.standard();

    @TempDir private Path folder;

    private static List<Feature> ratios() {
        return STANDARD.features().stream()
                .filter(f -> f.form() == Form.RATIO_OF_MEANS && f.statistic() == Statistic.MEAN)
                .filter(f -> f.smoothToResolvingPower().isEmpty())
                .filter(f -> f.minResolvingPower().isEmpty())
                .filter(
                        f ->
                                f.windows().stream()
                                        .allMatch(
                                                w ->
                                                        w.window().lowMicron() > 0.65
                                                                && w.window().highMicron() < 2.4))
                .toList();
    }

    private static String moved(Feature feature) {
        return "moved2026/" + feature.id().replace('/', '-');
    }

    private FeatureCatalogue moved(List<Feature> features, double factor) throws Exception {
        StringBuilder rows =
                new StringBuilder(
                        "id,symbol,kind,form,species,band,medium,window_unit,source,how_known,"
                                + "confidence_percent,sense,purpose\n");
        StringBuilder windows = new StringBuilder("feature,role,low,high\n");
        for (Feature feature : features) {
            List<?> cells =
                    List.of(
                            moved(feature),
                            "Moved",
                            feature.kind(),
                            feature.form(),
                            feature.species(),
                            feature.band(),
                            "VACUUM",
                            "MICRON",
                            "moved2026",
                            "FROM_MEMORY",
                            50,
                            feature.sense(),
                            feature.purpose());
            rows.append(String.join(",", cells.stream().map(String::valueOf).toList()))
                    .append('\n');
            for (FeatureWindow part : feature.windows()) {
                windows.append(moved(feature)).append(',').append(part.role()).append(',');
                windows.append(part.window().lowMicron() * factor).append(',');
                windows.append(part.window().highMicron() * factor).append('\n');
            }
        }
        Files.createDirectories(folder.resolve("features"));
        Files.createDirectories(folder.resolve("windows"));
        Files.writeString(
                folder.resolve("sources.csv"), "key,authors,year\nmoved2026,Example,2026\n");
        Files.writeString(folder.resolve("features/moved.csv"), rows);
        Files.writeString(folder.resolve("windows/moved.csv"), windows);
        return STANDARD.with(folder);
    }

    @ParameterizedTest
    @ValueSource(doubles = {1.0007, 0.99, 1.013})
    void movingWindowsAndWavelengthsTogetherChangesNothing(double factor) throws Exception {
        List<Feature> features = ratios();
        PreparedSpectrum here =
                TestSpectra.of(
                        0.6,
                        2.5,
                        3e-4,
                        1500,
                        0.02,
                        micron -> 2 + Math.sin(40 * micron) + 0.3 * Math.sin(1700 * micron));
        double[] wavelengths = here.spectrum().wavelengthsMicron();
        for (int i = 0; i < wavelengths.length; i++) {
            wavelengths[i] *= factor;
        }
        Measurements there =
                new Measurer(moved(features, factor), Measuring.withDefaults().withSite(Site.SPACE))
                        .measure(
                                TestSpectra.prepared(
                                        here.spectrum().withWavelengthsMicron(wavelengths), 1500));
        Measurements expected = TestSpectra.measure(here);
        int compared = 0;
        for (Feature feature : features) {
            if (expected.measured(feature.id()).isPresent()) {
                double value = TestSpectra.value(expected, feature.id());
                assertEquals(value, TestSpectra.value(there, moved(feature)), 1e-9, feature.id());
                compared++;
            }
        }
        assertTrue(compared >= 20, compared + " features");
    }
}
