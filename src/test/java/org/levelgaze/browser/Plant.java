package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.levelgaze.testing.Chromium;
import org.levelgaze.testing.RunningProgram;
import org.springframework.util.FileSystemUtils;

/** One installation, from its first start on: the whole program with a PostgreSQL and a home of its own. */
final class Plant implements AutoCloseable {

    /** Who made the first account: administrator, quality engineer and holder of the standard. */
    static final String ENGINEER = "mara";

    static final String PASSWORD = "glaze over slip over clay";

    private static final Pattern CODE = Pattern.compile("enter this one-time code: (\\S+)");

    private final Path folder;
    private final Set<String> looked = new HashSet<>();
    private RunningProgram program;

    private Plant(Path folder, RunningProgram program) {
        this.folder = folder;
        this.program = program;
    }

    /** Starts the program for the first time and makes the first account, as the console says. */
    static Plant start() {
        try {
            Path folder = Files.createTempDirectory("plant");
            Plant plant = new Plant(folder, RunningProgram.start(folder.resolve("home")));
            plant.setUp();
            return plant;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    private void setUp() throws IOException {
        Matcher printed = CODE.matcher(program.log());
        assertThat(printed.find()).as(program.log()).isTrue();
        try (Desk desk = new Desk(this, Chromium.open())) {
            desk.open("/");
            assertThat(desk.path()).isEqualTo("/setup");
            assertThat(desk.reads()).contains("Who looks after this installation?");
            desk.type("One-time code", "AAAA-AAAA-AAAA-AAAA");
            firstAccount(desk);
            assertThat(desk.reads()).contains("This is not the one-time code.");
            desk.type("One-time code", printed.group(1));
            firstAccount(desk);
            assertThat(desk.reads())
                    .contains("What needs a hand today?", "There is no study yet. Bring a file of calls");
        }
    }

    private static void firstAccount(Desk desk) {
        desk.type("Name", "Mara Tarn");
        desk.type("Sign-in name", ENGINEER);
        desk.type("New password", PASSWORD);
        desk.type("The new password once more", PASSWORD);
        desk.press("Make the first account");
    }

    /** A desk whose browser nobody has signed in at. */
    Desk desk() {
        return new Desk(this, Chromium.open());
    }

    /** A desk whose browser asks for German, and nobody has signed in at it. */
    Desk germanDesk() {
        return new Desk(this, Chromium.openInGerman());
    }

    /** A desk at which the quality engineer has signed in. */
    Desk engineer() {
        Desk desk = desk();
        desk.signIn(ENGINEER);
        return desk;
    }

    /** The same with a browser that runs no script. */
    Desk engineerWithoutScript() {
        Desk desk = new Desk(this, Chromium.openWithoutScript());
        desk.signIn(ENGINEER);
        return desk;
    }

    /** Stops the program and starts it again on the same home, as an evening and a morning do. */
    void restart() {
        program.close();
        try {
            program = RunningProgram.start(folder.resolve("home"));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    String address(String path) {
        return program.uri(path).toString();
    }

    /** Whether this kind of page has not been looked at for barriers in this run; from now on it has. */
    boolean isNew(String page) {
        return looked.add(page);
    }

    @Override
    public void close() throws IOException {
        program.close();
        FileSystemUtils.deleteRecursively(folder);
    }
}
