package emberline.reports.attach;

import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.Calibrator.Unseen;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.function.Predicate;

/** How well a calibration places objects that it has not seen, as a few lines of text. */
public final class UnseenSummary {

    private static final double M4 = 4;

    private UnseenSummary() {}

    /**
     * The summary: types of dwarfs from M4 on, then gravity classes from M6 to L7, of tiers A and
     * B.
     *
     * @param unseen the objects
     * @return lines of text
     */
    public static String text(List<Unseen> unseen) {
        StringBuilder text = new StringBuilder("types, each object unseen by its calibration\n");
        text.append(line("tier A, M4 and later", unseen, one -> tier(one, "A") && from(one, M4)));
        text.append(
                line("tiers A+B, M4 and later", unseen, one -> tier(one, "AB") && from(one, M4)));
        double[] limits = {0, 4, 10, 15, 20, 30, 32};
        String[] names = {"M0-M3", "M4-M9", "L0-L4", "L5-L9", "T", "Y"};
        for (int i = 0; i < names.length; i++) {
            double low = limits[i];
            double high = limits[i + 1];
            text.append(
                    line(
                            "tiers A+B, " + names[i],
                            unseen,
                            one -> tier(one, "AB") && from(one, low) && !from(one, high)));
        }
        text.append("gravity, M6 to L7, tiers A+B: most probable FLD-G / INT-G / VL-G\n");
        for (String known : List.of("VL-G", "INT-G", "FLD-G", "young", "")) {
            text.append(gravity(known, unseen));
        }
        return text.toString();
    }

    private static boolean tier(Unseen one, String tiers) {
        return tiers.contains(one.row().tier());
    }

    private static boolean from(Unseen one, double type) {
        return one.row().typeNumber().orElseThrow() >= type;
    }

    private static String line(String name, List<Unseen> unseen, Predicate<Unseen> wanted) {
        List<Unseen> chosen = unseen.stream().filter(wanted).toList();
        List<Unseen> placed =
                chosen.stream().filter(one -> one.placed().posterior().isPresent()).toList();
        double sum = 0;
        double squares = 0;
        int in68 = 0;
        int in95 = 0;
        double[] off = new double[placed.size()];
        for (int i = 0; i < off.length; i++) {
            Unseen one = placed.get(i);
            double known = one.row().typeNumber().orElseThrow();
            TypeEstimate type = one.placed().posterior().orElseThrow().estimate();
            double difference = type.typeNumber() - known;
            sum += difference;
            squares += difference * difference;
            off[i] = Math.abs(difference);
            in68 += type.lo68() <= known && known <= type.hi68() ? 1 : 0;
            in95 += type.lo95() <= known && known <= type.hi95() ? 1 : 0;
        }
        if (placed.isEmpty()) {
            return String.format(Locale.ROOT, "  %-24s   0 of %3d placed%n", name, chosen.size());
        }
        double n = placed.size();
        Arrays.sort(off);
        return String.format(
                Locale.ROOT,
                "  %-24s %3d of %3d placed, bias %+.2f, rms %.3f, median |difference| %.2f,"
                        + " within 68%% %.2f, within 95%% %.2f%n",
                name,
                placed.size(),
                chosen.size(),
                sum / n,
                Math.sqrt(squares / n),
                off[off.length / 2],
                in68 / n,
                in95 / n);
    }

    private static String gravity(String known, List<Unseen> unseen) {
        int[] counts = new int[3];
        int low = 0;
        for (Unseen one : unseen) {
            if (!one.row().gravity().equals(known)
                    || !tier(one, "AB")
                    || !from(one, 6)
                    || from(one, 17.01)
                    || one.placed().posterior().isEmpty()) {
                continue;
            }
            TypePosterior posterior = one.placed().posterior().get();
            double field = posterior.probability(GravityClass.FLD_G);
            double intermediate = posterior.probability(GravityClass.INT_G);
            double veryLow = posterior.probability(GravityClass.VL_G);
            counts[
                    field >= Math.max(intermediate, veryLow)
                            ? 0
                            : intermediate >= veryLow ? 1 : 2]++;
            low += field < 0.5 ? 1 : 0;
        }
        int all = counts[0] + counts[1] + counts[2];
        return String.format(
                Locale.ROOT,
                "  known %-6s %3d objects: %d / %d / %d; P(low gravity) > 0.5: %d%n",
                known.isEmpty() ? "none" : known,
                all,
                counts[0],
                counts[1],
                counts[2],
                low);
    }
}
