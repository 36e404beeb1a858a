package emberline.place.kind;

import java.util.ArrayList;
import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.ListSampler;
import org.apache.commons.rng.simple.RandomSource;

/** Draws the rows that are learned from, so that the frequent kinds do not crowd out the rare. */
final class TrainingSample {

    private TrainingSample() {}

    /** Most rows of each kind. */
    private static int most(ObjectKind kind) {
        return switch (kind) {
            case LATE_DWARF -> 1200;
            case GIANT -> 700;
            default -> 400;
        };
    }

    /** As many rows of each kind as are allowed, drawn always alike. */
    static List<TrainingRow> of(List<TrainingRow> rows) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(5);
        List<TrainingRow> chosen = new ArrayList<>();
        for (ObjectKind kind : ObjectKind.values()) {
            List<TrainingRow> ofKind =
                    new ArrayList<>(rows.stream().filter(r -> r.kind() == kind).toList());
            ListSampler.shuffle(random, ofKind);
            chosen.addAll(ofKind.subList(0, Math.min(ofKind.size(), most(kind))));
        }
        return chosen;
    }
}
