package ladderwell.kernel.command;

import java.nio.file.Path;
import java.util.Locale;
import java.util.Map;
import java.util.Properties;
import org.jspecify.annotations.Nullable;

/**
 * Where Jupyter keeps a user's data.
 *
 * @source jupyter_core, "Common Directories and File Locations",
 *     docs.jupyter.org/en/latest/use/jupyter-directories.html
 */
final class JupyterFolder {
    private JupyterFolder() {}

    static Path ofUser(Map<String, String> environment, Properties system) throws CommandException {
        String own = environment.get("JUPYTER_DATA_DIR");
        if (given(own)) {
            return Path.of(own);
        }
        String os = system.getProperty("os.name", "").toLowerCase(Locale.ROOT);
        boolean windows = os.startsWith("windows");
        // Java takes the home folder from the user's record, Jupyter from HOME where it is set.
        String home =
                windows || !given(environment.get("HOME")) ? system.getProperty("user.home") : environment.get("HOME");
        if (!given(home)) {
            throw new CommandException("there is no home folder to install into; name one with --prefix");
        }
        if (windows) {
            String roaming = environment.get("APPDATA");
            return given(roaming) ? Path.of(roaming, "jupyter") : Path.of(home, ".jupyter", "data");
        }
        if (os.startsWith("mac")) {
            return Path.of(home, "Library", "Jupyter");
        }
        String data = environment.get("XDG_DATA_HOME");
        return given(data) ? Path.of(data, "jupyter") : Path.of(home, ".local", "share", "jupyter");
    }

    private static boolean given(@Nullable String value) {
        return value != null && !value.isEmpty();
    }
}
