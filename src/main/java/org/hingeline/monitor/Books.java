package org.hingeline.monitor;

/** The records, as seen inside one transaction. */
public interface Books {
    PlaceBook place();

    PeopleBook people();

    KeyBook keys();

    ReadingBook readings();

    WaterBook water();

    LimitBook limits();

    AlertBook alerts();

    DoseBook doses();

    OutboxBook outbox();

    JournalBook journal();
}
