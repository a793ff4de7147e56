package org.hingeline.store;

import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Collectors;
import org.hingeline.monitor.WaterBook;
import org.hingeline.monitor.WaterNumbers;
import org.hingeline.monitor.WaterState;
import org.jdbi.v3.core.Handle;
import org.jspecify.annotations.Nullable;

/** Water states; of the order of the queries the same holds as in {@link ReadingTables}. */
final class WaterTables implements WaterBook {
    private static final int NUMBERS = 17;

    private final Handle handle;

    WaterTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public List<Instant> timesFrom(long pointId, Instant from, int most) {
        return Sql.list(handle, """
                SELECT at FROM water_state WHERE point_id = ? AND at >= ? ORDER BY point_id, at LIMIT ?
                """, row -> Sql.instant(row, 1), pointId, from, most);
    }

    /** Plain JDBC: this is the hot path of the whole service. */
    @Override
    public void save(List<WaterState> states) {
        if (states.isEmpty()) {
            return;
        }
        removeOlder(states);
        String sql = """
                INSERT INTO water_state
                    (point_id, at, complete, inputs, missing, cautions,
                     ph_total, temperature_c, salinity, total_alkalinity_umol_kg, dic_umol_kg, pco2_uatm, fco2_uatm,
                     co2_umol_kg, bicarbonate_umol_kg, carbonate_umol_kg, omega_aragonite, omega_calcite, density_kg_m3,
                     omega_aragonite_uncertainty, omega_aragonite_from_constants, omega_aragonite_from_inputs,
                     ph_total_uncertainty)
                VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)
                """;
        try (PreparedStatement insert = handle.getConnection().prepareStatement(sql)) {
            for (WaterState state : states) {
                insert.setLong(1, state.pointId());
                Sql.setInstant(insert, 2, state.at());
                insert.setBoolean(3, state.numbers() != null);
                insert.setString(4, WaterJson.inputs(state.inputs()));
                insert.setString(5, WaterJson.missing(state.missing()));
                insert.setString(6, WaterJson.notes(state.cautions()));
                setNumbers(insert, 7, state.numbers());
                insert.addBatch();
            }
            insert.executeBatch();
        } catch (SQLException e) {
            throw new StoreException("water states could not be stored: " + e.getMessage(), e);
        }
    }

    private void removeOlder(List<WaterState> states) {
        Map<Long, List<Instant>> times = states.stream()
                .collect(Collectors.groupingBy(
                        WaterState::pointId, Collectors.mapping(WaterState::at, Collectors.toList())));
        try (PreparedStatement delete =
                handle.getConnection().prepareStatement("DELETE FROM water_state WHERE point_id = ? AND at = ?")) {
            boolean any = false;
            for (Map.Entry<Long, List<Instant>> entry : times.entrySet()) {
                Set<Instant> present = new HashSet<>(
                        times(entry.getKey(), Collections.min(entry.getValue()), Collections.max(entry.getValue())));
                for (Instant at : entry.getValue()) {
                    if (present.contains(at)) {
                        delete.setLong(1, entry.getKey());
                        Sql.setInstant(delete, 2, at);
                        delete.addBatch();
                        any = true;
                    }
                }
            }
            if (any) {
                delete.executeBatch();
            }
        } catch (SQLException e) {
            throw new StoreException("older water states could not be replaced: " + e.getMessage(), e);
        }
    }

    /** Times of the states of a point, oldest first; read from the index alone. */
    private List<Instant> times(long pointId, Instant from, Instant to) {
        return Sql.list(handle, """
                SELECT at FROM water_state WHERE point_id = ? AND at >= ? AND at <= ? ORDER BY point_id, at
                """, row -> Sql.instant(row, 1), pointId, from, to);
    }

    @Override
    public Optional<WaterState> newest(long pointId) {
        return handle.createQuery(
                        "SELECT * FROM water_state WHERE point_id = :point ORDER BY point_id DESC, at DESC LIMIT 1")
                .bind("point", pointId)
                .map((row, context) -> state(row))
                .findOne();
    }

    @Override
    public Optional<WaterState> newestComplete(long pointId) {
        return handle.createQuery("""
                        SELECT * FROM water_state WHERE point_id = :point AND complete
                        ORDER BY point_id DESC, at DESC LIMIT 1
                        """)
                .bind("point", pointId)
                .map((row, context) -> state(row))
                .findOne();
    }

    @Override
    public List<WaterState> between(long pointId, Instant from, Instant to, int most) {
        return handle.createQuery("""
                        SELECT * FROM water_state WHERE point_id = :point AND at >= :from AND at <= :to
                        ORDER BY point_id, at LIMIT :most
                        """)
                .bind("point", pointId)
                .bind("from", from)
                .bind("to", to)
                .bind("most", most)
                .map((row, context) -> state(row))
                .list();
    }

