package emberline.survey;

import emberline.place.standard.Standard;
import emberline.place.standard.StandardComparison;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableListException;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import emberline.spectrum.SpectralType;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/**
 * A list of standard spectra: a candidate list with the column {@code known_type}. Every row must
 * be usable, so that a comparison never silently lacks a standard.
 *
 * @param comparison what objects are compared with
 * @param spectra the number of spectra
 * @param leftOut names of rows that state a kind that is no late dwarf
 */
public record StandardList(StandardComparison comparison, int spectra, List<String> leftOut) {

    private static final String TYPE = "known_type";
    private static final String NUMBER = "known_type_number";

    /** The words in {@code known_kind} of objects that can be standards. */
    private static final Set<String> DWARFS = Set.of("dwarf", "late dwarf", "subdwarf");

    /** Copies the list. */
    public StandardList {
        leftOut = List.copyOf(leftOut);
    }

    /**
     * Reads and prepares standards.
     *
     * @param file a list as for a survey; {@code known_type} such as {@code L3.5} in every row, or
     *     beside it {@code known_type_number}, which goes before it
     * @return the standards
     * @throws UnreadableListException if the list cannot be read, or a row holds no type or an
     *     unreadable spectrum; the message names file, row and column
     */
    public static StandardList read(Path file) throws UnreadableListException {
        CandidateList list = new CandidateListReader().read(file);
        if (!list.columns().contains(TYPE)) {
            throw new UnreadableListException(
                    file.toString(),
                    "no column '" + TYPE + "' among " + String.join(", ", list.columns()),
                    "a column " + TYPE + " with the type of each standard, such as L3.5",
                    "Add it.");
        }
        SpectrumReader reader = new SpectrumReader();
        Preparer preparer = new Preparer();
        List<Standard> standards = new ArrayList<>();
        List<String> leftOut = new ArrayList<>();
        for (ListedCandidate row : list.rows()) {
            if (row.problem().isPresent()) {
                throw fault(file, row.problem().get());
            }
            Candidate candidate = row.candidate();
            if (DWARFS.contains(candidate.text("known_kind").orElse("dwarf"))) {
                add(file, candidate, reader, preparer, standards);
            } else {
                leftOut.add(candidate.name());
            }
        }
        if (standards.isEmpty()) {
            throw new UnreadableListException(
                    file.toString(),
                    "column known_kind says of every row that it is no dwarf",
                    "late dwarfs",
                    "Correct the column or remove it.");
        }
        return new StandardList(new StandardComparison(standards), standards.size(), leftOut);
    }

    private static void add(
            Path file,
            Candidate candidate,
            SpectrumReader reader,
            Preparer preparer,
            List<Standard> standards)
            throws UnreadableListException {
        double type = type(file, candidate);
        if (candidate.spectra().isEmpty()) {
            throw fault(
                    file,
                    at("spectrum", candidate)
                            + "nothing; expected the path of a spectrum. Give it, or remove the"
                            + " row.");
        }
        Path folder = file.toAbsolutePath().getParent();
        for (int place = 0; place < candidate.spectra().size(); place++) {
            String path = candidate.spectra().get(place);
            Preparing stated =
                    Statements.of(candidate.forSpectrum(place), Preparing.withDefaults());
            try {
                for (String address : reader.expanded(folder, path)) {
                    Observation observation = reader.read(folder, address);
                    standards.add(
                            new Standard(
                                    candidate.name(),
                                    type,
                                    ObjectGroup.of(candidate),
                                    observation.sha256(),
                                    preparer.prepare(observation, stated)));
                }
            } catch (UnreadableSpectrumException e) {
                throw fault(file, at("spectrum", candidate) + e.getMessage());
            } catch (InvalidPathException e) {
                throw fault(
                        file,
                        at("spectrum", candidate)
                                + "'"
                                + path
                                + "' is not a file name: "
                                + e.getReason());
            }
        }
    }

    private static double type(Path file, Candidate candidate) throws UnreadableListException {
        if (candidate.number(NUMBER).isPresent()) {
            double number = candidate.number(NUMBER).getAsDouble();
            if (number >= -9 && number < 40) {
                return number;
            }
            throw fault(
                    file,
                    at(NUMBER, candidate)
                            + number
                            + "; expected a number from -9 (K) to below 40 (Y). Correct it, or"
                            + " leave it empty.");
        }
        String code = candidate.text(TYPE).orElse("");
        return SpectralType.parse(code)
                .orElseThrow(
                        () ->
                                fault(
                                        file,
                                        at(TYPE, candidate)
                                                + "'"
                                                + code
                                                + "'; expected a type of class K, M, L, T or Y such"
                                                + " as L3.5. Give the type, or remove the row."))
                .number();
    }

    private static String at(String column, Candidate candidate) {
        return "row " + candidate.row() + ", column " + column + ": ";
    }

    private static UnreadableListException fault(Path file, String problem) {
        return new UnreadableListException(file + ": " + problem);
    }
}
