package org.levelgaze.studies.pages;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
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
                plane(appraiser, figures, words, drawing.named("plane" + task.id())),
                pictures(appraiser, figures, words, drawing),
                ratios(figures, words));
    }

    private static Picture plane(Appraiser appraiser, List<Figure> figures, Wording words, Drawing drawing) {
        List<MistakePlane.Study> trail = figures.stream()
                .map(figure -> new MistakePlane.Study(
                        words.day(figure.performedOn()),
                        Estimates.share(Estimates.share(figure.falseReject())),
                        Estimates.share(Estimates.share(figure.falseAccept()))))
                .toList();
        MistakePlane.Corner corner = new MistakePlane.Corner(LIMITS.maxFalseReject(), LIMITS.maxFalseAccept());
        return MistakePlane.of(appraiser.name(), trail, corner, drawing);
    }

    private List<Picture> pictures(Appraiser appraiser, List<Figure> figures, Wording words, Drawing drawing) {
        return List.of(
                shares("byPiece", Figure::effectiveness, least(words), appraiser, figures, words, drawing),
                shares(
                        "falseAccept",
                        Figure::falseAccept,
                        most(words, LIMITS.maxFalseAccept()),
                        appraiser,
                        figures,
                        words,
                        drawing),
                shares(
                        "falseReject",
                        Figure::falseReject,
                        most(words, LIMITS.maxFalseReject()),
                        appraiser,
                        figures,
                        words,
                        drawing),
                picture("c", Trend.Figure.LEAN, Estimates::criterion, List.of(), appraiser, figures, words, drawing));
    }

    private static List<Trend.Limit> least(Wording words) {
        return List.of(new Trend.Limit(words.say("studies.trend.least"), LIMITS.minEffectiveness(), true));
    }

    private static List<Trend.Limit> most(Wording words, double limit) {
        return List.of(new Trend.Limit(words.say("studies.trend.most"), limit, false));
    }

    private Picture shares(
            String name,
            Function<Figure, Figure.Count> count,
            List<Trend.Limit> limits,
            Appraiser appraiser,
            List<Figure> figures,
            Wording words,
            Drawing drawing) {
        Function<Figure, Estimate> share = figure -> Estimates.share(Estimates.share(count.apply(figure)));
        return picture(name, Trend.Figure.SHARE, share, limits, appraiser, figures, words, drawing);
    }

    private Picture picture(
            String name,
            Trend.Figure kind,
            Function<Figure, Estimate> estimate,
            List<Trend.Limit> limits,
            Appraiser appraiser,
            List<Figure> figures,
            Wording words,
            Drawing drawing) {
        List<Trend.Point> points = figures.stream()
                .map(figure -> new Trend.Point(
                        figure.performedOn(),
                        words.day(figure.performedOn()),
                        sets.get(appraiser.site(), figure.setId()).code(),
                        estimate.apply(figure)))
                .toList();
        String figureName = words.say("studies.term." + name);
        return Trend.of(
                appraiser.name() + ": " + figureName,
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
