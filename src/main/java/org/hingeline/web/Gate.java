package org.hingeline.web;

import io.javalin.security.RouteRole;
import org.hingeline.monitor.Role;

/** Who may take a route. */
enum Gate implements RouteRole {
    /** Anybody: health, sign-in and the files the sign-in page needs. */
    OPEN,
    /** A gateway with its key. */
    GATEWAY,
    VIEWER,
    OPERATOR,
    MANAGER;

    Role role() {
        return switch (this) {
            case VIEWER -> Role.VIEWER;
            case OPERATOR -> Role.OPERATOR;
            case MANAGER -> Role.MANAGER;
            case OPEN, GATEWAY -> throw new IllegalStateException(this + " asks for no role");
        };
    }
}
