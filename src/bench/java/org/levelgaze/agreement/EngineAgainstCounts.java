package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.levelgaze.bench.Measured;

/**
 * The engine on studies of 50 pieces, 3 appraisers and 3 trials (450 calls) against the same work without intervals, see
 * {@link WithoutIntervals}. The studies are made beforehand and all differ.
 *
 * <p>What the engine remembers of shares is keyed by the level too, so a level that was never asked for finds nothing:
 * "nothing remembered" asks at a new level for each study, "remembered while going" at a new one for each round,
 * "remembered" at the same one in all rounds.
 *
 * <p>Arguments: studies (2000), rounds (7). Three more rounds warm up.
 */
final class EngineAgainstCounts {

    private static final long SEED = 20261201L;
    private static final int PIECES = 50;
    private static final int APPRAISERS = 3;
    private static final int TRIALS = 3;
    private static final int WARM_UP = 3;

    private final List<Study> studies = new ArrayList<>();
    private final Measured measured = new Measured();
    private int levels;
    private @Nullable Object last;

    private EngineAgainstCounts(int count) {
        Random random = new Random(SEED);
        for (int number = 0; number < count; number++) {
            studies.add(study(random));
        }
    }

    /** Runs the benchmark. */
    public static void main(String[] arguments) throws Exception {
        int studies = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 2_000;
        int rounds = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 7;
        EngineAgainstCounts bench = new EngineAgainstCounts(studies);
        for (int round = -WARM_UP; round < rounds; round++) {
            if (round == 0) {
                bench.measured.forget();
            }
            bench.round();
        }
        System.out.println("Time per study of 450 calls, seed " + SEED + ", " + studies + " studies");
        bench.measured.print();
    }

    private void round() throws Exception {
        overAll("all figures without intervals", WithoutIntervals::all);
        overAll("counts and coefficients only", WithoutIntervals::countsAndKappas);
        overAll("engine, remembered", study -> Engine.assess(study, Terms.STANDARD));
        Terms ofThisRound = newLevel();
        overAll("engine, remembered while going", study -> Engine.assess(study, ofThisRound));
        overAll("engine, nothing remembered", study -> Engine.assess(study, newLevel()));
    }

    private void overAll(String what, Function<Study, Object> work) throws Exception {
        measured.time(what, studies.size(), () -> studies.forEach(study -> last = work.apply(study)));
        if (last == null) {
            throw new IllegalStateException("Nothing was computed");
        }
    }

    private Terms newLevel() {
        return new Terms(0.95 + ++levels * 1e-9, null);
    }

    private static Study study(Random random) {
        StudyBuilder study = Study.builder(PIECES * APPRAISERS * TRIALS);
        for (int piece = 0; piece < PIECES; piece++) {
            study.piece("P" + piece, random.nextBoolean() ? TrueState.DEFECTIVE : TrueState.GOOD, null);
        }
        for (int appraiser = 0; appraiser < APPRAISERS; appraiser++) {
            study.appraiser("A" + appraiser);
        }
        StudyBuilder called = study;
        for (int appraiser = 0; appraiser < APPRAISERS; appraiser++) {
            double misses = random.nextDouble() * 0.3;
            double falseAlarms = random.nextDouble() * 0.3;
            for (int piece = 0; piece < PIECES; piece++) {
                boolean defective = study.pieces.get(piece).truth() == TrueState.DEFECTIVE;
                for (int trial = 1; trial <= TRIALS; trial++) {
                    boolean wrong = random.nextDouble() < (defective ? misses : falseAlarms);
                    called = called.call(
                            piece, appraiser, trial, defective != wrong ? Call.REJECT : Call.ACCEPT, Study.NO_KIND);
                }
            }
        }
        return called.build();
    }
}
