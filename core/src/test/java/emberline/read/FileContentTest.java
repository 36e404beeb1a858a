package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Arrays;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FileContentTest {

    @TempDir Path folder;

    private static String refusal(Path file) {
        return assertThrows(
                        UnreadableSpectrumException.class, () -> new SpectrumReader().read(file))
                .getMessage();
    }

    private static byte[] gzip(byte[] content) throws IOException {
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
            out.write(content);
        }
        return packed.toByteArray();
    }

    @Test
    void missingFileAndFolderAreSaidSo() {
        assertEquals(
                "none.txt: no such file (looked for "
                        + folder.resolve("none.txt")
                        + "); expected an existing file. Check the path; in a list it is relative"
                        + " to the folder of the list.",
                refusal(folder.resolve("none.txt")));
        assertTrue(refusal(folder).contains("a folder; expected a file. Name the spectrum file"));
    }

    @Test
    void unreadableFileIsSaidSo() throws IOException {
        Path file = Files.writeString(folder.resolve("locked.txt"), "0.65 1\n0.66 2\n");
        Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("---------"));
        Assumptions.assumeTrue(
                !Files.isReadable(file), "this user may read every file, so nothing can be locked");
        assertTrue(refusal(file).contains("no permission to read the file"));
    }

    @Test
    void packedTextIsReadWhateverItsName() throws IOException {
        byte[] text = "# medium: air\n0.65 1\n0.66 2\n".getBytes(StandardCharsets.UTF_8);
        Path file = Files.write(folder.resolve("odd.name"), gzip(text));
        Observation read = new SpectrumReader().read(file);
        assertEquals("odd.name", read.source());
        assertEquals("plain text, 2 columns, gzip", read.format());
    }

    /** Checksum of "abc" from FIPS 180-4's example. */
    @Test
    void checksumIsThatOfTheBytesOnDisk() throws IOException {
        assertEquals(
                "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad",
                FileContent.of("abc".getBytes(StandardCharsets.UTF_8), "abc").sha256());
    }

    @Test
    void damagedGzipIsSaidSo() throws IOException {
        byte[] text = new byte[5000];
        for (int i = 0; i < text.length; i++) {
            text[i] = (byte) ('0' + i * i % 10);
        }
        byte[] packed = gzip(text);
        Path cut = Files.write(folder.resolve("cut.gz"), Arrays.copyOf(packed, packed.length / 2));
        assertTrue(refusal(cut).contains("a gzip file that is cut off or damaged"));
        packed[packed.length - 6] ^= 1;
        Path wrong = Files.write(folder.resolve("wrong.gz"), packed);
        assertTrue(refusal(wrong).contains("a gzip file that is cut off or damaged"));
        Path nothing = Files.write(folder.resolve("nothing.gz"), gzip(new byte[0]));
        assertTrue(refusal(nothing).contains("nothing in the gzip file"));
        Path twice = Files.write(folder.resolve("twice.gz"), gzip(gzip(text)));
        assertTrue(refusal(twice).contains("a gzip file within a gzip file"));
    }

    @Test
    void whatUnpacksBeyondAllReasonIsRefused() throws IOException {
        byte[] packed = gzip(new byte[40 << 20]);
        Path bomb = Files.write(folder.resolve("bomb.gz"), packed);
        String message = refusal(bomb);
        assertTrue(message.contains(packed.length + " bytes that unpack to more than"), message);
        assertTrue(message.contains("expected at most 512 MB"), message);
    }

    @Test
    void specialFilesAreNotOpened() {
        Path device = Path.of("/dev/zero");
        Assumptions.assumeTrue(Files.exists(device), "no /dev/zero on this system");
        assertTrue(refusal(device).contains("a device, pipe or other special file"));
    }
}
