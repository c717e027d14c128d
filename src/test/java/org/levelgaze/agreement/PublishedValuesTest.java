package org.levelgaze.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.function.DoubleSupplier;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** Every published value in the scope of the engine; the test's name says where it comes from. */
class PublishedValuesTest {

    private static final double TOLERANCE = 1e-9;

    /** Values that the findings do not contain, by the form of their id, and why. */
    private static final Map<String, String> OUT_OF_SCOPE = outOfScope();

    private final Map<String, DoubleSupplier> figures = new PublishedValues().figures();

    private static Map<String, String> outOfScope() {
        Map<String, String> reasons = new LinkedHashMap<>();
        reasons.put("trend\\..*", "a trend over studies is not a finding of one study");
        reasons.put("rg\\..*", "the findings do not estimate a line's defect rate");
        reasons.put("kendall\\..*", "calls are accept or reject, not ranks");
        reasons.put("prop\\..*\\.ac\\.(lower|upper)", "shares carry Clopper-Pearson and Wilson, not Agresti-Coull");
        reasons.put("mcnemar\\..*\\.chi2(cc)?", "the exact test is used, not the chi-square");
        reasons.put("cohen1960\\.se1960", "superseded by Fleiss, Cohen and Everitt 1969");
        reasons.put("gwet2014\\.4x12\\.fleiss", "Fleiss' kappa is the classical one, with complete pieces alone");
        return reasons;
    }

    @TestFactory
    Stream<DynamicTest> reproducesEveryPublishedValueInScope() {
        return rowsInScope().map(row -> DynamicTest.dynamicTest(name(row), () -> check(row)));
    }

    @Test
    void leavesNothingOutThatIsInScope() {
        List<String> ids = rowsInScope().map(row -> row.get("id")).toList();

        assertThat(figures.keySet()).containsAll(ids);
        assertThat(ids).hasSize(136).doesNotHaveDuplicates();
    }

    @Test
    void leavesOutOnlyWhatTheFindingsDoNotContain() {
        for (String form : OUT_OF_SCOPE.keySet()) {
            assertThat(Reference.rows("results.csv"))
                    .as("%s: %s", form, OUT_OF_SCOPE.get(form))
                    .anyMatch(row -> row.get("id").matches(form));
        }
    }

    private void check(Reference.Row row) {
        DoubleSupplier figure = Objects.requireNonNull(figures.get(row.get("id")), "not computed");
        assertThat(figure.getAsDouble()).isCloseTo(Double.parseDouble(row.get("computed")), within(TOLERANCE));
    }

    private static Stream<Reference.Row> rowsInScope() {
        return Reference.rows("results.csv").stream()
                .filter(row -> OUT_OF_SCOPE.keySet().stream()
                        .noneMatch(form -> row.get("id").matches(form)));
    }

    private static String name(Reference.Row row) {
        String source = row.get("published_value_from");
        return row.get("id") + ": " + row.get("statistic") + " = " + row.get("computed") + " ("
                + (source.isEmpty() ? "no print; " + row.get("computed_with") : source) + ")";
    }
}
