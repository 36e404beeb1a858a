package emberline.survey;

import emberline.read.Checksum;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.HashMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;

/**
 * The checksum of all that an object is made of: the cells of its row and the bytes of its spectra.
 * Where it is the same as before, and so are program and options, the result is the same too. The
 * place of the row in the list does not count.
 */
public final class InputChecksum {

    private static final String UNREADABLE = "unreadable";

    private final SpectrumReader reader = new SpectrumReader();
    private final Path folder;

    /**
     * Checksums of objects whose spectra lie in a folder.
     *
     * @param folder the folder to which the paths of spectra are relative
     */
    public InputChecksum(Path folder) {
        this.folder = folder;
    }

    /**
     * The checksum of an object as it lies on disk now.
     *
     * @param candidate the object
     * @return SHA-256, hexadecimal; a spectrum that cannot be read counts as such
     */
    public String of(Candidate candidate) {
        return of(candidate, Map.of());
    }

    /**
     * The checksum of an object that has been through the chain; spectra that were read are not
     * read again.
     *
     * @param result its result
     * @return SHA-256, hexadecimal
     */
    public String of(ObjectResult result) {
        Map<String, String> known = new HashMap<>();
        result.spectra().forEach(spectrum -> known.put(spectrum.path(), spectrum.sha256()));
        return of(result.candidate(), known);
    }

    private String of(Candidate candidate, Map<String, String> known) {
        MessageDigest digest = Checksum.sha256();
        add(digest, candidate.name());
        candidate
                .cells()
                .forEach(
                        (column, cell) -> {
                            add(digest, column);
                            add(digest, cell);
                        });
        for (String listed : candidate.spectra()) {
            for (String path : expanded(listed)) {
                add(digest, path);
                String sum = known.get(path);
                add(digest, sum != null ? sum : reader.checksum(folder, path).orElse(UNREADABLE));
            }
        }
        return HexFormat.of().formatHex(digest.digest());
    }

    private List<String> expanded(String listed) {
        try {
            return reader.expanded(folder, listed);
        } catch (UnreadableSpectrumException e) {
            return List.of(listed);
        }
    }

    /** Adds a text so that no two sequences of texts look the same. */
    private static void add(MessageDigest digest, String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        digest.update((bytes.length + ":").getBytes(StandardCharsets.US_ASCII));
        digest.update(bytes);
    }
}
