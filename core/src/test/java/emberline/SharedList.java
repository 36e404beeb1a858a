package emberline;

import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import emberline.spectrum.Medium;
import java.nio.file.Path;
import java.util.List;

/** Spectra of the shared list by their name. */
public final class SharedList {

    private SharedList() {}

    /** All candidates of the list. */
    public static List<Candidate> candidates() throws Exception {
        return new CandidateListReader()
                .read(SharedSpectra.folder().resolve("list.csv")).rows().stream()
                        .map(ListedCandidate::candidate)
                        .toList();
    }

    /** A spectrum of the list, prepared as the list states. */
    public static PreparedSpectrum prepared(Candidate candidate) throws Exception {
        Path folder = SharedSpectra.folder();
        Preparing stated = Preparing.withDefaults();
        if (candidate.text("medium").flatMap(Medium::named).isPresent()) {
            stated = stated.withMedium(candidate.text("medium").flatMap(Medium::named).get());
        }
        if (candidate.number("resolution").isPresent()) {
            stated = stated.withResolvingPower(candidate.number("resolution").getAsDouble());
        }
        return new Preparer()
                .prepare(
                        new SpectrumReader().read(folder.resolve(candidate.spectra().get(0))),
                        stated);
    }

    /** A spectrum of the list by its name. */
    public static PreparedSpectrum prepared(String name) throws Exception {
        for (Candidate candidate : candidates()) {
            if (candidate.name().equals(name)) {
                return prepared(candidate);
            }
        }
        throw new IllegalArgumentException(name + ": not in the shared list");
    }
}
