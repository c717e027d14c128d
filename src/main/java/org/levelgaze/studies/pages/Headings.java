package org.levelgaze.studies.pages;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.CameraConfiguration;
import org.levelgaze.register.Task;
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
        return of(List.of(study)).get(0);
    }

    /** The headings of studies of one site; what several of them share is read once. */
    List<StudyHeading> of(List<StudyHead> studies) {
        Shared shared = new Shared();
        return studies.stream().map(study -> heading(study, shared)).toList();
    }

    private static StudyHeading heading(StudyHead study, Shared shared) {
        List<Appraiser> taking = study.appraisers().stream()
                .map(one -> shared.appraiser(study, one))
                .toList();
        ReferenceSet set = shared.set(study);
        return new StudyHeading(
                study,
                shared.task(study),
                set,
                shared.edition(set, study.edition()),
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

    /** What has been read for one list of studies. */
    private final class Shared {

        private final Map<Long, Task> knownTasks = new HashMap<>();
        private final Map<Long, ReferenceSet> knownSets = new HashMap<>();
        private final Map<Long, List<Edition>> knownEditions = new HashMap<>();
        private final Map<Long, Appraiser> knownAppraisers = new HashMap<>();

        Task task(StudyHead study) {
            return knownTasks.computeIfAbsent(study.taskId(), id -> tasks.get(study.site(), id));
        }

        ReferenceSet set(StudyHead study) {
            return knownSets.computeIfAbsent(study.setId(), id -> sets.get(study.site(), id));
        }

        Appraiser appraiser(StudyHead study, StudyHead.Participant one) {
            return knownAppraisers.computeIfAbsent(one.appraiserId(), id -> appraisers.get(study.site(), id));
        }

        Edition edition(ReferenceSet set, int number) {
            return knownEditions.computeIfAbsent(set.id(), id -> sets.editions(set)).stream()
                    .filter(edition -> edition.number() == number)
                    .findFirst()
                    .orElseThrow();
        }
    }
}
