package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import com.microsoft.playwright.Download;
import com.microsoft.playwright.Locator;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.options.AriaRole;
import com.microsoft.playwright.options.FilePayload;
import com.microsoft.playwright.options.WaitForSelectorState;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import org.levelgaze.testing.Chromium;

/**
 * Somebody's desk with a browser on it. Each kind of page is looked at for barriers the first time that it comes up in a
 * run; closing the desk fails when the browser saw a fault or a page had a barrier.
 */
final class Desk implements AutoCloseable {

    private static final Pattern WHICH =
            Pattern.compile("(?<=/)(?:\\d+|[0-9a-f-]{36})(?=/|$)|(?<=/(?:appraisers|tasks|sets)/)[^/]+");

    private static final int MOST_KEYS = 30;

    private final Plant plant;
    private final Chromium browser;
    private final Page page;
    private final List<String> barriers = new ArrayList<>();

    Desk(Plant plant, Chromium browser) {
        this.plant = plant;
        this.browser = browser;
        this.page = browser.page();
    }

    void signIn(String name) {
        open("/sign-in");
        type("Sign-in name", name);
        type("Password", Plant.PASSWORD);
        press("Sign in");
    }

    /** Makes an account with one role, as an administrator does. */
    void makeAccount(String displayName, String name, String role) {
        open("/settings/accounts");
        type("Name", displayName);
        type("Sign-in name", name);
        type("First password", Plant.PASSWORD);
        tick(role);
        press("Make the account");
        assertThat(reads()).contains(displayName + " may sign in now.");
    }

    void open(String path) {
        page.navigate(plant.address(path));
        look();
    }

    void follow(String link) {
        page.getByRole(AriaRole.LINK, new Page.GetByRoleOptions().setName(link).setExact(true))
                .first()
                .click();
        look();
    }

    void press(String button) {
        page.getByRole(
                        AriaRole.BUTTON,
                        new Page.GetByRoleOptions().setName(button).setExact(true))
                .first()
                .click();
        look();
    }

    void type(String label, String text) {
        field(label).fill(text);
    }

    void choose(String label, String option) {
        field(label).selectOption(option);
        settle();
    }

    /** Says on the form of an import that the task is new. */
    void newTask(String code, String name) {
        choose("Task", "new");
        type("Code of the new task", code);
        type("Name of the new task", name);
    }

    /** Says on the form of an import that the set is new. */
    void newSet(String code) {
        choose("Reference set", "new");
        type("Code of the new set", code);
    }

    void tick(String label) {
        field(label).check();
    }

    /** What is typed or chosen in a field. */
    String holds(String label) {
        return field(label).inputValue();
    }

    private Locator field(String label) {
        return page.getByLabel(label, new Page.GetByLabelOptions().setExact(true))
                .first();
    }

    /** Chooses a file, as if it were dropped on the field. */
    void drop(String label, String name, String content) {
        field(label).setInputFiles(new FilePayload(name, "text/csv", content.getBytes(StandardCharsets.UTF_8)));
    }

    /** Presses a key. */
    void key(String key) {
        page.keyboard().press(key);
    }

    /** Presses Enter on what has the focus and waits until it has led here. */
    void enter(String path) {
        key("Enter");
        page.waitForURL(plant.address(path));
    }

    /** Presses a key until what has the focus is called so. */
    void keyUntil(String key, String name) {
        for (int times = 0; times < MOST_KEYS && !focused().equals(name); times++) {
            key(key);
        }
        assertThat(focused()).isEqualTo(name);
    }

    /** The words of what has the focus. */
    String focused() {
        return String.valueOf(page.evaluate("document.activeElement.innerText"));
    }

    /** Follows a link to a file and answers its bytes. */
    byte[] take(String link) {
        Download download = page.waitForDownload(() -> page.getByRole(
                        AriaRole.LINK, new Page.GetByRoleOptions().setName(link).setExact(true))
                .first()
                .click());
        try {
            return Files.readAllBytes(download.path());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    String takeText(String link) {
        return new String(take(link), StandardCharsets.UTF_8);
    }

    /** The words on the page, as they are shown; a space is a space, however it breaks. */
    String reads() {
        return page.locator("#content").innerText().replace('\u00a0', ' ').replace('\u202f', ' ');
    }

    String path() {
        return URI.create(page.url()).getPath();
    }

    /** Waits for the page that comes after an import has been read: the study, its questions or what stood in its way. */
    void awaitImport() {
        page.locator("progress").waitFor(new Locator.WaitForOptions().setState(WaitForSelectorState.DETACHED));
        look();
    }

    private void settle() {
        page.waitForCondition(
                () -> page.locator(".htmx-request, .htmx-swapping").count() == 0);
    }

    /** The rules for everybody's access, once for each kind of page; a page that changes by itself is left alone. */
    private void look() {
        page.waitForLoadState();
        if (page.locator("progress").count() > 0) {
            return;
        }
        String kind = WHICH.matcher(path()).replaceAll("#")
                + (page.locator(".notice.fault").count() > 0 ? " with a fault" : "");
        if (plant.isNew(kind)) {
            barriers.addAll(browser.barriers());
        }
    }

    @Override
    public void close() {
        try (browser) {
            assertThat(browser.faults()).as("faults that the browser saw").isEmpty();
            assertThat(barriers).as("barriers").isEmpty();
        }
    }
}
