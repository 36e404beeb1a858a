package emberline.reports.survey;

import emberline.survey.map.NeighbourMap;
import emberline.survey.map.SurveyAxes;
import emberline.survey.map.SurveyAxes.Placed;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The part of the page that holds the map: the reference objects, and the plane of neighbours where
 * the survey is small enough for one. Fed row by row.
 */
final class PageMap {

    /** With more objects the plane of neighbours takes too long: its cost grows as the square. */
    static final int MOST_NEIGHBOURS = 2000;

    private static final long SEED = 20_260_101L;

    private final Optional<SurveyAxes> axes = SurveyAxes.standard();
    private final List<double[]> places = new ArrayList<>();
    private final List<Integer> rows = new ArrayList<>();
    private int count;

    /** Takes the next row. */
    void add(SurveyRow row) {
        if (count < MOST_NEIGHBOURS) {
            row.place()
                    .ifPresent(
                            place -> {
                                places.add(place);
                                rows.add(count);
                            });
        }
        count++;
    }

    /** The map as JSON. */
    String json() {
        Map<String, Object> map = new LinkedHashMap<>();
        List<Object> shares = new ArrayList<>();
        List<Object> references = new ArrayList<>();
        axes.ifPresent(
                known -> {
                    shares.addAll(SurveyRow.rounded(new double[] {known.share(0), known.share(1)}));
                    known.references().forEach(placed -> references.add(reference(placed)));
                });
        map.put("shares", shares);
        map.put("references", references);
        map.put("most", MOST_NEIGHBOURS);
        if (axes.isPresent() && count <= MOST_NEIGHBOURS && !places.isEmpty()) {
            addNeighbours(map, axes.get().references());
        }
        return PageJson.of(map);
    }

    private static List<Object> reference(Placed placed) {
        List<Object> cells = new ArrayList<>();
        cells.add(placed.reference().object());
        cells.add(SurveyRow.code(placed.reference().typeNumber()));
        cells.add(placed.reference().gravity());
        cells.add(placed.reference().kind().label());
        cells.add(placed.reference().source());
        double[] scores = placed.scores();
        cells.add(SurveyRow.rounded(new double[] {scores[0], scores[1]}));
        return cells;
    }

    private void addNeighbours(Map<String, Object> map, List<Placed> references) {
        List<double[]> all = new ArrayList<>();
        references.forEach(placed -> all.add(placed.scores()));
        all.addAll(places);
        List<double[]> plane = NeighbourMap.of(all, SEED);
        if (plane.isEmpty()) {
            return;
        }
        List<Object> ofReferences = new ArrayList<>();
        List<Object> ofRows = new ArrayList<>();
        for (int i = 0; i < plane.size(); i++) {
            (i < references.size() ? ofReferences : ofRows).add(SurveyRow.rounded(plane.get(i)));
        }
        map.put("near_references", ofReferences);
        map.put("near_rows", rows);
        map.put("near", ofRows);
    }
}
