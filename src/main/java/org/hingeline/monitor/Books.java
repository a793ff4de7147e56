package org.hingeline.monitor;

/** The records, as seen inside one transaction. */
public interface Books {
    PlaceBook place();

    PeopleBook people();

    ReadingBook readings();

    WaterBook water();

    AlertBook alerts();

    OutboxBook outbox();

    JournalBook journal();
}
