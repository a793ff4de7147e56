package org.hingeline.store;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hingeline.monitor.KeyBook;
import org.hingeline.monitor.Role;
import org.jdbi.v3.core.Handle;

final class KeyTables implements KeyBook {
    private final Handle handle;

    KeyTables(Handle handle) {
        this.handle = handle;
    }

    @Override
    public long addGatewayKey(long siteId, String gateway, String keyHash, Instant now) {
        return Sql.insertedId(handle.createUpdate("""
                                INSERT INTO gateway_key (site_id, gateway, key_hash, created_at)
                                VALUES (:site, :gateway, :hash, :now)
                                """)
                .bind("site", siteId)
                .bind("gateway", gateway)
                .bind("hash", keyHash)
                .bind("now", now));
    }

    @Override
    public Optional<GatewayKey> gatewayKey(String keyHash) {
        return handle.createQuery("SELECT * FROM gateway_key WHERE key_hash = :hash AND revoked_at IS NULL")
                .bind("hash", keyHash)
                .map((row, context) -> gatewayKey(row))
                .findOne();
    }

    @Override
    public List<GatewayKey> gatewayKeys(long siteId) {
        return handle.createQuery("SELECT * FROM gateway_key WHERE site_id = :site ORDER BY id")
                .bind("site", siteId)
                .map((row, context) -> gatewayKey(row))
                .list();
    }

    @Override
    public void gatewayHeard(long gatewayKeyId, Instant now) {
        handle.createUpdate("UPDATE gateway_key SET last_heard_at = :now WHERE id = :id")
                .bind("now", now)
                .bind("id", gatewayKeyId)
                .execute();
    }

    @Override
    public boolean revokeGatewayKey(long siteId, long id, Instant now) {
        return handle.createUpdate("""
                                UPDATE gateway_key SET revoked_at = :now
                                WHERE site_id = :site AND id = :id AND revoked_at IS NULL
                                """)
                        .bind("now", now)
                        .bind("site", siteId)
                        .bind("id", id)
                        .execute()
                == 1;
    }

    @Override
    public long addAccessToken(long siteId, String name, Role role, String tokenHash, Instant now) {
        return Sql.insertedId(handle.createUpdate("""
                                INSERT INTO access_token (site_id, name, role, token_hash, created_at)
                                VALUES (:site, :name, :role, :hash, :now)
                                """)
                .bind("site", siteId)
                .bind("name", name)
                .bind("role", role.code())
                .bind("hash", tokenHash)
                .bind("now", now));
    }

    @Override
    public Optional<AccessToken> accessToken(String tokenHash) {
        return handle.createQuery("SELECT * FROM access_token WHERE token_hash = :hash AND revoked_at IS NULL")
                .bind("hash", tokenHash)
                .map((row, context) -> accessToken(row))
                .findOne();
    }

    @Override
    public List<AccessToken> accessTokens(long siteId) {
        return handle.createQuery("SELECT * FROM access_token WHERE site_id = :site ORDER BY id")
                .bind("site", siteId)
                .map((row, context) -> accessToken(row))
                .list();
    }

    @Override
    public boolean revokeAccessToken(long siteId, long id, Instant now) {
        return handle.createUpdate("""
                                UPDATE access_token SET revoked_at = :now
                                WHERE site_id = :site AND id = :id AND revoked_at IS NULL
                                """)
                        .bind("now", now)
                        .bind("site", siteId)
                        .bind("id", id)
                        .execute()
                == 1;
    }

    private static GatewayKey gatewayKey(ResultSet row) throws SQLException {
        return new GatewayKey(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getString("gateway"),
                Sql.instant(row, "created_at"),
                Sql.instantOrNull(row, "last_heard_at"),
                Sql.instantOrNull(row, "revoked_at"));
    }

    private static AccessToken accessToken(ResultSet row) throws SQLException {
        return new AccessToken(
                row.getLong("id"),
                row.getLong("site_id"),
                row.getString("name"),
                Columns.role(row),
                Sql.instant(row, "created_at"),
                Sql.instantOrNull(row, "revoked_at"));
    }
}
