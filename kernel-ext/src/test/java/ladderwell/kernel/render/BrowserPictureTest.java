package ladderwell.kernel.render;

import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import ladderwell.Run;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.Declared;
import ladderwell.kernel.magic.PhaseAnimation;
import ladderwell.kernel.magic.PhasePortrait;
import ladderwell.kernel.picture.PageLibrary;
import ladderwell.kernel.real.RealPrograms;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.Table;
import tech.tablesaw.plotly.api.LinePlot;

/** Pages of pictures in a real browser: they are drawn, move, obey, ask for nothing, and stand still where they must. */
class BrowserPictureTest {
    private static final String HOSTILE = "</script><img src=x onerror='window.hacked=1'>\"\u2028&";

    /** A module loader that would swallow the library, as the classic notebook has one. */
    private static final String LOADER =
            "<script>window.modulesAsked=0;window.define=function(){window.modulesAsked++};window.define.amd={}</script>";

    @Test
    void picturesWorkInABrowser(@TempDir Path pages) throws Exception {
        RealPrograms.needPython("selenium");
        RealPrograms.needProgram("/usr/bin/chromium");
        RealPrograms.needProgram("/usr/bin/chromedriver");
        Table line = Table.create(
                "line", DoubleColumn.create("it's <b>x</b>", 0.0, 1.0, 2.0), DoubleColumn.create("y", 1.0, 4.0, 9.0));
        List<Object> values = List.of(
                new Declared("trap", "oscillator", Scenarios.TRAP),
                new Declared("psi", "state", Scenarios.TRAP.coherent(9.5)),
                Scenarios.animation("run", Scenarios.ion()),
                Scenarios.table(Scenarios.ion()),
                Scenarios.animation(HOSTILE, Scenarios.electron()),
                Scenarios.levels("well", Scenarios.WELL, 0, 1, 2, 3),
                Scenarios.levels(HOSTILE, Scenarios.BOX, 0, 1, 2),
                LinePlot.create("squares </script>", line, "it's <b>x</b>", "y"));
        Files.writeString(pages.resolve("light.html"), LOADER + PictureGallery.page(PictureGallery.LIGHT, values));
        Files.writeString(pages.resolve("dark.html"), PictureGallery.page(PictureGallery.DARK, values));
        Run moving = Scenarios.natural();
        Files.writeString(
                pages.resolve("phase.html"),
                PictureGallery.page(
                        PictureGallery.LIGHT,
                        List.of(
                                new PhasePortrait(HOSTILE, moving.phaseSpace(0.3, PERIOD), false),
                                new PhaseAnimation("run", moving, moving.density(), moving.phaseFilm(41)))));
        Animation animation = Scenarios.animation("run", Scenarios.ion());
        String library = PageLibrary.javascript();
        Renderings bare = new Renderings(PageLibrary.inPage());
        String still = bare.render(animation).data().get("text/html");
        Files.writeString(
                pages.resolve("missing.html"),
                "<!doctype html><meta charset=\"utf-8\">" + still + "<script id=\"library\" type=\"text/plain\">"
                        + library + "</script>");
        Files.writeString(
                pages.resolve("live.html"),
                "<!doctype html><meta charset=\"utf-8\"><script id=\"library\" type=\"text/plain\">" + library
                        + "</script>"
                        + "<script>window.comms=[];window.Jupyter={notebook:{kernel:{comm_manager:{new_comm:function(t){"
                        + "window.comms.push(t);return {on_msg:function(f){setTimeout(function(){f({content:{data:{script:"
                        + "document.getElementById('library').textContent}}})},100)}}}}}}};</script>"
                        + still + bare.render(animation).data().get("text/html"));
        Path screenshots = Files.createDirectories(Path.of("target", "pictures"));
        RealPrograms.Outcome outcome = RealPrograms.run(
                Map.of("PYTHONDONTWRITEBYTECODE", "1"),
                400,
                RealPrograms.PYTHON,
                "src/test/python/browser_pictures.py",
                pages.toString(),
                screenshots.toAbsolutePath().toString());
        assertEquals(0, outcome.exitCode(), outcome.text());
    }
}
