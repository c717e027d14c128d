package org.levelgaze.studies.importing;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What somebody answered to the questions of a run, as typed.
 *
 * @param appraisers what the unknown words for appraisers mean, in their order: {@code person}, {@code camera} or
 *     {@code slip}; empty: not said
 * @param newSet {@code yes}: the set may be made from the file
 * @param newKinds {@code yes}: the defect kinds may be added to the task
 * @param repeat {@code yes}: the same file may be stored once more
 */
record QuestionForm(List<Who> appraisers, String newSet, String newKinds, String repeat) {

    static final String YES = "yes";
    static final String PERSON = "person";
    static final String CAMERA = "camera";
    static final String SLIP = "slip";

    /** What one word means. */
    record Who(String kind) {

        Who(@Nullable String kind) {
            this.kind = Typed.text(kind);
        }
    }

    /** Takes what a form leaves out as nothing said. */
    QuestionForm(
            @Nullable List<@Nullable Who> appraisers,
            @Nullable String newSet,
            @Nullable String newKinds,
            @Nullable String repeat) {
        this.appraisers = Typed.list(appraisers);
        this.newSet = Typed.text(newSet);
        this.newKinds = Typed.text(newKinds);
        this.repeat = Typed.text(repeat);
    }

    static QuestionForm empty(int appraisers) {
        return new QuestionForm(Collections.nCopies(appraisers, new Who("")), null, null, null);
    }

    QuestionForm sized(int size) {
        List<Who> sized = new ArrayList<>(appraisers.subList(0, Math.min(size, appraisers.size())));
        while (sized.size() < size) {
            sized.add(new Who(""));
        }
        return new QuestionForm(Collections.unmodifiableList(sized), newSet, newKinds, repeat);
    }

    boolean saysSlip() {
        return appraisers.stream().anyMatch(who -> who.kind().equals(SLIP));
    }
}
