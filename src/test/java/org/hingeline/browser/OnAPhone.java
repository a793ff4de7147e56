package org.hingeline.browser;

import java.nio.file.Path;
import java.time.Clock;
import org.hingeline.RunningService;
import org.junit.jupiter.api.AfterAll;

/** A running service, and a guest who has a phone, for the tests of one class. */
abstract class OnAPhone {
    static RunningService service;
    static Browser phone;
    static Guest guest;

    static void open(Path data, Clock clock) {
        service = RunningService.start(data, clock);
        phone = Browser.phone();
        guest = new Guest(phone, service);
    }

    @AfterAll
    static void close() {
        if (phone != null) {
            phone.close();
        }
        if (service != null) {
            service.close();
        }
    }
}
