package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.hatchery.Dose;
import org.hingeline.monitor.DoseBook;
import org.jdbi.v3.core.Handle;
import org.jspecify.annotations.Nullable;

final class DoseTables implements DoseBook {
    /** A record with what is foretold of it and the correction that stands; only the newest one can stand. */
    private static final String SELECT = """
            SELECT d.*, f.*, (SELECT MAX(c.id) FROM dose c
                              WHERE c.corrects_id = d.id AND c.undone_at IS NULL) AS corrected_by_id
            FROM dose d LEFT JOIN dose_foretold f ON f.dose_id = d.id
            """;

    private final Handle handle;

    DoseTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public long add(Dose dose) {
        Dose.Given given = dose.given();
        long id = Sql.insertedId(handle.createUpdate("""
                                INSERT INTO dose
                                    (site_id, point_id, dose_key, at, recorded_at, recorded_by, agent, hydration,
                                     assay_percent, lot, mass_g, note, followed_plan, corrects_id, second_person)
                                VALUES (:site, :point, :doseKey, :at, :recordedAt, :recordedBy, :agent, :hydration,
                                        :assay, :lot, :mass, :note, :followedPlan, :corrects, :secondPerson)
                                """)
                .bind("site", dose.siteId())
                .bind("point", dose.pointId())
                .bind("doseKey", dose.key())
                .bind("at", dose.at())
                .bind("recordedAt", dose.recordedAt())
                .bind("recordedBy", Sql.fit(dose.by(), 80))
                .bind("agent", given.agent())
                .bind("hydration", given.hydration())
                .bind("assay", given.assayPercent())
                .bind("lot", given.lot())
                .bind("mass", given.massG())
                .bind("note", given.note())
                .bind("followedPlan", dose.followedPlan())
                .bind("corrects", dose.corrects())
                .bind("secondPerson", dose.secondPerson()));
        foretell(id, dose.foretold());
        return id;
    }

    private void foretell(long id, Dose.@Nullable Foretold foretold) {
        if (foretold == null) {
            return;
        }
        Dose.Water before = foretold.before();
        Dose.Water after = foretold.after();
        Sql.one(
                handle.createUpdate("""
                                INSERT INTO dose_foretold
                                    (dose_id, state_at, volume_l, temperature_c, salinity, before_ph_total,
                                     before_omega_aragonite, before_total_alkalinity_umol_kg, before_dic_umol_kg,
                                     ph_total, omega_aragonite, total_alkalinity_umol_kg, dic_umol_kg,
                                     ph_change_uncertainty, omega_change_uncertainty, alkalinity_uncertainty_umol_kg,
                                     mixing_min)
                                VALUES (:dose, :stateAt, :volume, :temperature, :salinity, :phBefore, :omegaBefore,
                                        :alkalinityBefore, :dicBefore, :ph, :omega, :alkalinity, :dic, :uPh, :uOmega,
                                        :uAlkalinity, :mixing)
                                """)
                        .bind("dose", id)
                        .bind("stateAt", foretold.stateAt())
                        .bind("volume", foretold.volumeL())
                        .bind("temperature", foretold.temperatureC())
                        .bind("salinity", foretold.salinity())
                        .bind("phBefore", before.phTotal())
                        .bind("omegaBefore", before.omegaAragonite())
                        .bind("alkalinityBefore", before.totalAlkalinityUmolKg())
                        .bind("dicBefore", before.dicUmolKg())
                        .bind("ph", after.phTotal())
                        .bind("omega", after.omegaAragonite())
                        .bind("alkalinity", after.totalAlkalinityUmolKg())
                        .bind("dic", after.dicUmolKg())
                        .bind("uPh", foretold.phChangeUncertainty())
                        .bind("uOmega", foretold.omegaChangeUncertainty())
                        .bind("uAlkalinity", foretold.alkalinityUncertaintyUmolKg())
                        .bind("mixing", foretold.mixingMin())
                        .execute(),
                "noting what is foretold of dose " + id);
    }

    @Override
    public Optional<Dose> dose(long siteId, long id) {
        return handle.createQuery(SELECT + "WHERE d.site_id = :site AND d.id = :id")
                .bind("site", siteId)
                .bind("id", id)
                .map((row, context) -> dose(row))
                .findOne();
    }

