package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaPackage;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.springframework.modulith.ApplicationModule;

/** The map that contributors read is the map of the code. */
class ModuleMapTest {

    private static final Pattern ROW = Pattern.compile("^\\| `(?<module>[a-z]+)` \\| .+ \\| (?<uses>[a-z, ]+) \\|$");
    private static final Pattern ARROW = Pattern.compile("([a-z]+) --> ([a-z]+)");

    @Test
    void theTableInTheContributorsGuideNamesEveryModuleAndItsArrows() throws IOException {
        Map<String, String> written = new TreeMap<>();
        Files.readString(Path.of("DEVELOPERS.md")).lines().map(ROW::matcher).forEach(row -> {
            if (row.matches()) {
                written.put(row.group("module"), row.group("uses"));
            }
        });

        assertThat(written).isEqualTo(inTheCode());
    }

    @Test
    void theDrawingShowsEveryDeclaredArrow() throws IOException {
        Set<String> drawn = new TreeSet<>();
        ARROW.matcher(Files.readString(Path.of("docs/modules.md")))
                .results()
                .forEach(arrow -> drawn.add(arrow.group(1) + " uses " + arrow.group(2)));
        Set<String> declared = new TreeSet<>();
        inTheCode().forEach((module, uses) -> {
            if (!uses.equals("nothing") && !uses.equals("everything")) {
                Stream.of(uses.split(", ")).forEach(used -> declared.add(module + " uses " + used));
            }
        });

        assertThat(drawn).isEqualTo(declared);
    }

    private static Map<String, String> inTheCode() {
        Map<String, String> modules = new TreeMap<>();
        for (JavaPackage each : new ClassFileImporter()
                .withImportOption(new ImportOption.DoNotIncludeTests())
                .importPackages("org.levelgaze")
                .getPackage("org.levelgaze")
                .getSubpackages()) {
            modules.put(
                    each.getRelativeName(),
                    each.tryGetAnnotationOfType(ApplicationModule.class)
                            .map(module -> uses(module.allowedDependencies()))
                            .orElse("everything"));
        }
        return modules;
    }

    private static String uses(String[] modules) {
        return modules.length == 0 ? "nothing" : String.join(", ", modules);
    }

    /** Java would load the test's one first, and the arrows that the module declares in the other would not be seen. */
    @Test
    void noPackageIsDescribedInBothTrees() throws IOException {
        Path tests = Path.of("src/test/java");
        try (Stream<Path> files = Files.walk(tests)) {
            assertThat(files.filter(file -> file.endsWith("package-info.java"))
                            .filter(file ->
                                    Files.exists(Path.of("src/main/java").resolve(tests.relativize(file)))))
                    .isEmpty();
        }
    }
}
