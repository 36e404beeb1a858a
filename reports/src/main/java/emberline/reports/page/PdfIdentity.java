package emberline.reports.page;

import java.awt.color.ColorSpace;
import java.awt.color.ICC_Profile;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.List;
import javax.xml.transform.TransformerException;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDDocumentCatalog;
import org.apache.pdfbox.pdmodel.PDDocumentInformation;
import org.apache.pdfbox.pdmodel.common.PDMetadata;
import org.apache.pdfbox.pdmodel.graphics.color.PDOutputIntent;
import org.apache.pdfbox.pdmodel.interactive.viewerpreferences.PDViewerPreferences;
import org.apache.xmpbox.XMPMetadata;
import org.apache.xmpbox.schema.AdobePDFSchema;
import org.apache.xmpbox.schema.DublinCoreSchema;
import org.apache.xmpbox.schema.PDFAIdentificationSchema;
import org.apache.xmpbox.schema.XMPBasicSchema;
import org.apache.xmpbox.type.BadFieldValueException;
import org.apache.xmpbox.xml.XmpSerializer;

/**
 * Title, language, metadata and colour profile of a report, as PDF/A-2b asks for them. There are no
 * dates, and the identifier follows from the content, so that the same result gives the same bytes.
 */
final class PdfIdentity {

    private static final String SRGB = "sRGB IEC61966-2.1";

    private PdfIdentity() {}

    /**
     * Stamps a document.
     *
     * @param named its title
     * @param parts what its content follows from, besides the settings
     */
    static void stamp(PDDocument pdf, String named, List<String> parts, ReportSettings settings)
            throws IOException {
        String title = named.replaceAll("\\p{Cntrl}", " ");
        String program = "Emberline " + settings.programVersion();
        PDDocumentInformation information = new PDDocumentInformation();
        information.setTitle(title);
        information.setCreator(program);
        information.setProducer(program);
        pdf.setDocumentInformation(information);
        PDDocumentCatalog catalog = pdf.getDocumentCatalog();
        catalog.setLanguage("en-GB");
        PDViewerPreferences preferences =
                new PDViewerPreferences(new org.apache.pdfbox.cos.COSDictionary());
        preferences.setDisplayDocTitle(true);
        catalog.setViewerPreferences(preferences);
        PDMetadata metadata = new PDMetadata(pdf);
        metadata.importXMPMetadata(xmp(title, program));
        catalog.setMetadata(metadata);
        byte[] profile = ICC_Profile.getInstance(ColorSpace.CS_sRGB).getData();
        PDOutputIntent intent = new PDOutputIntent(pdf, new ByteArrayInputStream(profile));
        intent.setInfo(SRGB);
        intent.setOutputCondition(SRGB);
        intent.setOutputConditionIdentifier(SRGB);
        intent.setRegistryName("http://www.color.org");
        catalog.addOutputIntent(intent);
        pdf.setDocumentId(identifier(parts, settings));
    }

    private static byte[] xmp(String title, String program) throws IOException {
        XMPMetadata xmp = XMPMetadata.createXMPMetadata();
        try {
            DublinCoreSchema core = xmp.createAndAddDublinCoreSchema();
            core.setTitle(title);
            core.addLanguage("en-GB");
            XMPBasicSchema basic = xmp.createAndAddXMPBasicSchema();
            basic.setCreatorTool(program);
            AdobePDFSchema adobe = xmp.createAndAddAdobePDFSchema();
            adobe.setProducer(program);
            PDFAIdentificationSchema identification = xmp.createAndAddPDFAIdentificationSchema();
            identification.setPart(2);
            identification.setConformance("B");
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            new XmpSerializer().serialize(xmp, bytes, true);
            return bytes.toByteArray();
        } catch (BadFieldValueException | TransformerException e) {
            throw new IOException("metadata of " + title + " could not be written", e);
        }
    }

    private static long identifier(List<String> parts, ReportSettings settings) {
        try {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            add(digest, settings.toString());
            for (String part : parts) {
                add(digest, part);
            }
            return ByteBuffer.wrap(digest.digest()).getLong() & Long.MAX_VALUE;
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }

    private static void add(MessageDigest digest, String text) {
        digest.update(text.getBytes(StandardCharsets.UTF_8));
        digest.update((byte) 0);
    }
}
