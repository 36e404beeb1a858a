package emberline.bench;

import emberline.catalogue.FeatureCatalogue;
import emberline.judge.AgeStatement;
import emberline.judge.GatheredEvidence;
import emberline.judge.Judge;
import emberline.judge.Judgement;
import emberline.judge.Judging;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.place.Placer;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.TypePriors;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/** What placing and judging cost, on objects of the demo survey. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class PlacingBench {

    private static final Path SURVEY = Path.of("../demo-objects/survey");

    /** A prism spectrum of R 120, and one of R 2000. */
    @Param({"Tamarisk-0335+0137", "Tamarisk-0217+0635"})
    public String name;

    private Measurements measurements;
    private Placer placer;
    private Judge judge;
    private GatheredEvidence evidence;
    private long ages;

    /** Reads and measures the object. */
    @Setup
    public void make() throws Exception {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        Candidate candidate =
                new CandidateListReader()
                        .read(SURVEY.resolve("candidates.csv")).rows().stream()
                                .map(ListedCandidate::candidate)
                                .filter(c -> c.name().equals(name))
                                .findFirst()
                                .orElseThrow();
        measurements =
                new Measurer(catalogue, Measuring.withDefaults())
                        .measure(
                                new Preparer()
                                        .prepare(
                                                new SpectrumReader()
                                                        .read(SURVEY.resolve(candidate.spectra().get(0))),
                                                Preparing.withDefaults()));
        placer = new Placer(catalogue, Calibration.standard(), TypePriors.FLAT.load());
        judge = new Judge(Judging.withDefaults());
        evidence =
                GatheredEvidence.of(
                                candidate,
                                placer.place(measurements, 1),
                                List.of(),
                                TypePriors.FLAT.load())
                        .orElseThrow();
    }

    /** Kind, posterior, gravity, metallicity, pair: all of placing. */
    @Benchmark
    public Placement place() {
        return placer.place(measurements, 1);
    }

    /** The same with an age that no object before had stated. */
    @Benchmark
    public Judgement judgeOfNewAge() {
        double myr = 100 + 1e-6 * ++ages;
        return judge.judge(
                evidence.evidence().withAge(AgeStatement.parse(myr + "+-10Myr")));
    }

    /** Properties, age, mass, limits and next steps: all of judging. */
    @Benchmark
    public Judgement judge() {
        return judge.judge(evidence.evidence());
    }
}
