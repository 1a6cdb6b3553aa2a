package sojourn;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** Holds the house together: who may import whom, which packages are pure, and who may see the whole price table. */
class ArchitectureTest {
    private static final Map<String, List<String>> MAY_IMPORT = mayImport();
    private static final List<String> PURE =
            List.of("numeric", "inference", "regime", "world", "walk", "allocate", "trade", "measure");
    private static JavaClasses ours;

    private static Map<String, List<String>> mayImport() {
        List<String> sections =
                List.of("numeric", "document", "market", "regime", "walk", "allocate", "trade", "measure");
        List<String> stored = and(sections, "strategy");
        List<String> compared = and(stored, "archive");
        List<String> questioned = and(compared, "inference", "compare");
        Map<String, List<String>> table = new LinkedHashMap<>();
        table.put("numeric", List.of());
        table.put("inference", List.of("numeric"));
        table.put("document", List.of("numeric"));
        table.put("market", List.of("numeric", "document"));
        table.put("regime", List.of("numeric", "document"));
        table.put("world", List.of("numeric", "document"));
        table.put("walk", List.of("numeric", "document", "market", "regime"));
        table.put("allocate", List.of("numeric", "document", "market", "walk"));
        table.put("trade", List.of("numeric", "document", "market", "walk", "allocate"));
        table.put("measure", List.of("numeric", "document", "inference", "market", "trade"));
        table.put("strategy", sections);
        table.put("archive", stored);
        table.put("compare", compared);
        table.put("evidence", questioned);
        table.put("latest", and(questioned, "evidence"));
        table.put("report", and(questioned, "evidence", "latest"));
        table.put(
                "cli",
                List.of(
                        "document",
                        "market",
                        "world",
                        "strategy",
                        "archive",
                        "compare",
                        "evidence",
                        "latest",
                        "report"));
        return table;
    }

    private static List<String> and(List<String> rooms, String... more) {
        return Stream.concat(rooms.stream(), Stream.of(more)).toList();
    }

    @BeforeAll
    static void importClasses() {
        ours = new ClassFileImporter()
                .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
                .importPackages("sojourn");
    }

    @Test
    void everyPackageStandsInTheTable() {
        Set<String> found = new TreeSet<>();
        for (JavaClass one : ours) {
            found.add(room(one));
        }
        assertThat(MAY_IMPORT.keySet()).containsAll(found);
    }

    @TestFactory
    Stream<DynamicTest> packagesImportOnlyWhatTheTableAllows() {
        return MAY_IMPORT.entrySet().stream()
                .map(entry -> DynamicTest.dynamicTest(
                        entry.getKey(),
                        () -> classes()
                                .that(resideInAPackage("sojourn." + entry.getKey() + ".."))
                                .should(importOnly(entry.getKey(), entry.getValue()))
                                .allowEmptyShould(true)
                                .check(ours)));
    }

    @TestFactory
    Stream<DynamicTest> purePackagesTouchNoFileConsoleClockOrEnvironment() {
        return PURE.stream()
                .map(name -> DynamicTest.dynamicTest(
                        name,
                        () -> noClasses()
                                .that(resideInAPackage("sojourn." + name + ".."))
                                .should()
                                .dependOnClassesThat()
                                .belongToAnyOf(
                                        java.io.File.class,
                                        java.nio.file.Files.class,
                                        java.nio.file.Path.class,
                                        java.io.Console.class,
                                        java.util.Random.class,
                                        java.util.concurrent.ThreadLocalRandom.class,
                                        java.time.Clock.class,
                                        java.time.Instant.class)
                                .orShould()
                                .accessField(System.class, "out")
                                .orShould()
                                .accessField(System.class, "err")
                                .orShould()
                                .callMethod(System.class, "currentTimeMillis")
                                .orShould()
                                .callMethod(System.class, "nanoTime")
                                .orShould()
                                .callMethod(System.class, "getenv")
                                .orShould()
                                .callMethod(System.class, "getenv", String.class)
                                .orShould()
                                .callMethod(System.class, "getProperty", String.class)
                                .orShould()
                                .callMethod(Math.class, "random")
                                .orShould()
                                .callMethod(java.time.LocalDate.class, "now")
                                .allowEmptyShould(true)
                                .check(ours)));
    }

