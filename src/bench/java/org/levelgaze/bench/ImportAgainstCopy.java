package org.levelgaze.bench;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import javax.sql.DataSource;
import org.flywaydb.core.Flyway;
import org.levelgaze.Levelgaze;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.StudyRequest;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.postgresql.PGConnection;
import org.postgresql.copy.CopyManager;
import org.springframework.boot.SpringApplication;
import org.springframework.context.ConfigurableApplicationContext;

/**
 * The whole import of a file (reading the CSV, checking, storing, computing the findings, journal, commit) against two floors
 * of the same rows: a raw binary COPY into the same table, with its key and foreign keys, and a raw binary COPY into a table
 * of the same columns without any. The program runs on its own, durable PostgreSQL.
 *
 * <p>Arguments: calls per file (200000), rounds (5), pieces of the set that each file brings (1000). The first round warms up
 * and is not counted. The floors get study, appraisers and pieces for nothing; the import makes a set, too.
 */
public final class ImportAgainstCopy {

    private static final Actor ACTOR = Actor.system(SiteId.MAIN);
    private static final String COLUMNS = "study_id, site_id, appraiser_no, piece_no, trial, kind_no, accepted";
    private static final int APPRAISERS = 4;

    private final StudyImport imports;
    private final DataSource database;
    private final Flyway flyway;
    private final int calls;
    private final int pieces;
    private final List<Double> importing = new ArrayList<>();
    private final List<Double> reading = new ArrayList<>();
    private final List<Double> constrained = new ArrayList<>();
    private final List<Double> bare = new ArrayList<>();

    private ImportAgainstCopy(ConfigurableApplicationContext program, int calls, int pieces) {
        this.imports = program.getBean(StudyImport.class);
        this.database = program.getBean(DataSource.class);
        this.flyway = program.getBean(Flyway.class);
        this.calls = calls;
        this.pieces = pieces;
    }

    /** Runs the benchmark and prints the medians as ratios. */
    public static void main(String[] arguments) throws Exception {
        int calls = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 200_000;
        int rounds = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 5;
        int pieces = arguments.length > 2 ? Integer.parseInt(arguments[2]) : 1_000;
        Path home = Files.createTempDirectory("levelgaze-bench");
        try (ConfigurableApplicationContext program =
                SpringApplication.run(Levelgaze.class, "--levelgaze.home=" + home.resolve("home"), "--server.port=0")) {
            program.getBean(Tasks.class).create(ACTOR, "RIM", "Rim of the bowl", List.of());
            new ImportAgainstCopy(program, calls, pieces).run(rounds);
        }
    }

    private void run(int rounds) throws Exception {
        try (Connection connection = database.getConnection()) {
            for (int round = 0; round <= rounds; round++) {
                round(connection, round);
                if (round == 0) {
                    List.of(importing, reading, constrained, bare).forEach(List::clear);
                }
            }
        }
        double floor = median(constrained);
        System.out.printf(Locale.ROOT, "%d calls on %d pieces, %d rounds, medians%n", calls, pieces, rounds);
        line("raw COPY, same table with its constraints", floor, floor);
        line("raw COPY, no constraints", median(bare), floor);
        line("whole import", median(importing), floor);
        line("of it reading the CSV", median(reading), floor);
        System.out.printf(Locale.ROOT, "import / COPY without constraints: %.2f%n", median(importing) / median(bare));
    }

    private static void line(String what, double seconds, double floor) {
        System.out.printf(Locale.ROOT, "%-45s %7.3f s  %5.2f%n", what, seconds, seconds / floor);
    }

    private void round(Connection connection, int round) throws Exception {
        byte[] file = file(round);
        long start = System.nanoTime();
        RecordedCalls read = ((Reading.Read) CallReader.standard().read(new ByteArrayInputStream(file))).calls();
        reading.add(since(start));
        StudyRequest request =
                new StudyRequest("RIM", "S-" + round, LocalDate.of(2026, 3, 2), null, true, "", Consent.EVERYTHING_NEW);
        long study = ((ImportOutcome.Stored) imports.take(ACTOR, request, read, Watcher.NONE))
                .study()
                .id();
        importing.add(since(start));
        copyOnce(connection, study, round);
    }

    private void copyOnce(Connection connection, long study, int round) throws SQLException, IOException {
        connection.setAutoCommit(false);
        CopyManager copies = connection.unwrap(PGConnection.class).getCopyAPI();
        long twin = 1_000_000_000L + round;
        try (Statement statement = connection.createStatement()) {
            twinHead(statement, study, twin);
        }
        byte[] rows = rows(copies, study, twin);
        connection.commit();
        constrained.add(copy(connection, "study_call", rows));
        try (Connection owner = flyway.getConfiguration().getDataSource().getConnection();
                Statement statement = owner.createStatement()) {
            statement.execute(
                    "create table if not exists bench_call as select " + COLUMNS + " from study_call limit 0");
            owner.setAutoCommit(false);
            bare.add(copy(owner, "bench_call", rows));
        }
    }

    private static double copy(Connection connection, String table, byte[] rows) throws SQLException, IOException {
        long start = System.nanoTime();
        connection
                .unwrap(PGConnection.class)
                .getCopyAPI()
                .copyIn(
                        "copy " + table + " (" + COLUMNS + ") from stdin (format binary)",
                        new ByteArrayInputStream(rows));
        connection.commit();
        return since(start);
    }

    /** The study again under another number, so that the same calls can be copied raw. */
    private static void twinHead(Statement statement, long study, long twin) throws SQLException {
        statement.execute("insert into study select site_id, " + twin + ", task_id, set_id, edition_no, performed_on,"
                + " file_name, file_digest, 1, pieces, calls, calls_missing, recorded_at, recorded_by"
                + " from study where study_id = " + study);
        statement.execute("insert into study_appraiser select site_id, " + twin
                + ", appraiser_no, appraiser_id, configuration_no, trials from study_appraiser where study_id = "
                + study);
        statement.execute("insert into study_piece select site_id, " + twin
                + ", piece_no, piece_id from study_piece where study_id = " + study);
    }

    /** The calls of the study in COPY's binary form, in the order in which they came. */
    private static byte[] rows(CopyManager copies, long study, long twin) throws SQLException, IOException {
        ByteArrayOutputStream rows = new ByteArrayOutputStream();
        copies.copyOut(
                "copy (select " + twin + "::bigint, site_id, appraiser_no, piece_no, trial, kind_no, accepted"
                        + " from study_call where study_id = " + study + ") to stdout (format binary)",
                rows);
        return rows.toByteArray();
    }

    /** A file that no other round has: its number is written into the labels. */
    private byte[] file(int round) {
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        int trials = calls / (pieces * APPRAISERS);
        for (int appraiser = 0; appraiser < APPRAISERS; appraiser++) {
            for (int trial = 1; trial <= trials; trial++) {
                for (int piece = 0; piece < pieces; piece++) {
                    boolean defective = piece % 2 == 0;
                    boolean wrong = (piece + 7 * trial + 3 * appraiser) % 11 == 0;
                    file.append('R').append(round).append('-').append(piece);
                    file.append(defective ? ",defective,A" : ",good,A")
                            .append(appraiser)
                            .append(',')
                            .append(trial);
                    file.append(defective == wrong ? ",accept\n" : ",reject\n");
                }
            }
        }
        return file.toString().getBytes(StandardCharsets.UTF_8);
    }

    private static double since(long start) {
        return (System.nanoTime() - start) / 1e9;
    }

    private static double median(List<Double> values) {
        List<Double> sorted = values.stream().sorted().toList();
        return sorted.get(sorted.size() / 2);
    }
}
