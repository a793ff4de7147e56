package org.hingeline.demo;

import java.net.URI;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.time.InstantSource;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.hingeline.demo.ServiceLink.NotTakenException;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * The invented hatchery's gateway: posts what the instruments show over HTTP, the present every five seconds and, beside
 * that, the fortnight before the first start. What the service could not take is kept and sent again.
 *
 * <p>The present goes first, so that the page is alive at once, and the past is no news to anybody when it comes.
 */
public final class DemoGateway implements AutoCloseable {

    /**
     * How fast it goes; what a test needs otherwise.
     *
     * @param retryPause first pause after a post that was not taken; it doubles up to fifteen times as much
     */
    record Pace(Duration live, Duration history, Duration retryPause) {
        static final Pace USUAL = new Pace(Duration.ofSeconds(5), Duration.ofDays(14), Duration.ofSeconds(1));
    }

    private static final Logger LOG = LoggerFactory.getLogger(DemoGateway.class);
    private static final Duration GOODBYE = Duration.ofSeconds(5);
    private static final int SAY_EVERY_POSTS = 10;

    private final ServiceLink service;
    private final long seed;
    private final InstantSource clock;
    private final Path memoryFile;
    private final Pace pace;
    private final CountDownLatch stopping = new CountDownLatch(1);
    private @Nullable Thread live;
    private volatile @Nullable Thread history;

    /**
     * @param base address of the service, on this machine
     * @param key the gateway's key for posting readings
     * @param token an access token of the site, to ask what the service knows
     * @param seed of the water; the same seed gives the same water
     * @param memoryFile where it remembers what was taken; in the folder of the database, so that both go together
     * @throws IllegalArgumentException when the address is not one of this machine
     */
    public DemoGateway(URI base, String key, String token, long seed, InstantSource clock, Path memoryFile) {
        this(base, key, token, seed, clock, memoryFile, Pace.USUAL);
    }

    DemoGateway(URI base, String key, String token, long seed, InstantSource clock, Path memoryFile, Pace pace) {
        this.service = new ServiceLink(base, key, token);
        this.seed = seed;
        this.clock = clock;
        this.memoryFile = memoryFile;
        this.pace = pace;
    }

    /** Begins to post, on threads of its own that keep no program alive. */
    public synchronized void start() {
        if (live != null) {
            throw new IllegalStateException("the gateway was started before");
        }
        live = thread("demo-gateway", this::runLive);
    }

    /** Stops within seconds; a post under way may be lost, and is sent again after the next start. */
    @Override
    public synchronized void close() {
        stopping.countDown();
        end(live);
        end(history);
    }

    private void runLive() throws InterruptedException {
        Instant start = clock.instant();
        GatewayMemory memory = memory(start);
        Readings readings = new Readings(seed, new HatcheryWater(seed, memory.origin(), start));
        Instant next = floor(start);
        Deque<Instant> unsent = new ArrayDeque<>();
        Duration pause = pace.retryPause;
        while (!stopping()) {
            for (Instant now = clock.instant(); !next.isAfter(now); next = next.plus(pace.live)) {
                unsent.add(next);
            }
            if (unsent.isEmpty()) {
                sleep(Duration.between(clock.instant(), next));
                continue;
            }
            Instant first = floor(start);
            Readings.Post post = readings.post(unsent, at -> at.equals(first) || Readings.titrated(at, pace.live));
            try {
                service.post(post.body());
                memory.liveUntil(lastOf(unsent, post.moments()));
                if (!pause.equals(pace.retryPause)) {
                    LOG.info("the service takes readings again; {} moments to catch up", unsent.size());
                    pause = pace.retryPause;
                }
                if (history == null) {
                    LOG.info("readings of now are being taken, every {} s", pace.live.toMillis() / 1000.0);
                    history = thread("demo-gateway-history", () -> runHistory(memory, readings));
                }
            } catch (NotTakenException e) {
                LOG.warn("{} moments wait to be sent: {}", unsent.size(), e.getMessage());
                sleep(pause);
                pause = longer(pause);
            }
        }
    }

