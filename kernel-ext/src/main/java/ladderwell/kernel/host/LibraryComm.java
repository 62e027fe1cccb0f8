package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.kernel.comm.Comm;
import io.github.spencerpark.jupyter.kernel.comm.CommManager;
import io.github.spencerpark.jupyter.messages.Message;
import io.github.spencerpark.jupyter.messages.MessageType;
import io.github.spencerpark.jupyter.messages.comm.CommCloseCommand;
import io.github.spencerpark.jupyter.messages.comm.CommMsgCommand;
import java.util.Map;
import java.util.function.Consumer;
import ladderwell.kernel.picture.PageLibrary;

/**
 * Answers a page that holds a picture but not the plotting library, as after a reload with only a later cell run again: the
 * page opens a comm, and gets the library as the data of one message.
 */
final class LibraryComm extends Comm {
    private LibraryComm(CommManager manager, String id, String target) {
        super(manager, id, target);
    }

    /** From now on such comms are answered through {@code publish}. */
    static void answer(CommManager manager, Consumer<Message<?>> publish) {
        manager.registerTarget(PageLibrary.COMM_TARGET, (comms, id, target, opened) -> {
            publish.accept(Messages.broadcast(
                    MessageType.COMM_MSG_COMMAND,
                    opened,
                    Map.of("comm_id", id, "data", Map.of("script", PageLibrary.javascript()))));
            return new LibraryComm(comms, id, target);
        });
    }

    @Override
    protected void onMessage(Message<CommMsgCommand> message) {
        // The page asks by opening and says nothing more.
    }

    @Override
    protected void onClose(Message<CommCloseCommand> closing, boolean sending) {
        // Nothing is held for it.
    }
}
