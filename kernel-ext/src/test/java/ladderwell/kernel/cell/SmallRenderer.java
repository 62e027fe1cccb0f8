package ladderwell.kernel.cell;

import java.util.List;

/** Lists as HTML besides plain text, everything else as plain text. */
public final class SmallRenderer implements Renderer {
    @Override
    public MimeBundle render(Object value) {
        MimeBundle plain = MimeBundle.plain(String.valueOf(value));
        return value instanceof List<?> list
                ? plain.with(MimeBundle.HTML, "<ul>" + list.size() + "</ul>")
                        .with("application/json", "{\"size\": " + list.size() + "}")
                : plain;
    }
}
