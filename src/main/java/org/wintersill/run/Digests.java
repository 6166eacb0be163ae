package org.wintersill.run;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import org.wintersill.problem.Problem;

/** SHA-256 fingerprints for the record. */
public final class Digests {
    private static final int BUFFER = 1 << 18;

    private Digests() {
    }

    public static String ofFile(Path file) {
        MessageDigest digest = sha256();
        byte[] buffer = new byte[BUFFER];
        try (InputStream in = Files.newInputStream(file)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                digest.update(buffer, 0, n);
            }
        } catch (IOException e) {
            throw Problem.input("the file cannot be read: " + e.getMessage(), file.toString(), "").asException(e);
        }
        return HexFormat.of().formatHex(digest.digest());
    }

    public static String ofText(String text) {
        return HexFormat.of().formatHex(sha256().digest(text.getBytes(StandardCharsets.UTF_8)));
    }

    private static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }
}
