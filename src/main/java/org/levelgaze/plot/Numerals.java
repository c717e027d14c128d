package org.levelgaze.plot;

import java.text.NumberFormat;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Writes numbers as a reader of the language expects them. */
enum Numerals {
    /** A share of 1 as per cent with at most one decimal: 12.5 %. */
    SHARE {
        @Override
        String of(double value, Locale locale) {
            return digits(100 * value, 0, 1, locale) + "\u00a0%";
        }
    },
    /** A number with two decimals and a true minus: −0.31. */
    DECIMAL {
        @Override
        String of(double value, Locale locale) {
            return digits(value, 2, 2, locale);
        }
    },
    /** A number with as few decimals as it has, at most two. */
    SHORT {
        @Override
        String of(double value, Locale locale) {
            return digits(value, 0, 2, locale);
        }
    };

    abstract String of(double value, Locale locale);

    /** An en dash for no value. */
    String orDash(@Nullable Double value, Locale locale) {
        return value == null ? "–" : of(value, locale);
    }

    private static String digits(double value, int least, int most, Locale locale) {
        NumberFormat format = NumberFormat.getNumberInstance(locale);
        format.setMinimumFractionDigits(least);
        format.setMaximumFractionDigits(most);
        String written = format.format(value);
        boolean isZero = written.chars().noneMatch(c -> Character.isDigit(c) && Character.digit(c, 10) > 0);
        return isZero ? format.format(0.0) : written.replace('-', '\u2212');
    }
}
