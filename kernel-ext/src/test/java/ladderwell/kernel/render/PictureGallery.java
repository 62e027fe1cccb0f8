package ladderwell.kernel.render;

import static ladderwell.quantity.Units.PERIOD;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import ladderwell.kernel.magic.Declared;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.Table;
import tech.tablesaw.plotly.api.LinePlot;

/** Pages to be looked at in a browser, by a test or by a person: one cell below the other, as an exported notebook has them. */
final class PictureGallery {
    private PictureGallery() {}

    /** A whole page. @param style of the page itself */
    static String page(String style, List<?> values) {
        Renderings renderings = new Renderings();
        StringBuilder page = new StringBuilder(
                "<!doctype html><html lang=\"en\"><head><meta charset=\"utf-8\"><title>Gallery</title>"
                        + "<link rel=\"icon\" href=\"data:,\"><style>body{margin:18px;font:14px/1.45 system-ui,'Segoe UI',Helvetica,Arial,sans-serif;"
                        + style
                        + "}</style></head><body>\n");
        for (Object value : values) {
            page.append("<div class=\"cell\">")
                    .append(renderings.render(value).data().get("text/html"))
                    .append("</div>\n");
        }
        return page.append("</body></html>\n").toString();
    }

    static final String LIGHT = "background:#fff;color:#1E2430";
    static final String DARK = "background:#15171B;color:#E6E3DC;color-scheme:dark";

    static List<Object> everything() {
        return List.of(
                new Declared("trap", "oscillator", Scenarios.TRAP),
                new Declared("psi", "state", Scenarios.TRAP.coherent(9.5)),
                new Declared("run", "evolve", Scenarios.ion()),
                Scenarios.animation("run", Scenarios.ion()),
                Scenarios.animation("hop", Scenarios.electron()),
                Scenarios.table(Scenarios.ion()),
                Scenarios.levels("well", Scenarios.WELL, 0, 1, 2, 3, 4, 5),
                Scenarios.levels("box", Scenarios.BOX, 0, 1, 2, 3),
                Scenarios.levels("trap", Scenarios.TRAP, 0, 1, 2, 3, 4),
                Scenarios.animation("nat", Scenarios.natural()),
                Scenarios.animation(
                        "far", Scenarios.TRAP.coherent(1e4).evolve(2, PERIOD).run()),
                Scenarios.animation(
                        "wave",
                        Scenarios.BOX
                                .superposition(0, 1, 2, 3)
                                .evolve(3, PERIOD)
                                .run()),
                LinePlot.create(
                        "squares",
                        Table.create("t", DoubleColumn.create("x", 1, 2, 3), DoubleColumn.create("y", 1, 4, 9)),
                        "x",
                        "y"));
    }

    static void write(Path directory) throws IOException {
        Files.writeString(directory.resolve("light.html"), page(LIGHT, everything()));
        Files.writeString(directory.resolve("dark.html"), page(DARK, everything()));
    }

    /** Writes the pages, to be looked at. */
    public static void main(String[] arguments) throws IOException {
        write(Path.of(arguments[0]));
    }
}
