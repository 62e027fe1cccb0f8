package ladderwell.kernel.picture;

import com.google.gson.JsonObject;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.concurrent.atomic.AtomicLong;

/**
 * Puts pictures together for one session: style, still, data, the words around them, and the library where it is due.
 * One easel per page, so that its pictures count on.
 */
public final class Easel {
    private final PageLibrary library;
    private final AtomicLong pictures = new AtomicLong();

    /** An easel for a page that gets the library in this way. */
    public Easel(PageLibrary library) {
        this.library = library;
    }

    /** How the library comes into the page. */
    public PageLibrary library() {
        return library;
    }

    /**
     * A whole picture.
     *
     * @param kind which of the player's drawings it is
     * @param lasting a name of the picture that stays when its cell is run again
     * @param drawing what the player needs; gets the key and the kind
     * @param verdict HTML above the picture, may be empty
     * @param still HTML of the still
     * @param below HTML below the picture, may be empty
     */
    String picture(String kind, String lasting, JsonObject drawing, String verdict, String still, String below) {
        drawing.addProperty("kind", kind);
        String content = Markup.script(drawing);
        String key = PictureKey.of(content, pictures.incrementAndGet());
        drawing.addProperty("key", key);
        return "<style>" + Resource.STYLE + "</style>\n"
                + "<div class=\"lw\" data-ladderwell=\"" + key + "\">\n"
                + line("lw-verdict", verdict)
                + still
                + "\n<div class=\"lw-hint\" hidden=\"hidden\">This picture is still because the first picture's cell has not "
                + "brought its program into the page: run that cell again.</div>\n"
                + line("lw-error", below)
                + "</div>\n"
                + library.before(kind + " " + lasting)
                + "<script>" + Resource.WAITING + " " + Markup.script(drawing) + ");</script>\n";
    }

    private static String line(String name, String html) {
        return html.isEmpty() ? "" : "<div class=\"" + name + "\">" + html + "</div>\n";
    }

    /**
     * A drawing as an image element. An image, not SVG in the page: pages that take scripts out of what they do not trust
     * take SVG out too, and leave images.
     */
    static String image(String svg, String alternative) {
        return "<img class=\"lw-still\" width=\"780\" alt=\"" + Markup.text(alternative)
                + "\" src=\"data:image/svg+xml;base64,"
                + Base64.getEncoder().encodeToString(svg.getBytes(StandardCharsets.UTF_8)) + "\"/>";
    }
}
