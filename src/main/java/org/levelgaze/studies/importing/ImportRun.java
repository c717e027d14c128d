package org.levelgaze.studies.importing;

import java.io.IOException;
import java.io.InputStream;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.CancellationException;
import java.util.function.BooleanSupplier;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionTemplate;

/** Takes one upload from its bytes to a study, or to the reason why there is none. */
@Component
class ImportRun {

    private static final Logger LOG = LoggerFactory.getLogger(ImportRun.class);
    private static final Duration BETWEEN_NOTES = Duration.ofMillis(500);

    private final Uploads uploads;
    private final StudyImport imports;
    private final Tasks tasks;
    private final Mappings mappings;
    private final ImportPapers papers;
    private final TransactionTemplate transactions;

    ImportRun(
            Uploads uploads,
            StudyImport imports,
            Tasks tasks,
            Mappings mappings,
            ImportPapers papers,
            TransactionTemplate transactions) {
        this.uploads = uploads;
        this.imports = imports;
        this.tasks = tasks;
        this.mappings = mappings;
        this.papers = papers;
        this.transactions = transactions;
    }

    /**
     * Runs to an end that is noted with the upload, whatever happens.
     *
     * @param stopping whether the program is going down, which ends the run without the user's doing
     */
    void run(Actor actor, Upload run, ImportOrder order, BooleanSupplier stopping) {
        try {
            readAndStore(actor, run, order, stopping);
        } catch (CancellationException e) {
            uploads.end(run, stopping.getAsBoolean() ? Upload.State.BROKEN : Upload.State.CANCELLED, null);
        } catch (Refusal refusal) {
            uploads.end(run, Upload.State.REFUSED, papers.write(ImportProblem.of(refusal)));
        } catch (IOException | RuntimeException | OutOfMemoryError e) {
            LOG.error("The import of upload {} broke off", run.id(), e);
            uploads.end(run, Upload.State.BROKEN, null);
        }
    }

    private void readAndStore(Actor actor, Upload run, ImportOrder order, BooleanSupplier stopping) throws IOException {
        Reading reading = read(run, order, new Notes(run, null, stopping));
        if (reading instanceof Reading.Refused refused) {
            throw badRows(refused);
        }
        RecordedCalls calls = ((Reading.Read) reading).calls();
        Notes notes = new Notes(run, (long) calls.calls(), stopping);
        if (!notes.note(0, run.bytes())) {
            throw new CancellationException("Stopped before anything was stored");
        }
        if (transactions.execute(status -> {
                    ImportOutcome outcome = store(actor, run, order, calls, notes);
                    if (outcome instanceof ImportOutcome.Asked) {
                        status.setRollbackOnly();
                    }
                    return outcome;
                })
                instanceof ImportOutcome.Asked asked) {
            uploads.end(run, Upload.State.REFUSED, papers.write(ImportProblem.of(asked)));
        }
    }

    private Reading read(Upload run, ImportOrder order, Watcher watcher) throws IOException {
        Mapping mapping = order.mapping();
        try (InputStream content = uploads.content(run)) {
            return new CallReader(mapping.layout(), mapping.words().withKnown()).read(content, watcher, error -> {});
        }
    }

    static Refusal badRows(Reading.Refused refused) {
        return new Refusal(
                Refusal.Kind.INVALID, "bad-rows", List.of(refused.inAll()), refused.first(), refused.inAll());
    }

    /** Everything that the file brings, and that the upload has become it, in one transaction. */
    private ImportOutcome store(Actor actor, Upload run, ImportOrder order, RecordedCalls calls, Watcher watcher) {
        Task task = tasks.byCode(actor.site(), order.task()).orElseGet(() -> create(actor, order));
        ImportOutcome outcome = imports.take(actor, order.request(run.fileName()), calls, watcher);
        if (outcome instanceof ImportOutcome.Stored stored) {
            mappings.remember(actor, task, order.mapping());
            if (!uploads.done(run, stored.study().id())) {
                throw new CancellationException("A later run of the same upload has taken over");
            }
        }
        return outcome;
    }

    private Task create(Actor actor, ImportOrder order) {
        String name = order.newTaskName();
        if (name == null) {
            throw new Refusal(Refusal.Kind.INVALID, "unknown-task", order.task());
        }
        return tasks.create(actor, order.task(), name, List.of());
    }

    /** Notes the progress with the upload, twice a second at most, and hears there whether to go on. */
    private final class Notes implements Watcher {

        private final Upload run;
        private final @Nullable Long callsInAll;
        private final BooleanSupplier stopping;
        private long notedAt = System.nanoTime();

        Notes(Upload run, @Nullable Long callsInAll, BooleanSupplier stopping) {
            this.run = run;
            this.callsInAll = callsInAll;
            this.stopping = stopping;
        }

        @Override
        public boolean goesOn(long rows, long bytes) {
            boolean due = System.nanoTime() - notedAt >= BETWEEN_NOTES.toNanos();
            return !due || note(rows, bytes);
        }

        boolean note(long rows, long bytes) {
            notedAt = System.nanoTime();
            return !stopping.getAsBoolean() && uploads.progress(run, rows, bytes, callsInAll);
        }
    }
}
