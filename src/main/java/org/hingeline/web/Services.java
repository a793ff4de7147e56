package org.hingeline.web;

import java.time.InstantSource;
import java.util.List;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.AlertDesk;
import org.hingeline.monitor.Check;
import org.hingeline.monitor.DoseDesk;
import org.hingeline.monitor.DoseHistory;
import org.hingeline.monitor.DoseRecords;
import org.hingeline.monitor.LimitDesk;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.monitor.ReadingIntake;
import org.hingeline.monitor.StateWishes;
import org.hingeline.monitor.StatusBoard;

/** The use cases the routes call. */
public record Services(
        InstantSource clock,
        Accounts accounts,
        ReadingIntake intake,
        StatusBoard board,
        LimitDesk limits,
        AlertDesk alerts,
        DoseDesk doses,
        DoseRecords doseRecords,
        DoseHistory doseHistory,
        PlaceDesk place,
        StateWishes states,
        List<Check> checks) {
    public Services {
        checks = List.copyOf(checks);
    }
}
