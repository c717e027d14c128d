package org.levelgaze.cli;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Terms;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.FindingsJson;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;

/** {@code assess FILE.csv}: what the calls of a file show. Needs no database and no web. */
final class AssessCommand {

    private final Console console;

    AssessCommand(Console console) {
        this.console = console;
    }

    int run(List<String> arguments) {
        AssessOptions options;
        try {
            options = AssessOptions.of(arguments);
        } catch (AssessOptions.NotUnderstood e) {
            console.err().println(console.text(e.key(), e.argument()));
            console.err().println(console.text("cli.assess.usage"));
            return Commands.REFUSED;
        }
        try {
            return assess(options);
        } catch (Refusal e) {
            console.err().println(console.sentence(e));
        } catch (NoSuchFileException e) {
            console.err().println(console.text("cli.assess.no-file", options.file()));
        } catch (IOException | InvalidPathException e) {
            console.err()
                    .println(console.text("cli.assess.unreadable", options.file(), String.valueOf(e.getMessage())));
        }
        return Commands.REFUSED;
    }

    private int assess(AssessOptions options) throws IOException {
        Reading reading;
        try (InputStream file = open(options)) {
            reading = CallReader.standard()
                    .read(file, Watcher.NONE, error -> console.err().println(console.sentence(error)));
        }
        if (reading instanceof Reading.Refused refused) {
            console.err().println(console.text("cli.assess.refused", refused.inAll()));
            return Commands.REFUSED;
        }
        RecordedCalls calls = ((Reading.Read) reading).calls();
        if (!calls.hasTruths()) {
            console.err().println(console.text("cli.assess.no-truths"));
            return Commands.REFUSED;
        }
        print(Engine.assess(calls.toStudy(), new Terms(options.confidence(), null)), options);
        return Commands.DONE;
    }

    private InputStream open(AssessOptions options) throws IOException {
        return options.file().equals("-")
                ? console.in()
                : new BufferedInputStream(Files.newInputStream(Path.of(options.file())));
    }

    private void print(Findings findings, AssessOptions options) {
        String text = options.json()
                ? FindingsJson.writeIndented(findings) + "\n"
                : new FindingsText(console, findings).text();
        console.out().print(text);
        console.out().flush();
    }
}