    @Test
    void nothingThatReachesAResultCallsAFunctionWhoseBitsMayDiffer() {
        List<String> loose = List.of(
                "exp", "log", "log10", "log1p", "expm1", "pow", "sin", "cos", "tan", "atan", "atan2", "sinh", "cosh",
                "tanh", "cbrt");
        ArchCondition<JavaClass> callOnlyExactMath = new ArchCondition<>("call only exact functions of Math") {
            @Override
            public void check(JavaClass item, ConditionEvents events) {
                item.getMethodCallsFromSelf().stream()
                        .filter(call ->
                                call.getTargetOwner().isEquivalentTo(Math.class) && loose.contains(call.getName()))
                        .forEach(call -> events.add(SimpleConditionEvent.violated(call, call.getDescription())));
            }
        };
        classes().should(callOnlyExactMath).check(ours);
    }

    @Test
    void onlyTradingAndWhatStandsBelowSeesTheWholePriceTable() {
        noClasses()
                .that(resideInAPackage("sojourn.walk..").or(resideInAPackage("sojourn.allocate..")))
                .should()
                .dependOnClassesThat()
                .haveFullyQualifiedName("sojourn.market.FillPrices")
                .orShould()
                .dependOnClassesThat()
                .haveFullyQualifiedName("sojourn.market.TimeAxis")
                .check(ours);
    }

    @Test
    void onlyRegimeAndEvidenceSeeSmoothedProbabilities() {
        noClasses()
                .that()
                .resideOutsideOfPackages("sojourn.regime..", "sojourn.evidence..")
                .should()
                .dependOnClassesThat()
                .haveFullyQualifiedName("sojourn.regime.Smoothed")
                .orShould()
                .dependOnClassesThat()
                .haveFullyQualifiedName("sojourn.regime.Viterbi")
                .check(ours);
    }

    @Test
    void theSeamsHaveOnlyHonestImplementations() {
        classes()
                .that()
                .implement("sojourn.walk.Signal")
                .should()
                .haveFullyQualifiedName("sojourn.walk.RegimeTimeline")
                .check(ours);
        classes()
                .that()
                .implement("sojourn.trade.FillRule")
                .should()
                .haveNameMatching("sojourn\\.trade\\.(NextClose|NextOpen)")
                .check(ours);
    }

    /** What stands in a sub-package is public for its own package alone: callers start at the front door. */
    @Test
    void subPackagesAreUsedOnlyFromWithinTheirOwnPackage() {
        classes()
                .that(resideInAPackage("sojourn.."))
                .should(stayOutOfOthersSubPackages())
                .check(ours);
    }

    @Test
    void onlyTheDoorsTouchFiles() {
        noClasses()
                .that()
                .resideOutsideOfPackages("sojourn.document..", "sojourn.market..", "sojourn.archive..", "sojourn.cli..")
                .should()
                .dependOnClassesThat()
                .belongToAnyOf(java.io.File.class, java.nio.file.Files.class)
                .check(ours);
    }

    @Test
    void onlyTheShellEndsTheProcess() {
        noClasses()
                .that()
                .doNotHaveFullyQualifiedName("sojourn.cli.Main")
                .should()
                .callMethod(System.class, "exit", int.class)
                .check(ours);
    }

    private static ArchCondition<JavaClass> importOnly(String own, List<String> allowed) {
        return new ArchCondition<>("import only " + allowed) {
            @Override
            public void check(JavaClass item, ConditionEvents events) {
                item.getDirectDependenciesFromSelf().stream()
                        .filter(dependency ->
                                dependency.getTargetClass().getPackageName().startsWith("sojourn."))
                        .filter(dependency -> !room(dependency.getTargetClass()).equals(own)
                                && !allowed.contains(room(dependency.getTargetClass())))
                        .forEach(dependency ->
                                events.add(SimpleConditionEvent.violated(dependency, dependency.getDescription())));
            }
        };
    }

    private static ArchCondition<JavaClass> stayOutOfOthersSubPackages() {
        return new ArchCondition<>("stay out of other packages' sub-packages") {
            @Override
            public void check(JavaClass item, ConditionEvents events) {
                item.getDirectDependenciesFromSelf().stream()
                        .filter(dependency ->
                                dependency.getTargetClass().getPackageName().matches("sojourn\\.[a-z]+\\..+"))
                        .filter(dependency -> !room(dependency.getTargetClass()).equals(room(item)))
                        .forEach(dependency ->
                                events.add(SimpleConditionEvent.violated(dependency, dependency.getDescription())));
            }
        };
    }

    private static String room(JavaClass one) {
        String name = one.getPackageName();
        return name.equals("sojourn") ? "" : name.substring("sojourn.".length()).split("\\.", 2)[0];
    }
}
