package org.hingeline.web;

import io.javalin.Javalin;
import io.javalin.config.JavalinConfig;
import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import io.javalin.http.HttpResponseException;
import io.javalin.http.staticfiles.Location;
import io.micrometer.core.instrument.Tags;
import io.micrometer.jetty12.server.TimedHandler;
import io.micrometer.prometheusmetrics.PrometheusMeterRegistry;
import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.eclipse.jetty.util.thread.QueuedThreadPool;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.Secrets;
import org.hingeline.monitor.WaterCalculator;
import org.hingeline.web.view.ErrorView;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import tools.jackson.core.JacksonException;

/** Puts the routes together and serves them. */
public final class WebServer implements AutoCloseable {
    private static final Logger LOG = LoggerFactory.getLogger(WebServer.class);
    private static final int THREADS = 40;
    private static final long STOP_MS = 10_000;

    /**
     * How to serve.
     *
     * @param port 0 takes any free one
     * @param cookiesOverTlsOnly whether browsers may send the session cookie over TLS only
     */
    public record Rules(String host, int port, int maxBodyBytes, int maxRowsPerPost, boolean cookiesOverTlsOnly) {}

    private final Javalin javalin;
    private final LiveEvents live;

    private WebServer(Javalin javalin, LiveEvents live) {
        this.javalin = javalin;
        this.live = live;
    }

    public static WebServer start(
            Rules rules, Services services, Secrets secrets, LiveEvents live, PrometheusMeterRegistry registry) {
        PageMaker pages = new PageMaker(services.clock());
        Javalin javalin = Javalin.create(config -> {
            serve(config, rules, registry);
            RoutesConfig routes = config.routes;
            routes.before(WebServer::harden);
            routes.before(WebServer::refuseUploads);
            routes.beforeMatched(new Gatekeeper(services.accounts())::check);
            Meters meters = new Meters(registry);
            new ReadingRoutes(services.intake(), meters, rules.maxRowsPerPost()).addTo(routes);
            new PointRoutes(services.board(), services.clock()).addTo(routes);
            new LimitRoutes(services.board(), services.limits()).addTo(routes);
            new AlertRoutes(services.board(), services.alerts()).addTo(routes);
            new DoseRoutes(services.doses()).addTo(routes);
            new DoseRecordRoutes(services.board(), services.doseRecords(), services.doseHistory(), services.clock())
                    .addTo(routes);
            new SeawaterRoutes(new WaterCalculator(), meters).addTo(routes);
            new OperationRoutes(services.checks(), registry).addTo(routes);
            new SignInPages(services.accounts(), pages, secrets, rules.cookiesOverTlsOnly()).addTo(routes);
            new StatusPages(services.board(), pages).addTo(routes);
            new PointPages(services.board(), services.limits(), new DoseRows(services.doseHistory()), pages)
                    .addTo(routes);
            new AlertPages(services.board(), services.alerts(), pages).addTo(routes);
            new DosePages(services.board(), services.doses(), services.doseRecords(), pages).addTo(routes);
            new DoseRecordPages(services.board(), services.doseRecords(), services.doseHistory(), pages).addTo(routes);
            new CalculatorPages(services.board(), services.states(), new WaterCalculator(), pages).addTo(routes);
            new ElectrodePages(pages).addTo(routes);
            new MessagePages(services.board(), pages).addTo(routes);
            new SetupPages(services.place(), services.accounts(), pages).addTo(routes);
            live.addTo(routes);
            failures(routes, pages);
        });
        javalin.start();
        return new WebServer(javalin, live);
    }

    private static void serve(JavalinConfig config, Rules rules, PrometheusMeterRegistry registry) {
        config.startup.showJavalinBanner = false;
        config.jetty.host = rules.host();
        config.jetty.port = rules.port();
        config.jetty.threadPool = new QueuedThreadPool(THREADS);
        config.jetty.modifyServer(server -> {
            server.setStopTimeout(STOP_MS);
            TimedHandler timed = new TimedHandler(registry, Tags.empty());
            timed.setHandler(server.getHandler());
            server.setHandler(timed);
            server.setErrorHandler(new EarlyRefusals());
        });
        config.http.maxRequestSize = rules.maxBodyBytes();
        config.http.prefer405over404 = true;
        config.http.asyncTimeout = 0;
        config.staticFiles.add(files -> {
            files.hostedPath = "/web";
            files.directory = "/web";
            files.location = Location.CLASSPATH;
            files.roles = Set.of(Gate.OPEN);
            files.headers.put("Cache-Control", "public, max-age=31536000, immutable");
        });
        config.staticFiles.add(files -> {
            files.hostedPath = "/webjars";
            files.directory = "META-INF/resources/webjars";
            files.location = Location.CLASSPATH;
            files.roles = Set.of(Gate.OPEN);
            files.headers.put("Cache-Control", "public, max-age=31536000, immutable");
        });
    }

