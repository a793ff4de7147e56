package org.hingeline.store;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import org.h2.engine.SessionLocal;
import org.h2.index.Cursor;
import org.h2.index.Index;
import org.h2.jdbc.JdbcConnection;
import org.h2.mvstore.db.MVSecondaryIndex;
import org.h2.result.Row;
import org.h2.table.Column;
import org.h2.table.Table;
import org.h2.value.Value;
import org.h2.value.ValueBigint;

/**
 * Does to a database file what a crash can do to it: changes a table or one of its indexes without the other. It goes
 * below SQL, to the engine's own structures, and leaves the change in the file.
 */
public final class Damage {

    /** What is done to the first row that the index knows. */
    public enum Kind {
        /** The index loses it. */
        LOST_FROM_INDEX,
        /** The table loses it. */
        LOST_FROM_TABLE,
        /** The index holds other values. */
        CHANGED_IN_INDEX,
        /** The index holds the right values and points at a row that is not there. */
        MISPOINTED_IN_INDEX
    }

    private Damage() {}

    /** The indexes of a table that are a structure of their own, in the closed database in a folder. */
    static List<String> indexesOf(Path folder, String table) throws SQLException {
        List<String> names = new ArrayList<>();
        inside(folder, session -> indexes(session, table).forEach(index -> names.add(index.getName())));
        return names;
    }

    /** Damages one index of the closed database in a folder. */
    static void to(Path folder, Kind kind, String table, String indexName) throws SQLException {
        inside(folder, session -> {
            Index index = indexes(session, table).stream()
                    .filter(candidate -> candidate.getName().equals(indexName))
                    .findFirst()
                    .orElseThrow();
            Cursor cursor = index.find(session, null, null, false);
            if (!cursor.next()) {
                throw new IllegalStateException("nothing to damage in " + table);
            }
            apply(kind, session, index.getTable(), index, cursor.get());
            session.commit(false);
        });
    }

    /** Damages the primary key of a table, which must be one of several columns. */
    public static void toPrimaryKey(Path folder, Kind kind, String table) throws SQLException {
        String name = indexesOf(folder, table).stream()
                .filter(index -> index.startsWith("PRIMARY_KEY"))
                .findFirst()
                .orElseThrow();
        to(folder, kind, table, name);
    }

    private static void inside(Path folder, Consumer<SessionLocal> work) throws SQLException {
        try (Connection connection = new DatabaseFolder(folder).connect();
                Statement statement = connection.createStatement()) {
            work.accept((SessionLocal) connection.unwrap(JdbcConnection.class).getSession());
            statement.execute("SHUTDOWN");
        }
    }

    private static List<MVSecondaryIndex> indexes(SessionLocal session, String table) {
        return session.getDatabase().getSchema("public").findTableOrView(session, table).getIndexes().stream()
                .filter(MVSecondaryIndex.class::isInstance)
                .map(MVSecondaryIndex.class::cast)
                .toList();
    }

    private static void apply(Kind kind, SessionLocal session, Table table, Index index, Row row) {
        if (kind == Kind.LOST_FROM_TABLE) {
            table.getScanIndex(session).remove(session, row);
            return;
        }
        index.remove(session, row);
        if (kind == Kind.LOST_FROM_INDEX) {
            return;
        }
        Row other = Row.get(row.getValueList().clone(), 1);
        other.setKey(kind == Kind.MISPOINTED_IN_INDEX ? row.getKey() + 1000 : row.getKey());
        if (kind == Kind.CHANGED_IN_INDEX) {
            Column first = index.getColumns()[0];
            Value changed = other.getValue(first.getColumnId()).add(ValueBigint.get(1000));
            other.setValue(first.getColumnId(), changed);
        }
        index.add(session, other);
    }
}
