package emberline;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchRule;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The arrows of the house: every step uses earlier steps only. Each rule is also run on classes
 * that break it (package {@code emberline.broken}), to show that it can fail.
 */
class ArrowsTest {

    private static final List<String> CHAIN =
            List.of(
                    "spectrum",
                    "catalogue",
                    "read",
                    "prepare",
                    "measure",
                    "place",
                    "judge",
                    "survey",
                    "reports",
                    "cli");

    private static final JavaClasses PRODUCT =
            new ClassFileImporter()
                    .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
                    .importPackages("emberline");

    private static final JavaClasses BROKEN =
            new ClassFileImporter().importPackages("emberline.broken");

    static List<ArchRule> rules() {
        List<ArchRule> rules = new ArrayList<>();
        for (int i = 0; i < CHAIN.size() - 1; i++) {
            String[] later =
                    CHAIN.subList(i + 1, CHAIN.size()).stream()
                            .map(step -> "emberline." + step + "..")
                            .toArray(String[]::new);
            rules.add(
                    noClasses()
                            .that()
                            .resideInAPackage("emberline." + CHAIN.get(i) + "..")
                            .should()
                            .dependOnClassesThat()
                            .resideInAnyPackage(later)
                            .allowEmptyShould(true));
        }
        rules.add(
                noClasses()
                        .that()
                        .resideInAnyPackage("emberline.read..", "emberline.prepare..")
                        .should()
                        .dependOnClassesThat()
                        .resideInAPackage("emberline.catalogue.."));
        return rules;
    }

    @ParameterizedTest
    @MethodSource("rules")
    void noStepUsesALaterStep(ArchRule rule) {
        rule.check(PRODUCT);
    }

    @Test
    void everyClassStandsInAKnownStep() {
        classes()
                .should()
                .resideInAnyPackage(
                        CHAIN.stream()
                                .map(step -> "emberline." + step + "..")
                                .toArray(String[]::new))
                .check(PRODUCT);
    }

    private static ArchRule noMutableStatics() {
        return fields().that().areStatic().should().beFinal();
    }

    private static ArchRule noConsole() {
        return noClasses()
                .that()
                .resideOutsideOfPackage("emberline.cli..")
                .should()
                .accessField(System.class, "out")
                .orShould()
                .accessField(System.class, "err");
    }

    private static ArchRule noDumpingGrounds() {
        return noClasses()
                .should()
                .haveNameMatching(".*(Util|Utils|Helper|Helpers|Manager|Common|Misc)");
    }

    private static ArchRule backwards() {
        return noClasses()
                .that()
                .resideInAPackage("emberline.broken.spectrum..")
                .should()
                .dependOnClassesThat()
                .resideInAPackage("emberline.broken.place..");
    }

    @Test
    void staticFieldsAreFinal() {
        noMutableStatics().check(PRODUCT);
    }

    @Test
    void onlyTheCommandLineTalksToTheConsole() {
        noConsole().check(PRODUCT);
    }

    @Test
    void nothingIsNamedAfterADrawer() {
        noDumpingGrounds().check(PRODUCT);
    }

    @Test
    void theRulesCanFail() {
        for (ArchRule rule :
                List.of(noMutableStatics(), noConsole(), noDumpingGrounds(), backwards())) {
            assertTrue(rule.evaluate(BROKEN).hasViolation(), rule.getDescription());
        }
    }
}
