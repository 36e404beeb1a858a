package emberline.reports.note;

import emberline.reports.attach.ResultColumn;
import java.io.IOException;
import java.io.Writer;

/** The table as VOTable 1.4 with units, content descriptors and descriptions. */
final class Votable {

    private static final String HEAD =
            """
            <?xml version="1.0" encoding="UTF-8"?>
            <VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3">
            <RESOURCE type="results" name="emberline">
            """;

    private Votable() {}

    static void write(TableRows rows, String origin, Writer out) throws IOException {
        out.write(HEAD);
        out.write("<DESCRIPTION>" + escaped(origin) + "</DESCRIPTION>\n");
        out.write("<TABLE name=\"results\" nrows=\"" + rows.count() + "\">\n");
        for (int c = 0; c < rows.columns().size(); c++) {
            field(rows, c, out);
        }
        out.write("<DATA><TABLEDATA>\n");
        rows.forEach(
                cells -> {
                    StringBuilder row = new StringBuilder("<TR>");
                    for (String cell : cells) {
                        row.append("<TD>").append(escaped(cell)).append("</TD>");
                    }
                    out.write(row.append("</TR>\n").toString());
                });
        out.write("</TABLEDATA></DATA>\n</TABLE>\n</RESOURCE>\n</VOTABLE>\n");
    }

    private static void field(TableRows rows, int c, Writer out) throws IOException {
        ResultColumn column = rows.columns().get(c);
        StringBuilder field =
                new StringBuilder("<FIELD ID=\"")
                        .append(id(rows, c))
                        .append("\" name=\"")
                        .append(escaped(column.name()))
                        .append('"');
        if (!column.ucd().isEmpty()) {
            field.append(" ucd=\"").append(escaped(column.ucd())).append('"');
        }
        if (rows.isNumber(c)) {
            String unit = TableUnit.of(column.unit()).vounit();
            if (!unit.isEmpty()) {
                field.append(" unit=\"").append(escaped(unit)).append('"');
            }
            field.append(" datatype=\"double\"");
        } else {
            field.append(" datatype=\"")
                    .append(rows.facts(c).isAscii() ? "char" : "unicodeChar")
                    .append("\" arraysize=\"*\"");
        }
        out.write(
                field.append("><DESCRIPTION>")
                        .append(escaped(column.description()))
                        .append("</DESCRIPTION></FIELD>\n")
                        .toString());
    }

    /** The name, by which some libraries take a column, where it can be an identifier of XML. */
    private static String id(TableRows rows, int c) {
        String name = rows.columns().get(c).name();
        boolean unique =
                rows.columns().stream().filter(other -> other.name().equals(name)).count() == 1;
        return unique && name.matches("[A-Za-z][A-Za-z0-9_]*") && !name.matches("c\\d+")
                ? name
                : "c" + (c + 1);
    }

    /** Text for XML: marks escaped, characters that XML does not allow become blanks. */
    private static String escaped(String text) {
        StringBuilder escaped = new StringBuilder(text.length());
        text.codePoints()
                .forEach(
                        sign -> {
                            switch (sign) {
                                case '&' -> escaped.append("&amp;");
                                case '<' -> escaped.append("&lt;");
                                case '>' -> escaped.append("&gt;");
                                case '"' -> escaped.append("&quot;");
                                default -> {
                                    boolean refused =
                                            sign < 32
                                                    || (sign >= 0xD800 && sign < 0xE000)
                                                    || sign == 0xFFFE
                                                    || sign == 0xFFFF;
                                    escaped.appendCodePoint(refused ? ' ' : sign);
                                }
                            }
                        });
        return escaped.toString();
    }
}
