package org.levelgaze.studies;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.CameraConfiguration;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.springframework.stereotype.Component;

/** Finds who a file's words for appraisers mean, and with which configuration a camera judged. */
@Component
class Participants {

    private final Appraisers appraisers;
    private final Sites sites;

    Participants(Appraisers appraisers, Sites sites) {
        this.appraisers = appraisers;
        this.sites = sites;
    }

    /**
     * Who the words mean: by code, then by name.
     *
     * @return the known ones by their word
     * @throws Refusal when a word is the name of two people, or two words mean the same appraiser
     */
    Map<String, Appraiser> known(SiteId site, List<String> words) {
        Map<String, Appraiser> found = new HashMap<>();
        Map<Long, String> wordOf = new HashMap<>();
        for (String word : words) {
            Optional<Appraiser> appraiser = find(site, word);
            if (appraiser.isPresent()) {
                String other = wordOf.put(appraiser.get().id(), word);
                if (other != null) {
                    throw new Refusal(Refusal.Kind.INVALID, "one-appraiser-two-words", other, word);
                }
                found.put(word, appraiser.get());
            }
        }
        return found;
    }

    private Optional<Appraiser> find(SiteId site, String word) {
        Optional<Appraiser> byCode = appraisers.byCode(site, word);
        if (byCode.isPresent()) {
            return byCode;
        }
        List<Appraiser> byName = appraisers.byName(site, word);
        if (byName.size() > 1) {
            throw new Refusal(Refusal.Kind.INVALID, "two-of-one-name", word, byName.size());
        }
        return byName.stream().findFirst();
    }

    /** All words as appraisers; the unknown ones are entered as the consent says. */
    List<Appraiser> enter(Actor actor, List<String> words, Map<String, Appraiser> known, Consent consent) {
        List<Appraiser> result = new ArrayList<>();
        for (String word : words) {
            Appraiser appraiser = known.get(word);
            if (appraiser == null) {
                AppraiserKind kind = consent.enterAs(word).orElseThrow();
                appraiser = appraisers.create(actor, word, word, kind);
            }
            result.add(appraiser);
        }
        return result;
    }

    /**
     * The number of the configuration that a study names, by appraiser; null where none is named.
     *
     * @throws Refusal when no camera of the study has it, or it was not in force at any time of that day
     */
    Map<Long, Integer> configurations(
            SiteId site, List<Appraiser> taking, @Nullable String label, LocalDate performedOn) {
        Map<Long, Integer> named = new HashMap<>();
        if (label == null) {
            return named;
        }
        ZoneId zone = sites.get(site).zone();
        for (Appraiser appraiser : taking) {
            Optional<CameraConfiguration> configuration = appraiser.configuration(label);
            if (configuration.isPresent()) {
                Instant dayBegins = performedOn.atStartOfDay(zone).toInstant();
                Instant dayEnds = performedOn.plusDays(1).atStartOfDay(zone).toInstant();
                if (!inForceBetween(appraiser, configuration.get(), dayBegins, dayEnds)) {
                    throw new Refusal(
                            Refusal.Kind.INVALID,
                            "configuration-not-in-force",
                            label,
                            appraiser.code(),
                            performedOn.toString());
                }
                named.put(appraiser.id(), configuration.get().number());
            }
        }
        if (named.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "unknown-configuration", label);
        }
        return named;
    }

    private static boolean inForceBetween(
            Appraiser camera, CameraConfiguration configuration, Instant begins, Instant ends) {
        List<CameraConfiguration> inOrder = camera.configurations();
        int next = inOrder.indexOf(configuration) + 1;
        boolean startedBefore = configuration.changedAt().isBefore(ends);
        boolean replacedBefore =
                next < inOrder.size() && !inOrder.get(next).changedAt().isAfter(begins);
        return startedBefore && !replacedBefore;
    }
}
