package org.levelgaze.studies.pages;

import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;
import org.levelgaze.agreement.SignalDetection;
import org.levelgaze.agreement.Terms;
import org.levelgaze.plot.Estimate;
import org.levelgaze.studies.Figure;

/** Findings and figures as the pictures take them. */
final class Estimates {

    private Estimates() {}

    static Estimate share(Share share) {
        Interval exact = share.clopperPearson();
        return share.value() == null ? Estimate.none() : new Estimate(share.value(), exact.lower(), exact.upper());
    }

    /** A counted share of a stored figure, at the level of all stored findings. */
    static Share share(Figure.Count count) {
        return Share.of(count.k(), count.n(), Terms.STANDARD.confidence());
    }

    static Estimate criterion(SignalDetection found) {
        Interval interval = found.criterionCInterval();
        return interval == null
                ? Estimate.none()
                : new Estimate(found.criterionC(), interval.lower(), interval.upper());
    }

    /** c of a stored figure; none where no mistake was made, since a flawless appraiser is never shown as leaning. */
    static Estimate criterion(Figure figure) {
        @Nullable Double c = figure.criterionC();
        return c == null || flawless(figure)
                ? Estimate.none()
                : new Estimate(c, figure.criterionCLow(), figure.criterionCHigh());
    }

    static boolean flawless(AppraiserFindings found) {
        return found.falseAccept().k() == 0 && found.falseReject().k() == 0;
    }

    static boolean flawless(Figure figure) {
        return figure.falseAccept().k() == 0 && figure.falseReject().k() == 0;
    }
}
