package org.hingeline.store;

import org.hingeline.monitor.AlertBook;
import org.hingeline.monitor.Books;
import org.hingeline.monitor.DoseBook;
import org.hingeline.monitor.JournalBook;
import org.hingeline.monitor.KeyBook;
import org.hingeline.monitor.LimitBook;
import org.hingeline.monitor.OutboxBook;
import org.hingeline.monitor.PeopleBook;
import org.hingeline.monitor.PlaceBook;
import org.hingeline.monitor.ReadingBook;
import org.hingeline.monitor.WaterBook;
import org.jdbi.v3.core.Handle;

/** The records over one Jdbi handle. */
record JdbiBooks(Handle handle) implements Books {

    @Override
    public PlaceBook place() {
        return new PlaceTables(handle);
    }

    @Override
    public PeopleBook people() {
        return new PeopleTables(handle);
    }

    @Override
    public KeyBook keys() {
        return new KeyTables(handle);
    }

    @Override
    public ReadingBook readings() {
        return new ReadingTables(handle);
    }

    @Override
    public WaterBook water() {
        return new WaterTables(handle);
    }

    @Override
    public LimitBook limits() {
        return new LimitTables(handle);
    }

    @Override
    public AlertBook alerts() {
        return new AlertTables(handle);
    }

    @Override
    public DoseBook doses() {
        return new DoseTables(handle);
    }

    @Override
    public OutboxBook outbox() {
        return new OutboxTables(handle);
    }

    @Override
    public JournalBook journal() {
        return new JournalTables(handle);
    }
}
