package org.hingeline.store;

import java.util.List;
import org.hingeline.monitor.JournalBook;
import org.jdbi.v3.core.Handle;

final class JournalTables implements JournalBook {
    private final Handle handle;

    JournalTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public void add(Entry entry) {
        handle.createUpdate("""
                        INSERT INTO journal (at, site_id, who, what, subject, detail)
                        VALUES (:at, :site, :who, :what, :subject, :detail)
                        """)
                .bind("at", entry.at())
                .bind("site", entry.siteId())
                .bind("who", Sql.fit(entry.who(), 80))
                .bind("what", entry.what())
                .bind("subject", Sql.fit(entry.subject(), 200))
                .bind("detail", Sql.fit(entry.detail(), 2000))
                .execute();
    }

    @Override
    public List<Entry> entries(long siteId, int most) {
        return handle.createQuery("SELECT * FROM journal WHERE site_id = :site ORDER BY at DESC, id DESC LIMIT :most")
                .bind("site", siteId)
                .bind("most", most)
                .map((row, context) -> new Entry(
                        Sql.instant(row, "at"),
                        Sql.longOrNull(row, "site_id"),
                        row.getString("who"),
                        row.getString("what"),
                        row.getString("subject"),
                        row.getString("detail")))
                .list();
    }
}
