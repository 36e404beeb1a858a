package emberline.read;

import java.io.ByteArrayInputStream;
import java.util.Locale;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/**
 * Looks through a VOTable before the table library sees it and refuses what could make the library
 * read other files, call the network or fill the memory: document type declarations (and with them
 * entities), data kept elsewhere (STREAM with href), FITS within the table, elements nested deeply,
 * and array sizes beyond the length of the file.
 */
final class VotableGuard {

    private static final int DEEPEST = 100;

    private final String name;
    private final int length;
    private double numbersPerRow;
    private double numbers;

    private VotableGuard(FileContent content) {
        this.name = content.name();
        this.length = content.bytes().length;
    }

    /** Returns only if the content is harmless. */
    static void check(FileContent content) throws UnreadableSpectrumException {
        new VotableGuard(content).scan(content.bytes());
    }

    private void scan(byte[] bytes) throws UnreadableSpectrumException {
        XMLInputFactory factory = XMLInputFactory.newFactory();
        factory.setProperty(XMLInputFactory.SUPPORT_DTD, false);
        factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
        try {
            XMLStreamReader xml = factory.createXMLStreamReader(new ByteArrayInputStream(bytes));
            int depth = 0;
            while (xml.hasNext()) {
                switch (xml.next()) {
                    case XMLStreamConstants.DTD ->
                            throw refused(
                                    "line " + xml.getLocation().getLineNumber(),
                                    "a document type declaration (DOCTYPE)",
                                    "a VOTable without one",
                                    "Remove the DOCTYPE line; VOTables are described by a schema.");
                    case XMLStreamConstants.ENTITY_REFERENCE ->
                            throw refused(
                                    "line " + xml.getLocation().getLineNumber(),
                                    "an entity reference",
                                    "plain text",
                                    "Write the text itself.");
                    case XMLStreamConstants.START_ELEMENT -> element(xml, ++depth);
                    case XMLStreamConstants.END_ELEMENT -> depth--;
                    default -> {}
                }
            }
        } catch (XMLStreamException | RuntimeException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "a VOTable that is not well-formed XML (" + FitsReader.reason(e) + ")",
                    "well-formed XML",
                    "The file is cut off or damaged: fetch it again.");
        }
    }

    private void element(XMLStreamReader xml, int depth) throws UnreadableSpectrumException {
        String line = "line " + xml.getLocation().getLineNumber();
        if (depth > DEEPEST) {
            throw refused(
                    line,
                    "elements nested more than " + DEEPEST + " deep",
                    "a plain VOTable",
                    "Write the table again.");
        }
        switch (xml.getLocalName().toUpperCase(Locale.ROOT)) {
            case "STREAM" -> {
                if (xml.getAttributeValue(null, "href") != null) {
                    throw refused(
                            line,
                            "data kept elsewhere (STREAM with href)",
                            "the data within the VOTable",
                            "Save the table with its data inline.");
                }
            }
            case "FITS" ->
                    throw refused(
                            line,
                            "a FITS file within the VOTable",
                            "the data as TABLEDATA or BINARY",
                            "Save the table with its data inline.");
            case "TABLE" -> numbersPerRow = 0;
            case "TR" -> row(line);
            case "FIELD", "PARAM" -> size(xml, line);
            default -> {}
        }
    }

    private void size(XMLStreamReader xml, String line) throws UnreadableSpectrumException {
        String text = xml.getAttributeValue(null, "arraysize");
        double cells = 1;
        for (String part :
                text == null ? new String[0] : text.toLowerCase(Locale.ROOT).split("x", -1)) {
            String digits = part.replaceAll("[^0-9]", "");
            cells *= digits.isEmpty() ? 1 : Double.parseDouble(digits);
        }
        String kind = String.valueOf(xml.getAttributeValue(null, "datatype"));
        numbersPerRow += kind.contains("har") ? 1 : cells;
        if (cells > length || numbersPerRow > length) {
            throw refused(
                    line,
                    "arraysize '" + text + "' in a file of " + length + " bytes",
                    "arrays that fit into the file",
                    "Correct the declared size.");
        }
    }

    /** Counts the numbers that the rows declare; each needs a few characters in the file. */
    private void row(String line) throws UnreadableSpectrumException {
        numbers += numbersPerRow;
        if (numbers > 4.0 * length) {
            throw refused(
                    line,
                    "rows declared to hold more numbers than a file of " + length + " bytes can",
                    "arrays that fit into the file",
                    "Correct the declared arraysize of the fields.");
        }
    }

    private UnreadableSpectrumException refused(
            String line, String found, String expected, String advice) {
        return new UnreadableSpectrumException(name + ", " + line, found, expected, advice);
    }
}
