package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.judge.Judging;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.reports.Samples;
import emberline.spectrum.Candidate;
import emberline.survey.KnownObject;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class JudgementOutputTest {

    private static final Map<String, String> CELLS =
            Map.of(
                    "ra_deg", "58.8474",
                    "dec_deg", "11.5622",
                    "parallax_mas", "109.14",
                    "parallax_mas_err", "0.48",
                    "pmra_masyr", "223.2",
                    "pmdec_masyr", "-631.3",
                    "rv_kms", "11.9",
                    "h_mag", "12.53",
                    "h_mag_err", "0.03",
                    "mag_system", "2MASS");

    private static ObjectResult judged() {
        return new KnownObject(Judging.withDefaults())
                .judged(
                        new Candidate("Ember 7", 1, List.of(), CELLS),
                        TypeEstimate.normal(13, 0.5),
                        Optional.of(GravityClass.VL_G));
    }

    private static String cell(ObjectResult result, String column) {
        return ResultColumns.standard().stream()
                .filter(c -> c.name().equals(column))
                .findFirst()
                .orElseThrow()
                .text(result);
    }

    @Test
    void theColumnsAreThoseOfTheContract() {
        String expected =
                "decision,p_substellar,p_substellar_070,p_substellar_075,p_below_13mjup,p_young,"
                        + "age_myr,age_myr_lo68,age_myr_hi68,mass_mjup,mass_mjup_lo68,"
                        + "mass_mjup_hi68,mass_msun,mass_msun_lo68,mass_msun_hi68,teff_k,"
                        + "teff_k_sigma,log_l_lsun,log_l_lsun_sigma,m_bol,m_bol_sigma,logg_cgs,"
                        + "logg_sigma,radius_rsun,radius_rsun_sigma,distance_pc,distance_pc_lo68,"
                        + "distance_pc_hi68,distance_method,abs_mag_j,abs_mag_j_sigma,abs_mag_h,"
                        + "abs_mag_h_sigma,abs_mag_k,abs_mag_k_sigma,vtan_kms,u_kms,v_kms,w_kms,"
                        + "next_step,score,priority";
        List<String> names = JudgementColumns.all().stream().map(ResultColumn::name).toList();
        assertEquals(expected, String.join(",", names));
    }

    @Test
    void columnsHoldTheJudgement() {
        ObjectResult result = judged();
        assertEquals("substellar", cell(result, "decision"));
        double low = Double.parseDouble(cell(result, "p_substellar_070"));
        double high = Double.parseDouble(cell(result, "p_substellar_075"));
        double middle = Double.parseDouble(cell(result, "p_substellar"));
        assertTrue(low <= middle && middle <= high && low >= 0.95);
        double jupiters = Double.parseDouble(cell(result, "mass_mjup"));
        double suns = Double.parseDouble(cell(result, "mass_msun"));
        assertEquals(1047.57, jupiters / suns, 15);
        assertEquals("parallax", cell(result, "distance_method"));
        assertEquals(9.16, Double.parseDouble(cell(result, "distance_pc")), 0.01);
        assertEquals(12.72, Double.parseDouble(cell(result, "abs_mag_h")), 0.011);
        assertEquals(29.1, Double.parseDouble(cell(result, "vtan_kms")), 0.1);
        assertEquals(-26.8, Double.parseDouble(cell(result, "v_kms")), 0.1);
        double logL = Double.parseDouble(cell(result, "log_l_lsun"));
        assertEquals(4.74 - 2.5 * logL, Double.parseDouble(cell(result, "m_bol")), 0.01);
        for (ResultColumn column : JudgementColumns.all()) {
            assertTrue(!column.text(result).isEmpty(), column.name());
            assertEquals("", column.text(Samples.failed("x", "no file")), column.name());
        }
    }

    @Test
    void jsonHoldsLedgersGridsAndSteps() throws IOException {
        Map<String, Object> map = JSON.std.mapFrom(ObjectJson.text(judged()));
        Map<?, ?> judgement = (Map<?, ?>) map.get("judgement");
        Map<?, ?> ledger = (Map<?, ?>) judgement.get("substellar_ledger");
        double sum = ((Number) ledger.get("prior_log10_odds")).doubleValue();
        for (Object entry : (List<?>) ledger.get("entries")) {
            sum += ((Number) ((Map<?, ?>) entry).get("log10_factor")).doubleValue();
        }
        assertEquals(((Number) ledger.get("final_log10_odds")).doubleValue(), sum, 0.005);
        assertEquals(2, ((List<?>) judgement.get("other_grids")).size());
        assertTrue(judgement.get("sources").toString().contains("Baraffe et al. 2015"));
        assertTrue(((Map<?, ?>) judgement.get("absolute_magnitudes")).containsKey("W2"));
        assertNull(
                JSON.std.mapFrom(ObjectJson.text(Samples.failed("x", "no file"))).get("judgement"));
    }

    @Test
    void textIsABlockOfLines() {
        String text = PlacementTable.print(List.of(judged()), TableFormat.TEXT);
        for (String words :
                List.of(
                        "Ember 7: substellar: P(substellar)",
                        "mass, age",
                        "log10 odds: prior",
                        "other grids",
                        "next step")) {
            assertTrue(text.contains(words), text);
        }
        assertEquals("", JudgementText.print(List.of(Samples.failed("x", "no file"))));
    }
}
