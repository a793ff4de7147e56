package org.hingeline.hatchery;

import java.time.ZoneId;

/**
 * A hatchery. Everything belongs to a site, and nobody sees another's.
 *
 * @param zone the zone its people live in; times are shown in it
 */
public record Site(long id, String code, String name, ZoneId zone) {
    public Site {
        Codes.check("site code", code);
        Codes.checkName("site name", name);
    }
}
