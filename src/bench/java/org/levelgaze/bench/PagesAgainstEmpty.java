package org.levelgaze.bench;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.levelgaze.Levelgaze;
import org.levelgaze.access.Accounts;
import org.levelgaze.access.NewAccount;
import org.levelgaze.access.Role;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.StudyRequest;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.boot.builder.SpringApplicationBuilder;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.context.support.GenericApplicationContext;

/**
 * Pages as a signed-in person gets them, over HTTP, four at a time, against an empty Thymeleaf page of the same program behind
 * the same sign-in; and how many statements each of them sends to the database. The program runs on its own PostgreSQL and
 * holds 60 studies of 450 calls by three appraisers, for three tasks.
 *
 * <p>Arguments: requests per page and round (200), rounds (7), addresses of further pages. Three more rounds warm up.
 */
final class PagesAgainstEmpty {

    private static final Actor ACTOR = Actor.system(SiteId.MAIN);
    private static final String PASSWORD = "glaze-kiln-and-chip-74";
    private static final int AT_ONCE = 4;
    private static final int STUDIES = 60;
    private static final int TASKS = 3;
    private static final int WARM_UP = 3;

    private final List<SignedIn> people = new ArrayList<>();
    private final List<String> pages = new ArrayList<>();
    private final Measured middle = new Measured();
    private final Measured slowest = new Measured();
    private final ExecutorService threads = Executors.newFixedThreadPool(AT_ONCE);

    private PagesAgainstEmpty() {}

    /** Runs the benchmark. */
    public static void main(String[] arguments) throws Exception {
        int requests = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 200;
        int rounds = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 7;
        Path home = Files.createTempDirectory("levelgaze-bench");
        try (ConfigurableApplicationContext program = new SpringApplicationBuilder(Levelgaze.class)
                .initializers((GenericApplicationContext context) -> context.registerBean(EmptyPages.class))
                .properties(Map.of("levelgaze.home", home.resolve("home").toString(), "server.port", "0"))
                .run()) {
            PagesAgainstEmpty bench = new PagesAgainstEmpty();
            bench.fill(program);
            bench.pages.addAll(List.of(arguments).subList(Math.min(2, arguments.length), arguments.length));
            bench.run(requests, rounds);
        }
    }

    private void fill(ConfigurableApplicationContext program) throws IOException, InterruptedException {
        NewAccount account = new NewAccount(
                "ana", "Ana Tarn", PASSWORD, Set.of(Role.ADMINISTRATOR, Role.QUALITY_ENGINEER), Locale.UK);
        program.getBean(Accounts.class).create(ACTOR, account);
        for (int task = 0; task < TASKS; task++) {
            program.getBean(Tasks.class).create(ACTOR, "RIM-" + task, "Rim of the bowl " + task, List.of());
        }
        long last = 0;
        for (int number = 0; number < STUDIES; number++) {
            last = study(program.getBean(StudyImport.class), number);
        }
        int port = program.getEnvironment().getRequiredProperty("local.server.port", Integer.class);
        for (int person = 0; person < AT_ONCE; person++) {
            people.add(SignedIn.as("ana", PASSWORD, port));
        }
        Collections.addAll(pages, EmptyPages.EMPTY, EmptyPages.FRAME, "/studies/" + last, "/studies");
    }

    private static long study(StudyImport imports, int number) throws IOException {
        Reading reading = CallReader.standard().read(new ByteArrayInputStream(calls()));
        String task = "RIM-" + number % TASKS;
        LocalDate day = LocalDate.of(2026, 1, 1).plusDays(number);
        StudyRequest request =
                new StudyRequest(task, "S-" + task, day, null, true, "calls.csv", Consent.EVERYTHING_NEW);
        ImportOutcome outcome = imports.take(ACTOR, request, ((Reading.Read) reading).calls(), Watcher.NONE);
        return ((ImportOutcome.Stored) outcome).study().id();
    }

    private static byte[] calls() throws IOException {
        try (InputStream file =
                Objects.requireNonNull(PagesAgainstEmpty.class.getResourceAsStream("/reference/aiag_msa4_calls.csv"))) {
            return new String(file.readAllBytes(), StandardCharsets.UTF_8)
                    .replace("\r\n", "\n")
                    .getBytes(StandardCharsets.UTF_8);
        }
    }

    private void run(int requests, int rounds) throws Exception {
        for (String page : pages) {
            statements(page);
        }
        for (int round = -WARM_UP; round < rounds; round++) {
            if (round == 0) {
                middle.forget();
                slowest.forget();
            }
            for (String page : pages) {
                round(page, requests);
            }
        }
        threads.shutdown();
        System.out.println("p50 of " + requests + " requests, " + AT_ONCE + " at once");
        middle.print();
        System.out.println("p99 of " + requests + " requests, " + AT_ONCE + " at once");
        slowest.print();
    }

    private void round(String page, int requests) throws Exception {
        List<Callable<List<Double>>> work = people.stream()
                .<Callable<List<Double>>>map(person -> () -> opened(person, page, requests / AT_ONCE))
                .toList();
        List<Double> seconds = new ArrayList<>();
        for (Future<List<Double>> one : threads.invokeAll(work)) {
            seconds.addAll(one.get());
        }
        middle.add(page, Measured.quantile(seconds, 0.5));
        slowest.add(page, Measured.quantile(seconds, 0.99));
    }

    private static List<Double> opened(SignedIn person, String page, int times)
            throws IOException, InterruptedException {
        List<Double> seconds = new ArrayList<>();
        for (int time = 0; time < times; time++) {
            long start = System.nanoTime();
            person.open(page);
            seconds.add((System.nanoTime() - start) / 1e9);
        }
        return seconds;
    }

    /** Opens the page twice, so that what is read only once in a while is not counted, and prints what the second one said. */
    private void statements(String page) throws Exception {
        int length = people.get(0).open(page).length();
        Map<String, Integer> said = StatementLog.during(() -> people.get(0).open(page));
        int all = said.values().stream().mapToInt(Integer::intValue).sum();
        System.out.println(page + ": " + length / 1000 + " kB, " + all + " statements");
        said.forEach((statement, times) -> System.out.println("  " + times + " x " + statement));
    }
}
