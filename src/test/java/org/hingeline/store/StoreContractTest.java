package org.hingeline.store;

import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;

/** What every database must do; the same tests run on each. The tests themselves are in the parts, one for each book. */
abstract class StoreContractTest
        implements PlaceContract,
                PeopleContract,
                ReadingContract,
                WaterContract,
                LimitContract,
                AlertContract,
                DoseContract,
                OutboxContract,
                JournalContract,
                TransactionContract,
                TimeContract {
    private Database store;

    @BeforeEach
    void open() {
        store = another();
    }

    @AfterEach
    void close() {
        if (store != null) {
            store.close();
        }
    }

    @Override
    public Database store() {
        return store;
    }
}
