package ladderwell.kernel.cell;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * One value in several forms: MIME type to text, in the order in which they were made. {@code text/plain} is always
 * there, so that every client can show something. The text of a JSON type is JSON.
 *
 * @param data the forms, one per MIME type
 * @param metadata what a client may want to know besides, as maps, lists, strings, numbers and booleans; mostly empty
 */
public record MimeBundle(Map<String, String> data, Map<String, Object> metadata) {
    /** The MIME type that every bundle holds. */
    public static final String PLAIN = "text/plain";

    /** The MIME type of a piece of HTML. */
    public static final String HTML = "text/html";

    /** Copies both maps and checks that a plain text is there. */
    public MimeBundle {
        if (!data.containsKey(PLAIN)) {
            throw new IllegalArgumentException("a MIME bundle needs text/plain; found only " + data.keySet());
        }
        data = Collections.unmodifiableMap(new LinkedHashMap<>(data));
        metadata = Collections.unmodifiableMap(new LinkedHashMap<>(metadata));
    }

    /** A bundle of plain text alone. */
    public static MimeBundle plain(String text) {
        return new MimeBundle(Map.of(PLAIN, text), Map.of());
    }

    /** This bundle with one more form, or with that form replaced. */
    public MimeBundle with(String mimeType, String text) {
        Map<String, String> more = new LinkedHashMap<>(data);
        more.put(mimeType, text);
        return new MimeBundle(more, metadata);
    }

    /** The plain text. */
    public String plainText() {
        return data.getOrDefault(PLAIN, "");
    }
}