    private void runHistory(GatewayMemory memory, Readings readings) throws InterruptedException {
        Deque<Instant> marks = new ArrayDeque<>();
        long total = memory.gaps().stream()
                .mapToLong(gap -> Readings.marks(gap).size())
                .sum();
        long sent = 0;
        int posts = 0;
        Duration pause = pace.retryPause;
        GatewayMemory.Gap gap;
        while ((gap = memory.oldestGap()) != null && !stopping()) {
            marks.addAll(Readings.marks(gap));
            Instant first = marks.peek();
            while (!marks.isEmpty() && !stopping()) {
                Readings.Post post = readings.post(marks, at -> at.equals(first) || Readings.titrated(at));
                try {
                    service.post(post.body());
                    memory.filledTo(lastOf(marks, post.moments()));
                    pause = pace.retryPause;
                    sent += post.moments();
                    if (++posts % SAY_EVERY_POSTS == 0) {
                        LOG.info("history: {} of {} moments sent", sent, total);
                    }
                } catch (NotTakenException e) {
                    LOG.warn("history waits: {}", e.getMessage());
                    sleep(pause);
                    pause = longer(pause);
                }
            }
            if (marks.isEmpty()) {
                memory.oldestGapFilled();
            }
        }
        if (sent > 0 && !stopping()) {
            LOG.info("history: complete, {} moments sent", sent);
        }
    }

    /** What was sent before, unless the service knows nothing of it. */
    private GatewayMemory memory(Instant start) throws InterruptedException {
        Duration pause = pace.retryPause;
        while (GatewayMemory.exists(memoryFile) && !stopping()) {
            try {
                Optional<Instant> known = service.waterKnownUntil(HatcheryWater.INTAKE);
                return GatewayMemory.open(memoryFile, floor(start), pace.history, known.orElse(null));
            } catch (NotTakenException e) {
                LOG.warn("the service does not say what it knows: {}", e.getMessage());
                sleep(pause);
                pause = longer(pause);
            }
        }
        return GatewayMemory.open(memoryFile, floor(start), pace.history, null);
    }

    /** Takes the first moments away; answers the last of them. */
    private static Instant lastOf(Deque<Instant> moments, int count) {
        for (int i = 1; i < count; i++) {
            moments.remove();
        }
        return moments.remove();
    }

    private Duration longer(Duration pause) {
        Duration longest = pace.retryPause.multipliedBy(15);
        Duration twice = pause.multipliedBy(2);
        return twice.compareTo(longest) > 0 ? longest : twice;
    }

    /** The last moment for a reading at or before a time. */
    private Instant floor(Instant time) {
        long step = pace.live.toMillis();
        return Instant.ofEpochMilli(Math.floorDiv(time.toEpochMilli(), step) * step);
    }

    private boolean stopping() {
        return stopping.getCount() == 0;
    }

    private void sleep(Duration time) throws InterruptedException {
        // cut short by close
        boolean stop = stopping.await(Math.max(1, time.toMillis()), TimeUnit.MILLISECONDS);
        if (stop) {
            LOG.debug("woken to stop");
        }
    }

    private interface Work {
        void run() throws InterruptedException;
    }

    private Thread thread(String name, Work work) {
        Thread thread = new Thread(
                () -> {
                    try {
                        work.run();
                    } catch (InterruptedException e) {
                        LOG.debug("{} stopped at work", name);
                    } catch (RuntimeException e) {
                        LOG.error("{} cannot go on", name, e);
                    }
                },
                name);
        thread.setDaemon(true);
        thread.start();
        return thread;
    }

    private static void end(@Nullable Thread thread) {
        if (thread == null || Objects.equals(thread, Thread.currentThread())) {
            return;
        }
        thread.interrupt();
        try {
            thread.join(GOODBYE.toMillis());
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
