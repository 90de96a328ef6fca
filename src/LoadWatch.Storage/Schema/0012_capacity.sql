-- Best means of activities, and reference values told from own sessions. What was computed before is computed again.
CREATE TABLE best_mean (
    activity TEXT NOT NULL REFERENCES activity (key) ON DELETE CASCADE,
    channel TEXT NOT NULL,
    means BLOB NOT NULL,
    PRIMARY KEY (activity, channel)
)
;
CREATE TABLE anchor_observed (
    person TEXT NOT NULL,
    kind TEXT NOT NULL,
    sport TEXT NOT NULL,
    exercise TEXT NOT NULL,
    machine TEXT NOT NULL,
    holds_from TEXT NOT NULL,
    value DOUBLE PRECISION NOT NULL,
    error DOUBLE PRECISION NOT NULL,
    shown_on TEXT NOT NULL,
    basis TEXT NOT NULL,
    PRIMARY KEY (person, kind, sport, exercise, machine, holds_from)
)
;
UPDATE activity SET checksum = NULL
