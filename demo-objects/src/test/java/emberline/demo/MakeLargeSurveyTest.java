package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import emberline.read.CandidateRows;
import emberline.read.CandidateSource;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class MakeLargeSurveyTest {

    private static final int COUNT = 45;

    @TempDir private Path folder;

    @Test
    void packedAndSingleFilesHoldTheSameSpectra() throws IOException {
        for (String form : new String[] {"files", "packed"}) {
            MakeLargeSurvey.main(new String[] {folder.toString(), "" + COUNT, form});
        }
        SpectrumReader reader = new SpectrumReader();
        int count = 0;
        try (CandidateRows files = CandidateSource.of(folder.resolve("list.csv")).open();
                CandidateRows packed = CandidateSource.of(folder.resolve("packed.fits")).open()) {
            for (var row = files.next(); row.isPresent(); row = files.next()) {
                Candidate single = row.get().candidate();
                Candidate within = packed.next().orElseThrow().candidate();
                assertEquals(single.name(), within.name());
                assertEquals(single.number("resolution"), within.number("resolution"));
                assertEquals(single.text("medium"), within.text("medium"));
                Observation one = reader.read(folder, single.spectra().get(0));
                Observation other = reader.read(folder, within.spectra().get(0));
                assertArrayEquals(one.wavelengthsMicron(), other.wavelengthsMicron());
                assertArrayEquals(one.fluxes(), other.fluxes());
                assertArrayEquals(one.fluxSigmas().orElseThrow(), other.fluxSigmas().orElseThrow());
                assertEquals(one.findings(), other.findings());
                count++;
            }
        }
        assertEquals(COUNT, count);
        assertThrows(
                IllegalArgumentException.class, () -> MakeLargeSurvey.main(new String[] {"x"}));
    }
}
