package org.levelgaze.studies.pages;

import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.CameraConfiguration;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyFilter;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.sentences.Wording;
import org.springframework.stereotype.Component;

/** A camera's configurations as a ladder, each with the studies made with it. */
@Component
class Rungs {

    private static final int MOST_STUDIES = 500;

    private final Studies studies;
    private final Sites sites;

    Rungs(Studies studies, Sites sites) {
        this.studies = studies;
        this.sites = sites;
    }

    /** The newest configuration first; studies from before the first one stand at the foot. */
    List<AppraiserPage.Rung> of(Appraiser camera, Wording words) {
        ZoneId zone = sites.get(camera.site()).zone();
        List<StudyHead> made =
                studies.page(camera.site(), new StudyFilter(null, null, camera.id(), null, null), 0, MOST_STUDIES);
        List<AppraiserPage.Rung> rungs = new ArrayList<>();
        for (CameraConfiguration configuration : camera.configurations()) {
            rungs.add(0, rung(configuration, camera, made, zone, words));
        }
        List<AppraiserPage.Made> before = madeWith(null, camera, made, zone, words);
        if (!before.isEmpty()) {
            rungs.add(new AppraiserPage.Rung("", "", "", before));
        }
        return rungs;
    }

    private static AppraiserPage.Rung rung(
            CameraConfiguration configuration, Appraiser camera, List<StudyHead> made, ZoneId zone, Wording words) {
        String since = DateTimeFormatter.ofPattern(words.say("site.instant"), words.locale())
                .format(configuration.changedAt().atZone(zone));
        return new AppraiserPage.Rung(
                configuration.label(), since, configuration.note(), madeWith(configuration, camera, made, zone, words));
    }

    private static List<AppraiserPage.Made> madeWith(
            @Nullable CameraConfiguration configuration,
            Appraiser camera,
            List<StudyHead> made,
            ZoneId zone,
            Wording words) {
        return made.stream()
                .filter(study -> Objects.equals(configuration, usedIn(study, camera, zone)))
                .map(study -> new AppraiserPage.Made(study.id(), words.day(study.performedOn())))
                .toList();
    }

    /** The configuration that the study names; else the one in force at the end of its day; null: none yet. */
    private static @Nullable CameraConfiguration usedIn(StudyHead study, Appraiser camera, ZoneId zone) {
        Integer named = study.appraisers().stream()
                .filter(one -> one.appraiserId() == camera.id())
                .map(StudyHead.Participant::configuration)
                .filter(Objects::nonNull)
                .findFirst()
                .orElse(null);
        CameraConfiguration used = null;
        for (CameraConfiguration each : camera.configurations()) {
            boolean inForce = !each.changedAt().atZone(zone).toLocalDate().isAfter(study.performedOn());
            if (named == null ? inForce : each.number() == named) {
                used = each;
            }
        }
        return used;
    }
}
