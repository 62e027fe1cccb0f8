package ladderwell.kernel.render;

import ladderwell.Oscillator;
import ladderwell.PhaseSpace;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.Renderer;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.Declared;
import ladderwell.kernel.magic.LevelTable;
import ladderwell.kernel.magic.PhaseAnimation;
import ladderwell.kernel.magic.PhasePortrait;
import ladderwell.kernel.magic.TableRead;
import ladderwell.kernel.picture.Easel;
import ladderwell.kernel.picture.PageLibrary;
import tech.tablesaw.api.Table;
import tech.tablesaw.plotly.components.Figure;

/**
 * Finds the form of any value that a cell returns. One per kernel session, because it remembers whether the page has the
 * plotting library already.
 */
public final class Renderings implements Renderer {
    private final Easel easel;

    /** For a kernel session: the first picture brings the library into the page. */
    public Renderings() {
        this(PageLibrary.withFirstPicture());
    }

    /** For a page that gets the library in the way given. */
    public Renderings(PageLibrary library) {
        this.easel = new Easel(library);
    }

    /** How the library comes into the page. */
    public PageLibrary library() {
        return easel.library();
    }

    @Override
    public MimeBundle render(Object value) {
        if (value instanceof Declared declared) {
            return declared(declared);
        }
        if (value instanceof Oscillator oscillator) {
            return CardRendering.oscillator("oscillator", oscillator);
        }
        if (value instanceof State state) {
            return CardRendering.state("state", state);
        }
        if (value instanceof Run run) {
            return CardRendering.run("run", run);
        }
        if (value instanceof TableRead read) {
            return TableRendering.read(read.run(), read.table());
        }
        if (value instanceof Animation animation) {
            return PictureRendering.animation(animation, easel);
        }
        if (value instanceof PhasePortrait portrait) {
            return PictureRendering.portrait(portrait, easel);
        }
        if (value instanceof PhaseAnimation film) {
            return PictureRendering.film(film, easel);
        }
        if (value instanceof PhaseSpace space) {
            return PictureRendering.portrait(new PhasePortrait("run", space, false), easel);
        }
        if (value instanceof LevelTable levels) {
            return PictureRendering.levels(levels, easel);
        }
        if (value instanceof Table table) {
            return TableRendering.table(table, table.name() == null ? "" : table.name(), "");
        }
        if (value instanceof Figure figure) {
            return PictureRendering.figure(figure, easel);
        }
        return MimeBundle.plain(String.valueOf(value));
    }

    private MimeBundle declared(Declared declared) {
        String head = declared.noun() + " " + declared.name();
        Object value = declared.value();
        if (value instanceof Oscillator oscillator) {
            return CardRendering.oscillator(head, oscillator);
        }
        if (value instanceof State state) {
            return CardRendering.state(head, state);
        }
        return value instanceof Run run ? CardRendering.run(head, run) : render(value);
    }
}
