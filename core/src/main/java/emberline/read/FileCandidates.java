package emberline.read;

import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;

/**
 * Files as candidates. Each is named after its file, without the endings; each spectrum of a packed
 * file after a column {@code name}, {@code object}, {@code target}, {@code designation} or {@code
 * id} of its table, after the keywords OBJECT or EXTNAME of its HDU, or after the file and its
 * number. The single values of a table with array columns become columns of the list where there is
 * one file only.
 */
final class FileCandidates implements CandidateRows {

    private static final List<String> NAMES =
            List.of("name", "object", "target", "designation", "id");

    private final Path folder;
    private final Iterator<String> files;
    private final boolean oneFile;
    private final List<String> columns;
    private final NameRows names = new NameRows();
    private final NameRows taken = new NameRows();
    private int row;
    private Optional<Packed> current = Optional.empty();

    /** A packed file that is being read. */
    private static final class Packed {

        private final String file;
        private final PackedSpectra spectra;
        private final Iterator<PackedRange> ranges;
        private PackedRange range;
        private FitsCards header;
        private List<FitsTableRow.Column> cells = List.of();
        private long next;

        Packed(String file, PackedSpectra spectra, List<PackedRange> ranges) {
            this.file = file;
            this.spectra = spectra;
            this.ranges = ranges.iterator();
        }
    }

    FileCandidates(Path folder, List<String> files) throws UnreadableListException {
        this.folder = folder;
        this.files = files.iterator();
        this.oneFile = files.size() == 1;
        List<String> all = new ArrayList<>(List.of("name", "spectrum"));
        if (oneFile) {
            all.addAll(cellColumns(files.get(0)));
        }
        this.columns = List.copyOf(all);
    }

    @Override
    public List<String> columns() {
        return columns;
    }

    /** The columns of single values of a packed table, by the names that lists have for them. */
    private List<String> cellColumns(String file) throws UnreadableListException {
        Set<String> keys = new HashSet<>(List.of("name", "spectrum"));
        List<String> found = new ArrayList<>();
        for (FitsTableRow.Column column : singles(file)) {
            String key = CandidateListReader.key(column.name());
            if (!key.isBlank() && keys.add(key)) {
                found.add(key);
            }
        }
        return found;
    }

    private List<FitsTableRow.Column> singles(String file) throws UnreadableListException {
        try {
            Optional<PackedSpectra> spectra = packed(file);
            if (spectra.isEmpty()) {
                return List.of();
            }
            for (PackedRange one : spectra.get().ranges()) {
                FitsCards cards = spectra.get().fits().header(one.hdu());
                if (one.rows().isPresent() && cards.isTable()) {
                    return FitsTableRow.columns(cards).stream()
                            .filter(FitsTableRow.Column::isSingle)
                            .toList();
                }
            }
            return List.of();
        } catch (UnreadableSpectrumException e) {
            throw new UnreadableListException(e);
        }
    }

    /** A file as a packed one; empty where it is no FITS file, or a gzip of one. */
    private Optional<PackedSpectra> packed(String file) throws UnreadableSpectrumException {
        Path path = folder.resolve(file);
        boolean fits =
                FileContent.reading(
                        path,
                        () -> {
                            try (InputStream in = Files.newInputStream(path)) {
                                return new String(in.readNBytes(9), StandardCharsets.ISO_8859_1)
                                        .equals("SIMPLE  =");
                            }
                        });
        return fits ? Optional.of(new PackedSpectra(PackedFits.of(path))) : Optional.empty();
    }

    @Override
    public Optional<ListedCandidate> next() throws UnreadableListException {
        if (current.isPresent()) {
            Optional<ListedCandidate> one = nextOf(current.get());
            if (one.isPresent()) {
                return one;
            }
            current = Optional.empty();
        }
        if (!files.hasNext()) {
            return Optional.empty();
        }
        String file = files.next();
        try {
            Optional<PackedSpectra> spectra = packed(file);
            if (spectra.isPresent()) {
                List<PackedRange> ranges = spectra.get().ranges();
                if (!ranges.isEmpty()) {
                    current = Optional.of(new Packed(file, spectra.get(), ranges));
                    return next();
                }
            }
        } catch (UnreadableSpectrumException e) {
            return Optional.of(listed(stem(file), file, List.of())); // fails when it is read
        }
        return Optional.of(listed(stem(file), file, List.of()));
    }

