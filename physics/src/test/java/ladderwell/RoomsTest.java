package ladderwell;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;
import java.util.ArrayList;
import java.util.List;

/** Which room may use which: each one only those named before it; the nouns in the root package may use all, none the nouns. */
@AnalyzeClasses(packages = "ladderwell", importOptions = ImportOption.DoNotIncludeTests.class)
class RoomsTest {
    private static final String[] LIBRARIES = {
        "java..",
        "jdk.incubator.vector..",
        "javax.measure..",
        "org.apache.commons.math3..",
        "tech.tablesaw..",
        "tech.units..",
        "org.erdtman..",
        "org.jspecify.."
    };

    private static ArchRule only(String room, String... lower) {
        List<String> allowed = new ArrayList<>(List.of(LIBRARIES));
        allowed.add("ladderwell." + room + "..");
        for (String name : lower) {
            allowed.add("ladderwell." + name + "..");
        }
        return classes()
                .that()
                .resideInAPackage("ladderwell." + room + "..")
                .should()
                .onlyDependOnClassesThat()
                .resideInAnyPackage(allowed.toArray(String[]::new))
                .because("rooms are entered from above only, see DEVELOPERS.md");
    }

    @ArchTest
    static final ArchRule numericKnowsNoPhysics = only("numeric");

    @ArchTest
    static final ArchRule quantity = only("quantity", "numeric");

    @ArchTest
    static final ArchRule formula = only("formula", "quantity", "numeric");

    @ArchTest
    static final ArchRule operator = only("operator", "formula", "quantity", "numeric");

    @ArchTest
    static final ArchRule mode = only("mode", "operator", "formula", "quantity", "numeric");

    @ArchTest
    static final ArchRule gaussian = only("gaussian", "mode", "operator", "formula", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule potential = only("potential", "formula", "quantity", "numeric");

    @ArchTest
    static final ArchRule evidence = only("evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule level = only("level", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule state = only("state", "level", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule classical = only("classical", "numeric");

    @ArchTest
    static final ArchRule motion = only("motion", "state", "level", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule window =
            only("window", "state", "operator", "formula", "level", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule packet = only("packet", "state", "level", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule phasespace = only("phasespace", "state", "evidence", "quantity", "numeric");

    @ArchTest
    static final ArchRule roomsAreFreeOfCycles =
            slices().matching("ladderwell.(*)..").should().beFreeOfCycles();
}
