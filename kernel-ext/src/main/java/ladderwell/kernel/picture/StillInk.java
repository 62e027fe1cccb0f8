package ladderwell.kernel.picture;

/** Head and style of a still: the hues of {@code picture.css}, in a middle lightness where the image cannot know the page. */
final class StillInk {
    private static final String STYLE = """
            :root{color-scheme:light dark}
            text{font:11.5px system-ui,"Segoe UI",Helvetica,Arial,sans-serif;font-variant-numeric:tabular-nums}
            .ink{fill:#6B7078;fill:light-dark(#1E2430,#E6E3DC)}
            .faint{fill:#7C7F85;fill:light-dark(#6F6A66,#A39B95)}
            .ochre{fill:#B4770F;fill:light-dark(#B4770F,#E3AC4C)}
            .line,.hair,.dash,.ring{fill:none}
            .line{stroke-width:1.6;stroke:#178080;stroke:light-dark(#0B6E6E,#5FC0B6)}
            .fill{fill-opacity:.33;fill:#178080;fill:light-dark(#0B6E6E,#5FC0B6)}
            .hair{stroke-width:.9;stroke:#8A817C;stroke:light-dark(#8A817C,#A39B95)}
            .dash{stroke-width:1.1;stroke-dasharray:5 4;stroke:#C98A1B;stroke:light-dark(#C98A1B,#E3AC4C)}
            .ring{stroke-width:1.6;stroke:#D1495B;stroke:light-dark(#D1495B,#F07C8B)}
            """.replace("\n", "");

    private StillInk() {}

    static String head(int width, int height, String title) {
        return "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"" + width + "\" height=\"" + height
                + "\" viewBox=\"0 0 "
                + width + " " + height + "\" role=\"img\"><title>" + Markup.text(title) + "</title><style>" + STYLE
                + "</style>";
    }
}
