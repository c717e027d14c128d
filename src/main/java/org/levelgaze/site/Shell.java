package org.levelgaze.site;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.springframework.web.util.UriComponentsBuilder;

/**
 * What every page needs around its content; the templates know it as {@code shell}. Public methods are called by
 * templates.
 */
public final class Shell {

    private final Sentences words;
    private final Locale locale;
    private final String theme;
    private final String query;
    private final @Nullable String who;
    private final List<Place> places;
    private final Predicate<String> rights;

    Shell(
            Sentences words,
            Locale locale,
            String theme,
            String query,
            @Nullable String who,
            List<Place> places,
            Predicate<String> rights) {
        this.words = words;
        this.locale = locale;
        this.theme = theme;
        this.query = query;
        this.who = who;
        this.places = List.copyOf(places);
        this.rights = rights;
    }

    /** Whether somebody is signed in; without, no navigation is shown. */
    public boolean isSignedIn() {
        return who != null;
    }

    /** Who is signed in. */
    public @Nullable String getWho() {
        return who;
    }

    /** The places that the signed-in role may open. */
    public List<Place> getPlaces() {
        return places;
    }

    /** Whether the caller has a permission of module access, by its name such as {@code TRUE_STATES}. */
    public boolean may(String permission) {
        return rights.test(permission);
    }

    /** The saved brightness: {@code system}, {@code light} or {@code dark}. */
    public String getTheme() {
        return theme;
    }

    /** This page in each language. */
    public List<Switch> getLanguages() {
        return Languages.OFFERED.stream()
                .map(Locale::toLanguageTag)
                .map(tag ->
                        new Switch(tag, withParameter(Languages.PARAMETER, tag), tag.equals(locale.toLanguageTag())))
                .toList();
    }

    /** This page in each brightness. */
    public List<Switch> getThemes() {
        return Themes.OFFERED.stream()
                .map(value -> new Switch(value, withParameter(Themes.PARAMETER, value), value.equals(theme)))
                .toList();
    }

    /** This page's address with one parameter set and the others kept, relative to the page itself. */
    public String withParameter(String name, Object value) {
        return UriComponentsBuilder.newInstance()
                .query(query)
                .replaceQueryParam(name, value)
                .build()
                .toUriString();
    }

    /** What a refusal says, in the reader's language. */
    public String sentence(Refusal refusal) {
        return words.sentence(refusal, locale);
    }

    /** What is wrong with a row, in the reader's language. */
    public String sentence(RowError row) {
        return words.sentence(row, locale);
    }

    /** The arguments of a message as templates need them; none for {@code null}. */
    public Object[] arguments(@Nullable List<?> arguments) {
        return arguments == null ? new Object[0] : arguments.toArray();
    }

    /** The ids that describe a field: its hint, and its fault when it has one. */
    public @Nullable String describedBy(String name, @Nullable String hint, boolean wrong) {
        List<String> ids = new ArrayList<>();
        if (hint != null) {
            ids.add(name + "-hint");
        }
        if (wrong) {
            ids.add(name + "-fault");
        }
        return ids.isEmpty() ? null : String.join(" ", ids);
    }
}
