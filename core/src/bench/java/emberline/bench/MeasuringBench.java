package emberline.bench;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.measure.Measurement.Measured;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.io.ByteArrayOutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import nom.tam.fits.Fits;
import nom.tam.fits.FitsFactory;
import nom.tam.util.FitsOutputStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;

/** What measuring costs: all features with covariance and draws, against perturbing pixels. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 4, time = 2)
public class MeasuringBench {

    private static final int DRAWS = 1000;

    /** Pixels of the spectrum: a prism, and a cross-dispersed spectrograph. */
    @Param({"600", "6000"})
    public int pixels;

    private PreparedSpectrum prepared;
    private Measurer measurer;
    private List<String> measured;
    private byte[] fits;
    private Path file;
    private long perturbations;

    /** Makes the spectrum and warms the grid cache, as a survey on one instrument does. */
    @Setup
    public void make() throws Exception {
        double resolvingPower = pixels < 1000 ? 120 : 2000;
        double[] wavelengths = new double[pixels];
        double[] flux = new double[pixels];
        double[] sigma = new double[pixels];
        double ratio = Math.pow(2.45 / 0.65, 1.0 / pixels);
        for (int i = 0; i < pixels; i++) {
            wavelengths[i] = 0.65 * Math.pow(ratio, i);
            flux[i] = 1 + 0.3 * Math.sin(9 * wavelengths[i]);
            sigma[i] = flux[i] / 30;
        }
        prepared =
                new PreparedSpectrum(
                        Spectrum.of(wavelengths, flux, sigma),
                        new ResolvingPower(resolvingPower, Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of());
        measurer = new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
        Measurements all = measurer.measure(prepared);
        measured =
                all.all().stream()
                        .filter(m -> m.result() instanceof Measured)
                        .map(m -> m.feature().id())
                        .toList();
        float[][] rows = new float[3][pixels];
        for (int i = 0; i < pixels; i++) {
            rows[0][i] = (float) wavelengths[i];
            rows[1][i] = (float) flux[i];
            rows[2][i] = (float) sigma[i];
        }
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (Fits file = new Fits()) {
            file.addHDU(FitsFactory.hduFactory(rows));
            file.write(new FitsOutputStream(bytes));
        }
        fits = bytes.toByteArray();
        file = Files.createTempFile("bench", ".fits");
        Files.write(file, fits);
    }

    /** Takes the file away. */
    @TearDown
    public void remove() throws Exception {
        Files.delete(file);
    }

    /** All features with their sigmas. */
    @Benchmark
    public Measurements features() {
        return measurer.measure(prepared);
    }

    /** All features with their sigmas and 1000 draws of each. */
    @Benchmark
    public double[][] featuresWithDraws() {
        return measurer.measure(prepared).draws(measured, DRAWS, 1);
    }

    /** One of 1000 perturbations of the pixels, measured again with the windows already found. */
    @Benchmark
    public Measurements onePerturbation() {
        return measurer.measure(perturbed(prepared.resolvingPower()));
    }

    /** The same with the windows found anew on the pixels, as without the kept operator. */
    @Benchmark
    public Measurements onePerturbationAnew() {
        double unlikeTheLast = prepared.resolvingPower().value() * (1 + 1e-9 * ++perturbations);
        return measurer.measure(perturbed(new ResolvingPower(unlikeTheLast, Basis.GIVEN)));
    }

    private PreparedSpectrum perturbed(ResolvingPower resolvingPower) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(1);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        Spectrum spectrum = prepared.spectrum();
        double[] flux = spectrum.fluxes();
        for (int i = 0; i < flux.length; i++) {
            flux[i] += spectrum.fluxSigma(i) * normal.sample();
        }
        return new PreparedSpectrum(
                spectrum.withFluxes(flux, spectrum.fluxSigmas()),
                resolvingPower,
                prepared.noise(),
                List.of());
    }

    /** Reading the same spectrum from a FITS image in memory. */
    @Benchmark
    public Observation read() throws Exception {
        return new SpectrumReader().read(fits, "bench.fits");
    }

    /** Reading the same spectrum from the file, as a survey does. */
    @Benchmark
    public Observation readFile() throws Exception {
        return new SpectrumReader().read(file);
    }

    /** Reading and preparing. */
    @Benchmark
    public PreparedSpectrum prepare() throws Exception {
        return new Preparer()
                .prepare(
                        new SpectrumReader().read(fits, "bench.fits"), Preparing.withDefaults());
    }
}
