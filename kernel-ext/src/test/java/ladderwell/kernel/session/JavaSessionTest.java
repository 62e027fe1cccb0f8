package ladderwell.kernel.session;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

public class JavaSessionTest {
    private static JavaSession session;

    @BeforeAll
    static void start() {
        session = new JavaSession(List.of("java.util.*", "no.such.place.*", "static java.lang.Math.*"));
    }

    @AfterAll
    static void end() {
        session.close();
    }

    private static Object value(String text) {
        JavaEnd end = session.run(text, 3, 1);
        return assertInstanceOf(JavaEnd.Done.class, end, () -> end.toString())
                .value()
                .orElseThrow();
    }

    private static JavaEnd.Failed failure(String text) {
        return assertInstanceOf(JavaEnd.Failed.class, session.run(text, 3, 1));
    }

    private static String lines(JavaEnd.Failed failed) {
        return String.join("\n", failed.traceback()).replaceAll("\u001b\\[[0-9;]*m", "");
    }

    @Test
    void theLastExpressionGivesItsValueAsAnObject() {
        assertEquals(2, value("1+1"));
        assertEquals(List.of(1, 2), value("int a = 1;\nList.of(a, 2)"));
        assertEquals(5, value("int assigned = 1; assigned = 5"));
        assertEquals("a;", value("String.valueOf(\"a;\") /* no; end */"));
        assertEquals(6, value("\"\"\"\n  a;\n  \"b\n  \"\"\".length() // ;"));
        assertEquals(Math.PI, value("PI // the ratio; of a circle"));
    }

    @Test
    void statementsAndDeclarationsGiveNoValue() {
        for (String text : List.of(
                "1+1;",
                "int b = 3",
                "int c = 3;",
                "for (int i = 0; i < 2; i++) { }",
                "",
                "// only a remark",
                "System.out.print(\"\")")) {
            JavaEnd.Done done = assertInstanceOf(JavaEnd.Done.class, session.run(text, 1, 1), text);
            assertEquals(Optional.empty(), done.value(), text);
            assertFalse(done.isNull(), text);
        }
    }

    @Test
    void anExpressionThatIsNullSaysSo() {
        assertTrue(assertInstanceOf(JavaEnd.Done.class, session.run("(String) null", 1, 1))
                .isNull());
        value("String nothing = null; 1");
        assertTrue(assertInstanceOf(JavaEnd.Done.class, session.run("nothing", 1, 1))
                .isNull());
    }

    @Test
    void aFailingDeclarationKeepsTheOldValue() {
        value("int kept = 5; kept");
        failure("int kept = 1 / 0;");
        assertEquals(5, value("kept"));
        failure("String kept = List.of().get(0).toString();");
        assertEquals(5, value("kept + 0"));
        failure("int neverThere = 1 / 0;");
        assertTrue(session.variable("neverThere").isEmpty());
        assertEquals("CompilationError", failure("neverThere").name());
    }

    @Test
    void aTracebackEndsAtTheUsersOwnLine() {
        JavaEnd.Failed failed = failure("int d = 1;\n\n  d = d / (d - 1);");
        assertEquals("java.lang.ArithmeticException", failed.name());
        assertEquals("/ by zero", failed.message());
        assertEquals("java.lang.ArithmeticException: / by zero\n    at cell [3], line 3", lines(failed));
    }

    @Test
    void aTracebackNamesTheCellOfEveryMethod() {
        session.run("int third(List<Integer> list) {\n    return list.get(3);\n}", 1, 1);
        String lines = lines(assertInstanceOf(JavaEnd.Failed.class, session.run("\nthird(new ArrayList<>())", 2, 4)));
        assertTrue(lines.contains("at java.base/java.util.ArrayList.get"), lines);
        assertTrue(lines.contains("\n    at third (cell [1], line 2)\n"), lines);
        assertTrue(lines.endsWith("\n    at cell [2], line 5"), lines);
    }

