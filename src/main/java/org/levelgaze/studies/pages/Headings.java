package org.levelgaze.studies.pages;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.CameraConfiguration;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.Edition;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.studies.StudyHead;
import org.springframework.stereotype.Component;

/** Reads what a study was. */
@Component
class Headings {

    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Appraisers appraisers;

    Headings(Tasks tasks, ReferenceSets sets, Appraisers appraisers) {
        this.tasks = tasks;
        this.sets = sets;
        this.appraisers = appraisers;
    }

    StudyHeading of(StudyHead study) {
        ReferenceSet set = sets.get(study.site(), study.setId());
        List<Appraiser> taking = study.appraisers().stream()
                .map(one -> appraisers.get(study.site(), one.appraiserId()))
                .toList();
        return new StudyHeading(
                study,
                tasks.get(study.site(), study.taskId()),
                set,
                edition(set, study.edition()),
                study.appraisers().stream()
                        .map(one -> taking(one, taking.get(one.number()), taking))
                        .toList());
    }

    private static StudyHeading.Taking taking(
            StudyHead.Participant one, Appraiser appraiser, List<Appraiser> everybody) {
        long sameName = everybody.stream()
                .filter(other -> other.name().equals(appraiser.name()))
                .count();
        String name = sameName > 1 ? appraiser.name() + " (" + appraiser.code() + ")" : appraiser.name();
        return new StudyHeading.Taking(appraiser, name, configuration(appraiser, one.configuration()), one.trials());
    }

    private static @Nullable CameraConfiguration configuration(Appraiser appraiser, @Nullable Integer number) {
        return appraiser.configurations().stream()
                .filter(configuration -> number != null && configuration.number() == number)
                .findFirst()
                .orElse(null);
    }

    private Edition edition(ReferenceSet set, int number) {
        return sets.editions(set).stream()
                .filter(edition -> edition.number() == number)
                .findFirst()
                .orElseThrow();
    }
}
