package emberline.read;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;

/**
 * Files without a list, each an object: those of a folder and the folders within it, or those that
 * a pattern names. A FITS file that holds many spectra gives an object for each of them. The names
 * of the files are held, some 150 bytes each; nothing else is.
 */
final class FileSource implements CandidateSource {

    private final String name;
    private final Path folder;
    private final List<String> files;

    private FileSource(String name, Path folder, List<String> files) {
        this.name = name;
        this.folder = folder;
        this.files = files;
    }

    static CandidateSource ofFolder(Path folder) throws UnreadableListException {
        try (Stream<Path> found = Files.walk(folder)) {
            List<String> files =
                    found.filter(Files::isRegularFile)
                            .map(folder::relativize)
                            .map(path -> path.toString().replace('\\', '/'))
                            .filter(path -> !path.matches("(.*/)?\\..*"))
                            .sorted()
                            .toList();
            return checked(FileContent.name(folder.toAbsolutePath().normalize()), folder, files);
        } catch (IOException | UncheckedIOException e) {
            if (e instanceof UnreadableListException known) {
                throw known;
            }
            throw new UnreadableListException(
                    folder.toString(),
                    "a folder that cannot be listed (" + e.getMessage() + ")",
                    "folders that can be read",
                    "Check their permissions.");
        }
    }

    static CandidateSource ofPattern(String pattern) throws UnreadableListException {
        try {
            Path root = SpectrumPattern.root(Path.of(""), pattern);
            Path absolute = root.toAbsolutePath();
            List<String> files =
                    SpectrumPattern.files(Path.of(""), pattern).stream()
                            .map(file -> absolute.relativize(Path.of(file).toAbsolutePath()))
                            .map(path -> path.toString().replace('\\', '/'))
                            .toList();
            return checked(pattern.substring(pattern.lastIndexOf('/') + 1), absolute, files);
        } catch (UnreadableSpectrumException e) {
            throw new UnreadableListException(e);
        }
    }

    static CandidateSource ofFile(Path file) throws UnreadableListException {
        Path absolute = file.toAbsolutePath();
        return checked(
                FileContent.name(file), absolute.getParent(), List.of(FileContent.name(file)));
    }

    private static CandidateSource checked(String name, Path folder, List<String> files)
            throws UnreadableListException {
        if (files.isEmpty()) {
            throw new UnreadableListException(
                    name,
                    "no files",
                    "files of spectra, or a candidate list",
                    "Check the folder or the pattern; quote a pattern so that the shell leaves it"
                            + " alone.");
        }
        return new FileSource(name, folder, files);
    }

    @Override
    public String name() {
        return name;
    }

    @Override
    public Path folder() {
        return folder;
    }

    @Override
    public CandidateRows open() throws UnreadableListException {
        return new FileCandidates(folder, files);
    }

    @Override
    public String sha256() {
        return Checksum.of(String.join("\n", files).getBytes(StandardCharsets.UTF_8));
    }
}