    @Test
    void aTracebackHoldsCauses() {
        String lines = lines(
                failure(
                        "try { List.of().get(0); }\ncatch (RuntimeException e) {\n  throw new IllegalStateException(\"outer\", e); }"));
        assertTrue(
                lines.startsWith(
                        "java.lang.IllegalStateException: outer\n    at cell [3], line 3\nCaused by: java.lang."),
                lines);
    }

    @Test
    void aCompilerErrorMarksThePlace() {
        JavaEnd.Failed failed = failure("int e = 1;\nint f = \"a\";");
        assertEquals("CompilationError", failed.name());
        assertTrue(lines(failed).startsWith("cell [3], line 2: incompatible types"), lines(failed));
        assertTrue(lines(failed).endsWith("    int f = \"a\";\n            ^^^"), lines(failed));
    }

    @Test
    void nothingRunsWhenTheTextDoesNotParse() {
        value("int untouched = 1; untouched");
        failure("untouched = 2;\nint g = (;");
        failure("untouched = 2;\nvoid open() {");
        assertEquals(1, value("untouched"));
    }

    @Test
    void aSealedFamilyMayStandInOneCell() {
        assertEquals(
                4.0,
                value(
                        "sealed interface Shape permits Square, Disc {}\nrecord Square(double side) implements Shape {}\nrecord Disc(double r) implements Shape {}\nnew Square(2).side() * 2"));
    }

    @Test
    void aMissingTypeIsAnErrorAtTheEndOfTheCell() {
        String lines = lines(failure("1+1;\nclass Lonely extends Missing {}"));
        assertEquals("cell [3], line 2: Lonely needs class Missing, which is not defined", lines);
    }

