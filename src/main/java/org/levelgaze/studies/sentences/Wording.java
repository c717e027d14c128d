package org.levelgaze.studies.sentences;

import java.math.RoundingMode;
import java.text.NumberFormat;
import java.time.LocalDate;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;

/**
 * One language: its words, and how it writes figures. A share gets the digits that its sample earns: whole per cents below
 * 50, one decimal below 5,000, two above (common practice, no source).
 *
 * @param locale how figures and days are written
 * @param phrases the words
 */
public record Wording(Locale locale, Phrases phrases) {

    private static final int ONE_DECIMAL_FROM = 50;
    private static final int TWO_DECIMALS_FROM = 5_000;
    private static final int MOST_DECIMALS = 3;
    private static final String NONE = "–";

    /** A sentence of the bundle with what it names. */
    public String say(String key, Object... arguments) {
        return phrases.of(key, arguments);
    }

    /** A count, grouped. */
    public String count(long number) {
        return NumberFormat.getIntegerInstance(locale).format(number);
    }

    /** So many of so many: 18 of 20. */
    public String counts(Share share) {
        return say("studies.of", count(share.k()), count(share.n()));
    }

    /** A share in per cent with the digits that n earns; a dash where there is none. */
    public String percent(@Nullable Double value, long n) {
        return value == null ? NONE : inPercent(value, decimals(n));
    }

    /** The share in per cent; a dash at n = 0. */
    public String percent(Share share) {
        return percent(share.value(), share.n());
    }

    /** The share with as many digits as it takes to tell it from a limit. */
    public String percentBeside(Share share, double limit) {
        Double value = share.value();
        if (value == null) {
            return NONE;
        }
        int digits = decimals(share.n());
        while (digits < MOST_DECIMALS
                && value != limit
                && inPercent(value, digits).equals(inPercent(limit, digits))) {
            digits++;
        }
        return inPercent(value, digits);
    }

    /** A limit in per cent, as short as it can be written. */
    public String limit(double share) {
        return inPercent(share, 2);
    }

    /** An interval of a share: 68 % to 99 %. */
    public String range(Interval interval, long n) {
        return say("studies.range", percent(interval.lower(), n), percent(interval.upper(), n));
    }

    /** An interval of a number, open upwards or not; a dash where there is none. */
    public String range(@Nullable Interval interval) {
        if (interval == null) {
            return NONE;
        }
        return Double.isInfinite(interval.upper())
                ? say("studies.range.open", number(interval.lower()))
                : say("studies.range", number(interval.lower()), number(interval.upper()));
    }

    /** A number with two decimals and a true minus; a dash where there is none. */
    public String number(@Nullable Double value) {
        return value == null ? NONE : digits(value, 2, 2);
    }

    /** A probability, never shown as an impossible 0. */
    public String probability(double p) {
        return p < 0.001 ? "< " + digits(0.001, 3, 3) : digits(p, 3, 3);
    }

    /** A day as the language writes it. */
    public String day(LocalDate day) {
        return DateTimeFormatter.ofPattern(say("site.day"), locale).format(day);
    }

    /** Several things in one sentence. */
    public String list(List<String> things) {
        return String.join("; ", things);
    }

    private static int decimals(long n) {
        if (n < ONE_DECIMAL_FROM) {
            return 0;
        }
        return n < TWO_DECIMALS_FROM ? 1 : 2;
    }

    private String inPercent(double share, int decimals) {
        return digits(100 * share, 0, decimals) + "\u00a0%";
    }

    private String digits(double value, int least, int most) {
        NumberFormat format = NumberFormat.getNumberInstance(locale);
        format.setMinimumFractionDigits(least);
        format.setMaximumFractionDigits(most);
        format.setRoundingMode(RoundingMode.HALF_UP);
        String written = format.format(value);
        boolean zero = written.chars().noneMatch(c -> Character.isDigit(c) && Character.digit(c, 10) > 0);
        return zero ? format.format(0.0) : written.replace('-', '\u2212');
    }
}
