package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PlanCommandTest {

    @Test
    void tellsTheSignalToNoiseAsTableAndChart(@TempDir Path folder) throws IOException {
        Path chart = folder.resolve("plan.pdf");
        CommandRun run =
                CommandRun.of(
                        "plan",
                        "--type",
                        "L1",
                        "--gravity",
                        "VL-G",
                        "--resolution",
                        "120",
                        "--aim",
                        "gravity",
                        "--snr-now",
                        "20",
                        "--draws",
                        "20",
                        "--chart",
                        chart.toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().startsWith("L1 VL-G at a resolving power of 120"), run.out());
        assertTrue(run.out().contains("exposure_factor"), run.out());
        assertTrue(run.out().contains("95% sure"), run.out());
        try (PDDocument pdf = Loader.loadPDF(Files.readAllBytes(chart))) {
            String text = new PDFTextStripper().getText(pdf);
            assertEquals(1, pdf.getNumberOfPages());
            assertTrue(text.contains("How sure the answer becomes"), text);
            assertTrue(text.contains("does not replace expert judgement"), text);
        }
    }

    @Test
    void jsonHoldsTheAnswer() {
        CommandRun run = CommandRun.of("plan", "--type", "M8", "--draws", "20", "--format", "json");
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("\"snr_needed\": "), run.out());
        assertTrue(run.out().contains("\"gravity\": \"FLD-G\""), run.out());
    }

    @Test
    void wrongWishesAreExplained() {
        CommandRun gravity = CommandRun.of("plan", "--type", "T6");
        assertEquals(2, gravity.code());
        assertTrue(gravity.err().contains("gravity is judged from M5 to L7"), gravity.err());
        CommandRun type = CommandRun.of("plan", "--type", "G2");
        assertEquals(2, type.code());
        assertTrue(type.err().contains("--type: expected one from M0 to Y1"), type.err());
        CommandRun aim = CommandRun.of("plan", "--type", "L3", "--aim", "pairs");
        assertEquals(2, aim.code());
        assertTrue(aim.err().contains("aim 'pairs'"), aim.err());
    }
}
