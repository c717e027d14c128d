package org.levelgaze.cli;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;

/** Figures as text, with the digits that the sample earns. */
final class Figures {

    static final String NONE = "-";

    private static final int ENOUGH_FOR_A_DECIMAL = 100;
    private static final int ENOUGH_FOR_TWO = 10_000;

    private final Locale locale;

    Figures(Locale locale) {
        this.locale = locale;
    }

    /** "42/50". */
    String counts(Share share) {
        return share.k() + "/" + share.n();
    }

    /** "84 %". */
    String percent(Share share) {
        return share.value() == null ? NONE : percent(share.value(), share.n()) + " %";
    }

    /** "71-93 %", the exact interval. */
    String range(Share share) {
        if (share.value() == null) {
            return NONE;
        }
        Interval interval = share.clopperPearson();
        return percent(interval.lower(), share.n()) + "-" + percent(interval.upper(), share.n()) + " %";
    }

    /** "0.88", or "-" when there is none. */
    String number(@Nullable Double value) {
        return value == null ? NONE : String.format(locale, "%.2f", value);
    }

    /** "0.80 to 0.96"; "0.80 up" when it is open upwards. */
    String range(@Nullable Interval interval, String open) {
        if (interval == null) {
            return NONE;
        }
        return Double.isInfinite(interval.upper())
                ? number(interval.lower()) + " " + open
                : number(interval.lower()) + ".." + number(interval.upper());
    }

    /** A share of the flow, in % with three digits that tell something. */
    String flow(@Nullable Double share) {
        if (share == null) {
            return NONE;
        }
        double percent = share * 100;
        String format = percent >= 10 ? "%.1f %%" : percent >= 0.1 ? "%.2f %%" : "%.4f %%";
        return String.format(locale, format, percent);
    }

    /** A level such as "95 %". */
    String level(double confidence) {
        String plain = String.format(locale, "%.4f", confidence * 100).replaceAll("[.,]?0+$", "");
        return plain + " %";
    }

    private String percent(double share, long n) {
        int digits = n < ENOUGH_FOR_A_DECIMAL ? 0 : n < ENOUGH_FOR_TWO ? 1 : 2;
        return String.format(locale, "%." + digits + "f", share * 100);
    }
}
