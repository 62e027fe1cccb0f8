package ladderwell.kernel.notebook;

import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;
import org.commonmark.Extension;
import org.commonmark.ext.gfm.tables.TablesExtension;
import org.commonmark.node.AbstractVisitor;
import org.commonmark.node.Code;
import org.commonmark.node.Heading;
import org.commonmark.node.HtmlBlock;
import org.commonmark.node.HtmlInline;
import org.commonmark.node.Image;
import org.commonmark.node.Node;
import org.commonmark.node.SoftLineBreak;
import org.commonmark.node.Text;
import org.commonmark.parser.Parser;
import org.commonmark.renderer.NodeRenderer;
import org.commonmark.renderer.html.DefaultUrlSanitizer;
import org.commonmark.renderer.html.HtmlNodeRendererContext;
import org.commonmark.renderer.html.HtmlRenderer;
import org.commonmark.renderer.html.HtmlWriter;

/**
 * Markdown as HTML that is safe in the page of whoever opens it. HTML inside the Markdown is shown as text, but for a
 * few tags without attributes ({@code <br>}, {@code <sub>}, {@code <sup>} …); links lead to http, https, mailto or a
 * place in the page; pictures are put into the page or named, never fetched.
 */
final class MarkdownText {
    private static final Pattern HARMLESS =
            Pattern.compile("</?(?:b|br|code|em|i|kbd|mark|s|small|strong|sub|sup|u)\\s*/?>", Pattern.CASE_INSENSITIVE);

    private static final Parser PARSER = Parser.builder()
            .extensions(List.<Extension>of(TablesExtension.create()))
            .customInlineContentParserFactory(new Formula.Factory())
            .build();

    private final HtmlRenderer renderer;

    /** Markdown whose pictures come from {@code pictures}. */
    MarkdownText(Pictures pictures) {
        renderer = HtmlRenderer.builder()
                .extensions(List.<Extension>of(TablesExtension.create()))
                .sanitizeUrls(true)
                .urlSanitizer(new DefaultUrlSanitizer(List.of("http", "https", "mailto")))
                .escapeHtml(true)
                .attributeProviderFactory(context -> (node, tag, attributes) -> {
                    if (tag.equals("a")) {
                        attributes.put("rel", "noopener noreferrer");
                    }
                })
                .nodeRendererFactory(context -> new Own(context, pictures))
                .build();
    }

    /** The HTML of a text. */
    String html(String markdown) {
        return renderer.render(PARSER.parse(markdown));
    }

    /** The text of the first heading of the best level, if there is any. */
    static Optional<String> heading(String markdown) {
        Heading[] best = new Heading[1];
        PARSER.parse(markdown).accept(new AbstractVisitor() {
            @Override
            public void visit(Heading heading) {
                if (best[0] == null || heading.getLevel() < best[0].getLevel()) {
                    best[0] = heading;
                }
            }
        });
        return Optional.ofNullable(best[0]).map(MarkdownText::words).filter(words -> !words.isBlank());
    }

    private static String words(Node node) {
        StringBuilder words = new StringBuilder();
        node.accept(new AbstractVisitor() {
            @Override
            public void visit(Text text) {
                words.append(text.getLiteral());
            }

            @Override
            public void visit(Code code) {
                words.append(code.getLiteral());
            }

            @Override
            public void visit(SoftLineBreak line) {
                words.append(' ');
            }
        });
        return words.toString().strip();
    }

    /** Where the pictures of a text come from. */
    interface Pictures {
        /** A {@code data:} address for a picture, if it can be put into the page. */
        Optional<String> embedded(String address);
    }

    /** How the nodes are shown that CommonMark would show otherwise. */
    private record Own(HtmlNodeRendererContext context, Pictures pictures) implements NodeRenderer {
        @Override
        public Set<Class<? extends Node>> getNodeTypes() {
            return new HashSet<>(List.of(Image.class, HtmlInline.class, HtmlBlock.class, Formula.class));
        }

        @Override
        public void render(Node node) {
            HtmlWriter writer = context.getWriter();
            if (node instanceof Formula formula) {
                writer.tag("span", Map.of("class", "formula"));
                writer.text(formula.text());
                writer.tag("/span");
            } else if (node instanceof HtmlInline inline) {
                if (HARMLESS.matcher(inline.getLiteral()).matches()) {
                    writer.raw(inline.getLiteral());
                } else if (!inline.getLiteral().startsWith("<!--")) {
                    writer.text(inline.getLiteral());
                }
            } else if (node instanceof HtmlBlock block) {
                if (!block.getLiteral().strip().startsWith("<!--")) {
                    writer.line();
                    writer.tag("p");
                    writer.text(block.getLiteral().strip());
                    writer.tag("/p");
                    writer.line();
                }
            } else if (node instanceof Image image) {
                picture(image, writer);
            }
        }

        private void picture(Image image, HtmlWriter writer) {
            String words = words(image);
            Optional<String> data = pictures.embedded(image.getDestination());
            if (data.isPresent()) {
                writer.tag("img", Map.of("src", data.get(), "alt", words), true);
            } else {
                writer.tag("span", Map.of("class", "absent"));
                writer.text("[picture not in this page: " + (words.isEmpty() ? image.getDestination() : words) + "]");
                writer.tag("/span");
            }
        }
    }
}
