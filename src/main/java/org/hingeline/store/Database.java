package org.hingeline.store;

import javax.sql.DataSource;
import org.hingeline.monitor.Storage;

/** An open database. */
public interface Database extends Storage, AutoCloseable {

    /** For the timed work's own table. On the embedded database its connections go through the write lane. */
    DataSource schedulerDataSource();

    /** @throws StoreException when the database does not answer */
    void checkAlive();

    @Override
    void close();
}
