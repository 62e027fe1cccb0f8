package ladderwell.kernel.picture;

import java.util.Optional;

/**
 * How the plotting library comes into the page: once, and never from a network.
 *
 * <p>{@link #withFirstPicture()} lets the first picture carry it, and that same picture again each time it is shown, so
 * that a notebook whose first picture was run twice still holds it. {@link #inPage()} carries it nowhere: whoever writes
 * the page puts {@link #script()} in it, before or after the pictures. A picture that finds no library after two seconds
 * asks the kernel for it over a comm with the target {@link #COMM_TARGET} (where the client lets a page do that), and
 * otherwise keeps its still and says what to run.
 */
public final class PageLibrary {
    /**
     * Target of the comm by which a page asks for the library. The kernel answers an opened comm with one message whose
     * data is {@code {"script": javascript()}}.
     */
    public static final String COMM_TARGET = "ladderwell.library";

    private final boolean withFirstPicture;
    private Optional<String> carrier = Optional.empty();

    private PageLibrary(boolean withFirstPicture) {
        this.withFirstPicture = withFirstPicture;
    }

    /** The library comes with the first picture of a session. */
    public static PageLibrary withFirstPicture() {
        return new PageLibrary(true);
    }

    /** The page itself holds the library; no picture carries it. */
    public static PageLibrary inPage() {
        return new PageLibrary(false);
    }

    /**
     * The plotting library and our player as one program, about 1 MB. It sees neither a module loader of the page nor
     * another plotting library there, and leaves both alone; run twice, it does nothing the second time.
     */
    public static String javascript() {
        return Program.TEXT;
    }

    /** {@link #javascript()} as a script element. */
    public static String script() {
        return "<script>" + Program.TEXT + "</script>\n";
    }

    /** Lets the next picture carry the library again, whichever it is. */
    public synchronized void forget() {
        carrier = Optional.empty();
    }

    /** What has to stand before a picture: the library, or nothing. @param picture a name that stays when it is run again */
    synchronized String before(String picture) {
        if (!withFirstPicture) {
            return "";
        }
        if (carrier.isEmpty()) {
            carrier = Optional.of(picture);
        }
        return carrier.get().equals(picture) ? script() : "";
    }

    /** Read and joined when the first picture needs it. */
    private static final class Program {
        // Handing the library a `module` of its own makes it return itself instead of looking for a loader or a global.
        static final String TEXT = "(function(w){if(w.ladderwellPlayer)return;"
                + "var module={exports:{}};(function(module,exports,define){"
                + guarded(Resource.read("plotly-cartesian.min.js"))
                + "\n}).call(w,module,module.exports);(function(w,Plotly){'use strict';"
                + guarded(Resource.read("player.js"))
                + "\n})(w,module.exports);})(window);";

        private static String guarded(String program) {
            return program.replace("</script", "<\\/script").replace("<!--", "<\\!--");
        }
    }
}
