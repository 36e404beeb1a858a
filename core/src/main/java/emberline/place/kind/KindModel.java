package emberline.place.kind;

import emberline.place.kind.KinTable.Remoteness;
import java.io.BufferedInputStream;
import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.zip.GZIPInputStream;
import java.util.zip.GZIPOutputStream;

/**
 * What was learned of kinds: a blend for each coverage, the reference objects, and how remoteness
 * turns into the probability of something unknown. Written by {@code calibrate}, read at first use.
 *
 * <p>The file is gzipped and binary (big-endian, as of {@link DataOutputStream}): a version, the
 * ids of the features, the limits of remoteness, the reference objects, the blends.
 */
public final class KindModel {

    private static final String RESOURCE = "/emberline/place/kind/model.gz";
    private static final int VERSION = 3;
    private static final int MOST_COVERAGES = 4;
    private static final double LEAST = 1e-4;

    private final KindFeatures features;
    private final KinTable kin;
    private final RemotenessLimits limits;
    private final Map<Coverage, Blend> blends;
    private final double sharpness;

    KindModel(
            KindFeatures features,
            KinTable kin,
            RemotenessLimits limits,
            Map<Coverage, Blend> blends,
            double sharpness) {
        this.features = features;
        this.kin = kin;
        this.limits = limits;
        this.blends = new LinkedHashMap<>(blends);
        this.sharpness = sharpness;
    }

    private static final class Holder {
        static final Optional<KindModel> STANDARD = load();

        private static Optional<KindModel> load() {
            try (InputStream stream = KindModel.class.getResourceAsStream(RESOURCE)) {
                return stream == null ? Optional.empty() : Optional.of(read(stream));
            } catch (IOException e) {
                return Optional.empty();
            }
        }
    }

    /**
     * The model of the product; read at the first call.
     *
     * @return the model of the resource; empty where it is missing or was made for other features,
     *     so that {@code calibrate} can make it anew
     */
    public static Optional<KindModel> standard() {
        return Holder.STANDARD;
    }

    KindFeatures features() {
        return features;
    }

    KinTable kin() {
        return kin;
    }

    /** The coverages of which the blends are used for a spectrum: the widest that hold. */
    List<Coverage> coverages(FeatureVector vector) {
        List<Coverage> holding = Coverage.of(vector, features, List.copyOf(blends.keySet()));
        return holding.subList(0, Math.min(MOST_COVERAGES, holding.size()));
    }

    /**
     * Probabilities of the known kinds for equal priors: the geometric mean of those of several
     * coverages, since few spectra to learn from have the widest coverages, to the power that
     * calibrates it.
     */
    double[] known(List<Coverage> coverages, FeatureVector vector) {
        double[] logs = new double[Forest.KINDS];
        for (Coverage coverage : coverages) {
            double[] p = blends.get(coverage).probabilities(vector.values());
            for (int kind = 0; kind < logs.length; kind++) {
                logs[kind] += Math.log(Math.max(LEAST, p[kind])) / coverages.size();
            }
        }
        double sum = 0;
        for (int kind = 0; kind < logs.length; kind++) {
            logs[kind] = Math.exp(sharpness * logs[kind]);
            sum += logs[kind];
        }
        for (int kind = 0; kind < logs.length; kind++) {
            logs[kind] /= sum;
        }
        return logs;
    }

    /** This model with another power of the mean. */
    KindModel withSharpness(double power) {
        return new KindModel(features, kin, limits, blends, power);
    }

    /**
     * Probability of something unknown for the standard prior; empty where nothing can be compared.
     */
    OptionalDouble unlike(FeatureVector vector, String withoutGroup) {
        Optional<Remoteness> found = kin.remoteness(vector, withoutGroup);
        return found.isEmpty()
                ? OptionalDouble.empty()
                : OptionalDouble.of(limits.unlike(found.get(), Regions.covered(vector, features)));
    }

