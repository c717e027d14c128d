package org.levelgaze.studies.pages;

import io.swagger.v3.oas.annotations.Operation;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.time.LocalDate;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.Figure;
import org.levelgaze.studies.Studies;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

/** Calls of a study and trends of an appraiser over the API. */
@RestController
class ReadingApi {

    private final Studies studies;
    private final Appraisers appraisers;
    private final Tasks tasks;
    private final Ladders ladders;
    private final CallsCsv csv;

    ReadingApi(Studies studies, Appraisers appraisers, Tasks tasks, Ladders ladders, CallsCsv csv) {
        this.studies = studies;
        this.appraisers = appraisers;
        this.tasks = tasks;
        this.ladders = ladders;
        this.csv = csv;
    }

    /** A share as findings write it. */
    record ShareAnswer(long k, long n, @Nullable Double value, List<Double> clopperPearson, List<Double> wilson) {

        static ShareAnswer of(Figure.Count count) {
            Share share = Estimates.share(count);
            return new ShareAnswer(
                    share.k(), share.n(), share.value(), ends(share.clopperPearson()), ends(share.wilson()));
        }

        private static List<Double> ends(Interval interval) {
            return List.of(interval.lower(), interval.upper());
        }
    }

    record PointAnswer(
            long study,
            LocalDate when,
            ShareAnswer effectiveness,
            ShareAnswer falseAccept,
            ShareAnswer falseReject,
            @Nullable Double biasRatio,
            @Nullable Double criterionC,
            @Nullable List<Double> criterionCInterval) {

        static PointAnswer of(Figure figure) {
            Double low = figure.criterionCLow();
            Double high = figure.criterionCHigh();
            return new PointAnswer(
                    figure.studyId(),
                    figure.performedOn(),
                    ShareAnswer.of(figure.effectiveness()),
                    ShareAnswer.of(figure.falseAccept()),
                    ShareAnswer.of(figure.falseReject()),
                    figure.biasRatio(),
                    figure.criterionC(),
                    low == null || high == null ? null : List.of(low, high));
        }
    }

    record TrendAnswer(String appraiser, String task, List<PointAnswer> points) {}

    /** One point per concluded study, the earliest day first. */
    @Operation(summary = "The figures of an appraiser, study by study")
    @GetMapping("/api/v1/appraisers/{code}/trend")
    TrendAnswer trend(Actor actor, @PathVariable String code, @RequestParam String task) {
        Appraiser appraiser = appraisers
                .byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-appraiser", code));
        Task judged = tasks.byCode(actor.site(), task)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-task", task));
        List<PointAnswer> points = studies.figures(actor.site(), appraiser.id(), judged.id()).stream()
                .map(PointAnswer::of)
                .toList();
        return new TrendAnswer(appraiser.code(), judged.code(), points);
    }

    /** The calls with their true states: scope {@code key:read}; the reading is recorded. */
    @Operation(summary = "The calls of a study; shows true states, the reading is recorded")
    @GetMapping(path = "/api/v1/studies/{id}/calls.csv", produces = "text/csv")
    void calls(Actor actor, @PathVariable long id, HttpServletResponse response) throws IOException {
        StudyHeading heading = ladders.heading(actor, id);
        ladders.open(actor, heading);
        response.setContentType("text/csv;charset=UTF-8");
        csv.write(heading.study(), response.getOutputStream());
    }
}