    @Override
    public Optional<Dose> byKey(long siteId, String key) {
        return handle.createQuery(SELECT + "WHERE d.site_id = :site AND d.dose_key = :doseKey")
                .bind("site", siteId)
                .bind("doseKey", key)
                .map((row, context) -> dose(row))
                .findOne();
    }

    @Override
    public List<Dose> between(long pointId, Instant from, Instant to) {
        return handle.createQuery(
                        SELECT + "WHERE d.point_id = :point AND d.at >= :fromAt AND d.at <= :toAt ORDER BY d.at, d.id")
                .bind("point", pointId)
                .bind("fromAt", from)
                .bind("toAt", to)
                .map((row, context) -> dose(row))
                .list();
    }

    @Override
    public void confirm(long id, Dose.Signed confirmed, Instant at, Dose.@Nullable Foretold foretold) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE dose SET confirmed_at = :confirmedAt, confirmed_by = :confirmedBy, at = :at
                                WHERE id = :id AND second_person AND confirmed_at IS NULL AND undone_at IS NULL
                                """)
                        .bind("confirmedAt", confirmed.at())
                        .bind("confirmedBy", Sql.fit(confirmed.by(), 80))
                        .bind("at", at)
                        .bind("id", id)
                        .execute(),
                "confirming dose " + id);
        handle.createUpdate("DELETE FROM dose_foretold WHERE dose_id = :id")
                .bind("id", id)
                .execute();
        foretell(id, foretold);
    }

    @Override
    public void undo(long id, Dose.Signed undone) {
        Sql.one(
                handle.createUpdate("""
                                UPDATE dose SET undone_at = :undoneAt, undone_by = :undoneBy
                                WHERE id = :id AND undone_at IS NULL
                                """)
                        .bind("undoneAt", undone.at())
                        .bind("undoneBy", Sql.fit(undone.by(), 80))
                        .bind("id", id)
                        .execute(),
                "undoing dose " + id);
    }

    private static Dose dose(ResultSet row) throws SQLException {
        return new Dose(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getLong("point_id"),
                row.getString("dose_key"),
                Sql.instant(row, "at"),
                Sql.instant(row, "recorded_at"),
                row.getString("recorded_by"),
                new Dose.Given(
                        row.getString("agent"),
                        row.getString("hydration"),
                        row.getDouble("assay_percent"),
                        row.getString("lot"),
                        row.getDouble("mass_g"),
                        row.getString("note")),
                row.getBoolean("followed_plan"),
                foretold(row),
                Sql.longOrNull(row, "corrects_id"),
                Sql.longOrNull(row, "corrected_by_id"),
                row.getBoolean("second_person"),
                signed(row, "confirmed"),
                signed(row, "undone"));
    }

    private static Dose.@Nullable Signed signed(ResultSet row, String what) throws SQLException {
        Instant at = Sql.instantOrNull(row, what + "_at");
        return at == null ? null : new Dose.Signed(row.getString(what + "_by"), at);
    }

    private static Dose.@Nullable Foretold foretold(ResultSet row) throws SQLException {
        Instant stateAt = Sql.instantOrNull(row, "state_at");
        if (stateAt == null) {
            return null;
        }
        return new Dose.Foretold(
                stateAt,
                row.getDouble("volume_l"),
                row.getDouble("temperature_c"),
                row.getDouble("salinity"),
                row.getInt("mixing_min"),
                new Dose.Water(
                        row.getDouble("before_ph_total"),
                        row.getDouble("before_omega_aragonite"),
                        row.getDouble("before_total_alkalinity_umol_kg"),
                        row.getDouble("before_dic_umol_kg")),
                new Dose.Water(
                        row.getDouble("ph_total"),
                        row.getDouble("omega_aragonite"),
                        row.getDouble("total_alkalinity_umol_kg"),
                        row.getDouble("dic_umol_kg")),
                row.getDouble("ph_change_uncertainty"),
                row.getDouble("omega_change_uncertainty"),
                row.getDouble("alkalinity_uncertainty_umol_kg"));
    }
}
