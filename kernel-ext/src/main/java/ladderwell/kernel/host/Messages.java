package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.messages.Header;
import io.github.spencerpark.jupyter.messages.KernelTimestamp;
import io.github.spencerpark.jupyter.messages.Message;
import io.github.spencerpark.jupyter.messages.MessageContext;
import io.github.spencerpark.jupyter.messages.MessageType;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Map;
import java.util.UUID;

/**
 * Builds messages. The base library's own constructors write dates without seconds, which clients cannot read; content
 * is given as a map, since the library's content classes lack fields of the protocol. No blobs must be null: with an empty
 * list the library never ends the message.
 */
final class Messages {
    /** The protocol spoken, which is the base library's. */
    static final String PROTOCOL = "5.3";

    private static final String SESSION = UUID.randomUUID().toString();

    private Messages() {}

    /** An answer to a request, sent back the way it came. */
    static Message<Object> reply(MessageType<?> type, MessageContext request, Map<String, ?> content) {
        return new Message<>(request.getIdentities(), header(type), request.getHeader(), Map.of(), content, null);
    }

    /** Something that every client of the kernel may see, on behalf of a request. */
    static Message<Object> broadcast(MessageType<?> type, MessageContext request, Map<String, ?> content) {
        List<byte[]> topic = List.of(type.getName().getBytes(StandardCharsets.UTF_8));
        return new Message<>(topic, header(type), request.getHeader(), Map.of(), content, null);
    }

    @SuppressWarnings("unchecked") // The type's content class only matters for reading.
    private static Header<Object> header(MessageType<?> type) {
        return new Header<>(
                UUID.randomUUID().toString(),
                "kernel",
                SESSION,
                new KernelTimestamp(Instant.now().truncatedTo(ChronoUnit.MICROS).toString()),
                (MessageType<Object>) type,
                PROTOCOL);
    }
}
