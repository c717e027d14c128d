package org.levelgaze.shared;

import java.time.ZoneId;

/**
 * A plant or a part of one, with a calendar of its own.
 *
 * @param id its number
 * @param code its code, unique in the installation
 * @param name its name on screen
 * @param zone where its days begin and end
 */
public record Site(SiteId id, String code, String name, ZoneId zone) {}
