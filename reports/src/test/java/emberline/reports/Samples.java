package emberline.reports;

import emberline.catalogue.FeatureCatalogue;
import emberline.judge.GatheredEvidence;
import emberline.judge.Judge;
import emberline.judge.Judging;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.measure.Site;
import emberline.measure.SpectraMerger;
import emberline.measure.line.LineReporter;
import emberline.place.Placement;
import emberline.place.Placer;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.UnreadableListException;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import emberline.survey.Status;
import emberline.survey.SurveySettings;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;

/** Invented objects, measured and placed by the core. */
public final class Samples {

    /** The catalogue of the product. */
    public static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    /** A checksum that stands for that of a file. */
    public static final String SHA256 =
            "3b1f9c0a5d7e42886f1420c9d5ab7730e1c4987f6a2b3c5d8e9f001122334455";

    private static final Measurer MEASURER = new Measurer(CATALOGUE, Measuring.withDefaults());
    private static final LineReporter LINES = new LineReporter(CATALOGUE, Site.DRY);
    private static final Judge JUDGE = new Judge(Judging.withDefaults());
    private static final TypePrior PRIOR = TypePriors.FLAT.load();
    private static final Placer PLACER = new Placer(CATALOGUE);

    private Samples() {}

    /** Depths of the bands of an invented dwarf. */
    public record Bands(double water, double methane, double carbonMonoxide) {
        /** About L3. */
        public static final Bands L_DWARF = new Bands(0.24, 0, 0.12);

        /** About T5. */
        public static final Bands T_DWARF = new Bands(1.8, 1.6, 0.1);
    }

    /**
     * An invented near-infrared spectrum: a smooth hill with bands of water, methane and carbon
     * monoxide, with noise.
     */
    public static Spectrum spectrum(
            double low, double high, int pixels, Bands bands, double signalToNoise, long seed) {
        Random random = new Random(seed);
        double[] wavelength = new double[pixels];
        double[] flux = new double[pixels];
        double[] sigma = new double[pixels];
        for (int i = 0; i < pixels; i++) {
            double w = low * Math.pow(high / low, i / (pixels - 1.0));
            wavelength[i] = w;
            double hill = Math.exp(-Math.pow(Math.log(w / 1.35) / 0.65, 2));
            double depth =
                    bands.water() * (band(w, 1.15, 0.04) + 2.4 * band(w, 1.42, 0.07))
                            + bands.water() * 2 * band(w, 1.88, 0.11)
                            + bands.water() * band(w, 2.6, 0.2)
                            + bands.methane() * (band(w, 1.68, 0.06) + 1.3 * band(w, 2.3, 0.12))
                            + bands.carbonMonoxide() * (w > 2.293 ? 1 : 0);
            double clean = hill * Math.exp(-depth);
            sigma[i] = 0.6 / signalToNoise;
            flux[i] = clean + sigma[i] * random.nextGaussian();
        }
        return Spectrum.of(wavelength, flux, sigma);
    }

    private static double band(double w, double centre, double width) {
        return Math.exp(-0.5 * Math.pow((w - centre) / width, 2));
    }

    /** A spectrum without the pixels of an interval. */
    public static Spectrum withGap(Spectrum spectrum, double from, double to) {
        List<double[]> kept = new ArrayList<>();
        for (int i = 0; i < spectrum.size(); i++) {
            double w = spectrum.wavelengthMicron(i);
            if (w < from || w > to) {
                kept.add(new double[] {w, spectrum.flux(i), spectrum.fluxSigma(i)});
            }
        }
        return Spectrum.of(column(kept, 0), column(kept, 1), column(kept, 2));
    }

    private static double[] column(List<double[]> rows, int column) {
        return rows.stream().mapToDouble(row -> row[column]).toArray();
    }

    /** An object with one spectrum, taken through measuring and placing. */
    public static ObjectResult object(String name, Spectrum spectrum, double resolvingPower) {
        return object(name, Map.of("name", name), List.of(spectrum), resolvingPower);
    }

    /** An object with several spectra and the cells of its row. */
    public static ObjectResult object(
            String name, Map<String, String> cells, List<Spectrum> spectra, double resolvingPower) {
        List<SpectrumResult> results = new ArrayList<>();
        for (Spectrum spectrum : spectra) {
            PreparedSpectrum prepared =
                    new PreparedSpectrum(
                            spectrum,
                            new ResolvingPower(resolvingPower, ResolvingPower.Basis.GIVEN),
                            NoiseModel.INDEPENDENT,
                            List.of());
            Measurements measurements = MEASURER.measure(prepared);
            results.add(
                    new SpectrumResult(
                            "spectra/" + results.size() + ".csv",
                            "CSV, columns wavelength, flux, sigma",
                            SHA256,
                            prepared,
                            measurements,
                            LINES.report(prepared, measurements)));
        }
        Measurements best =
                new SpectraMerger(id -> java.util.OptionalDouble.empty())
                        .merge(results.stream().map(SpectrumResult::measurements).toList());
        Placement placement = PLACER.place(best, 1);
        List<Finding> findings = new ArrayList<>();
        findings.add(Finding.note("medium-assumed", "no medium is stated; vacuum was assumed"));
        findings.addAll(placement.findings());
        return new ObjectResult(
                new Candidate(name, 1, List.of("spectra/0.csv"), new LinkedHashMap<>(cells)),
                placement.type().isPresent() ? Status.MEASURED : Status.PARTIAL,
                placement.typeReason(),
                results,
                Optional.of(best),
                Optional.of(placement),
                findings);
    }

    /** The object with its judgement, where there is anything to judge. */
    public static ObjectResult judged(ObjectResult placed) {
        return GatheredEvidence.of(
                        placed.candidate(),
                        placed.placement().orElseThrow(),
                        placed.spectra().stream().map(SpectrumResult::lines).toList(),
                        PRIOR)
                .map(gathered -> placed.withJudgement(JUDGE.judge(gathered.evidence())))
                .orElse(placed);
    }

    /** An object of which nothing could be read. */
    public static ObjectResult failed(String name, String reason) {
        return new ObjectResult(
                new Candidate(name, 2, List.of("missing.fits"), Map.of("name", name)),
                Status.FAILED,
                reason,
                List.of(),
                Optional.empty(),
                Optional.empty(),
                List.of());
    }

    /** An invented L dwarf at low resolution with good signal. */
    public static ObjectResult lDwarf() {
        return object("Ember 12", spectrum(0.8, 2.45, 600, Bands.L_DWARF, 60, 3), 120);
    }

    /** An L3 of very low gravity from the demo survey, with all the bands of its type. */
    public static ObjectResult demoLDwarf() {
        Path list =
                Path.of(System.getProperty("emberline.root", ".."))
                        .resolve("demo-objects/survey/candidates.csv")
                        .toAbsolutePath();
        try {
            Candidate candidate =
                    new CandidateListReader()
                            .read(list).rows().stream()
                                    .map(ListedCandidate::candidate)
                                    .filter(one -> one.name().equals("Tamarisk-0246+0411"))
                                    .findFirst()
                                    .orElseThrow();
            return new Chain(CATALOGUE, Measuring.withDefaults(), SurveySettings.withDefaults())
                    .run(candidate, list.getParent());
        } catch (UnreadableListException e) {
            throw new IllegalStateException(e);
        }
    }

    /** An invented T dwarf. */
    public static ObjectResult tDwarf() {
        return object("Ember 31", spectrum(0.9, 2.45, 560, Bands.T_DWARF, 40, 4), 120);
    }
}
