package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * What the loci learn from: single late dwarfs of known type, weighted by how far their labels and
 * data can be trusted, and anchors from published relations where such dwarfs are scarce.
 */
final class TrainingSet {

    /** Weight of a spectrum by its tier; other tiers teach nothing. */
    private static final Map<String, Double> WEIGHT = Map.of("A", 1.0, "B", 0.8, "C", 0.3);

    /**
     * One-sigma error of published types (subclass), of which the scatter of objects is cleared.
     * Chosen by cross-validation; typers agree to about half a subclass.
     */
    static final double TYPE_NOISE_SUBCLASS = 0.35;

    /**
     * One-sigma spread of gravity within a published class, on the scale of the loci, of which the
     * scatter of objects is cleared. Chosen by cross-validation.
     */
    static final double GRAVITY_NOISE = 0.2;

    /** Latest type that can be placed. */
    private static final double LATEST = TypeKnots.typeNumber(TypeKnots.COUNT - 1);

    private final List<Dwarf> dwarfs;
    private final Map<String, List<Point>> anchors;

    private TrainingSet(List<Dwarf> dwarfs, Map<String, List<Point>> anchors) {
        this.dwarfs = dwarfs;
        this.anchors = anchors;
    }

    /**
     * A dwarf of known type.
     *
     * @param row what was measured
     * @param typeNumber published type (M0 = 0)
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @param weight how far it is trusted
     */
    record Dwarf(ReferenceRow row, double typeNumber, double lowGravity, double weight) {}

    /**
     * One value of one feature at a known type.
     *
     * @param typeNumber type (M0 = 0)
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @param weight how far it is trusted
     * @param value value of the feature
     * @param oneSigma noise of the value
     * @param ownScatter scatter of objects about the value where it is itself a mean; else 0
     */
    record Point(
            double typeNumber,
            double lowGravity,
            double weight,
            double value,
            double oneSigma,
            double ownScatter) {}

    /**
     * Chooses what can be learned from.
     *
     * @param table what was measured on objects of known kind
     * @param anchors values of features at types by published relations, by feature
     * @return the training set
     */
    static TrainingSet of(ReferenceTable table, Map<String, List<Point>> anchors) {
        Map<String, Double> ofGroup = lowGravityByGroup(table);
        List<Dwarf> dwarfs = new ArrayList<>();
        for (ReferenceRow row : table.rows()) {
            Double weight = WEIGHT.get(row.tier());
            if (weight != null
                    && row.kind().equals("dwarf")
                    && row.typeNumber().isPresent()
                    && row.typeNumber().getAsDouble() <= LATEST) {
                dwarfs.add(
                        new Dwarf(
                                row,
                                row.typeNumber().getAsDouble(),
                                row.gravity().isEmpty()
                                        ? ofGroup.getOrDefault(row.group(), 0.0)
                                        : lowGravity(row.gravity()),
                                weight));
            }
        }
        return new TrainingSet(List.copyOf(dwarfs), anchors);
    }

    /**
     * The mean place on the scale of the loci of the spectra of each group that were classed: an
     * object keeps its gravity from spectrum to spectrum, and companions are of one age.
     */
    private static Map<String, Double> lowGravityByGroup(ReferenceTable table) {
        return table.rows().stream()
                .filter(row -> row.kind().equals("dwarf") && !row.gravity().isEmpty())
                .collect(
                        Collectors.groupingBy(
                                ReferenceRow::group,
                                Collectors.averagingDouble(row -> lowGravity(row.gravity()))));
    }

    /**
     * The place of a published gravity on the scale of the loci. {@code young} means a member of a
     * young group whose spectrum was not classed; objects without a remark are taken as field.
     */
    private static double lowGravity(String published) {
        return switch (published) {
            case "VL-G" -> 1;
            case "young" -> 0.7;
            case "INT-G" -> 0.5;
            default -> 0;
        };
    }

    /**
     * The dwarfs.
     *
     * @return in the order of the table
     */
    List<Dwarf> dwarfs() {
        return dwarfs;
    }

    /**
     * Everything that is known of one feature.
     *
     * @param feature feature id
     * @return points of dwarfs, then anchors
     */
    List<Point> points(String feature) {
        List<Point> points = new ArrayList<>();
        for (Dwarf dwarf : dwarfs) {
            Optional<Measured> value = dwarf.row.feature(feature);
            if (value.isPresent()) {
                points.add(
                        new Point(
                                dwarf.typeNumber,
                                dwarf.lowGravity,
                                dwarf.weight,
                                value.get().value(),
                                value.get().oneSigma(),
                                0));
            }
        }
        points.addAll(anchors.getOrDefault(feature, List.of()));
        return points;
    }

    /**
     * The set without some objects.
     *
     * @param groups names of the groups to keep out, as {@link ReferenceRow#group} gives them
     * @return a smaller set with the same anchors
     */
    TrainingSet without(Set<String> groups) {
        return new TrainingSet(
                dwarfs.stream().filter(dwarf -> !groups.contains(dwarf.row.group())).toList(),
                new LinkedHashMap<>(anchors));
    }
}
