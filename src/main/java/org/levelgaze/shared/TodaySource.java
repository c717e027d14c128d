package org.levelgaze.shared;

import java.util.List;

/** Implemented by each module that knows of something that needs a hand; the home page gathers them all. */
@FunctionalInterface
public interface TodaySource {

    /**
     * What needs a hand now, the most pressing first, and only so many that a person can read them.
     *
     * @param site at which site
     * @param who whose day it is, as the journal names people
     */
    List<TodayLine> lines(SiteId site, String who);
}
