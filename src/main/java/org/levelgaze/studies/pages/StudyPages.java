package org.levelgaze.studies.pages;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.StudyShape;
import org.levelgaze.plot.Drawing;
import org.levelgaze.plot.LeanScale;
import org.levelgaze.plot.MistakePlane;
import org.levelgaze.plot.Picture;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.sets.Basis;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.sentences.AppraiserSentences;
import org.levelgaze.studies.sentences.StudyFacts;
import org.levelgaze.studies.sentences.StudyWarnings;
import org.levelgaze.studies.sentences.Subject;
import org.levelgaze.studies.sentences.UsualLimits;
import org.levelgaze.studies.sentences.Wording;
import org.springframework.stereotype.Component;

/** Puts the pages of a study together. */
@Component
class StudyPages {

    private static final UsualLimits LIMITS = UsualLimits.COMMON_PRACTICE;

    private final Studies studies;
    private final Headings headings;
    private final Languages languages;

    StudyPages(Studies studies, Headings headings, Languages languages) {
        this.studies = studies;
        this.headings = headings;
        this.languages = languages;
    }

    /**
     * The study's page in a language.
     *
     * @throws org.levelgaze.shared.Refusal when there is no such study
     */
    StudyPage page(SiteId site, long id, Locale locale) {
        StudyHead study = studies.get(site, id);
        StudyHeading heading = headings.of(study);
        Optional<Findings> findings = studies.findings(study);
        if (findings.isEmpty()) {
            return new StudyPage(heading, List.of(), List.of(), List.of());
        }
        Wording words = languages.wording(locale);
        Findings found = findings.get();
        List<String> names =
                heading.taking().stream().map(StudyHeading.Taking::name).toList();
        return new StudyPage(
                heading,
                StudyWarnings.of(facts(heading, found.study()), LIMITS, words),
                IntStream.range(0, names.size())
                        .mapToObj(number -> appraised(heading, number, found, words))
                        .toList(),
                new StudySections(names, found, planes(names, found, locale), LIMITS, words).all());
    }

    private static StudyFacts facts(StudyHeading heading, StudyShape shape) {
        return new StudyFacts(
                shape.defectivePieces(),
                shape.goodPieces(),
                heading.study().pieces() - shape.pieces(),
                shape.trials(),
                heading.study().callsMissing(),
                heading.set().code(),
                heading.edition().basis() == Basis.IMPORT,
                heading.study().performedOn(),
                heading.edition().decidedOn(),
                heading.edition().validUntil());
    }

    private StudyPage.Appraised appraised(StudyHeading heading, int number, Findings findings, Wording words) {
        StudyHeading.Taking taking = heading.taking().get(number);
        AppraiserFindings found = findings.appraisers().get(number);
        boolean camera = taking.appraiser().kind() == AppraiserKind.CAMERA;
        Subject subject = new Subject(taking.name(), camera, taking.trials());
        Drawing drawing = languages.drawing("a" + number, words.locale());
        return new StudyPage.Appraised(
                taking.name(),
                taking.appraiser().code(),
                AppraiserSentences.of(subject, found, findings.confidence(), LIMITS, words),
                number < StudyPage.MOST_DRAWN ? lean(taking.name(), found, drawing) : null);
    }

    private List<Section.Drawn> planes(List<String> names, Findings findings, Locale locale) {
        return IntStream.range(0, Math.min(StudyPage.MOST_DRAWN, names.size()))
                .mapToObj(number -> new Section.Drawn(
                        names.get(number),
                        plane(
                                names.get(number),
                                findings.appraisers().get(number),
                                languages.drawing("p" + number, locale))))
                .toList();
    }

    /** Who made no mistake is never shown as leaning, whatever c is. */
    private static @Nullable Picture lean(String name, AppraiserFindings found, Drawing drawing) {
        return Estimates.flawless(found)
                ? null
                : LeanScale.form(name, Estimates.criterion(found.signalDetection()), List.of(), drawing);
    }

    private static Picture plane(String name, AppraiserFindings found, Drawing drawing) {
        MistakePlane.Study present = new MistakePlane.Study(
                name, Estimates.share(found.falseReject()), Estimates.share(found.falseAccept()));
        MistakePlane.Corner corner = new MistakePlane.Corner(LIMITS.maxFalseReject(), LIMITS.maxFalseAccept());
        return MistakePlane.of(name, List.of(present), corner, drawing);
    }
}
