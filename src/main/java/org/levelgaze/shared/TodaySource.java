package org.levelgaze.shared;

import java.util.List;

/** Implemented by each module that knows of something that needs a hand; the home page gathers them all. */
@FunctionalInterface
public interface TodaySource {

    /** What needs a hand at this site now, the most pressing first. */
    List<TodayLine> lines(SiteId site);
}
