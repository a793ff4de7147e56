package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.security.SecureRandom;
import java.util.Arrays;
import java.util.Base64;
import java.util.HexFormat;
import org.bouncycastle.crypto.generators.Argon2BytesGenerator;
import org.bouncycastle.crypto.params.Argon2Parameters;
import org.junit.jupiter.api.Test;

class PasswordsTest {
    private final Passwords passwords = new Passwords(new SecureRandom());

    @Test
    void only_the_same_password_matches() {
        String hash = passwords.hash("tide pool 17");

        assertThat(passwords.matches("tide pool 17", hash)).isTrue();
        assertThat(passwords.matches("tide pool 18", hash)).isFalse();
        assertThat(passwords.matches("", hash)).isFalse();
    }

    @Test
    void the_stored_form_says_how_it_was_made_and_has_a_salt_of_its_own() {
        String one = passwords.hash("tide pool 17");
        String other = passwords.hash("tide pool 17");

        assertThat(one)
                .startsWith("$argon2id$v=19$m=19456,t=2,p=1$")
                .doesNotContain("tide")
                .hasSizeLessThan(200);
        assertThat(Base64.getDecoder().decode(one.split("\\$")[4])).hasSize(16);
        assertThat(Base64.getDecoder().decode(one.split("\\$")[5])).hasSize(32);
        assertThat(one).isNotEqualTo(other);
    }

    @Test
    void a_hash_made_with_other_costs_is_checked_with_those() {
        byte[] salt = "sixteen bytes of".getBytes(java.nio.charset.StandardCharsets.US_ASCII);
        byte[] hash = derive(
                new Argon2Parameters.Builder(Argon2Parameters.ARGON2_id)
                        .withVersion(Argon2Parameters.ARGON2_VERSION_13)
                        .withMemoryAsKB(64)
                        .withIterations(1)
                        .withParallelism(1)
                        .withSalt(salt)
                        .build(),
                "tide pool 17".getBytes(java.nio.charset.StandardCharsets.UTF_8));
        Base64.Encoder encoder = Base64.getEncoder().withoutPadding();
        String stored =
                "$argon2id$v=19$m=64,t=1,p=1$" + encoder.encodeToString(salt) + "$" + encoder.encodeToString(hash);

        assertThat(passwords.matches("tide pool 17", stored)).isTrue();
        assertThat(passwords.matches("tide pool 16", stored)).isFalse();
    }

    @Test
    void a_hash_of_another_form_is_refused_without_showing_it() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> passwords.matches("x", "$2a$10$something"))
                .withMessageNotContaining("something");
    }

    /** RFC 9106, section 5.3: Argon2id, 3 passes, 32 KiB, 4 lanes, a tag of 32 bytes. */
    @Test
    void the_hash_function_gives_the_tag_of_the_standard() {
        Argon2Parameters parameters = new Argon2Parameters.Builder(Argon2Parameters.ARGON2_id)
                .withVersion(Argon2Parameters.ARGON2_VERSION_13)
                .withIterations(3)
                .withMemoryAsKB(32)
                .withParallelism(4)
                .withSalt(repeated(0x02, 16))
                .withSecret(repeated(0x03, 8))
                .withAdditional(repeated(0x04, 12))
                .build();

        assertThat(HexFormat.of().formatHex(derive(parameters, repeated(0x01, 32))))
                .isEqualTo("0d640df58d78766c08c037a34a8b53c9d01ef0452d75b65eb52520e96b01e659");
    }

    private static byte[] derive(Argon2Parameters parameters, byte[] password) {
        Argon2BytesGenerator generator = new Argon2BytesGenerator();
        generator.init(parameters);
        byte[] tag = new byte[32];
        generator.generateBytes(password, tag);
        return tag;
    }

    private static byte[] repeated(int value, int length) {
        byte[] bytes = new byte[length];
        Arrays.fill(bytes, (byte) value);
        return bytes;
    }
}
