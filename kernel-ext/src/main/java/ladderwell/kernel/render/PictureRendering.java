package ladderwell.kernel.render;

import java.util.Map;
import ladderwell.Density;
import ladderwell.Run;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.LevelTable;
import ladderwell.kernel.magic.PhaseAnimation;
import ladderwell.kernel.magic.PhasePortrait;
import ladderwell.kernel.picture.Easel;
import ladderwell.kernel.picture.FigurePicture;
import ladderwell.kernel.picture.LevelPicture;
import ladderwell.kernel.picture.MotionPicture;
import ladderwell.kernel.picture.PhaseMotionPicture;
import ladderwell.kernel.picture.PhasePicture;
import ladderwell.quantity.Digits;
import tech.tablesaw.plotly.components.Figure;

/** Animations, levels and figures: HTML with a drawing and a still, the still alone as SVG, and what it shows in words. */
final class PictureRendering {
    private static final String SVG = "image/svg+xml";

    private PictureRendering() {}

    static MimeBundle animation(Animation animation, Easel easel) {
        Run run = animation.run();
        Density density = animation.density();
        MotionPicture picture = MotionPicture.of(animation.name(), run, density);
        String text = "Animation " + animation.name() + ": " + run.verdict() + "\n" + picture.description() + "\n"
                + density.times() + " times, " + density.points() + " positions, " + density.method()
                + ", density off by at most "
                + Digits.pretty(Digits.upward(density.bound().size(), 2))
                + " per scaled length (" + density.bound().kind().word() + ")\n" + run.errorLine();
        MimeBundle bundle = MimeBundle.plain(text)
                .with(MimeBundle.HTML, picture.html(easel))
                .with(SVG, picture.still());
        return new MimeBundle(bundle.data(), Map.of("ladderwell", CardRendering.record(run)));
    }

    static MimeBundle portrait(PhasePortrait portrait, Easel easel) {
        PhasePicture picture = PhasePicture.of(portrait.name(), portrait.space(), portrait.husimi());
        String text = "phasespace " + portrait.name() + " at " + picture.instant() + ": " + picture.verdict() + "\n"
                + picture.description() + "\n" + picture.errorLine();
        MimeBundle bundle = MimeBundle.plain(text)
                .with(MimeBundle.HTML, picture.html(easel))
                .with(SVG, picture.still());
        return new MimeBundle(
                bundle.data(),
                Map.of("ladderwell", CardRendering.record(portrait.space().run())));
    }

    static MimeBundle film(PhaseAnimation film, Easel easel) {
        Run run = film.run();
        PhaseMotionPicture picture = PhaseMotionPicture.of(film.name(), run, film.density(), film.film());
        String text = "phasespace " + film.name() + ": " + run.verdict() + "\n" + picture.description() + "\n"
                + film.film().frames() + " frames, ħW off by at most "
                + Digits.pretty(Digits.upward(film.film().bound().size(), 2)) + " ("
                + film.film().bound().kind().word() + ")\n" + run.errorLine();
        MimeBundle bundle = MimeBundle.plain(text)
                .with(MimeBundle.HTML, picture.html(easel))
                .with(SVG, picture.still());
        return new MimeBundle(bundle.data(), Map.of("ladderwell", CardRendering.record(run)));
    }

    static MimeBundle levels(LevelTable levels, Easel easel) {
        String head = "levels " + levels.name() + ": " + levels.oscillator().kind();
        String html = TableRendering.html(levels.table(), head, "");
        String plain = TableRendering.plain(levels.table(), head, "");
        if (levels.levels().length == 0) {
            return MimeBundle.plain(plain).with(MimeBundle.HTML, html);
        }
        LevelPicture picture = LevelPicture.of(levels.name(), levels.oscillator(), levels.levels());
        return MimeBundle.plain(plain + "\n" + picture.description())
                .with(MimeBundle.HTML, html + "\n" + picture.html(easel))
                .with(SVG, picture.still());
    }

    static MimeBundle figure(Figure figure, Easel easel) {
        FigurePicture picture = FigurePicture.of(figure);
        return MimeBundle.plain(picture.description()).with(MimeBundle.HTML, picture.html(easel));
    }
}
