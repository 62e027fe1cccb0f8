package ladderwell.kernel.render;

import java.io.StringReader;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;
import org.xml.sax.helpers.DefaultHandler;

/** Reads our HTML and SVG strictly, as XML; an unescaped character or a tag left open fails. */
final class WellFormed {
    private WellFormed() {}

    /** A piece of HTML, the bodies of scripts and styles left out. */
    static Document html(String html) throws Exception {
        String bare = html.replaceAll("(?s)(<(script|style)[^>]*>).*?(</\\2>)", "$1$3");
        return xml("<page>" + bare + "</page>");
    }

    static Document xml(String text) throws Exception {
        DocumentBuilder builder = DocumentBuilderFactory.newInstance().newDocumentBuilder();
        builder.setErrorHandler(new DefaultHandler());
        return builder.parse(new InputSource(new StringReader(text)));
    }
}
