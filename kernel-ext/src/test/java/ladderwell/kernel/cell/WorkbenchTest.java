package ladderwell.kernel.cell;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class WorkbenchTest {
    private Workbench bench;
    private int number;
    private List<String> said;

    /** Writes down what a cell says, adjacent pieces of a stream as one. */
    private final class Script implements CellOutput {
        private final List<String> lines = new ArrayList<>();

        private void add(String head, String text) {
            int last = lines.size() - 1;
            if (last >= 0 && lines.get(last).startsWith(head)) {
                lines.set(last, lines.get(last) + text);
            } else {
                lines.add(head + text);
            }
        }

        @Override
        public void stdout(String text) {
            add("out ", text);
        }

        @Override
        public void stderr(String text) {
            add("err ", text);
        }

        @Override
        public void display(MimeBundle bundle, Optional<String> displayId) {
            lines.add("display " + bundle.plainText()
                    + displayId.map(id -> " as " + id).orElse(""));
        }

        @Override
        public void update(MimeBundle bundle, String displayId) {
            lines.add("update " + bundle.plainText() + " as " + displayId);
        }

        @Override
        public void clear(boolean wait) {
            lines.add("clear " + wait);
        }
    }

    @BeforeEach
    void open() {
        bench = new Workbench(
                new SmallSentences(),
                new SmallRenderer(),
                List.of("java.util.*", "static ladderwell.kernel.cell.Show.*"));
    }

    @AfterEach
    void close() {
        bench.close();
    }

    private CellEnd run(String code) {
        Script script = new Script();
        said = script.lines;
        return bench.run(code, ++number, script);
    }

    private String result(String code) {
        CellEnd end = run(code);
        return assertInstanceOf(CellEnd.Done.class, end, () -> code + " gave " + end)
                .result()
                .map(MimeBundle::plainText)
                .orElse("");
    }

    private CellEnd.Failed failure(String code) {
        return assertInstanceOf(CellEnd.Failed.class, run(code));
    }

    private Object value(String name) {
        return bench.names().find(name).orElseThrow().value();
    }

    @Test
    void earlierResultsAreDisplayedAndTheLastIsTheResult() {
        assertEquals("3", result("%count a: 1\n%count b: 2\n1 + 2"));
        assertEquals(List.of("display 1", "display 2"), said);
        assertEquals("5", result("%%declare\ncount a: 4\ncount b: 5"));
        assertEquals(List.of("display 4"), said);
    }

    @Test
    void sentencesAloneDoNotStartJava() {
        assertEquals("1", result("%count a: 1"));
        assertEquals("3", result("%count b: a plus 2"));
        assertTrue(Thread.getAllStackTraces().keySet().stream()
                .noneMatch(t -> t.getName().equals("java session")));
        assertEquals(Optional.empty(), bench.names().find("nothing"));
    }

    @Test
    void declaredNamesAreTypedJavaVariables() {
        result("%count a: 41\n%word w: text");
        assertEquals("42", result("Integer copy = a; copy + 1"));
        assertEquals("4", result("w.length()"));
        result("%count a: 7");
        assertEquals("7", result("a"));
        assertEquals("Integer", result("a.getClass().getSimpleName()"));
    }

    @Test
    void methodsSeeTheLatestValue() {
        result("%count a: 1\nint twice() { return 2 * a; }");
        result("%count a: 21");
        assertEquals("42", result("twice()"));
    }

    @Test
    void javaValuesAreReadInBraces() {
        result("double nbar = 9.5;\nint plus(int n) { return n + 1; }");
        assertEquals("9", result("%count n: {nbar}"));
        assertEquals("10", result("%count m: {plus(n)}"));
        assertEquals(
                "Java cannot evaluate {no + 1}: cannot find symbol: variable no",
                failure("%count n: {no + 1}").message());
        assertEquals(
                "Java cannot evaluate {1 / 0}: / by zero",
                failure("%count n: {1 / 0}").message());
        assertEquals(
                "{int i = 3;} has no value", failure("%count n: {int i = 3;}").message());
        assertEquals(9, value("n"));
    }

    @Test
    void javaAssignmentsToDeclaredNamesAreSeenBySentences() {
        result("%count a: 1");
        result("a = 30;");
        assertEquals("32", result("%count b: a plus 2"));
        result("Integer mine = 5;");
        assertEquals("6", result("%count c: mine plus 1"));
        assertEquals("java", bench.names().find("mine").orElseThrow().noun());
    }

    @Test
    void aNameTakenByAnotherTypeIsRefused() {
        result("String taken = \"\";\nInteger free = 1;");
        assertEquals(
                "taken is already a Java variable of type String; choose another name for this count",
                failure("%count taken: 1").message());
        assertEquals("2", result("%count free: 2"));
        assertEquals("2", result("free"));
        result("%word w: x");
        assertEquals(
                "w is already declared as word; choose another name for this count",
                failure("%count w: 1").message());
        for (String name : List.of("3a", "int", "a-b", "_")) {
            assertTrue(failure("%count " + name + ": 1").message().startsWith("\"" + name + "\" cannot be a name"));
        }
        assertEquals("1", result("%count ψ: 1"));
    }

    @Test
    void aFailedCellChangesNoDeclaredName() {
        result("%count a: 1\nInteger j = 10;");
        failure("%count a: 2\n%count fresh: 3\n%nonsense");
        assertEquals(1, value("a"));
        assertTrue(bench.names().find("fresh").isEmpty());
        failure("%count a: 2\n%count fresh: 3\n%count j: 4\nint sum = a + fresh + j;\nint q = 1 / 0;");
        assertEquals(1, value("a"));
        assertEquals("1", result("a"));
        assertEquals("10", result("j"));
        assertEquals("CompilationError", failure("fresh").name());
        failure("a = 5; int q = 1 / 0;");
        assertEquals(1, value("a"));
        assertEquals("1", result("a"));
        failure("%count a: 2\n%break");
        assertEquals(
                List.of("a"),
                bench.names().declared().stream().map(Names.Named::name).toList());
    }

    @Test
    void whatWasDeclaredBeforeAMistakeIsShown() {
        CellEnd.Failed failed = failure("%count a: 1\n%nonsense");
        assertEquals(List.of("display 1"), said);
        assertEquals("Declaration", failed.name());
        assertEquals("line 1: no sentence \"nonsense\"; expected count", failed.message());
        assertEquals(List.of("%nonsense", " ^"), failed.traceback().subList(0, 2));
    }

    @Test
    void aNameThatJavaRedefinesIsJavas() {
        result("%count a: 1\na");
        result("String a = \"text\";");
        assertEquals("java", bench.names().find("a").orElseThrow().noun());
        assertFalse(run("%count a: 2") instanceof CellEnd.Done);
    }

    @Test
    void streamsAndDisplaysKeepTheirOrder() {
        assertEquals(
                "7",
                result(
                        "System.out.print(\"a\"); System.out.print(\"b\"); System.err.print(\"c\"); display(1);\n"
                                + "System.out.print(\"d\"); display(List.of(2), \"spot\"); updateDisplay(3, \"spot\"); clearOutput(true);\n7"));
        assertEquals(
                List.of(
                        "out ab",
                        "err c",
                        "display 1",
                        "out d",
                        "display [2] as spot",
                        "update 3 as spot",
                        "clear true"),
                said);
        result("%chat hello");
        assertEquals(List.of("out hello", "display shown as chat", "update shown anew as chat"), said);
    }

    @Test
    void listsCarryHtml() {
        CellEnd.Done done = (CellEnd.Done) run("List.of(1, 2)");
        assertEquals(
                List.of("text/plain", "text/html", "application/json"),
                List.copyOf(done.result().orElseThrow().data().keySet()));
    }

    @Test
    void valuesThatCannotBeShownAreNamed() {
        assertTrue(result(
                        "class Mute { public String toString() { throw new IllegalStateException(\"mute\"); } }\nnew Mute()")
                .endsWith("Mute (cannot be shown: java.lang.IllegalStateException: mute)"));
        assertEquals("null", result("(Object) null"));
    }

    @Test
    void anExpressionIsEvaluatedWithoutOutput() {
        result("int x = 3;");
        assertEquals(new CellEnd.Done(Optional.of(MimeBundle.plain("4"))), bench.evaluate("x + 1"));
        CellEnd.Failed failed = assertInstanceOf(CellEnd.Failed.class, bench.evaluate("x / 0"));
        assertTrue(
                failed.traceback().get(failed.traceback().size() - 1).endsWith("at the expression"), failed.toString());
    }

    private CellEnd interrupted(String code, int afterMillis) throws Exception {
        // as the kernel does: on a busy machine the interrupt may come before the cell's thread has begun
        bench.announceCell();
        CompletableFuture<CellEnd> running = CompletableFuture.supplyAsync(() -> run(code));
        Thread.sleep(afterMillis);
        bench.interrupt();
        return running.get(30, TimeUnit.SECONDS);
    }

    @Test
    void anInterruptEndsSentencesAndJavaAlike() throws Exception {
        result("%count a: 1\na");
        for (String code : List.of(
                "%wait",
                "while (true) { }", "%count b: {Thread.sleep(600000)}", "Thread.sleep(600_000);\n%count never: 1")) {
            assertInstanceOf(CellEnd.Interrupted.class, interrupted(code, 500), code);
            assertEquals("1", result("a"));
        }
        assertTrue(bench.names().find("never").isEmpty());
        bench.interrupt();
        assertEquals("2", result("1 + 1"));
    }

    @Test
    void anInterruptBetweenACellsAnnouncementAndItsFirstStepIsNotLost() throws Exception {
        bench.announceCell();
        bench.interrupt();
        assertInstanceOf(CellEnd.Interrupted.class, run("%wait"));
        assertEquals("2", result("1 + 1"));
    }

    @Test
    void anInterruptDoesNotHaveToWaitForJavaToStart() throws Exception {
        assertInstanceOf(CellEnd.Interrupted.class, interrupted("1 + 1", 1));
        assertEquals("2", result("1 + 1"));
    }

    @Test
    void whatWasThereAtAnInterruptIsKept() throws Exception {
        assertInstanceOf(CellEnd.Interrupted.class, interrupted("%slowly part", 300));
        assertEquals(List.of("display what there was"), said);
        assertEquals(1, value("part"));
    }

    @Test
    void completionAndInspectionGoToTheLanguageAtTheCursor() {
        result("%count trapDepth: 1");
        String cell = "%count b: {trapD}\nString s = trapD";
        assertEquals("[count]", texts(bench.complete("%cou", 4)));
        assertEquals(
                new Completion(11, 16, List.of(new Completion.Candidate("trapDepth", "instance"))),
                bench.complete(cell, 16));
        Completion inJava = bench.complete(cell, cell.length());
        assertEquals("[trapDepth]", texts(inJava));
        assertEquals(cell.length() - 5, inJava.start());
        assertEquals(Optional.of(MimeBundle.plain("count: a whole number")), bench.inspect("%count b: 1", 3, 0));
        assertEquals(
                "Integer trapDepth\n1",
                bench.inspect("%count b: {trapDepth}", 13, 0).orElseThrow().plainText());
        assertEquals(
                "int Math.abs(int a)",
                bench.inspect("Math.abs(-3)", 6, 0)
                        .orElseThrow()
                        .plainText()
                        .lines()
                        .findFirst()
                        .orElseThrow());
        assertEquals(Optional.empty(), bench.inspect("", 0, 0));
    }

    private static String texts(Completion completion) {
        return completion.candidates().stream()
                .map(Completion.Candidate::text)
                .toList()
                .toString();
    }

    @Test
    void completenessKnowsBothLanguages() {
        assertEquals(Completeness.COMPLETE, bench.completeness("%count a: 1"));
        assertEquals(Completeness.COMPLETE, bench.completeness(""));
        assertEquals(Completeness.INCOMPLETE, bench.completeness("%%declare\ncount a: 1"));
        assertEquals(Completeness.INCOMPLETE, bench.completeness("%%declare\n"));
        assertEquals(Completeness.COMPLETE, bench.completeness("%%declare\ncount a: 1\n"));
        assertEquals(Completeness.INCOMPLETE, bench.completeness("%count a: 1\nint f() {"));
        assertEquals(Completeness.INVALID, bench.completeness("int i = )"));
    }

    @Test
    void theStreamsOfTheProcessAreGivenBack() {
        PrintStream during = System.out;
        bench.close();
        assertFalse(System.out == during);
    }

    @Test
    void readingInputEndsAtOnce() {
        assertEquals("-1", result("System.in.read()"));
    }
}
