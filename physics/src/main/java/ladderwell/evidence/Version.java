package ladderwell.evidence;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/**
 * The version of Ladderwell that computed something.
 *
 * @param number as released: "0.1.0"
 */
public record Version(String number) {

    private static final Version CURRENT = read();

    /** Refuses a blank number. */
    public Version {
        if (number.isBlank()) {
            throw new IllegalArgumentException("a version needs a number, such as 0.1.0");
        }
    }

    /** The version of the classes that are running. */
    public static Version current() {
        return CURRENT;
    }

    private static Version read() {
        try (InputStream in = Version.class.getResourceAsStream("version.properties")) {
            if (in == null) {
                throw new IllegalStateException("version.properties is missing from the Ladderwell classes");
            }
            Properties properties = new Properties();
            properties.load(in);
            return new Version(properties.getProperty("version", ""));
        } catch (IOException e) {
            throw new UncheckedIOException("version.properties of the Ladderwell classes cannot be read", e);
        }
    }

    /** The number. */
    @Override
    public String toString() {
        return number;
    }
}
