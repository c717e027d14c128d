package org.levelgaze.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.levelgaze.Levelgaze;
import org.levelgaze.studies.FindingsJson;

/** The command as a program of its own, as a user starts it. */
class AssessProcessTest {

    private static final String STUDY = "src/test/resources/reference/aiag_msa4_calls.csv";

    @TempDir
    Path folder;

    @Test
    void answersWithoutLoadingTheFramework() throws Exception {
        Path classes = folder.resolve("classes.log");

        int code = run(List.of("-Xlog:class+load:file=" + classes), "assess", STUDY, "--format", "json");

        assertThat(code).isZero();
        assertThat(FindingsJson.read(read("out")).appraisers()).hasSize(3);
        assertThat(read("err")).isEmpty();
        assertThat(Files.readString(classes))
                .contains("org.levelgaze.agreement.Engine")
                .doesNotContain(" org.springframework.");
    }

    @Test
    void exitsWithTwoOnBadInput() throws Exception {
        Path bad = Files.writeString(
                folder.resolve("bad.csv"), "piece,reference,appraiser,trial,call\n1,good,Zoë,1,jein\n");

        int code = run(List.of(), "assess", bad.toString());

        assertThat(code).isEqualTo(2);
        assertThat(read("out")).isEmpty();
        assertThat(read("err")).contains("'jein'");
    }

    private int run(List<String> options, String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(options);
        command.addAll(
                List.of("-Duser.language=en", "-cp", System.getProperty("java.class.path"), Levelgaze.class.getName()));
        command.addAll(List.of(arguments));
        Process process = new ProcessBuilder(command)
                .redirectOutput(folder.resolve("out").toFile())
                .redirectError(folder.resolve("err").toFile())
                .start();
        assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
        return process.exitValue();
    }

    private String read(String name) throws IOException {
        return Files.readString(folder.resolve(name), StandardCharsets.UTF_8);
    }
}
