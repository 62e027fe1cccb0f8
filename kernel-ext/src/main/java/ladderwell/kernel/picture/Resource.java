package ladderwell.kernel.picture;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;

/** The texts that travel beside the classes of this package. */
final class Resource {
    /** Style of all pictures, for a style element. */
    static final String STYLE = read("picture.css");

    /** Puts a picture in the queue; the data and {@code );} are to follow. */
    static final String WAITING = read("waiting.js").replaceAll("\\n\\s*", "\n").strip();

    private Resource() {}

    static String read(String name) {
        try (InputStream in = Resource.class.getResourceAsStream(name)) {
            if (in == null) {
                throw new IllegalStateException("the file " + name + " is missing from this build of Ladderwell");
            }
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
