package org.levelgaze.bench;

import static java.net.URLEncoder.encode;
import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.IOException;
import java.net.CookieManager;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A browser with a session of its own, signed in through the form. */
final class SignedIn {

    private static final Pattern FORM_TOKEN = Pattern.compile("name=\"_csrf\" value=\"([^\"]+)\"");

    private final String address;
    private final HttpClient client = HttpClient.newBuilder()
            .version(HttpClient.Version.HTTP_1_1)
            .cookieHandler(new CookieManager())
            .build();

    private SignedIn(int port) {
        this.address = "http://localhost:" + port;
    }

    static SignedIn as(String loginName, String password, int port) throws IOException, InterruptedException {
        SignedIn browser = new SignedIn(port);
        Matcher token = FORM_TOKEN.matcher(browser.open("/sign-in"));
        if (!token.find()) {
            throw new IllegalStateException("The sign-in page has no form");
        }
        String form = "_csrf=" + encode(token.group(1), UTF_8) + "&loginName=" + encode(loginName, UTF_8) + "&password="
                + encode(password, UTF_8);
        HttpRequest request = HttpRequest.newBuilder(URI.create(browser.address + "/sign-in"))
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(HttpRequest.BodyPublishers.ofString(form))
                .build();
        int status = browser.client
                .send(request, HttpResponse.BodyHandlers.discarding())
                .statusCode();
        if (status != 302) {
            throw new IllegalStateException("Sign-in was answered with " + status);
        }
        return browser;
    }

    /** The page at an address; anything but 200 ends the benchmark. */
    String open(String path) throws IOException, InterruptedException {
        HttpRequest request = HttpRequest.newBuilder(URI.create(address + path)).build();
        HttpResponse<String> answer = client.send(request, HttpResponse.BodyHandlers.ofString());
        if (answer.statusCode() != 200) {
            throw new IllegalStateException(path + " was answered with " + answer.statusCode());
        }
        return answer.body();
    }
}