    private Optional<ListedCandidate> nextOf(Packed packed) throws UnreadableListException {
        try {
            while (packed.range == null || packed.next > packed.range.rows().orElse(1)) {
                if (!packed.ranges.hasNext()) {
                    return Optional.empty();
                }
                packed.range = packed.ranges.next();
                packed.header = packed.spectra.fits().header(packed.range.hdu());
                packed.cells =
                        packed.range.rows().isPresent() && packed.header.isTable()
                                ? FitsTableRow.columns(packed.header).stream()
                                        .filter(FitsTableRow.Column::isSingle)
                                        .toList()
                                : List.of();
                packed.next = 1;
            }
            return Optional.of(candidate(packed, packed.next++));
        } catch (UnreadableSpectrumException e) {
            throw new UnreadableListException(e);
        }
    }

    private ListedCandidate candidate(Packed packed, long number)
            throws UnreadableSpectrumException {
        int hdu = packed.range.hdu();
        if (packed.range.rows().isEmpty()) {
            String name =
                    packed.header
                            .text("OBJECT")
                            .or(() -> packed.header.text("EXTNAME"))
                            .orElse(stem(packed.file) + "-" + hdu);
            String address = PackedAddress.text(packed.file, hdu, OptionalLong.empty());
            return listed(unique(name, hdu), address, List.of());
        }
        String address = PackedAddress.text(packed.file, hdu, OptionalLong.of(number));
        if (packed.cells.isEmpty()) {
            return listed(stem(packed.file) + "-" + number, address, List.of());
        }
        long bytes = packed.header.number("NAXIS1", 0);
        byte[] cells = packed.spectra.fits().data(hdu, (number - 1) * bytes, bytes);
        List<String> texts = new ArrayList<>();
        for (FitsTableRow.Column column : packed.cells) {
            texts.add(FitsTableRow.text(packed.header, column, cells));
        }
        return listed(name(packed, texts).orElse(stem(packed.file) + "-" + number), address, texts);
    }

    /** A name that no HDU before had. */
    private String unique(String name, int hdu) {
        String lower = name.toLowerCase(Locale.ROOT);
        return taken.firstRow(lower, row + 1) == row + 1 ? name : name + "-" + hdu;
    }

    private static Optional<String> name(Packed packed, List<String> texts) {
        for (String wanted : NAMES) {
            for (int i = 0; i < texts.size(); i++) {
                if (packed.cells.get(i).name().trim().equalsIgnoreCase(wanted)
                        && !texts.get(i).isEmpty()) {
                    return Optional.of(texts.get(i));
                }
            }
        }
        return Optional.empty();
    }

    private ListedCandidate listed(String name, String address, List<String> texts) {
        List<String> cells = new ArrayList<>(List.of(name, address));
        List<FitsTableRow.Column> singles = current.map(packed -> packed.cells).orElse(List.of());
        for (String column : columns.subList(2, columns.size())) {
            String cell = "";
            for (int i = 0; i < texts.size(); i++) {
                if (CandidateListReader.key(singles.get(i).name()).equals(column)) {
                    cell = texts.get(i);
                    break;
                }
            }
            cells.add(cell);
        }
        return CandidateListReader.listed(columns, cells, ++row, names);
    }

    private static String stem(String file) {
        String stem =
                file.replaceFirst("(?i)(\\.(fits?|csv|txt|dat|ecsv|vot|xml|tsv))?(\\.gz)?$", "");
        return stem.isBlank() ? file : stem;
    }

    @Override
    public void close() {
        current = Optional.empty();
    }
}
