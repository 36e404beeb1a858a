package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.IntFunction;
import java.util.function.Predicate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads a spectrum from plain text or CSV. Columns are found by name where a line of names, or a
 * comment that looks like one, names a wavelength and a flux; else the first is the wavelength, the
 * second the flux and a third the one-sigma noise. Units, medium and resolving power are taken from
 * names and from comments such as {@code flux (erg/s/cm2/A) as a function of wavelength (um)} or
 * {@code medium: vacuum}.
 */
final class PlainTextReader {

    private static final Pattern WAVELENGTH_UNIT =
            Pattern.compile(
                    "(?i)wave(?:length)?s?\\s*(?:unit\\w*\\s*[:=]\\s*(\\S+)|"
                            + "in\\s+([a-z\u00b5\u03bc]+)|\\[([^\\]]+)\\]|\\(([^)]+)\\))");
    private static final Pattern FLUX_UNIT =
            Pattern.compile(
                    "(?i)flux[^\\[(:=]*?(?:unit\\w*\\s*[:=]\\s*(.+)|\\[([^\\]]+)\\]|"
                            + "\\(((?:[^()]|\\([^()]*\\))+)\\))");
    private static final Pattern PAIR = Pattern.compile("\\s*([A-Za-z_ ]{1,30}?)\\s*[:=]\\s*(.*)");

    private PlainTextReader() {}

    static RawSpectrum read(FileContent content) throws UnreadableSpectrumException {
        TextTable table = TextTable.read(content);
        List<Finding> findings = new ArrayList<>();
        List<ColumnLabel> labels = labels(table);
        Optional<ColumnRoles> byName = ColumnRoles.find(labels);
        if (byName.isEmpty()) {
            findings.add(byPosition(table));
        }
        ColumnRoles roles = byName.orElseGet(() -> ColumnRoles.byPosition(table.columnCount()));
        List<ColumnLabel> complete = withUnitsFromComments(labels, roles, table.comments());
        return TabularReader.read(new TextColumns(table, complete), roles, findings);
    }

    private static Finding byPosition(TextTable table) {
        String text =
                "No column names were recognised: the columns were taken as wavelength, flux"
                        + (table.columnCount() > 2 ? ", one-sigma noise" : "");
        return table.columnCount() > 3
                ? Finding.caution("columns-by-position", text + "; the rest was not used.")
                : Finding.note("columns-by-position", text + ".");
    }

    private static List<ColumnLabel> labels(TextTable table) {
        if (!table.names().isEmpty()) {
            List<ColumnLabel> labels = new ArrayList<>();
            for (int i = 0; i < table.names().size(); i++) {
                Optional<String> unit =
                        i < table.units().size()
                                ? Optional.of(table.units().get(i))
                                : Optional.empty();
                labels.add(ColumnLabel.of(table.names().get(i), unit, "", ""));
            }
            return labels;
        }
        for (int i = table.comments().size() - 1; i >= 0; i--) {
            Optional<List<ColumnLabel>> named =
                    namesIn(table.comments().get(i), table.columnCount());
            if (named.isPresent()) {
                return named.get();
            }
        }
        return unnamed(new ArrayList<>(), table.columnCount());
    }

    /** The labels in a comment that names a wavelength first and a flux second. */
    private static Optional<List<ColumnLabel>> namesIn(String comment, int columns) {
        for (String separator : new String[] {",", ";", "\\t", "\\|", "\\s+"}) {
            String[] parts = comment.trim().split(separator, -1);
            if (parts.length >= 2 && parts.length <= columns) {
                List<ColumnLabel> labels =
                        new ArrayList<>(Arrays.stream(parts).map(ColumnLabel::of).toList());
                Optional<ColumnRoles> roles = ColumnRoles.find(labels);
                if (roles.isPresent() && (parts.length == columns || inUsualOrder(roles.get()))) {
                    return Optional.of(unnamed(labels, columns));
                }
            }
        }
        return Optional.empty();
    }

