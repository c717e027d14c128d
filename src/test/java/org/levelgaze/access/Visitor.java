package org.levelgaze.access;

import static java.net.URLEncoder.encode;
import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.CookieManager;
import java.net.HttpCookie;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** Somebody at a browser without JavaScript: keeps cookies, fills in forms, follows no redirect. */
final class Visitor {

    private static final Pattern FORM_TOKEN = Pattern.compile("name=\"_csrf\" value=\"([^\"]+)\"");

    private final String address;
    private final CookieManager cookies = new CookieManager();
    private final HttpClient client =
            HttpClient.newBuilder().cookieHandler(cookies).build();

    Visitor(int port) {
        this.address = "http://localhost:" + port;
    }

    HttpResponse<String> open(String path, String... headers) {
        HttpRequest.Builder request = HttpRequest.newBuilder(URI.create(address + path));
        return send(headers.length == 0 ? request : request.headers(headers));
    }

    /** Opens the page that has the form, then sends it filled in. */
    HttpResponse<String> fillIn(String page, String target, Map<String, String> fields) {
        Matcher token = FORM_TOKEN.matcher(open(page).body());
        String secret = token.find() ? token.group(1) : "";
        return post(target, secret, fields);
    }

    HttpResponse<String> post(String target, String formToken, Map<String, String> fields) {
        String body = "_csrf=" + encode(formToken, UTF_8) + "&"
                + fields.entrySet().stream()
                        .map(field -> field.getKey() + "=" + encode(field.getValue(), UTF_8))
                        .collect(Collectors.joining("&"));
        return send(HttpRequest.newBuilder(URI.create(address + target))
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(HttpRequest.BodyPublishers.ofString(body)));
    }

    HttpResponse<String> signIn(String loginName, String password) {
        return fillIn("/sign-in", "/sign-in", Map.of("loginName", loginName, "password", password));
    }

    /** The session's cookie as the browser keeps it, empty without one. */
    String session() {
        return cookies.getCookieStore().getCookies().stream()
                .filter(cookie -> "SESSION".equals(cookie.getName()))
                .map(HttpCookie::getValue)
                .findFirst()
                .orElse("");
    }

    private HttpResponse<String> send(HttpRequest.Builder request) {
        try {
            return client.send(request.build(), BodyHandlers.ofString());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException(e);
        }
    }
}
