-- What cannot be computed again. One statement per command: a line that holds a semicolon alone ends each.
CREATE TABLE config_version (
    hash TEXT NOT NULL PRIMARY KEY,
    seq BIGINT NOT NULL,
    text TEXT NOT NULL
)
;
CREATE TABLE arrival (
    sha TEXT NOT NULL PRIMARY KEY,
    parent_sha TEXT,
    object_sha TEXT NOT NULL,
    kind TEXT,
    state TEXT NOT NULL,
    reason TEXT,
    person TEXT,
    attempts BIGINT NOT NULL,
    size BIGINT NOT NULL
)
;
CREATE INDEX arrival_state ON arrival (state, sha)
;
CREATE TABLE sighting (
    inbox TEXT NOT NULL,
    path TEXT NOT NULL,
    sha TEXT NOT NULL,
    first_seen TEXT NOT NULL,
    size BIGINT NOT NULL,
    mtime BIGINT NOT NULL,
    file_id TEXT NOT NULL,
    latest BIGINT NOT NULL,
    PRIMARY KEY (inbox, path, sha)
)
;
CREATE INDEX sighting_sha ON sighting (sha)
;
CREATE TABLE decision (
    id TEXT NOT NULL PRIMARY KEY,
    made TEXT NOT NULL,
    kind TEXT NOT NULL,
    person TEXT,
    alert TEXT,
    detail TEXT NOT NULL
)
;
CREATE TABLE evaluation (
    scope TEXT NOT NULL,
    date TEXT NOT NULL,
    config_hash TEXT NOT NULL,
    PRIMARY KEY (scope, date)
)
;
CREATE TABLE alert (
    id TEXT NOT NULL PRIMARY KEY,
    person TEXT NOT NULL,
    rule TEXT NOT NULL,
    region TEXT NOT NULL,
    raised TEXT NOT NULL,
    judged TEXT NOT NULL,
    state TEXT NOT NULL,
    severity TEXT NOT NULL,
    text TEXT NOT NULL
)
;
CREATE INDEX alert_person ON alert (person, state)
;
CREATE TABLE alert_change (
    alert TEXT NOT NULL REFERENCES alert (id),
    seq BIGINT NOT NULL,
    position BIGINT NOT NULL UNIQUE,
    date TEXT NOT NULL,
    from_state TEXT NOT NULL,
    to_state TEXT NOT NULL,
    reason TEXT NOT NULL,
    severity TEXT NOT NULL,
    text TEXT NOT NULL,
    evidence TEXT,
    PRIMARY KEY (alert, seq)
)
;
CREATE TABLE notice (
    key TEXT NOT NULL PRIMARY KEY,
    contact TEXT NOT NULL,
    kind TEXT NOT NULL,
    date TEXT NOT NULL,
    subject TEXT NOT NULL,
    text TEXT NOT NULL,
    html TEXT NOT NULL,
    reason TEXT NOT NULL,
    alert_position BIGINT NOT NULL
)
;
CREATE INDEX notice_contact ON notice (contact, kind, date)
;
CREATE TABLE delivery (
    notice TEXT NOT NULL REFERENCES notice (key),
    channel TEXT NOT NULL,
    recipient TEXT NOT NULL,
    state TEXT NOT NULL,
    attempts BIGINT NOT NULL,
    last_error TEXT,
    PRIMARY KEY (notice, channel, recipient)
)
;
CREATE INDEX delivery_state ON delivery (state)
;
CREATE TABLE tombstone (
    sha TEXT NOT NULL PRIMARY KEY,
    erased TEXT NOT NULL,
    reason TEXT NOT NULL
)
;
CREATE TABLE audit (
    seq BIGINT NOT NULL PRIMARY KEY,
    instant TEXT NOT NULL,
    what TEXT NOT NULL,
    detail TEXT NOT NULL
)
