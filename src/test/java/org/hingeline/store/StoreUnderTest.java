package org.hingeline.store;

import org.hingeline.monitor.Books;

/** What the parts of the store contract ask of the database they run on. */
interface StoreUnderTest {

    /** The database of this test, empty when the test began. */
    Database store();

    /** Opens another empty database; the caller closes it. */
    Database another();

    /** The records, each question asked in a reading of its own. */
    default Books seen() {
        return OneByOne.books(work -> store().read(work));
    }

    /** The records, each call made in a transaction of its own. */
    default Books done() {
        return OneByOne.books(work -> store().write(work));
    }
}
