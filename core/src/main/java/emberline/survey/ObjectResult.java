package emberline.survey;

import emberline.judge.Judgement;
import emberline.measure.Measurements;
import emberline.place.Placement;
import emberline.place.standard.StandardVerdict;
import emberline.prepare.BandSignal;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.survey.verdict.Verdict;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Everything that is known of one object at the end of the chain.
 *
 * @param candidate the row of the list
 * @param status how far the object came
 * @param reason why it did not come further; empty where it is measured
 * @param spectra its spectra, those that could be read, in the order of the list
 * @param best the measurements that were placed: those of the one spectrum, or those of several
 *     joined; empty where nothing was read
 * @param placement type and gravity; empty where nothing was read
 * @param judgement mass, age and decision; empty where there is no type or it means nothing
 * @param standards the comparison with the standards of the run; empty where none were given or
 *     nothing was read
 * @param findings all findings, those of the spectra first
 * @param verdict what an observer says of it; empty where nothing is said
 */
public record ObjectResult(
        Candidate candidate,
        Status status,
        String reason,
        List<SpectrumResult> spectra,
        Optional<Measurements> best,
        Optional<Placement> placement,
        Optional<Judgement> judgement,
        Optional<StandardVerdict> standards,
        List<Finding> findings,
        Optional<Verdict> verdict) {

    /** Copies the lists. */
    public ObjectResult {
        spectra = List.copyOf(spectra);
        findings = List.copyOf(findings);
    }

    /**
     * An object that was not judged.
     *
     * @param candidate the row of the list
     * @param status how far the object came
     * @param reason why it did not come further
     * @param spectra its spectra
     * @param best the measurements that were placed
     * @param placement type and gravity
     * @param findings all findings
     */
    public ObjectResult(
            Candidate candidate,
            Status status,
            String reason,
            List<SpectrumResult> spectra,
            Optional<Measurements> best,
            Optional<Placement> placement,
            List<Finding> findings) {
        this(
                candidate,
                status,
                reason,
                spectra,
                best,
                placement,
                Optional.empty(),
                Optional.empty(),
                findings,
                Optional.empty());
    }

    /**
     * The spectrum that stands for an object where one number is wanted, such as its resolving
     * power: the one with the highest signal-to-noise, the first of equals.
     *
     * @return its leading spectrum; empty where none was read
     */
    public Optional<SpectrumResult> leading() {
        if (spectra.size() == 1) {
            return Optional.of(spectra.get(0));
        }
        SpectrumResult leading = null;
        double highest = Double.NEGATIVE_INFINITY;
        for (SpectrumResult spectrum : spectra) {
            double signal =
                    BandSignal.best(spectrum.quality().bands())
                            .map(BandSignal::medianSignalToNoise)
                            .orElse(Double.NEGATIVE_INFINITY);
            if (leading == null || signal > highest) {
                leading = spectrum;
                highest = signal;
            }
        }
        return Optional.ofNullable(leading);
    }

    /**
     * The same object with a judgement, whose findings come after the others.
     *
     * @param made the judgement
     * @return a new result
     */
    public ObjectResult withJudgement(Judgement made) {
        List<Finding> all = new ArrayList<>(findings);
        all.addAll(made.findings());
        return new ObjectResult(
                candidate,
                status,
                reason,
                spectra,
                best,
                placement,
                Optional.of(made),
                standards,
                all,
                verdict);
    }

    /**
     * The same object with an observer's verdict.
     *
     * @param said what the observer says; empty for nothing
     * @return a new result
     */
    public ObjectResult withVerdict(Optional<Verdict> said) {
        return new ObjectResult(
                candidate, status, reason, spectra, best, placement, judgement, standards, findings,
                said);
    }

    /**
     * The same object with more findings.
     *
     * @param more what comes after the others
     * @return a new result
     */
    public ObjectResult withFindings(List<Finding> more) {
        List<Finding> all = new ArrayList<>(findings);
        all.addAll(more);
        return new ObjectResult(
                candidate, status, reason, spectra, best, placement, judgement, standards, all,
                verdict);
    }

    /**
     * The same object with a comparison with standards, whose findings come after the others.
     *
     * @param made the comparison
     * @return a new result
     */
    public ObjectResult withStandards(StandardVerdict made) {
        List<Finding> all = new ArrayList<>(findings);
        all.addAll(made.findings(placement.flatMap(Placement::type)));
        return new ObjectResult(
                candidate,
                status,
                reason,
                spectra,
                best,
                placement,
                judgement,
                Optional.of(made),
                all,
                verdict);
    }
}