    /** Headers that keep a browser from doing with our pages what they do not ask for. */
    private static void harden(Context ctx) {
        ctx.header(
                "Content-Security-Policy",
                "default-src 'self'; frame-ancestors 'none'; base-uri 'none'; form-action 'self'");
        ctx.header("X-Content-Type-Options", "nosniff");
        ctx.header("Referrer-Policy", "same-origin");
    }

    /** No page sends files; such a body would be kept on disk without a bound. */
    private static void refuseUploads(Context ctx) {
        String type = ctx.contentType();
        if (type != null && type.toLowerCase(Locale.ROOT).startsWith("multipart/")) {
            throw new ProblemException(415, "Unknown format", "multipart bodies are not taken here");
        }
    }

    private static void failures(RoutesConfig routes, PageMaker pages) {
        routes.exception(ProblemException.class, (e, ctx) -> tell(ctx, e.problem(), pages));
        routes.exception(FieldFaultsException.class, (e, ctx) -> tell(ctx, Problem.of(e), pages));
        routes.exception(JacksonException.class, (e, ctx) -> tell(ctx, JsonFaults.problem(e), pages));
        routes.exception(
                HttpResponseException.class,
                (e, ctx) -> tell(ctx, Problem.of(e.getStatus(), title(e.getStatus()), detail(e, ctx)), pages));
        routes.exception(Exception.class, (e, ctx) -> {
            LOG.error("{} {} failed", ctx.method(), ctx.path(), e);
            tell(
                    ctx,
                    Problem.of(500, "Failed", "something failed on our side; it is in the log. Send it again later"),
                    pages);
        });
        routes.error(404, ctx -> {
            if (!ctx.res().isCommitted() && ctx.result() == null
                    || "Not Found".equals(ctx.result())
                    || ctx.result() != null && ctx.result().startsWith("Endpoint")) {
                tell(ctx, Problem.of(404, "No such address", "there is nothing at " + ctx.path()), pages);
            }
        });
    }

    private static String title(int status) {
        return switch (status) {
            case 404 -> "No such address";
            case 405 -> "Wrong method";
            case 413 -> "Too large";
            default -> "Refused";
        };
    }

    private static String detail(HttpResponseException e, Context ctx) {
        return switch (e.getStatus()) {
            case 404 -> "there is nothing at " + ctx.path();
            case 405 -> ctx.method() + " is not possible at " + ctx.path();
            case 413 -> "the body is larger than this service takes; send it in several requests";
            default -> String.valueOf(e.getMessage()).toLowerCase(Locale.ROOT);
        };
    }

    private static void tell(Context ctx, Problem problem, PageMaker pages) {
        String accept = ctx.header("Accept");
        boolean person = !Gatekeeper.forProgram(ctx) && accept != null && accept.contains("text/html");
        if (person) {
            ErrorView usual = ErrorView.of(problem.status());
            boolean ours = problem.status() < 500 && problem.status() != 404 && problem.status() != 403;
            pages.error(ctx, ours ? new ErrorView(problem.status(), usual.title(), problem.detail()) : usual);
        } else {
            Json.answer(ctx, problem);
        }
    }

    /** The port it is served on. */
    public int port() {
        return javalin.port();
    }

    /** Every route that is served, as {@code GET /api/v1/points}; what the description of the API is held against. */
    public Set<String> routes() {
        return javalin.unsafe.internalRouter.allHttpHandlers().stream()
                .map(parsed -> parsed.endpoint)
                .filter(endpoint -> endpoint.method.isHttpMethod())
                .map(endpoint -> endpoint.method.name() + " " + endpoint.path)
                .collect(Collectors.toCollection(TreeSet::new));
    }

    @Override
    public void close() {
        live.close();
        javalin.stop();
    }
}
