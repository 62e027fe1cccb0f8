package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.channels.JupyterConnection;
import io.github.spencerpark.jupyter.channels.ShellHandler;
import io.github.spencerpark.jupyter.channels.ShellReplyEnvironment;
import io.github.spencerpark.jupyter.kernel.BaseKernel;
import io.github.spencerpark.jupyter.kernel.LanguageInfo;
import io.github.spencerpark.jupyter.kernel.comm.Comm;
import io.github.spencerpark.jupyter.kernel.display.DisplayData;
import io.github.spencerpark.jupyter.messages.Message;
import io.github.spencerpark.jupyter.messages.MessageContext;
import io.github.spencerpark.jupyter.messages.MessageType;
import io.github.spencerpark.jupyter.messages.request.CommInfoRequest;
import io.github.spencerpark.jupyter.messages.request.CompleteRequest;
import io.github.spencerpark.jupyter.messages.request.ExecuteRequest;
import io.github.spencerpark.jupyter.messages.request.HistoryRequest;
import io.github.spencerpark.jupyter.messages.request.InspectRequest;
import io.github.spencerpark.jupyter.messages.request.IsCompleteRequest;
import io.github.spencerpark.jupyter.messages.request.ShutdownRequest;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicBoolean;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.Completeness;
import ladderwell.kernel.cell.Completion;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.Workbench;
import org.jspecify.annotations.Nullable;

/** What the kernel answers to each request. */
final class CellKernel extends BaseKernel {
    private final Workbench workbench;
    private final Runnable end;
    private final Runnable onceKnown;
    private final AtomicBoolean known = new AtomicBoolean();
    private final History history = new History();
    private @Nullable Publisher publisher;
    /** Requests written before this moment are not run: an earlier cell failed. */
    private Instant abortBefore = Instant.MIN;

    /**
     * A kernel.
     *
     * @param workbench where cells are worked
     * @param end what ends the process, called when a client wants the kernel to shut down
     * @param onceKnown called once, after the first reply to a client that asks what kernel this is
     */
    CellKernel(Workbench workbench, Runnable end, Runnable onceKnown) {
        this.workbench = workbench;
        this.end = end;
        this.onceKnown = onceKnown;
        setShouldReplaceStdStreams(false);
    }

    @Override
    public DisplayData eval(String expression) {
        throw new UnsupportedOperationException("cells run on the workbench");
    }

    @Override
    public LanguageInfo getLanguageInfo() {
        return new LanguageInfo.Builder("java")
                .version(Runtime.version().toString())
                .mimetype("text/x-java-source")
                .fileExtension(".java")
                .pygments("java")
                .codemirror("text/x-java")
                .build();
    }

    @Override
    public void becomeHandlerForConnection(JupyterConnection connection) {
        super.becomeHandlerForConnection(connection);
        publisher = new Publisher(connection.getIOPub());
        connection.setHandler(
                MessageType.KERNEL_INFO_REQUEST, guarded(MessageType.KERNEL_INFO_REPLY, (env, message) -> {
                    env.reply(Messages.reply(MessageType.KERNEL_INFO_REPLY, message, kernelInfo()));
                    if (known.compareAndSet(false, true)) {
                        onceKnown.run();
                    }
                }));
        answer(connection, MessageType.COMPLETE_REQUEST, MessageType.COMPLETE_REPLY, this::complete);
        answer(connection, MessageType.INSPECT_REQUEST, MessageType.INSPECT_REPLY, this::inspect);
        answer(connection, MessageType.IS_COMPLETE_REQUEST, MessageType.IS_COMPLETE_REPLY, this::isComplete);
        answer(connection, MessageType.HISTORY_REQUEST, MessageType.HISTORY_REPLY, this::history);
        answer(connection, MessageType.COMM_INFO_REQUEST, MessageType.COMM_INFO_REPLY, this::commInfo);
        answer(connection, MessageType.INTERRUPT_REQUEST, MessageType.INTERRUPT_REPLY, request -> {
            workbench.interrupt();
            return Map.of("status", "ok");
        });
        connection.setHandler(
                MessageType.EXECUTE_REQUEST,
                guarded(MessageType.EXECUTE_REPLY, (env, message) -> execute(env, message)));
        connection.setHandler(
                MessageType.SHUTDOWN_REQUEST,
                guarded(MessageType.SHUTDOWN_REPLY, (env, message) -> shutDown(env, message)));
        LibraryComm.answer(commManager, message -> publisher().send(message));
        for (MessageType<?> type :
                List.of(MessageType.COMM_OPEN_COMMAND, MessageType.COMM_MSG_COMMAND, MessageType.COMM_CLOSE_COMMAND)) {
            guardExisting(connection, type);
        }
    }

