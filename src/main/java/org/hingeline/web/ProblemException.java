package org.hingeline.web;

/** Ends a request with a problem. */
final class ProblemException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final transient Problem problem;

    ProblemException(Problem problem) {
        super(problem.detail(), null, false, false);
        this.problem = problem;
    }

    ProblemException(int status, String title, String detail) {
        this(Problem.of(status, title, detail));
    }

    Problem problem() {
        return problem;
    }
}