    private static boolean inUsualOrder(ColumnRoles roles) {
        return roles.wavelength() == 0 && roles.flux() == 1;
    }

    /** Labels lengthened to all columns; the third, if it has no name, is the noise. */
    private static List<ColumnLabel> unnamed(List<ColumnLabel> labels, int columns) {
        boolean some = !labels.isEmpty();
        for (int i = labels.size(); i < columns; i++) {
            labels.add(ColumnLabel.of(i == 2 && some ? "sigma" : ""));
        }
        return labels;
    }

    private static List<ColumnLabel> withUnitsFromComments(
            List<ColumnLabel> labels, ColumnRoles roles, List<String> comments) {
        List<ColumnLabel> complete = new ArrayList<>(labels);
        complete.set(
                roles.wavelength(),
                withUnit(
                        labels.get(roles.wavelength()),
                        comments,
                        WAVELENGTH_UNIT,
                        text -> WavelengthUnit.parse(text).isPresent()));
        complete.set(
                roles.flux(),
                withUnit(
                        labels.get(roles.flux()),
                        comments,
                        FLUX_UNIT,
                        text -> FluxUnit.parse(text).isPresent()));
        return complete;
    }

    private static ColumnLabel withUnit(
            ColumnLabel label, List<String> comments, Pattern pattern, Predicate<String> known) {
        if (label.unit().isPresent()) {
            return label;
        }
        for (String comment : comments) {
            Matcher matcher = pattern.matcher(comment);
            while (matcher.find()) {
                for (int group = 1; group <= matcher.groupCount(); group++) {
                    String text = matcher.group(group);
                    if (text != null && known.test(text.trim())) {
                        return new ColumnLabel(
                                label.name(), Optional.of(text.trim()), label.ucd(), label.utype());
                    }
                }
            }
        }
        return label;
    }

    /** The columns of a text table with their labels. */
    private record TextColumns(TextTable table, List<ColumnLabel> labels)
            implements TabularReader.Columns {

        @Override
        public double[] values(int column) {
            return table.column(column);
        }

        @Override
        public String format() {
            boolean csv = table.separator() == ',' || table.separator() == ';';
            return (csv ? "CSV text, " : "plain text, ") + table.columnCount() + " columns";
        }

        @Override
        public IntFunction<String> place() {
            return row -> "line " + table.line(row);
        }

        @Override
        public Keywords keywords() {
            return new CommentKeywords(table.comments());
        }
    }

    /** Pairs such as {@code medium: vacuum} or {@code R = 2000} within comments. */
    private record CommentKeywords(List<String> comments) implements Keywords {

        @Override
        public Optional<String> text(String key) {
            for (String comment : comments) {
                Matcher matcher = PAIR.matcher(comment);
                if (matcher.matches()
                        && matcher.group(1)
                                .trim()
                                .replace(' ', '_')
                                .toUpperCase(Locale.ROOT)
                                .equals(key)) {
                    return Optional.of(matcher.group(2).trim()).filter(t -> !t.isEmpty());
                }
            }
            return Optional.empty();
        }

        @Override
        public Optional<Medium> medium() {
            Optional<Medium> stated = Keywords.super.medium();
            if (stated.isPresent()) {
                return stated;
            }
            String all = String.join("\n", comments).toLowerCase(Locale.ROOT);
            boolean air =
                    all.matches("(?s).*\\bair[- ]wavelengths?\\b.*|.*wavelengths? in air\\b.*");
            boolean vacuum =
                    all.matches(
                            "(?s).*\\bvac(uum)?[- ]wavelengths?\\b.*|.*wavelengths? in vacuum\\b.*");
            if (air == vacuum) {
                return Optional.empty();
            }
            return Optional.of(air ? Medium.AIR : Medium.VACUUM);
        }

        @Override
        public Optional<ResolvingPower> resolvingPower(List<Finding> findings) {
            return comments.isEmpty() ? Optional.empty() : Keywords.super.resolvingPower(findings);
        }
    }
}