    /**
     * Writes the model; the same model gives the same bytes.
     *
     * @param stream where to; not closed
     * @throws IOException if it cannot be written
     */
    public void write(OutputStream stream) throws IOException {
        GZIPOutputStream zip = new GZIPOutputStream(stream);
        DataOutputStream out = new DataOutputStream(zip);
        out.writeInt(VERSION);
        out.writeInt(features.size());
        for (String id : features.ids()) {
            out.writeUTF(id);
        }
        Map<Integer, Double> sorted = new TreeMap<>(limits.limits());
        out.writeInt(sorted.size());
        for (Map.Entry<Integer, Double> limit : sorted.entrySet()) {
            out.writeInt(limit.getKey());
            out.writeDouble(limit.getValue());
        }
        for (float scatter : kin.scatter()) {
            out.writeFloat(scatter);
        }
        out.writeInt(kin.rows().size());
        for (ReferenceKin row : kin.rows()) {
            write(out, row, kin.columns());
        }
        out.writeDouble(sharpness);
        out.writeInt(blends.size());
        for (Map.Entry<Coverage, Blend> blend : blends.entrySet()) {
            out.writeUTF(blend.getKey().code());
            blend.getValue().write(out);
        }
        out.flush();
        zip.finish();
    }

    private static void write(DataOutputStream out, ReferenceKin row, int[] columns)
            throws IOException {
        out.writeUTF(row.object());
        out.writeUTF(row.group());
        out.writeDouble(row.typeNumber().orElse(Double.NaN));
        out.writeUTF(row.gravity());
        out.writeUTF(row.kind().label());
        out.writeUTF(row.source());
        for (int k : columns) {
            out.writeFloat((float) row.vector().values()[k]);
            out.writeFloat((float) row.vector().sigmas()[k]);
        }
    }

    /**
     * Reads a model.
     *
     * @param stream what {@link #write} wrote
     * @return the model
     * @throws IOException if it cannot be read or was made for other features; make it again with
     *     {@code calibrate} then
     */
    public static KindModel read(InputStream stream) throws IOException {
        DataInputStream in =
                new DataInputStream(
                        new BufferedInputStream(new GZIPInputStream(stream, 1 << 16), 1 << 16));
        int version = in.readInt();
        KindFeatures features = KindFeatures.standard();
        List<String> ids = new ArrayList<>();
        int count = in.readInt();
        for (int k = 0; k < count; k++) {
            ids.add(in.readUTF());
        }
        if (version != VERSION || !ids.equals(features.ids())) {
            throw new IOException(
                    "the model of kinds is of version "
                            + version
                            + " with "
                            + count
                            + " features; expected version "
                            + VERSION
                            + " with the "
                            + features.size()
                            + " of features.csv. Make it again with `calibrate`.");
        }
        Map<Integer, Double> limits = new TreeMap<>();
        int limitCount = in.readInt();
        for (int k = 0; k < limitCount; k++) {
            limits.put(in.readInt(), in.readDouble());
        }
        float[] scatter = NumberBlocks.floats(in, count);
        int[] columns = KinTable.columns(features);
        List<ReferenceKin> rows = new ArrayList<>();
        int rowCount = in.readInt();
        for (int k = 0; k < rowCount; k++) {
            rows.add(readRow(in, count, columns));
        }
        Map<Coverage, Blend> blends = new LinkedHashMap<>();
        double sharpness = in.readDouble();
        int blendCount = in.readInt();
        for (int k = 0; k < blendCount; k++) {
            blends.put(Coverage.parse(in.readUTF()), Blend.read(in));
        }
        return new KindModel(
                features,
                new KinTable(features, rows, scatter),
                new RemotenessLimits(limits),
                blends,
                sharpness);
    }

    private static ReferenceKin readRow(DataInputStream in, int count, int[] columns)
            throws IOException {
        String object = in.readUTF();
        String group = in.readUTF();
        double type = in.readDouble();
        String gravity = in.readUTF();
        ObjectKind kind = ObjectKind.labelled(in.readUTF()).orElseThrow();
        String source = in.readUTF();
        double[] values = new double[count];
        double[] sigmas = new double[count];
        Arrays.fill(values, Double.NaN);
        Arrays.fill(sigmas, Double.NaN);
        float[] written = NumberBlocks.floats(in, 2 * columns.length);
        for (int i = 0; i < columns.length; i++) {
            values[columns[i]] = written[2 * i];
            sigmas[columns[i]] = written[2 * i + 1];
        }
        return new ReferenceKin(
                object,
                group,
                Double.isNaN(type) ? OptionalDouble.empty() : OptionalDouble.of(type),
                gravity,
                kind,
                source,
                new FeatureVector(values, sigmas));
    }
}
