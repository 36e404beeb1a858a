package emberline.survey;

import emberline.judge.GatheredEvidence;
import emberline.judge.Judge;
import emberline.judge.Judgement;
import emberline.judge.Judging;
import emberline.place.Placement;
import emberline.place.calibrated.TypePrior;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;

/** Judges placed objects, as far as their type means something. */
final class JudgingStep {

    /** With this finding a type means nothing. */
    private static final String NO_BANDS = "no-bands";

    /** Made while the first object is read, measured and placed: its tables take their time. */
    private final CompletableFuture<Judge> judge;

    private final TypePrior prior;

    JudgingStep(Judging judging, TypePrior prior) {
        this.judge = CompletableFuture.supplyAsync(() -> new Judge(judging));
        this.prior = prior;
    }

    /** The object with its judgement, or as it was where there is nothing to judge. */
    ObjectResult judged(ObjectResult placed) {
        if (placed.placement().isEmpty()) {
            return placed;
        }
        Placement placement = placed.placement().get();
        if (placement.findings().stream().anyMatch(f -> f.code().equals(NO_BANDS))) {
            return placed;
        }
        Optional<GatheredEvidence> gathered =
                GatheredEvidence.of(
                        placed.candidate(),
                        placement,
                        placed.spectra().stream().map(SpectrumResult::lines).toList(),
                        prior);
        if (gathered.isEmpty()) {
            return placed;
        }
        ObjectResult told = placed.withFindings(gathered.get().findings());
        try {
            Judgement judgement = judge.join().judge(gathered.get().evidence());
            return told.withJudgement(judgement);
        } catch (IllegalStateException e) {
            return told.withFindings(
                    List.of(Finding.caution("not-judged", "not judged: " + e.getMessage())));
        }
    }
}
