package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

@Timeout(60)
class WriteLaneTest {
    @TempDir
    Path path;

    private final ExecutorService others = Executors.newFixedThreadPool(4);
    private WriteLane lane;
    private LaneDataSource source;

    @BeforeEach
    void open() throws SQLException {
        lane = new WriteLane(new DatabaseFolder(path).connect());
        source = new LaneDataSource(lane);
        lane.transaction(connection -> run(connection, "CREATE TABLE tide (level INTEGER)"));
    }

    @AfterEach
    void close() throws SQLException {
        others.shutdownNow();
        lane.close();
    }

    @Test
    void one_writer_is_at_work_at_a_time() throws Exception {
        AtomicInteger atWork = new AtomicInteger();
        AtomicInteger most = new AtomicInteger();
        Callable<Boolean> writer = () -> {
            for (int i = 0; i < 20; i++) {
                lane.transaction(connection -> {
                    most.accumulateAndGet(atWork.incrementAndGet(), Math::max);
                    run(connection, "INSERT INTO tide VALUES (1)");
                    Thread.yield();
                    return atWork.decrementAndGet();
                });
            }
            return true;
        };

        for (Future<Boolean> done : others.invokeAll(List.of(writer, writer, writer, writer))) {
            assertThat(done.get()).isTrue();
        }

        assertThat(most).hasValue(1);
        assertThat(rows()).isEqualTo(80);
    }

    @Test
    void an_exception_rolls_back_and_frees_the_lane() throws Exception {
        assertThatThrownBy(() -> lane.transaction(connection -> {
                    run(connection, "INSERT INTO tide VALUES (1)");
                    throw new IllegalStateException("thought better of it");
                }))
                .hasMessage("thought better of it");

        assertThat(inAnotherThread(this::rows)).isZero();
    }

    @Test
    void a_failure_of_the_engine_rolls_back_frees_the_lane_and_is_told_as_ours() throws Exception {
        assertThatThrownBy(() -> lane.transaction(connection -> {
                    run(connection, "INSERT INTO tide VALUES (1)");
                    return run(connection, "INSERT INTO nowhere VALUES (1)");
                }))
                .isInstanceOf(StoreException.class)
                .hasMessageContaining("nowhere");

        assertThat(inAnotherThread(this::rows)).isZero();
    }

    @Test
    void a_transaction_within_a_transaction_is_refused_and_the_outer_one_undone() {
        assertThatThrownBy(() -> lane.transaction(connection -> {
                    run(connection, "INSERT INTO tide VALUES (1)");
                    return lane.transaction(inner -> run(inner, "INSERT INTO tide VALUES (2)"));
                }))
                .isInstanceOf(IllegalStateException.class)
                .hasMessageContaining("cannot hold another");
        assertThatThrownBy(() -> lane.transaction(connection -> {
                    run(connection, "INSERT INTO tide VALUES (3)");
                    return source.getConnection();
                }))
                .isInstanceOf(IllegalStateException.class);

        assertThat(rows()).isZero();
    }

    @Test
    void only_the_holder_is_given_the_connection() {
        assertThatThrownBy(() -> lane.held()).isInstanceOf(IllegalStateException.class);

        assertThat(lane.<Boolean>transaction(connection -> lane.held() == connection))
                .isTrue();
    }

    @Test
    void a_lent_connection_holds_the_lane_until_it_is_closed() throws Exception {
        Connection lent = source.getConnection();
        Future<Long> waiting = others.submit(this::rows);
        assertThatThrownBy(() -> waiting.get(200, TimeUnit.MILLISECONDS)).isInstanceOf(TimeoutException.class);
        run(lent, "INSERT INTO tide VALUES (1)");

        lent.close();

        assertThat(waiting.get(20, TimeUnit.SECONDS)).isEqualTo(1);
        assertThat(lent.isClosed()).isTrue();
    }

    @Test
    void a_lent_connection_closed_twice_gives_the_lane_back_once() throws Exception {
        Connection lent = source.getConnection();
        lent.close();
        CountDownLatch taken = new CountDownLatch(1);
        CountDownLatch done = new CountDownLatch(1);
        Future<Integer> holder = others.submit(() -> lane.transaction(connection -> {
            taken.countDown();
            waitFor(done);
            return 1;
        }));
        waitFor(taken);

        lent.close();

        Future<Long> waiting = others.submit(this::rows);
        assertThatThrownBy(() -> waiting.get(200, TimeUnit.MILLISECONDS)).isInstanceOf(TimeoutException.class);
        done.countDown();
        assertThat(holder.get(20, TimeUnit.SECONDS)).isEqualTo(1);
        assertThat(waiting.get(20, TimeUnit.SECONDS)).isZero();
    }

    @Test
    void a_connection_that_was_given_back_writes_nothing_more() throws Exception {
        Connection lent = source.getConnection();
        lent.close();

        assertThatThrownBy(lent::createStatement)
                .isInstanceOf(SQLException.class)
                .hasMessageContaining("given the write lane back");
        assertThatThrownBy(() -> lent.setAutoCommit(true)).isInstanceOf(SQLException.class);
    }

    @Test
    void what_was_written_on_a_lent_connection_is_there_after_its_close() throws Exception {
        try (Connection lent = source.getConnection()) {
            assertThat(lent.getAutoCommit()).isTrue();
            run(lent, "INSERT INTO tide VALUES (1)");
        }

        assertThat(rows()).isEqualTo(1);
    }

    @Test
    void what_was_not_committed_on_a_lent_connection_is_undone_and_the_next_transaction_is_whole() throws Exception {
        try (Connection lent = source.getConnection()) {
            lent.setAutoCommit(false);
            run(lent, "INSERT INTO tide VALUES (1)");
            lent.commit();
            run(lent, "INSERT INTO tide VALUES (2)");
        }
        assertThat(rows()).isEqualTo(1);

        assertThatThrownBy(() -> lane.transaction(connection -> {
                    run(connection, "INSERT INTO tide VALUES (3)");
                    throw new IllegalStateException("no");
                }))
                .hasMessage("no");

        assertThat(rows()).isEqualTo(1);
    }

    @Test
    void writers_are_served_in_the_order_they_came() throws Exception {
        List<Integer> order = new ArrayList<>();
        Connection lent = source.getConnection();
        List<Future<Boolean>> waiting = new ArrayList<>();
        for (int i = 0; i < 3; i++) {
            int n = i;
            waiting.add(others.submit(() -> lane.transaction(connection -> order.add(n))));
            while (lane.waiting() <= n) {
                Thread.onSpinWait();
            }
        }

        lent.close();
        for (Future<Boolean> done : waiting) {
            done.get(20, TimeUnit.SECONDS);
        }

        assertThat(order).containsExactly(0, 1, 2);
    }

    private long rows() {
        return lane.transaction(connection -> {
            try (Statement statement = connection.createStatement();
                    var rows = statement.executeQuery("SELECT count(*) FROM tide")) {
                rows.next();
                return rows.getLong(1);
            }
        });
    }

    private <T> T inAnotherThread(Callable<T> work) throws Exception {
        return others.submit(work).get(20, TimeUnit.SECONDS);
    }

    private static int run(Connection connection, String sql) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            return statement.executeUpdate(sql);
        }
    }

    private static void waitFor(CountDownLatch latch) {
        try {
            assertThat(latch.await(20, TimeUnit.SECONDS)).isTrue();
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }
}
