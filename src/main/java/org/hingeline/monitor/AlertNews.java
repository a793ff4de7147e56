package org.hingeline.monitor;

import java.time.Instant;
import org.hingeline.alert.Limit;
import org.hingeline.hatchery.Batch;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.jspecify.annotations.Nullable;

/**
 * All that a message about an alert is made of.
 *
 * @param alert as it is after what the message tells of
 * @param limit the limit as it is now; what the alert says of it outranks it
 * @param water the newest state of the point, if there is one
 * @param batch what is in the tank, if anything
 * @param publicUrl where the service is reached, without a slash at the end
 */
public record AlertNews(
        Site site,
        Point point,
        AlertBook.Alert alert,
        Limit limit,
        @Nullable WaterState water,
        @Nullable Batch batch,
        String publicUrl,
        Instant now) {

    String pointLink() {
        return publicUrl + "/points/" + point.code() + "?site=" + site.code();
    }

    String alertsLink() {
        return publicUrl + "/alerts?site=" + site.code();
    }
}
