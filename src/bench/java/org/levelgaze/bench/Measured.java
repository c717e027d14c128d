package org.levelgaze.bench;

import java.lang.management.ManagementFactory;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.IntStream;

/**
 * What was measured in turn, round by round. The first thing measured is the floor; the others are told as ratios to it,
 * each to the floor of its own round, so that a machine that is busy with other work weighs on both.
 */
public final class Measured {

    private final Map<String, List<Double>> rounds = new LinkedHashMap<>();

    /** Adds what one round took, in seconds. */
    public void add(String what, double seconds) {
        rounds.computeIfAbsent(what, name -> new ArrayList<>()).add(seconds);
    }

    /** Runs it and adds how long that took, divided by how often it did its work. */
    public void time(String what, int times, Work work) throws Exception {
        long start = System.nanoTime();
        work.run();
        add(what, (System.nanoTime() - start) / 1e9 / times);
    }

    /** Forgets the rounds so far, which warmed up. */
    public void forget() {
        rounds.clear();
    }

    /** Prints one line for each thing: its median, its ratio to the floor, the lowest and the highest ratio. */
    public void print() {
        List<Double> floor = rounds.values().iterator().next();
        System.out.printf(Locale.ROOT, "%-44s %12s %8s   %s%n", "", "median", "ratio", "of all rounds");
        rounds.forEach((what, seconds) -> {
            List<Double> ratios = IntStream.range(0, seconds.size())
                    .mapToObj(round -> seconds.get(round) / floor.get(round))
                    .sorted()
                    .toList();
            System.out.printf(
                    Locale.ROOT,
                    "%-44s %9.3f ms %8.2f   %.2f to %.2f%n",
                    what,
                    1000 * quantile(seconds, 0.5),
                    quantile(ratios, 0.5),
                    ratios.get(0),
                    ratios.get(ratios.size() - 1));
        });
        System.out.printf(Locale.ROOT, "%d rounds, %s%n%n", floor.size(), load());
    }

    /** The value below which the share {@code p} of the values lies. */
    public static double quantile(List<Double> values, double p) {
        List<Double> sorted = values.stream().sorted().toList();
        return sorted.get((int) Math.min(sorted.size() - 1, Math.floor(p * sorted.size())));
    }

    private static String load() {
        return String.format(
                Locale.ROOT,
                "load %.1f on %d processors, Java %s",
                ManagementFactory.getOperatingSystemMXBean().getSystemLoadAverage(),
                Runtime.getRuntime().availableProcessors(),
                Runtime.version());
    }

    /** Something to be measured. */
    @FunctionalInterface
    public interface Work {

        /** Does it once. */
        void run() throws Exception;
    }
}
