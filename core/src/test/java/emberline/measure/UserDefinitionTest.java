package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A user's own definition is measured like the product's. */
class UserDefinitionTest {

    @TempDir private Path folder;

    @Test
    void aLinearCombinationOfTwoIndicesIsMeasured() throws Exception {
        Files.createDirectories(folder.resolve("features"));
        Files.createDirectories(folder.resolve("parts"));
        Files.writeString(
                folder.resolve("sources.csv"), "key,authors,year\nmine2026,Example,2026\n");
        Files.writeString(
                folder.resolve("features/mine2026.csv"),
                """
                id,symbol,kind,form,species,band,medium,window_unit,source,how_known,\
                confidence_percent,sense,purpose
                mine2026/mix,mix,BAND_INDEX,LINEAR_COMBINATION_OF_FEATURES,H2O,J_H,UNSTATED,NONE,\
                mine2026,DERIVED,90,UNSTATED,TYPE
                """);
        Files.writeString(
                folder.resolve("parts/mine2026.csv"),
                """
                feature,role,part,coefficient
                mine2026/mix,TERM,burgasser2006/h2o-j,2
                mine2026/mix,TERM,burgasser2006/h2o-h,-0.5
                """);
        Measurements measured =
                new Measurer(FeatureCatalogue.standard().with(folder), Measuring.withDefaults())
                        .measure(
                                TestSpectra.of(
                                        0.9, 2.4, 1e-3, 500, 0.02, l -> 1 + 0.3 * Math.sin(9 * l)));
        double j = TestSpectra.value(measured, "burgasser2006/h2o-j");
        double h = TestSpectra.value(measured, "burgasser2006/h2o-h");
        Measured mix = measured.measured("mine2026/mix").orElseThrow();
        assertEquals(2 * j - 0.5 * h, mix.value(), 1e-12);
        double sigmaJ = measured.measured("burgasser2006/h2o-j").orElseThrow().oneSigma();
        double sigmaH = measured.measured("burgasser2006/h2o-h").orElseThrow().oneSigma();
        // the two indices share no pixel
        assertEquals(Math.hypot(2 * sigmaJ, 0.5 * sigmaH), mix.oneSigma(), 1e-9);
    }
}