    /**
     * Chooses by the times, which the index gives at little cost, and reads only the states chosen. To ask for the newest
     * state before a time, step by step, would have the engine walk through all that is newer at each step.
     */
    @Override
    public List<WaterState> newestOfEach(long pointId, Instant from, Instant to, Duration step) {
        NavigableMap<Long, Instant> newest = new TreeMap<>();
        times(pointId, from, to).forEach(at -> newest.put(Math.floorDiv(at.toEpochMilli(), step.toMillis()), at));
        String sql = "SELECT * FROM water_state WHERE point_id = ? AND at = ?";
        List<WaterState> states = new ArrayList<>(newest.size());
        try (PreparedStatement query = handle.getConnection().prepareStatement(sql)) {
            query.setLong(1, pointId);
            for (Instant at : newest.values()) {
                Sql.setInstant(query, 2, at);
                try (ResultSet row = query.executeQuery()) {
                    if (row.next()) {
                        states.add(state(row));
                    }
                }
            }
        } catch (SQLException e) {
            throw new StoreException("water states could not be read: " + e.getMessage(), e);
        }
        return states;
    }

    @Override
    public void addSpan(long pointId, Instant after, Instant to) {
        handle.createUpdate("INSERT INTO recompute_span (point_id, after_at, to_at) VALUES (:point, :after, :to)")
                .bind("point", pointId)
                .bind("after", after)
                .bind("to", to)
                .execute();
    }

    @Override
    public Optional<Span> nextSpan() {
        return handle.createQuery("SELECT * FROM recompute_span ORDER BY id LIMIT 1")
                .map((row, context) -> new Span(
                        row.getLong("id"),
                        row.getLong("point_id"),
                        Sql.instant(row, "after_at"),
                        Sql.instant(row, "to_at")))
                .findOne();
    }

    @Override
    public void moveSpan(long spanId, Instant after) {
        handle.createUpdate("UPDATE recompute_span SET after_at = :after WHERE id = :id")
                .bind("after", after)
                .bind("id", spanId)
                .execute();
    }

    @Override
    public void removeSpan(long spanId) {
        handle.createUpdate("DELETE FROM recompute_span WHERE id = :id")
                .bind("id", spanId)
                .execute();
    }

    private static void setNumbers(PreparedStatement insert, int first, @Nullable WaterNumbers n) throws SQLException {
        if (n == null) {
            for (int i = 0; i < NUMBERS; i++) {
                insert.setNull(first + i, Types.DOUBLE);
            }
            return;
        }
        double[] values = {
            n.phTotal(),
            n.temperatureC(),
            n.salinity(),
            n.totalAlkalinityUmolKg(),
            n.dicUmolKg(),
            n.pco2Uatm(),
            n.fco2Uatm(),
            n.co2UmolKg(),
            n.bicarbonateUmolKg(),
            n.carbonateUmolKg(),
            n.omegaAragonite(),
            n.omegaCalcite(),
            n.densityKgM3(),
            n.omegaAragoniteUncertainty(),
            n.omegaAragoniteFromConstants(),
            n.omegaAragoniteFromInputs(),
            n.phTotalUncertainty()
        };
        for (int i = 0; i < NUMBERS; i++) {
            insert.setDouble(first + i, values[i]);
        }
    }

    private static WaterState state(ResultSet row) throws SQLException {
        return new WaterState(
                row.getLong("point_id"),
                Sql.instant(row, "at"),
                WaterJson.inputs(row.getString("inputs")),
                WaterJson.missing(row.getString("missing")),
                row.getBoolean("complete") ? numbers(row) : null,
                WaterJson.notes(row.getString("cautions")));
    }

    private static WaterNumbers numbers(ResultSet row) throws SQLException {
        return new WaterNumbers(
                row.getDouble("ph_total"),
                row.getDouble("temperature_c"),
                row.getDouble("salinity"),
                row.getDouble("total_alkalinity_umol_kg"),
                row.getDouble("dic_umol_kg"),
                row.getDouble("pco2_uatm"),
                row.getDouble("fco2_uatm"),
                row.getDouble("co2_umol_kg"),
                row.getDouble("bicarbonate_umol_kg"),
                row.getDouble("carbonate_umol_kg"),
                row.getDouble("omega_aragonite"),
                row.getDouble("omega_calcite"),
                row.getDouble("density_kg_m3"),
                row.getDouble("omega_aragonite_uncertainty"),
                row.getDouble("omega_aragonite_from_constants"),
                row.getDouble("omega_aragonite_from_inputs"),
                row.getDouble("ph_total_uncertainty"));
    }
}
