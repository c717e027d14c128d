package org.levelgaze.bench;

import java.io.IOException;
import java.util.List;
import java.util.Random;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.StudyBuilder;
import org.levelgaze.agreement.Terms;
import org.levelgaze.agreement.TrueState;

/**
 * One camera that judges each piece 50 times: how the time grows from 100,000 calls to 1,000,000, how it stands to a plain
 * walk over the same calls, and the smallest heap in which 1,000,000 calls are put together and assessed.
 *
 * <p>Arguments: rounds (9). Five more rounds warm up. With {@code once} it only puts one large study together and assesses it.
 */
final class CameraStudy {

    private static final int TRIALS = 50;
    private static final int SMALL = 100_000;
    private static final int LARGE = 1_000_000;
    private static final int REPEATS = LARGE / SMALL;
    private static final int WARM_UP = 5;
    private static final int[] HEAPS = {256, 192, 128, 96, 80, 64, 56, 48, 40, 32};

    private final Study small = study(SMALL);
    private final Study large = study(LARGE);
    private final Measured growth = new Measured();
    private final Measured work = new Measured();
    private int levels;
    private long rejects;
    private @Nullable Object last;

    private CameraStudy() {}

    /** Runs the benchmark. */
    public static void main(String[] arguments) throws Exception {
        if (List.of(arguments).contains("once")) {
            System.out.println(Engine.assess(study(LARGE), Terms.STANDARD).study());
            return;
        }
        int rounds = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 9;
        CameraStudy bench = new CameraStudy();
        for (int round = -WARM_UP; round < rounds; round++) {
            if (round == 0) {
                bench.growth.forget();
                bench.work.forget();
            }
            bench.round();
        }
        bench.print();
        System.out.println("Smallest heap of those tried, for " + LARGE + " calls: " + smallestHeap() + " MB");
    }

    private void round() throws Exception {
        growth.time("assess, 100,000 calls", REPEATS, () -> assessRepeatedly(() -> Terms.STANDARD));
        growth.time("assess, 1,000,000 calls", 1, () -> last = Engine.assess(large, Terms.STANDARD));
        growth.time("100,000 calls, nothing remembered", REPEATS, () -> assessRepeatedly(this::newLevel));
        growth.time("1,000,000 calls, nothing remembered", 1, () -> last = Engine.assess(large, newLevel()));
        work.time(
                "walk over 1,000,000 calls",
                1,
                () -> large.forEachCall((piece, appraiser, trial, call, seen) -> {
                    rejects += call == Call.REJECT ? 1 : 0;
                }));
        work.time("assess 1,000,000 calls", 1, () -> last = Engine.assess(large, newLevel()));
        work.time("make up 1,000,000 calls, put them together", 1, () -> last = study(LARGE));
    }

    /** As many calls in all as the large study has. */
    private void assessRepeatedly(Supplier<Terms> terms) {
        for (int repeat = 0; repeat < REPEATS; repeat++) {
            last = Engine.assess(small, terms.get());
        }
    }

    private void print() {
        System.out.println("One camera, " + TRIALS + " trials: growth with the number of calls");
        growth.print();
        System.out.println("The same, against a plain walk (" + rejects + " rejects seen in all walks)");
        work.print();
        if (last == null) {
            throw new IllegalStateException("Nothing was computed");
        }
    }

    /** What the engine remembers of shares is keyed by the level: at a new one it remembers nothing. */
    private Terms newLevel() {
        return new Terms(0.95 + ++levels * 1e-9, null);
    }

    private static Study study(int calls) {
        Random random = new Random(calls);
        StudyBuilder study = Study.builder(calls);
        study.appraiser("CAMERA");
        for (int piece = 0; piece < calls / TRIALS; piece++) {
            boolean defective = random.nextInt(4) == 0;
            study.piece("P" + piece, defective ? TrueState.DEFECTIVE : TrueState.GOOD, null);
            study = called(study, piece, defective, random);
        }
        return study.build();
    }

    private static StudyBuilder called(StudyBuilder study, int piece, boolean defective, Random random) {
        StudyBuilder called = study;
        for (int trial = 1; trial <= TRIALS; trial++) {
            boolean wrong = random.nextInt(20) == 0;
            called = called.call(piece, 0, trial, defective != wrong ? Call.REJECT : Call.ACCEPT, Study.NO_KIND);
        }
        return called;
    }

    /** Tries ever smaller heaps, each in a virtual machine of its own, until one is too small. */
    private static int smallestHeap() throws IOException, InterruptedException {
        int smallest = Integer.MAX_VALUE;
        for (int heap : HEAPS) {
            Process process = ProgramJar.java(
                            "-Xmx" + heap + "m",
                            "-cp",
                            System.getProperty("java.class.path"),
                            CameraStudy.class.getName(),
                            "once")
                    .start();
            if (process.waitFor() != 0) {
                return smallest;
            }
            smallest = heap;
        }
        return smallest;
    }
}