    /** Answers one kind of request; the answer's map is the whole content of the reply. */
    private interface Answer<T> {
        Map<String, ?> to(T request);
    }

    private <T> void answer(
            JupyterConnection connection, MessageType<T> request, MessageType<?> reply, Answer<T> answer) {
        connection.setHandler(
                request,
                guarded(
                        reply,
                        (env, message) -> env.reply(Messages.reply(reply, message, answer.to(message.getContent())))));
    }

    private <T> void guardExisting(JupyterConnection connection, MessageType<T> type) {
        ShellHandler<T> existing = connection.getHandler(type);
        connection.setHandler(type, (env, message) -> {
            status("busy", message);
            try {
                existing.handle(env, message);
            } catch (Throwable e) {
                // These messages have no reply, so there is nobody to tell.
            } finally {
                status("idle", message);
            }
        });
    }

    /** Whatever a handler throws becomes an error reply; the kernel lives on. */
    private <T> ShellHandler<T> guarded(MessageType<?> reply, ShellHandler<T> handler) {
        return (env, message) -> {
            status("busy", message);
            try {
                handler.handle(env, message);
            } catch (Throwable e) {
                Map<String, Object> content = new LinkedHashMap<>();
                content.put("status", "error");
                content.put("ename", e.getClass().getName());
                content.put("evalue", String.valueOf(e.getMessage()));
                content.put("traceback", List.of(e.toString()));
                content.put("execution_count", executionCount.get());
                env.reply(Messages.reply(reply, message, content));
            } finally {
                status("idle", message);
            }
        };
    }

    private void status(String state, MessageContext request) {
        publisher().send(Messages.broadcast(MessageType.PUBLISH_STATUS, request, Map.of("execution_state", state)));
    }

    private Publisher publisher() {
        Publisher connected = publisher;
        if (connected == null) {
            throw new IllegalStateException("not connected");
        }
        return connected;
    }

    private Map<String, ?> kernelInfo() {
        String version = Optional.ofNullable(CellKernel.class.getPackage().getImplementationVersion())
                .orElse("0.1.0");
        Map<String, Object> content = new LinkedHashMap<>();
        content.put("status", "ok");
        content.put("protocol_version", Messages.PROTOCOL);
        content.put("implementation", "ladderwell");
        content.put("implementation_version", version);
        content.put("language_info", getLanguageInfo());
        content.put("banner", "Ladderwell " + version + " on Java " + Runtime.version());
        content.put("help_links", List.of());
        return content;
    }

    private void execute(ShellReplyEnvironment env, Message<ExecuteRequest> message) {
        ExecuteRequest request = message.getContent();
        if (writtenAt(message).isBefore(abortBefore)) {
            env.reply(Messages.reply(
                    MessageType.EXECUTE_REPLY,
                    message,
                    Map.of("status", "aborted", "execution_count", executionCount.get())));
            return;
        }
        workbench.announceCell();
        boolean stored = request.shouldStoreHistory() && !request.isSilent();
        // The count of the base library stands at the number of the next cell, 1 at first.
        int number = stored ? executionCount.getAndIncrement() : executionCount.get();
        CellMessages messages = new CellMessages(publisher(), message, request.isSilent());
        messages.send(MessageType.PUBLISH_EXECUTE_INPUT, Map.of("code", request.getCode(), "execution_count", number));
        CellEnd cellEnd = workbench.run(request.getCode(), number, messages);
        Map<String, Object> reply = new LinkedHashMap<>();
        reply.put("execution_count", number);
        reply.put("user_expressions", Map.of());
        reply.put("payload", List.of());
        if (cellEnd instanceof CellEnd.Done done) {
            done.result().ifPresent(bundle -> {
                Map<String, Object> content = CellMessages.content(bundle);
                content.put("execution_count", number);
                messages.send(MessageType.PUBLISH_EXECUTION_RESULT, content);
            });
            reply.put("status", "ok");
            reply.put("user_expressions", userExpressions(request));
        } else {
            Map<String, Object> error = error(cellEnd);
            messages.send(MessageType.PUBLISH_ERROR, error);
            reply.put("status", "error");
            reply.putAll(error);
            if (request.shouldStopOnError()) {
                abortBefore = Instant.now();
            }
        }
        if (stored) {
            Optional<String> output =
                    cellEnd instanceof CellEnd.Done done ? done.result().map(MimeBundle::plainText) : Optional.empty();
            history.add(number, request.getCode(), output);
        }
        env.reply(Messages.reply(MessageType.EXECUTE_REPLY, message, reply));
    }

