package org.levelgaze.studies.pages;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.LeanScale;
import org.levelgaze.plot.Picture;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.AppraiserFigure;
import org.levelgaze.studies.Figure;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.sentences.Wording;
import org.springframework.stereotype.Component;

/** Puts the pages of appraisers together. */
@Component
class AppraiserPages {

    private final Appraisers appraisers;
    private final Studies studies;
    private final Trends trends;
    private final Rungs rungs;
    private final Languages languages;

    AppraiserPages(Appraisers appraisers, Studies studies, Trends trends, Rungs rungs, Languages languages) {
        this.appraisers = appraisers;
        this.studies = studies;
        this.trends = trends;
        this.rungs = rungs;
        this.languages = languages;
    }

    AppraiserList list(SiteId site, Locale locale) {
        Map<Long, Figure> newest = studies.newestFigures(site).stream()
                .collect(Collectors.toMap(AppraiserFigure::appraiserId, AppraiserFigure::figure));
        return new AppraiserList(appraisers.all(site).stream()
                .map(one -> line(one, newest.get(one.id()), locale))
                .toList());
    }

    /**
     * One appraiser's page.
     *
     * @throws Refusal when nobody has this code
     */
    AppraiserPage page(SiteId site, String code, Locale locale) {
        Appraiser appraiser = appraisers
                .byCode(site, code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-appraiser", code));
        return new AppraiserPage(
                appraiser, trends.of(appraiser, locale), rungs.of(appraiser, languages.wording(locale)));
    }

    private AppraiserList.Line line(Appraiser one, @Nullable Figure newest, Locale locale) {
        if (newest == null) {
            return new AppraiserList.Line(one, null, "", null);
        }
        Wording words = languages.wording(locale);
        var right = Estimates.share(newest.effectiveness());
        String share = words.say("studies.appraisers.right", words.counts(right), words.percent(right));
        Picture lean = Estimates.flawless(newest)
                ? null
                : LeanScale.row(
                        one.name(), Estimates.criterion(newest), List.of(), languages.drawing("a" + one.id(), locale));
        return new AppraiserList.Line(one, newest, share, lean);
    }
}
