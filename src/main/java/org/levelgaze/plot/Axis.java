package org.levelgaze.plot;

import java.util.ArrayList;
import java.util.List;

/**
 * Numbers to coordinates along one direction; what lies beyond an end is drawn at that end.
 *
 * @param from the number at {@code start}
 * @param to the number at {@code end}, larger than {@code from}
 * @param start a coordinate
 * @param end a coordinate, smaller than {@code start} for an axis that climbs
 */
record Axis(double from, double to, double start, double end) {

    Axis {
        if (!(to > from)) {
            throw new IllegalArgumentException("An axis from " + from + " to " + to);
        }
    }

    double at(double number) {
        double inside = Math.min(to, Math.max(from, number));
        return start + (inside - from) / (to - from) * (end - start);
    }

    boolean holds(double number) {
        return number >= from && number <= to;
    }

    /** Round numbers on the axis, both ends among them when they are round, at most {@code most} + 1 of them. */
    List<Double> ticks(int most) {
        double raw = (to - from) / most;
        double power = Math.pow(10, Math.floor(Math.log10(raw)));
        double step = power;
        for (double factor : new double[] {1, 2, 5, 10}) {
            step = factor * power;
            if (step >= raw * (1 - 1e-9)) {
                break;
            }
        }
        List<Double> ticks = new ArrayList<>();
        for (long i = Math.round(Math.ceil(from / step - 1e-9)); i * step <= to + 1e-9 * step; i++) {
            ticks.add(i * step);
        }
        return ticks;
    }
}
