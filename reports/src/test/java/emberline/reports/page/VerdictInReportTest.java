package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.Samples;
import emberline.survey.ObjectResult;
import emberline.survey.verdict.Verdict;
import emberline.survey.verdict.VerdictCall;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class VerdictInReportTest {

    private static byte[] pdf(ObjectResult object) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        new PdfReport(ReportSettings.of("0.1.0", 7), Samples.CATALOGUE).write(object, bytes);
        return bytes.toByteArray();
    }

    @Test
    void theVerdictStandsAmongTheKeyNumbersHoweverLongItIs() throws IOException {
        String note = "strong CO\nin K, </script> ".repeat(40);
        Verdict verdict =
                new Verdict(Optional.of(VerdictCall.GIANT), "M7 III", Optional.empty(), note);
        byte[] said = pdf(Samples.lDwarf().withVerdict(Optional.of(verdict)));
        PageLayout.assertWellSet(said, Paper.A4);
        assertTrue(PdfText.all(said).contains("giant, M7 III"), PdfText.all(said));
        assertFalse(PdfText.all(pdf(Samples.lDwarf())).contains("verdict"));
    }
}
