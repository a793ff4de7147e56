package org.hingeline.monitor;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** Gateway keys and access tokens. Secrets are here as hashes only. */
public interface KeyBook {

    /** A key with which a gateway posts readings. */
    record GatewayKey(
            long id,
            long siteId,
            String gateway,
            Instant createdAt,
            @Nullable Instant lastHeardAt,
            @Nullable Instant revokedAt) {}

    /** A token with which a script calls the API. */
    record AccessToken(
            long id,
            long siteId,
            String name,
            Role role,
            Instant createdAt,
            @Nullable Instant revokedAt) {}

    long addGatewayKey(long siteId, String gateway, String keyHash, Instant now);

    /** The key in use with this hash. */
    Optional<GatewayKey> gatewayKey(String keyHash);

    List<GatewayKey> gatewayKeys(long siteId);

    void gatewayHeard(long gatewayKeyId, Instant now);

    boolean revokeGatewayKey(long siteId, long id, Instant now);

    long addAccessToken(long siteId, String name, Role role, String tokenHash, Instant now);

    /** The token in use with this hash. */
    Optional<AccessToken> accessToken(String tokenHash);

    List<AccessToken> accessTokens(long siteId);

    boolean revokeAccessToken(long siteId, long id, Instant now);
}
