package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.nio.file.Path;
import java.util.Map;
import java.util.Properties;
import org.junit.jupiter.api.Test;

/** Expected folders are those of jupyter_core's documentation, "Common Directories and File Locations". */
class JupyterFolderTest {
    private static Path folder(String os, Map<String, String> environment) throws CommandException {
        Properties system = new Properties();
        system.setProperty("os.name", os);
        system.setProperty("user.home", "/home/record");
        return JupyterFolder.ofUser(environment, system);
    }

    @Test
    void jupytersOwnVariableWinsEverywhere() throws Exception {
        Map<String, String> environment = Map.of("JUPYTER_DATA_DIR", "/data", "HOME", "/h", "APPDATA", "/a");
        for (String os : new String[] {"Linux", "Mac OS X", "Windows 11"}) {
            assertEquals(Path.of("/data"), folder(os, environment));
        }
    }

    @Test
    void linuxFollowsXdg() throws Exception {
        assertEquals(Path.of("/x/jupyter"), folder("Linux", Map.of("XDG_DATA_HOME", "/x", "HOME", "/h")));
        assertEquals(Path.of("/h/.local/share/jupyter"), folder("Linux", Map.of("XDG_DATA_HOME", "", "HOME", "/h")));
        assertEquals(Path.of("/home/record/.local/share/jupyter"), folder("FreeBSD", Map.of()));
    }

    @Test
    void macUsesItsLibrary() throws Exception {
        assertEquals(Path.of("/h/Library/Jupyter"), folder("Mac OS X", Map.of("HOME", "/h", "XDG_DATA_HOME", "/x")));
    }

    @Test
    void windowsUsesItsRoamingFolder() throws Exception {
        assertEquals(Path.of("/a/jupyter"), folder("Windows 11", Map.of("APPDATA", "/a", "HOME", "/h")));
        assertEquals(Path.of("/home/record/.jupyter/data"), folder("Windows 11", Map.of("HOME", "/h")));
    }

    @Test
    void withoutAHomeThePrefixIsAskedFor() {
        Properties system = new Properties();
        system.setProperty("os.name", "Linux");
        assertEquals(
                "there is no home folder to install into; name one with --prefix",
                assertThrows(CommandException.class, () -> JupyterFolder.ofUser(Map.of(), system))
                        .getMessage());
    }
}
