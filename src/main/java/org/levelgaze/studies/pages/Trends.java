package org.levelgaze.studies.pages;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.BiasRatio;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;
import org.levelgaze.agreement.Terms;
import org.levelgaze.plot.Drawing;
import org.levelgaze.plot.Estimate;
import org.levelgaze.plot.MistakePlane;
import org.levelgaze.plot.Picture;
import org.levelgaze.plot.Trend;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.studies.Figure;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.sentences.UsualLimits;
import org.levelgaze.studies.sentences.Wording;
import org.springframework.stereotype.Component;

/** Draws what studies showed of one appraiser, task by task. */
@Component
class Trends {

    private static final UsualLimits LIMITS = UsualLimits.COMMON_PRACTICE;

    private final Studies studies;
    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Languages languages;

    Trends(Studies studies, Tasks tasks, ReferenceSets sets, Languages languages) {
        this.studies = studies;
        this.tasks = tasks;
        this.sets = sets;
        this.languages = languages;
    }

    /**
     * What one appraiser's studies showed at one task.
     *
     * @param appraiser whose
     * @param figures one for each study, the earliest day first
     * @param sets the codes of the sets that they used, by number
     * @param words the language in which they are told
     */
    private record Trail(Appraiser appraiser, List<Figure> figures, Map<Long, String> sets, Wording words) {}

    /** One trend for each task with a concluded study, in the order of the tasks' codes. */
    List<AppraiserPage.TaskTrend> of(Appraiser appraiser, Locale locale) {
        Map<Long, List<Figure>> byTask = studies.figures(appraiser.site(), appraiser.id(), null).stream()
                .collect(Collectors.groupingBy(Figure::taskId));
        return byTask.entrySet().stream()
                .map(each -> trend(appraiser, tasks.get(appraiser.site(), each.getKey()), each.getValue(), locale))
                .sorted(Comparator.comparing(each -> each.task().code()))
                .toList();
    }

    private AppraiserPage.TaskTrend trend(Appraiser appraiser, Task task, List<Figure> figures, Locale locale) {
        Wording words = languages.wording(locale);
        Drawing drawing = languages.drawing("t" + task.id(), locale);
        Trail trail = new Trail(appraiser, figures, codes(appraiser, figures), words);
        Figure newest = figures.get(figures.size() - 1);
        String sentence = words.say(
                "studies.trend.newest",
                words.day(newest.performedOn()),
                words.counts(Estimates.share(newest.effectiveness())),
                words.percent(Estimates.share(newest.falseAccept())),
                words.percent(Estimates.share(newest.falseReject())));
        return new AppraiserPage.TaskTrend(
                task,
                sentence,
                plane(trail, drawing.named("plane" + task.id())),
                pictures(trail, drawing),
                ratios(figures, words));
    }

    /** Reads each set once, however many studies used it. */
    private Map<Long, String> codes(Appraiser appraiser, List<Figure> figures) {
        return figures.stream()
                .map(Figure::setId)
                .distinct()
                .collect(Collectors.toMap(
                        id -> id, id -> sets.get(appraiser.site(), id).code()));
    }

    private static Picture plane(Trail trail, Drawing drawing) {
        List<MistakePlane.Study> studies = trail.figures().stream()
                .map(figure -> new MistakePlane.Study(
                        trail.words().day(figure.performedOn()),
                        Estimates.share(Estimates.share(figure.falseReject())),
                        Estimates.share(Estimates.share(figure.falseAccept()))))
                .toList();
        MistakePlane.Corner corner = new MistakePlane.Corner(LIMITS.maxFalseReject(), LIMITS.maxFalseAccept());
        return MistakePlane.of(trail.appraiser().name(), studies, corner, drawing);
    }

    private static List<Picture> pictures(Trail trail, Drawing drawing) {
        List<Trend.Limit> mostAccepts = most(trail.words(), LIMITS.maxFalseAccept());
        List<Trend.Limit> mostRejects = most(trail.words(), LIMITS.maxFalseReject());
        return List.of(
                shares("byPiece", Figure::effectiveness, least(trail.words()), trail, drawing),
                shares("falseAccept", Figure::falseAccept, mostAccepts, trail, drawing),
                shares("falseReject", Figure::falseReject, mostRejects, trail, drawing),
                picture("c", Trend.Figure.LEAN, Estimates::criterion, List.of(), trail, drawing));
    }

    private static List<Trend.Limit> least(Wording words) {
        return List.of(new Trend.Limit(words.say("studies.trend.least"), LIMITS.minEffectiveness(), true));
    }

    private static List<Trend.Limit> most(Wording words, double limit) {
        return List.of(new Trend.Limit(words.say("studies.trend.most"), limit, false));
    }

    private static Picture shares(
            String name, Function<Figure, Figure.Count> count, List<Trend.Limit> limits, Trail trail, Drawing drawing) {
        Function<Figure, Estimate> share = figure -> Estimates.share(Estimates.share(count.apply(figure)));
        return picture(name, Trend.Figure.SHARE, share, limits, trail, drawing);
    }

    private static Picture picture(
            String name,
            Trend.Figure kind,
            Function<Figure, Estimate> estimate,
            List<Trend.Limit> limits,
            Trail trail,
            Drawing drawing) {
        List<Trend.Point> points = trail.figures().stream()
                .map(figure -> new Trend.Point(
                        figure.performedOn(),
                        trail.words().day(figure.performedOn()),
                        Objects.requireNonNull(trail.sets().get(figure.setId())),
                        estimate.apply(figure)))
                .toList();
        String figureName = trail.words().say("studies.term." + name);
        return Trend.of(
                trail.appraiser().name() + ": " + figureName,
                kind,
                figureName,
                points,
                limits,
                drawing.named(drawing.id() + "-" + name));
    }

    private static Table ratios(List<Figure> figures, Wording words) {
        List<String> head = Stream.of(
                        "studies.list.day", "studies.term.ratio", "studies.column.interval", "studies.trend.reads")
                .map(words::say)
                .toList();
        return new Table(
                words.say("studies.trend.ratios"),
                head,
                figures.stream().map(figure -> ratio(figure, words)).toList());
    }

    private static List<String> ratio(Figure figure, Wording words) {
        Share rejects = Estimates.share(figure.falseReject());
        Share accepts = Estimates.share(figure.falseAccept());
        BiasRatio ratio = BiasRatio.of(rejects, accepts, Terms.STANDARD.confidence());
        var interval = ratio.interval();
        return List.of(
                words.day(figure.performedOn()),
                ratio.ofRates() == null ? words.say("studies.ratio." + ratio.status()) : words.number(ratio.ofRates()),
                words.range(interval),
                words.say("studies.trend.reads." + reads(interval)));
    }

    private static String reads(@Nullable Interval interval) {
        if (interval == null) {
            return "none";
        }
        if (interval.contains(1)) {
            return "even";
        }
        return interval.lower() > 1 ? "strict" : "lenient";
    }
}
