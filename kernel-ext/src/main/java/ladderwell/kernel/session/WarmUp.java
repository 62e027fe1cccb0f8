package ladderwell.kernel.session;

import java.util.List;
import java.util.function.BooleanSupplier;

/**
 * Practice for the compiler that cells go through. Fresh from its start it takes ten times as long as after some hundred
 * snippets, so a session of its own is given some while nobody is waiting.
 */
public final class WarmUp {
    private static final int ROUNDS = 160;
    private static final int PAUSE_MILLIS = 25;
    private static final int FIRST_PAUSE_MILLIS = 1500;
    private static final List<String> TEXTS = List.of(
            "1+1",
            "int number = 3;",
            "sqrt(2.0) + number",
            "List<Integer> list = new ArrayList<>(List.of(1, 2));",
            "for (int i = 0; i < 3; i++) { list.add(i); }",
            "list.stream().map(i -> i + 1).toList()");

    private WarmUp() {}

    /**
     * Practises, now and then, until it has been done or the thread is interrupted.
     *
     * @param imports as in {@link JavaSession}
     * @param idle whether nobody is waiting for anything
     */
    public static void practise(List<String> imports, BooleanSupplier idle) throws InterruptedException {
        Thread.sleep(FIRST_PAUSE_MILLIS);
        waitFor(idle);
        try (JavaSession session = new JavaSession(imports)) {
            for (int round = 0; round < ROUNDS; round++) {
                waitFor(idle);
                JavaEnd unused = session.run(TEXTS.get(round % TEXTS.size()), 0, 1);
            }
        }
    }

    private static void waitFor(BooleanSupplier idle) throws InterruptedException {
        do {
            Thread.sleep(PAUSE_MILLIS);
        } while (!idle.getAsBoolean());
    }
}
