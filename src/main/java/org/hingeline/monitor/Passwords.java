package org.hingeline.monitor;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.SecureRandom;
import java.util.Base64;
import java.util.Optional;
import java.util.concurrent.Semaphore;
import org.bouncycastle.crypto.generators.Argon2BytesGenerator;
import org.bouncycastle.crypto.params.Argon2Parameters;

/**
 * Hashes passwords with Argon2id (RFC 9106), 19 MiB of memory and two passes, so that a stolen table is of little use.
 * Kept as {@code $argon2id$v=19$m=19456,t=2,p=1$salt$hash}.
 */
public final class Passwords {
    private static final int MEMORY_KIB = 19456;
    private static final int PASSES = 2;
    private static final int SALT_BYTES = 16;
    private static final int HASH_BYTES = 32;

    /** Attempts hashed at the same time, so that a flood of sign-ins cannot take all memory and cores. */
    private static final int AT_ONCE = 2;

    /** Attempts at the same time, hashed or waiting to be: fewer than the server has threads. */
    private static final int WAITING = 12;

    private final SecureRandom random;
    private final Semaphore waiting = new Semaphore(WAITING);
    private final Semaphore slots = new Semaphore(AT_ONCE, true);

    public Passwords(SecureRandom random) {
        this.random = random;
    }

    public String hash(String password) {
        byte[] salt = new byte[SALT_BYTES];
        random.nextBytes(salt);
        Base64.Encoder encoder = Base64.getEncoder().withoutPadding();
        return "$argon2id$v=19$m=" + MEMORY_KIB + ",t=" + PASSES + ",p=1$" + encoder.encodeToString(salt) + "$"
                + encoder.encodeToString(derive(password, salt, MEMORY_KIB, PASSES));
    }

    /** Whether this is the password; takes the same time for right and wrong ones. */
    public boolean matches(String password, String hash) {
        String[] parts = hash.split("\\$", -1);
        if (parts.length != 6 || !parts[1].equals("argon2id")) {
            throw new IllegalArgumentException("a stored password hash has an unknown form");
        }
        String[] cost = parts[3].split("[=,]", -1);
        byte[] salt = Base64.getDecoder().decode(parts[4]);
        byte[] derived = derive(password, salt, Integer.parseInt(cost[1]), Integer.parseInt(cost[3]));
        return MessageDigest.isEqual(derived, Base64.getDecoder().decode(parts[5]));
    }

    /**
     * The same, unless so many wait already that it would take long.
     *
     * @return empty when the password was not looked at
     */
    public Optional<Boolean> matchesSoon(String password, String hash) {
        if (!waiting.tryAcquire()) {
            return Optional.empty();
        }
        try {
            return Optional.of(matches(password, hash));
        } finally {
            waiting.release();
        }
    }

    private byte[] derive(String password, byte[] salt, int memoryKib, int passes) {
        slots.acquireUninterruptibly();
        try {
            Argon2BytesGenerator generator = new Argon2BytesGenerator();
            generator.init(new Argon2Parameters.Builder(Argon2Parameters.ARGON2_id)
                    .withVersion(Argon2Parameters.ARGON2_VERSION_13)
                    .withMemoryAsKB(memoryKib)
                    .withIterations(passes)
                    .withParallelism(1)
                    .withSalt(salt)
                    .build());
            byte[] hash = new byte[HASH_BYTES];
            generator.generateBytes(password.getBytes(StandardCharsets.UTF_8), hash);
            return hash;
        } finally {
            slots.release();
        }
    }
}
