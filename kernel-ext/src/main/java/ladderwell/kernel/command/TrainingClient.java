package ladderwell.kernel.command;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.IOException;
import java.net.InetAddress;
import java.net.ServerSocket;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.GeneralSecurityException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.UUID;
import javax.crypto.Mac;
import javax.crypto.spec.SecretKeySpec;
import org.zeromq.SocketType;
import org.zeromq.ZContext;
import org.zeromq.ZMQ;

/** The least a client of the Jupyter protocol needs: send a request, wait until its reply is there. */
final class TrainingClient implements AutoCloseable {
    private static final int TIMEOUT_MILLIS = 60_000;
    private static final String DELIMITER = "<IDS|MSG>";
    private static final List<String> PORTS =
            List.of("shell_port", "iopub_port", "stdin_port", "control_port", "hb_port");

    private final ZContext context = new ZContext();
    private final Path connectionFile;
    private final ZMQ.Socket shell;
    private final ZMQ.Socket published;
    private final String key = UUID.randomUUID().toString();
    private final String session = UUID.randomUUID().toString();

    private TrainingClient() throws IOException {
        JsonObject connection = connection();
        connection.addProperty("key", key);
        connectionFile = Files.createTempFile("ladderwell-train", ".json");
        Files.writeString(connectionFile, connection.toString());
        Thread kernel = new Thread(() -> Ladderwell.serve(connectionFile), "kernel");
        kernel.setDaemon(true);
        kernel.start();
        shell = socket(SocketType.DEALER, connection, "shell_port");
        published = socket(SocketType.SUB, connection, "iopub_port");
        published.subscribe(new byte[0]);
    }

    /** A client of a kernel that it starts itself, in this process. */
    static TrainingClient ofNewKernel() throws IOException {
        TrainingClient client = new TrainingClient();
        client.request("kernel_info_request", new JsonObject());
        return client;
    }

    private static JsonObject connection() throws IOException {
        JsonObject connection = new JsonObject();
        connection.addProperty("transport", "tcp");
        connection.addProperty("ip", "127.0.0.1");
        connection.addProperty("signature_scheme", "hmac-sha256");
        List<ServerSocket> held = new ArrayList<>();
        try {
            for (String port : PORTS) {
                ServerSocket free = new ServerSocket(0, 1, InetAddress.getLoopbackAddress());
                held.add(free);
                connection.addProperty(port, free.getLocalPort());
            }
        } finally {
            for (ServerSocket socket : held) {
                socket.close();
            }
        }
        return connection;
    }

    private ZMQ.Socket socket(SocketType type, JsonObject connection, String port) {
        ZMQ.Socket socket = context.createSocket(type);
        socket.setReceiveTimeOut(TIMEOUT_MILLIS);
        socket.setLinger(0);
        socket.connect("tcp://127.0.0.1:" + connection.get(port).getAsInt());
        return socket;
    }

    /** Runs a cell to its end, whatever it does. */
    void execute(String code) throws IOException {
        JsonObject content = new JsonObject();
        content.addProperty("code", code);
        content.addProperty("silent", false);
        content.addProperty("store_history", true);
        content.addProperty("allow_stdin", false);
        content.addProperty("stop_on_error", false);
        request("execute_request", content);
    }

    private void request(String type, JsonObject content) throws IOException {
        JsonObject header = new JsonObject();
        String id = UUID.randomUUID().toString();
        header.addProperty("msg_id", id);
        header.addProperty("session", session);
        header.addProperty("username", "install");
        header.addProperty("date", Instant.now().toString());
        header.addProperty("msg_type", type);
        header.addProperty("version", "5.3");
        List<String> parts = List.of(header.toString(), "{}", "{}", content.toString());
        shell.sendMore(DELIMITER);
        shell.sendMore(signature(parts));
        shell.sendMore(parts.get(0));
        shell.sendMore(parts.get(1));
        shell.sendMore(parts.get(2));
        shell.send(parts.get(3));
        awaitReply(type, id);
        // What the kernel publishes is taken off the socket; nobody reads it.
        boolean more = true;
        while (more) {
            more = published.recv(ZMQ.DONTWAIT) != null;
        }
    }

    private void awaitReply(String type, String id) throws IOException {
        while (true) {
            List<String> frames = new ArrayList<>();
            do {
                String frame = shell.recvStr();
                if (frame == null) {
                    throw new IOException("the kernel gave no reply to " + type);
                }
                frames.add(frame);
            } while (shell.hasReceiveMore());
            int parts = frames.indexOf(DELIMITER) + 2;
            JsonObject parent = JsonParser.parseString(frames.get(parts + 1)).getAsJsonObject();
            if (parent.has("msg_id") && parent.get("msg_id").getAsString().equals(id)) {
                return;
            }
        }
    }

    private String signature(List<String> parts) {
        try {
            Mac mac = Mac.getInstance("HmacSHA256");
            mac.init(new SecretKeySpec(key.getBytes(StandardCharsets.US_ASCII), "HmacSHA256"));
            parts.forEach(part -> mac.update(part.getBytes(StandardCharsets.UTF_8)));
            return HexFormat.of().formatHex(mac.doFinal());
        } catch (GeneralSecurityException e) {
            throw new IllegalStateException("every Java has HmacSHA256", e);
        }
    }

    /** Leaves; the kernel goes with the process. */
    @Override
    public void close() throws IOException {
        context.close();
        Files.deleteIfExists(connectionFile);
    }
}
