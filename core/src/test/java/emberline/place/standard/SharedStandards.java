package emberline.place.standard;

import emberline.SharedList;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Candidate;
import emberline.survey.ObjectGroup;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/** Field dwarfs of the shared list from M5 on that cover J, H and K, as standards. */
final class SharedStandards {

    /** T dwarfs are few: these are of poorer data, but not noisy. */
    private static final Set<String> MORE_T =
            Set.of("DENIS J0817-6155", "SIMP J0136+0933", "SIMP J2132-1452");

    private SharedStandards() {}

    /** Those of some tiers; all T dwarfs of tiers A and B, and a few more, in any case. */
    static List<Standard> of(String tiers) throws Exception {
        List<Standard> standards = new ArrayList<>();
        for (Candidate candidate : SharedList.candidates()) {
            double type = candidate.number("known_type_number").orElse(-9);
            String tier = candidate.text("tier").orElse("");
            boolean wanted =
                    candidate.text("known_kind").orElse("").equals("dwarf")
                            && candidate.text("known_gravity").orElse("FLD-G").equals("FLD-G")
                            && candidate.number("resolution").orElse(100) >= 60
                            && type >= 5
                            && (tiers.contains(tier)
                                    || (type >= 20 && "AB".contains(tier))
                                    || MORE_T.contains(candidate.name()));
            if (wanted) {
                PreparedSpectrum prepared = SharedList.prepared(candidate);
                Set<Range> covered = new CommonGrid(60).of(prepared).covered();
                if (covered.containsAll(List.of(Range.J, Range.H, Range.K))) {
                    standards.add(
                            new Standard(
                                    candidate.name(),
                                    type,
                                    ObjectGroup.of(candidate),
                                    "",
                                    prepared));
                }
            }
        }
        return standards;
    }
}