    private static Instant writtenAt(Message<?> message) {
        try {
            return OffsetDateTime.parse(message.getHeader().getTimestamp().getDateString())
                    .toInstant();
        } catch (DateTimeException | NullPointerException e) {
            // A client without dates cannot have its requests told apart; they are run.
            return Instant.MAX;
        }
    }

    private static Map<String, Object> error(CellEnd end) {
        Map<String, Object> content = new LinkedHashMap<>();
        if (end instanceof CellEnd.Failed failed) {
            content.put("ename", failed.name());
            content.put("evalue", failed.message());
            content.put("traceback", failed.traceback());
        } else if (end instanceof CellEnd.Interrupted interrupted) {
            content.put("ename", "Interrupted");
            content.put("evalue", "");
            content.put("traceback", interrupted.traceback());
        }
        return content;
    }

    private Map<String, Object> userExpressions(ExecuteRequest request) {
        Map<String, Object> values = new LinkedHashMap<>();
        if (request.getUserExpr() == null) {
            return values;
        }
        request.getUserExpr().forEach((name, expression) -> {
            CellEnd cellEnd = workbench.evaluate(expression);
            Map<String, Object> value;
            if (cellEnd instanceof CellEnd.Done done) {
                value = CellMessages.content(done.result().orElse(MimeBundle.plain("")));
                value.put("status", "ok");
            } else {
                value = error(cellEnd);
                value.put("status", "error");
            }
            values.put(name, value);
        });
        return values;
    }

    private Map<String, ?> complete(CompleteRequest request) {
        String code = request.getCode();
        Completion completion = workbench.complete(code, CodePoints.toChars(code, request.getCursorPos()));
        int start = CodePoints.fromChars(code, completion.start());
        int stop = CodePoints.fromChars(code, completion.end());
        List<Object> kinds = new ArrayList<>();
        for (Completion.Candidate candidate : completion.candidates()) {
            kinds.add(Map.of("text", candidate.text(), "type", candidate.kind(), "start", start, "end", stop));
        }
        return Map.of(
                "status",
                "ok",
                "matches",
                completion.candidates().stream().map(Completion.Candidate::text).toList(),
                "cursor_start",
                start,
                "cursor_end",
                stop,
                "metadata",
                Map.of("_jupyter_types_experimental", kinds));
    }

    private Map<String, ?> inspect(InspectRequest request) {
        String code = request.getCode();
        Optional<MimeBundle> about =
                workbench.inspect(code, CodePoints.toChars(code, request.getCursorPos()), request.getDetailLevel());
        Map<String, Object> content = new LinkedHashMap<>();
        content.put("status", "ok");
        content.put("found", about.isPresent());
        content.put("data", Map.of());
        content.put("metadata", Map.of());
        about.ifPresent(bundle -> content.putAll(CellMessages.content(bundle)));
        return content;
    }

    private Map<String, ?> isComplete(IsCompleteRequest request) {
        Completeness completeness = workbench.completeness(request.getCode());
        boolean opens = request.getCode().stripTrailing().endsWith("{");
        return switch (completeness) {
            case COMPLETE -> Map.of("status", "complete");
            case INCOMPLETE -> Map.of("status", "incomplete", "indent", opens ? "    " : "");
            case INVALID -> Map.of("status", "invalid");
        };
    }

    private Map<String, ?> history(HistoryRequest request) {
        return Map.of("status", "ok", "history", history.find(request));
    }

    private Map<String, ?> commInfo(CommInfoRequest request) {
        Map<String, Object> comms = new LinkedHashMap<>();
        for (Comm comm : commManager) {
            if (request.getTargetName() == null || request.getTargetName().equals(comm.getTargetName())) {
                comms.put(comm.getID(), Map.of("target_name", comm.getTargetName()));
            }
        }
        return Map.of("status", "ok", "comms", comms);
    }

    private void shutDown(ShellReplyEnvironment env, Message<ShutdownRequest> message) {
        workbench.interrupt();
        env.reply(Messages.reply(
                MessageType.SHUTDOWN_REPLY,
                message,
                Map.of("status", "ok", "restart", message.getContent().isRestart())));
        end.run();
    }

    /** Waits a moment for messages still to be sent, then another for the sockets' own threads. */
    void drain() {
        publisher().drain(500);
        try {
            Thread.sleep(50);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
