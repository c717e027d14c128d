package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicReference;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.RepeatedTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.junit.jupiter.api.io.TempDir;
import org.levelgaze.testing.RunningProgram;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** kill -9 in the middle of a loop of imports: what was acknowledged is there, nothing is there in part. */
class KilledWhileImportingTest {

    private static final JsonMapper JSON = new JsonMapper();
    private static final int PIECES = 200;
    private static final long SEED = 20261201L;

    @TempDir
    Path folder;

    @Test
    void keepsEveryAcknowledgedImportAndNoPartOfAnother() throws Exception {
        killedTimes(3);
    }

    /** Run by the profile {@code kills}; its result stands in the README of the benchmarks. */
    @RepeatedTest(1)
    @EnabledIfSystemProperty(named = "levelgaze.kills", matches = "\\d+")
    void keepsThemOverManyKills() throws Exception {
        killedTimes(Integer.getInteger("levelgaze.kills"));
    }

    private void killedTimes(int kills) throws Exception {
        SplittableRandom chance = new SplittableRandom(SEED);
        Map<Long, String> acknowledged = new HashMap<>();
        for (int kill = 0; kill < kills; kill++) {
            RunningProgram program = RunningProgram.start(folder.resolve("home"));
            if (kill == 0) {
                enterTask(program);
            }
            assertWhole(program, acknowledged, "seed " + SEED + ", before kill " + (kill + 1));
            importUntilKilled(program, acknowledged, kill, 2 + chance.nextInt(6), chance.nextInt(60));
        }
        try (RunningProgram program = RunningProgram.start(folder.resolve("home"))) {
            assertWhole(program, acknowledged, "seed " + SEED + ", after the last kill");
            assertThat(RunningProgram.command(folder.resolve("home"), "verify"))
                    .contains("the journal is intact", "0 differ", "Everything that is stored follows from its facts.")
                    .endsWith("exit 0");
        }
    }

    private static void enterTask(RunningProgram program) throws IOException, InterruptedException {
        HttpResponse<String> answer = program.post(
                "/api/v1/tasks", "application/json", BodyPublishers.ofString("{\"code\":\"RIM\",\"name\":\"Rim\"}"));
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(201);
    }

    /** Imports one file after the other; some milliseconds after so many answers the process is killed. */
    private static void importUntilKilled(
            RunningProgram program, Map<Long, String> acknowledged, int kill, int answers, int milliseconds)
            throws Exception {
        CountDownLatch enough = new CountDownLatch(answers);
        AtomicReference<@Nullable Throwable> failure = new AtomicReference<>();
        Thread importing = new Thread(() -> {
            try {
                for (int number = 0; ; number++) {
                    String set = "S-" + kill + "-" + number;
                    acknowledged.put(imported(program, set), set);
                    enough.countDown();
                }
            } catch (IOException killed) {
                enough.countDown();
            } catch (Throwable other) {
                failure.set(other);
            }
        });
        importing.start();
        enough.await();
        importing.join(milliseconds);
        program.kill();
        importing.join();
        assertThat(failure.get()).isNull();
    }

    private static long imported(RunningProgram program, String set) throws IOException, InterruptedException {
        HttpResponse<String> answer = program.post(
                "/api/v1/studies?task=RIM&performedOn=2026-05-04&create=true&set=" + set,
                "text/csv",
                BodyPublishers.ofString(calls(set)));
        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(201);
        return JSON.readTree(answer.body()).get("id").asLong();
    }

    private static String calls(String set) {
        StringBuilder csv = new StringBuilder("piece,reference,appraiser,trial,call\n");
        for (int piece = 0; piece < PIECES; piece++) {
            String truth = piece % 2 == 0 ? "good,ANA,1,accept" : "defective,ANA,1,reject";
            csv.append(set).append('-').append(piece).append(',').append(truth).append('\n');
        }
        return csv.toString();
    }

    private static void assertWhole(RunningProgram program, Map<Long, String> acknowledged, String when)
            throws IOException, InterruptedException {
        Set<Long> present = new HashSet<>();
        String after = "";
        while (after != null) {
            JsonNode page = JSON.readTree(
                    program.get("/api/v1/studies?limit=500" + after).body());
            for (JsonNode study : page.get("items")) {
                assertStudyWhole(program, study, when);
                present.add(study.get("id").asLong());
            }
            after = page.get("next").isNull()
                    ? null
                    : "&after=" + page.get("next").asString();
        }
        assertThat(present).as(when).containsAll(acknowledged.keySet());
        JsonNode journal =
                JSON.readTree(program.get("/api/v1/journal/verification").body());
        assertThat(journal.get("intact").asBoolean()).as(when + ": " + journal).isTrue();
    }

    /** An import that nobody was told of may be there, but then all of it. */
    private static void assertStudyWhole(RunningProgram program, JsonNode study, String when)
            throws IOException, InterruptedException {
        HttpResponse<String> findings = program.get("/api/v1/studies/" + study.get("id") + "/findings");
        assertThat(findings.statusCode()).as(when).isEqualTo(200);
        JsonNode shape = JSON.readTree(findings.body()).get("study");
        assertThat(shape.get("callsMade").asInt()).as(when).isEqualTo(PIECES);
        assertThat(study.get("calls").asInt()).as(when).isEqualTo(PIECES);
        assertThat(study.get("callsMissing").asInt()).as(when).isZero();
    }
}
