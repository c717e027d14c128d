package org.levelgaze.site;

import java.util.List;

/**
 * One entry of the navigation.
 *
 * @param key names it: the message {@code site.place.<key>}, and what a page gives the layout as {@code place}
 * @param href where it leads
 */
record Place(String key, String href) {

    /** All places, in the order of the navigation. */
    static final List<Place> ALL = List.of(
            new Place("today", "/"),
            new Place("studies", "/studies"),
            new Place("appraisers", "/appraisers"),
            new Place("tasks", "/tasks"),
            new Place("sets", "/sets"),
            new Place("journal", "/journal"),
            new Place("settings", "/settings"));
}
