package ladderwell.launch;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.DataInputStream;
import java.util.Objects;
import org.junit.jupiter.api.Test;

class LauncherTest {
    @Test
    void anOldJavaIsNamedAsSuch() {
        for (String old : new String[] {"1.7", "1.8", "9", "11", "16"}) {
            assertEquals("Java 17 or newer is needed", Launcher.complaint(old, true), old);
        }
    }

    @Test
    void aJavaThatWillDoIsNotComplainedOf() {
        for (String good : new String[] {"17", "21", "25", "26.0.1", "unheard of"}) {
            assertEquals("", Launcher.complaint(good, true), good);
        }
    }

    @Test
    void aJavaWithoutItsShellIsNamedAsSuch() {
        assertEquals("a full JDK is needed, with the module jdk.jshell", Launcher.complaint("17", false));
    }

    @Test
    void java8CanLoadIt() throws Exception {
        try (DataInputStream in =
                new DataInputStream(Objects.requireNonNull(Launcher.class.getResourceAsStream("Launcher.class")))) {
            assertEquals(0xCAFEBABE, in.readInt());
            assertEquals(0, in.readUnsignedShort());
            // The class file version of Java 8 (Java Virtual Machine Specification, table 4.1-A).
            assertEquals(52, in.readUnsignedShort());
        }
    }
}
