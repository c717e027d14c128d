package org.levelgaze.studies.importing;

import jakarta.annotation.PreDestroy;
import java.time.Duration;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.Future;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.RejectedExecutionException;
import java.util.concurrent.ThreadPoolExecutor;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.springframework.scheduling.annotation.Scheduled;
import org.springframework.stereotype.Service;

/** Runs imports in the background, a few at once; the others wait for their turn. */
@Service
class ImportRuns {

    private static final int AT_ONCE = 2;
    private static final int WAITING = 50;
    private static final Duration PATIENCE = Duration.ofMillis(1500);
    private static final int SECONDS_TO_STOP = 20;

    private final Uploads uploads;
    private final ImportRun oneRun;
    private final ImportPapers papers;
    private final Set<Upload> underWay = ConcurrentHashMap.newKeySet();
    private final ThreadPoolExecutor threads = new ThreadPoolExecutor(
            AT_ONCE, AT_ONCE, 1, TimeUnit.MINUTES, new LinkedBlockingQueue<>(WAITING), ImportRuns::thread);
    private volatile boolean stopping;

    ImportRuns(Uploads uploads, ImportRun oneRun, ImportPapers papers) {
        this.uploads = uploads;
        this.oneRun = oneRun;
        this.papers = papers;
    }

    private static Thread thread(Runnable task) {
        return new Thread(task, "import");
    }

    /**
     * Starts a run, unless one is under way, and waits a little for it, since most files are short.
     *
     * @throws Refusal when too many imports are waiting already
     */
    void start(Actor actor, Upload upload, ImportOrder order) {
        Optional<Upload> run = uploads.start(actor, upload, papers.write(order));
        run.ifPresent(started -> waitALittle(submit(actor, started, order)));
    }

    private Future<?> submit(Actor actor, Upload run, ImportOrder order) {
        underWay.add(run);
        try {
            return threads.submit(() -> {
                try {
                    oneRun.run(actor, run, order, () -> stopping);
                } finally {
                    underWay.remove(run);
                }
            });
        } catch (RejectedExecutionException e) {
            underWay.remove(run);
            uploads.end(run, Upload.State.BROKEN, null);
            throw new Refusal(Refusal.Kind.TOO_MANY, "imports-busy");
        }
    }

    private static void waitALittle(Future<?> run) {
        try {
            run.get(PATIENCE.toMillis(), TimeUnit.MILLISECONDS);
        } catch (TimeoutException e) {
            return; // the page shows how far it is
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        } catch (ExecutionException e) {
            throw new IllegalStateException(e.getCause());
        }
    }

    /** Tells every other node, and the pages, that what waits or works here is alive. */
    @Scheduled(fixedDelay = 10, timeUnit = TimeUnit.SECONDS)
    void giveSignsOfLife() {
        underWay.forEach(uploads::touch);
    }

    @Scheduled(initialDelay = 1, fixedDelay = 60, timeUnit = TimeUnit.MINUTES)
    void forgetOld() {
        uploads.forgetOld();
    }

    /** Breaks off what is under way before the database goes; it can be started again. */
    @PreDestroy
    void stop() throws InterruptedException {
        stopping = true;
        threads.shutdown();
        if (!threads.awaitTermination(SECONDS_TO_STOP, TimeUnit.SECONDS)) {
            threads.shutdownNow();
        }
    }
}
