package emberline.reports;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import org.junit.jupiter.api.Test;

class ReportsArrowsTest {

    private static final JavaClasses REPORTS =
            new ClassFileImporter()
                    .withImportOption(new ImportOption.DoNotIncludeTests())
                    .importPackages("emberline.reports");

    @Test
    void onlyThePainterSeesTheChartLibrary() {
        noClasses()
                .that()
                .resideOutsideOfPackage("emberline.reports.paint..")
                .should()
                .dependOnClassesThat()
                .resideInAPackage("org.jfree..")
                .check(REPORTS);
    }

    @Test
    void chartsAreValuesThatKnowNoPainter() {
        noClasses()
                .that()
                .resideInAPackage("emberline.reports.chart..")
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("java.awt..", "emberline.reports.paint..", "org.apache..")
                .check(REPORTS);
    }

    @Test
    void nothingReadsSpectraOrKnowsTheCommands() {
        noClasses()
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage("emberline.read..", "emberline.cli..")
                .check(REPORTS);
    }

    @Test
    void nothingPrintsToTheConsole() {
        noClasses()
                .should()
                .accessField(System.class, "out")
                .orShould()
                .accessField(System.class, "err")
                .check(REPORTS);
    }

    @Test
    void staticFieldsAreFinal() {
        fields().that().areStatic().should().beFinal().check(REPORTS);
    }
}
