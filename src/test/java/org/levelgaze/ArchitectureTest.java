package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchRule;
import counterexamples.modules.WrongArrows;
import java.util.List;
import java.util.function.Function;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.springframework.modulith.core.ApplicationModules;
import org.springframework.modulith.core.Violations;

/** Holds every rule against the program, and against what it must find. */
class ArchitectureTest {

    private static final JavaClasses PROGRAM = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("org.levelgaze");

    private static final JavaClasses TESTS = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.ONLY_INCLUDE_TESTS)
            .importPackages("org.levelgaze");

    private static final JavaClasses COUNTEREXAMPLES = new ClassFileImporter().importPackages("counterexamples");

    @Test
    void modulesKeepToTheirArrows() {
        ApplicationModules.of(Levelgaze.class).verify();
    }

    @Test
    void anArrowThatNobodyDeclaredIsFound() {
        ApplicationModules wrong = ApplicationModules.of(WrongArrows.class, new ImportOption.OnlyIncludeTests());

        assertThatThrownBy(wrong::verify)
                .isInstanceOf(Violations.class)
                .hasMessageContaining("Module 'first' depends on module 'second'");
    }

    @ParameterizedTest
    @MethodSource("ofTheProgram")
    void theProgramKeepsTo(String name, Function<ArchitectureRules, ArchRule> rule) {
        rule.apply(new ArchitectureRules("org.levelgaze")).check(PROGRAM);
    }

    @ParameterizedTest
    @MethodSource("ofTheTests")
    void theTestsKeepTo(String name, Function<ArchitectureRules, ArchRule> rule) {
        rule.apply(new ArchitectureRules("org.levelgaze")).check(TESTS);
    }

    @ParameterizedTest
    @MethodSource({"ofTheProgram", "ofTheTests"})
    void everyRuleFindsWhatItForbids(
            String name, Function<ArchitectureRules, ArchRule> rule, List<String> mustBeFound) {
        List<String> found = rule.apply(new ArchitectureRules("counterexamples"))
                .evaluate(COUNTEREXAMPLES)
                .getFailureReport()
                .getDetails();

        assertThat(mustBeFound)
                .isNotEmpty()
                .allSatisfy(each ->
                        assertThat(found).anySatisfy(line -> assertThat(line).contains(each)));
    }

    static Stream<Arguments> ofTheProgram() {
        return Stream.of(
                rule("a pure engine", ArchitectureRules::agreementIsPure, "StringUtils", "words.Mutable"),
                rule("pure pictures", ArchitectureRules::plotIsPure, "java.sql.Connection", "java.time.Clock"),
                rule("pure reading", ArchitectureRules::readingIsPure, "stereotype.Component"),
                rule("pure sentences", ArchitectureRules::sentencesArePure, "MessageSource"),
                rule("entities of its modules' own", ArchitectureRules::entitiesAreNotPublic, "PublicEntity"),
                rule("repositories of its modules' own", ArchitectureRules::repositoriesAreNotPublic, "PublicStore"),
                rule("controllers for requests alone", ArchitectureRules::controllersAreNotPublic, "PublicController"),
                rule(
                        "time from the clock",
                        ArchitectureRules::timeComesFromTheClock,
                        "LooksAtTheWall.today()",
                        "LooksAtTheWall.todayThere()",
                        "LooksAtTheWall.instant()",
                        "LooksAtTheWall.millis()",
                        "LooksAtTheWall.date()",
                        "LooksAtTheWall.clock()",
                        "LooksAtTheWall.zone()"),
                rule("objects without setters", ArchitectureRules::nothingHasSetters, "Mutable.setName"),
                rule("names that say something", ArchitectureRules::namesSayWhatIsInside, "PieceManager"),
                rule("null that is said", ArchitectureRules::packagesAreNullMarked, "unmarked.Unmarked"));
    }

    static Stream<Arguments> ofTheTests() {
        return Stream.of(
                rule("null that is said", ArchitectureRules::packagesAreNullMarked, "unmarked.Unmarked"),
                rule("tests that are run", ArchitectureRules::testsAreCalledTest, "SuiteOfNothing.neverRuns"));
    }

    private static Arguments rule(String name, Function<ArchitectureRules, ArchRule> rule, String... mustBeFound) {
        return Arguments.of(name, rule, List.of(mustBeFound));
    }
}
