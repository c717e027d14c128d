package org.levelgaze.studies.pages;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.LeanScale;
import org.levelgaze.plot.Picture;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.AppraiserFigure;
import org.levelgaze.studies.Figure;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyFilter;
import org.levelgaze.studies.StudyHead;
import org.springframework.stereotype.Component;

/** Puts the list of studies together. */
@Component
class StudyLists {

    static final int PAGE_SIZE = 50;

    /** How many lean scales stand in one line. */
    private static final int MOST_DRAWN = 4;

    /** A number that no task, set or appraiser has. */
    private static final long NOBODY = -1;

    private final Studies studies;
    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Appraisers appraisers;
    private final Headings headings;
    private final Languages languages;

    StudyLists(
            Studies studies,
            Tasks tasks,
            ReferenceSets sets,
            Appraisers appraisers,
            Headings headings,
            Languages languages) {
        this.studies = studies;
        this.tasks = tasks;
        this.sets = sets;
        this.appraisers = appraisers;
        this.headings = headings;
        this.languages = languages;
    }

    StudyList list(SiteId site, StudyQuery query, Locale locale) {
        StudyFilter filter = new StudyFilter(
                number(site, query.task(), tasks::byCode, Task::id),
                number(site, query.set(), sets::byCode, ReferenceSet::id),
                number(site, query.appraiser(), appraisers::byCode, Appraiser::id),
                query.from(),
                query.to());
        int count = studies.count(site, filter);
        int page = query.pageNumber();
        List<StudyHead> shown = studies.page(site, filter, page * PAGE_SIZE, PAGE_SIZE);
        return new StudyList(
                lines(site, shown, locale),
                count,
                page,
                (page + 1) * PAGE_SIZE < count,
                choices(tasks.all(site), Task::code, Task::name),
                choices(sets.all(site), ReferenceSet::code, ReferenceSet::code),
                choices(appraisers.all(site), Appraiser::code, Appraiser::name));
    }

    private List<StudyList.Line> lines(SiteId site, List<StudyHead> shown, Locale locale) {
        List<AppraiserFigure> figures = studies.figuresOf(site, shown);
        List<StudyList.Line> lines = new ArrayList<>();
        for (StudyHeading heading : headings.of(shown)) {
            StudyHead study = heading.study();
            List<StudyList.Lean> leans = new ArrayList<>();
            for (StudyHeading.Taking one : heading.taking()) {
                figure(figures, study, one).ifPresent(figure -> leans.add(lean(study, one, figure, locale)));
            }
            int drawn = Math.min(MOST_DRAWN, leans.size());
            lines.add(new StudyList.Line(heading, leans.subList(0, drawn), leans.size() - drawn));
        }
        return lines;
    }

    private static Optional<Figure> figure(List<AppraiserFigure> figures, StudyHead study, StudyHeading.Taking one) {
        return figures.stream()
                .filter(each -> each.figure().studyId() == study.id()
                        && each.appraiserId() == one.appraiser().id())
                .map(AppraiserFigure::figure)
                .findFirst();
    }

    private StudyList.Lean lean(StudyHead study, StudyHeading.Taking one, Figure figure, Locale locale) {
        String id = "s" + study.id() + "-" + one.appraiser().id();
        Picture picture = Estimates.flawless(figure)
                ? null
                : LeanScale.row(one.name(), Estimates.criterion(figure), List.of(), languages.drawing(id, locale));
        return new StudyList.Lean(one.name(), picture);
    }

    /** The number behind a code; a code that nobody has filters everything out. */
    private static <T> @Nullable Long number(
            SiteId site, @Nullable String code, BiFunction<SiteId, String, Optional<T>> find, Function<T, Long> id) {
        return code == null || code.isEmpty()
                ? null
                : find.apply(site, code).map(id).orElse(NOBODY);
    }

    private static <T> Map<String, String> choices(List<T> all, Function<T, String> code, Function<T, String> name) {
        Map<String, String> choices = new LinkedHashMap<>();
        all.forEach(one -> choices.put(code.apply(one), name.apply(one)));
        return choices;
    }
}
