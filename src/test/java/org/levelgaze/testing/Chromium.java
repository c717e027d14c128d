package org.levelgaze.testing;

import com.deque.html.axecore.playwright.AxeBuilder;
import com.deque.html.axecore.results.Rule;
import com.microsoft.playwright.Browser;
import com.microsoft.playwright.BrowserContext;
import com.microsoft.playwright.BrowserType;
import com.microsoft.playwright.Page;
import com.microsoft.playwright.Playwright;
import com.microsoft.playwright.options.ColorScheme;
import java.io.File;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.extension.ConditionEvaluationResult;
import org.junit.jupiter.api.extension.ExecutionCondition;
import org.junit.jupiter.api.extension.ExtensionConfigurationException;
import org.junit.jupiter.api.extension.ExtensionContext;

/** A real browser, as people use it. Every page is watched: an error or a breach of the content policy fails the test. */
public final class Chromium implements AutoCloseable {

    private static final List<String> NAMES = List.of("chromium", "chromium-browser", "google-chrome");
    private static final List<String> QUIET = List.of(
            "--disable-gpu",
            "--disable-quic",
            "--no-first-run",
            "--disable-background-networking",
            "--disable-component-update",
            "--disable-sync");
    private static final String WATCH =
            "window.policyBreaches = []; document.addEventListener('securitypolicyviolation',"
                    + " e => window.policyBreaches.push(e.violatedDirective + ' ' + e.blockedURI));";

    private final Playwright playwright;
    private final Browser browser;
    private final BrowserContext context;
    private final Page page;
    private final List<String> errors = new ArrayList<>();

    private Chromium(Browser.NewContextOptions manner) {
        playwright = Playwright.create(
                new Playwright.CreateOptions().setEnv(Map.of("PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD", "1")));
        browser = playwright
                .chromium()
                .launch(new BrowserType.LaunchOptions()
                        .setExecutablePath(find().orElseThrow())
                        .setHeadless(true)
                        .setChromiumSandbox(false)
                        .setArgs(QUIET));
        context = browser.newContext(manner);
        context.addInitScript(WATCH);
        page = context.newPage();
        page.onConsoleMessage(message -> {
            if (message.type().equals("error") && !message.text().contains("Failed to load resource")) {
                errors.add(page.url() + ": " + message.text());
            }
        });
        page.onPageError(error -> errors.add(page.url() + ": " + error));
    }

    /** Opens a browser with nothing remembered, of somebody who reads English. */
    public static Chromium open() {
        return new Chromium(reading("en-GB"));
    }

    /** Opens a browser of somebody who reads German. */
    public static Chromium openInGerman() {
        return new Chromium(reading("de-DE"));
    }

    /** Opens a browser that runs no script. */
    public static Chromium openWithoutScript() {
        return new Chromium(reading("en-GB").setJavaScriptEnabled(false));
    }

    private static Browser.NewContextOptions reading(String language) {
        return new Browser.NewContextOptions().setLocale(language);
    }

    /** The one page of this browser. */
    public Page page() {
        return page;
    }

    /** Faults that the browser has seen so far, on any page. */
    public List<String> faults() {
        List<String> faults = new ArrayList<>(errors);
        Object breaches = page.evaluate("window.policyBreaches || []");
        if (breaches instanceof List<?> list) {
            list.forEach(breach -> faults.add(page.url() + ": " + breach));
        }
        return faults;
    }

    /**
     * What the accessibility rules say against the page, at phone and desk width, in light and dark. No page has a frame,
     * so the rules run in the page alone, which takes half the time.
     */
    public List<String> barriers() {
        List<String> barriers = new ArrayList<>();
        for (ColorScheme scheme : List.of(ColorScheme.LIGHT, ColorScheme.DARK)) {
            page.emulateMedia(new Page.EmulateMediaOptions().setColorScheme(scheme));
            for (int width : new int[] {360, 1440}) {
                page.setViewportSize(width, 900);
                for (Rule rule :
                        new AxeBuilder(page).setLegacyMode(true).analyze().getViolations()) {
                    barriers.add(page.url() + " " + scheme + " " + width + ": " + rule.getId() + " "
                            + rule.getNodes().get(0).getTarget());
                }
                if (sidewaysScroll() > 0) {
                    barriers.add(page.url() + " " + width + ": scrolls sideways by " + sidewaysScroll());
                }
            }
        }
        return barriers;
    }

    private int sidewaysScroll() {
        Object pixels = page.evaluate("document.documentElement.scrollWidth - document.documentElement.clientWidth");
        return ((Number) pixels).intValue();
    }

    @Override
    public void close() {
        context.close();
        browser.close();
        playwright.close();
    }

    private static Optional<Path> find() {
        String named = System.getenv("CHROMIUM_PATH");
        Stream<Path> onPath = Arrays.stream(System.getenv("PATH").split(File.pathSeparator))
                .flatMap(folder -> NAMES.stream().map(name -> Path.of(folder, name)));
        return Stream.concat(Stream.ofNullable(named).map(Path::of), onPath)
                .filter(Files::isExecutable)
                .findFirst();
    }

    /** Leaves browser tests out where there is no browser, but never where everything must be proven. */
    public static final class Present implements ExecutionCondition {

        private static final String WAY_OUT = "No Chromium: install the Debian package 'chromium' or set CHROMIUM_PATH";

        @Override
        public ConditionEvaluationResult evaluateExecutionCondition(ExtensionContext test) {
            if (find().isPresent()) {
                return ConditionEvaluationResult.enabled("A browser is there");
            }
            if (System.getenv("CI") != null) {
                throw new ExtensionConfigurationException(WAY_OUT);
            }
            return ConditionEvaluationResult.disabled(WAY_OUT);
        }
    }
}
