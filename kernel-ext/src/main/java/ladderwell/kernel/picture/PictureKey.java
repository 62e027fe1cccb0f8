package ladderwell.kernel.picture;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * By what a script finds its place in the page. The key is a digest of what is drawn and a running number: the same
 * session gives the same bytes again, two pictures of a session never share a key, and where pages of two sessions meet,
 * equal keys mean equal pictures.
 */
final class PictureKey {
    private PictureKey() {}

    static String of(String content, long number) {
        try {
            byte[] digest = MessageDigest.getInstance("SHA-256").digest(content.getBytes(StandardCharsets.UTF_8));
            return "lw" + HexFormat.of().formatHex(digest, 0, 6) + "-" + number;
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java has SHA-256", e);
        }
    }
}