    @Test
    void aCallOfWhatIsNotThereIsAnError() {
        assertInstanceOf(JavaEnd.Done.class, session.run("int early() { return late(); }", 1, 1));
        assertTrue(failure("early()").message().contains("late()"));
        value("int late() { return 7; }\n1");
        assertEquals(7, value("early()"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "while (true) { }",
                "Thread.sleep(600_000);",
                "long h = 0; long until = System.nanoTime() + 5_000_000_000L; while (System.nanoTime() < until) { try { h++; } catch (Throwable t) { h--; } }",
                "synchronized (new Object()) { new java.util.concurrent.CountDownLatch(1).await(); }",
                "new java.util.concurrent.CountDownLatch(1).await();"
            })
    void aRunningTextIsStopped(String text) throws Exception {
        CompletableFuture<JavaEnd> running = CompletableFuture.supplyAsync(() -> session.run(text, 1, 1));
        Thread.sleep(700);
        session.stop();
        JavaEnd end = running.get(20, TimeUnit.SECONDS);
        // Before Java 20 a loop that catches everything may catch every stop; then it is left behind.
        boolean mayStay = text.contains("Throwable") && Runtime.version().feature() < 20;
        assertTrue(
                end.equals(new JavaEnd.Stopped(false)) || mayStay && end.equals(new JavaEnd.Stopped(true)),
                end.toString());
        session.ready();
        assertEquals(2, value("1+1"));
    }

    @Test
    void codeThatHeedsNothingIsLeftBehind() throws Exception {
        CompletableFuture<JavaEnd> running = CompletableFuture.supplyAsync(
                () -> session.run("ladderwell.kernel.session.JavaSessionTest.deaf()", 1, 1));
        Thread.sleep(700);
        session.stop();
        assertInstanceOf(JavaEnd.Stopped.class, running.get(20, TimeUnit.SECONDS));
        session.ready();
        assertEquals(2, value("1+1"));
        end = true;
    }

    private static volatile boolean end;

    public static void deaf() {
        while (!end) {
            try {
                Thread.sleep(1000);
            } catch (Throwable e) {
                // Heeds nothing, as some libraries do.
            }
        }
    }

    @Test
    void definedVariablesAreTypedAndReplaceable() {
        session.define("given", List.class, List.of(1));
        assertEquals(1, value("given.size()"));
        session.define("given", List.class, List.of(1, 2));
        assertEquals(2, value("given.size()"));
        session.define("given", String.class, "abc");
        assertEquals(3, value("given.length()"));
        session.drop("given");
        assertEquals("CompilationError", failure("given").name());
    }

    @Test
    void variablesOfTheSessionCanBeRead() {
        value("double nbar = 9.5; nbar");
        assertEquals(
                new Variable("nbar", double.class, Optional.of(9.5)),
                session.variable("nbar").orElseThrow());
        session.run("var nbar = List.of(nbar);", 1, 1);
        session.run("String nbar = \"text\";", 1, 1);
        assertEquals(Optional.of("text"), session.variable("nbar").orElseThrow().value());
    }

    @Test
    void deepRecursionAndBrokenClassesAreErrorsLikeOthers() {
        assertEquals(
                "java.lang.StackOverflowError",
                failure("int deep(int n) { return deep(n + 1) + 1; }\ndeep(0)").name());
        assertEquals(
                "java.lang.ExceptionInInitializerError",
                failure("class Bad { static int v = 1 / Integer.parseInt(\"0\"); }\nBad.v")
                        .name());
        assertEquals(
                "java.lang.OutOfMemoryError",
                failure(
                                "long[][] all = new long[100000][]; for (int i = 0; i < all.length; i++) all[i] = new long[1 << 27];")
                        .name());
        assertEquals(2, value("1+1"));
    }

    @Test
    void exitDoesNotEndTheProcess() {
        assertTrue(failure("long big = 1L << 40; double half = 0.5; System.exit(7);")
                .message()
                .startsWith("System.exit(7) "));
        assertTrue(failure("java.util.stream.IntStream.of(8).forEach(System::exit)")
                .message()
                .startsWith("System.exit(8) "));
    }

    @Test
    void completionKnowsTheSessionAndTheLinesAbove() {
        value("int nbarOfTrap = 3; 1");
        assertEquals(List.of("nbarOfTrap"), texts(session.suggestions("nbarOfT", 7)));
        String text = "var names = new ArrayList<String>();\nnames.ensure";
        Suggestions found = session.suggestions(text, text.length());
        assertEquals(List.of("ensureCapacity("), texts(found));
        assertEquals(text.indexOf("ensure"), found.start());
        assertEquals("function", found.list().get(0).kind());
        String early = "import java.util.concurrent.*;\nint m() { return 1; }\nMath.hypo + 3";
        Suggestions math = session.suggestions(early, early.indexOf(" +"));
        assertEquals(List.of("hypot("), texts(math));
        assertEquals(early.indexOf("hypo"), math.start());
    }

    private static List<String> texts(Suggestions suggestions) {
        List<String> texts = new ArrayList<>();
        suggestions.list().forEach(suggestion -> texts.add(suggestion.text()));
        return texts;
    }

    @Test
    void documentationGivesSignatures() {
        assertEquals(
                List.of("double Math.hypot(double x, double y)"), session.documentation("Math.hypot(1, 2)", 7, false));
        assertEquals(List.of("double Math.hypot(double x, double y)"), session.documentation("Math.hypot", 10, false));
        assertTrue(session.documentation("int i = 1;\nList", 14, false).get(0).contains("java.util.List"));
        assertEquals(List.of(), session.documentation("noSuchThing", 3, true));
    }

    @Test
    void parsingTellsWhetherMoreMustFollow() {
        assertEquals(Optional.of(true), session.parses("1+1"));
        assertEquals(Optional.of(true), session.parses("int i = 1; i"));
        assertEquals(Optional.of(true), session.parses(""));
        assertEquals(Optional.empty(), session.parses("for (int i = 0; i < 3; i++) {"));
        assertEquals(Optional.empty(), session.parses("/* open"));
        assertEquals(Optional.of(false), session.parses("int i = )"));
    }
}
