package emberline.read;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** SHA-256 checksums, hexadecimal. */
public final class Checksum {

    private Checksum() {}

    /**
     * The checksum of a file of any size.
     *
     * @param file the file
     * @return checksum of its bytes
     * @throws IOException if it cannot be read
     */
    public static String of(Path file) throws IOException {
        try (InputStream bytes = Files.newInputStream(file);
                DigestInputStream digest = new DigestInputStream(bytes, sha256())) {
            digest.transferTo(OutputStream.nullOutputStream());
            return HexFormat.of().formatHex(digest.getMessageDigest().digest());
        }
    }

    /**
     * The checksum of bytes.
     *
     * @param bytes the bytes
     * @return their checksum
     */
    public static String of(byte[] bytes) {
        return HexFormat.of().formatHex(sha256().digest(bytes));
    }

    /**
     * A digest to which pieces can be added.
     *
     * @return a new SHA-256 digest
     */
    public static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
