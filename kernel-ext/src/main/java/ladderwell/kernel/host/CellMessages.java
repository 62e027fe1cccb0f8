package ladderwell.kernel.host;

import com.google.gson.JsonParseException;
import com.google.gson.JsonParser;
import io.github.spencerpark.jupyter.messages.MessageContext;
import io.github.spencerpark.jupyter.messages.MessageType;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;

/** What a cell says, as messages on behalf of the request that runs it. */
final class CellMessages implements CellOutput {
    private final Publisher publisher;
    private final MessageContext request;
    private final boolean silent;

    /** @param silent whether the client wants to hear nothing of this run */
    CellMessages(Publisher publisher, MessageContext request, boolean silent) {
        this.publisher = publisher;
        this.request = request;
        this.silent = silent;
    }

    void send(MessageType<?> type, Map<String, ?> content) {
        if (!silent) {
            publisher.send(Messages.broadcast(type, request, content));
        }
    }

    @Override
    public void stdout(String text) {
        send(MessageType.PUBLISH_STREAM, Map.of("name", "stdout", "text", text));
    }

    @Override
    public void stderr(String text) {
        send(MessageType.PUBLISH_STREAM, Map.of("name", "stderr", "text", text));
    }

    @Override
    public void display(MimeBundle bundle, Optional<String> displayId) {
        Map<String, Object> content = content(bundle);
        content.put("transient", displayId.map(id -> Map.of("display_id", id)).orElse(Map.of()));
        send(MessageType.PUBLISH_DISPLAY_DATA, content);
    }

    @Override
    public void update(MimeBundle bundle, String displayId) {
        Map<String, Object> content = content(bundle);
        content.put("transient", Map.of("display_id", displayId));
        send(MessageType.PUBLISH_UPDATE_DISPLAY_DATA, content);
    }

    @Override
    public void clear(boolean wait) {
        send(MessageType.PUBLISH_CLEAR_OUTPUT, Map.of("wait", wait));
    }

    /** The fields {@code data} and {@code metadata} of a bundle, JSON forms as JSON. */
    static Map<String, Object> content(MimeBundle bundle) {
        Map<String, Object> data = new LinkedHashMap<>();
        bundle.data().forEach((type, text) -> data.put(type, type.endsWith("json") ? json(text) : text));
        Map<String, Object> content = new LinkedHashMap<>();
        content.put("data", data);
        content.put("metadata", bundle.metadata());
        return content;
    }

    private static Object json(String text) {
        try {
            return JsonParser.parseString(text);
        } catch (JsonParseException e) {
            return text;
        }
    }
}
