package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ForecastTest {

    private final FeatureNoise noise = FeatureNoise.standard();
    private final Forecast forecast =
            new Forecast(Calibration.standard(), TypePriors.FLAT.load(), noise);

    @Test
    void aFeatureIsNoisierPerPixelSignalWhereItsBandIsDeep() {
        double ofM = noise.atUnitSignal("geballe2002/h2o_1.2", 7, 120).orElseThrow();
        double ofT = noise.atUnitSignal("geballe2002/h2o_1.2", 22, 120).orElseThrow();
        assertTrue(ofT > 2 * ofM, ofM + " at M7, " + ofT + " at T2");
    }

    @Test
    void finePixelsHaveLessSignalEachSoThatAFeatureIsSharperAtUnitSignal() {
        double low = noise.atUnitSignal("allers2013/h2od", 12, 120).orElseThrow();
        double high = noise.atUnitSignal("allers2013/h2od", 12, 750).orElseThrow();
        assertTrue(high < low, low + " at R 120, " + high + " at R 750");
    }

    @Test
    void whatNoSpectrumShowsIsNotForecast() {
        assertTrue(noise.atUnitSignal("no/such_feature", 12, 120).isEmpty());
        assertTrue(
                forecast.features(new Forecast.Setting(12, GravityClass.FLD_G, 120)).size() > 20);
    }

    /** Binomial sigma of 300 draws: 2.7% and 1.3%; the label error, which is added, widens. */
    @Test
    void theTrueTypeLiesInTheIntervalsAsOftenAsTheySay() {
        int in68 = 0;
        int in95 = 0;
        int draws = 300;
        for (int draw = 0; draw < draws; draw++) {
            double truth = 6 + 12.0 * draw / draws;
            TypeEstimate type =
                    forecast.draw(new Forecast.Setting(truth, GravityClass.FLD_G, 120), 20, draw)
                            .posterior()
                            .orElseThrow()
                            .estimate();
            in68 += type.lo68() <= truth && truth <= type.hi68() ? 1 : 0;
            in95 += type.lo95() <= truth && truth <= type.hi95() ? 1 : 0;
        }
        assertTrue(in68 >= 0.62 * draws, in68 + " of " + draws + " in 68%");
        assertTrue(in95 >= 0.91 * draws, in95 + " of " + draws + " in 95%");
    }

    @Test
    void drawsScatterAboutTheTruth() {
        double sum = 0;
        for (int draw = 0; draw < 100; draw++) {
            sum +=
                    forecast.draw(new Forecast.Setting(13, GravityClass.FLD_G, 120), 50, draw)
                            .posterior()
                            .orElseThrow()
                            .estimate()
                            .typeNumber();
        }
        assertEquals(13, sum / 100, 0.2);
    }
}
