-- Rows of tables in force, what a version of a table was seen last, and what the plan says of a day.
CREATE TABLE table_row (
    scope TEXT NOT NULL,
    subject TEXT NOT NULL,
    key TEXT NOT NULL,
    kind TEXT NOT NULL,
    layout TEXT NOT NULL,
    person TEXT,
    date TEXT NOT NULL,
    since TEXT NOT NULL,
    content TEXT NOT NULL,
    PRIMARY KEY (scope, kind, subject, key)
)
;
CREATE TABLE table_content (
    sha TEXT NOT NULL PRIMARY KEY REFERENCES arrival (sha),
    layout TEXT NOT NULL,
    named_by_folder BIGINT NOT NULL
)
;
CREATE TABLE table_version (
    scope TEXT NOT NULL,
    path TEXT NOT NULL,
    sha TEXT NOT NULL,
    since TEXT NOT NULL,
    owner TEXT,
    PRIMARY KEY (scope, path, sha)
)
;
CREATE TABLE question (
    person TEXT NOT NULL,
    date TEXT NOT NULL,
    sentence TEXT NOT NULL,
    PRIMARY KEY (person, date, sentence)
)
;
CREATE TABLE content_question (
    sha TEXT NOT NULL REFERENCES arrival (sha),
    sentence TEXT NOT NULL,
    PRIMARY KEY (sha, sentence)
)
;
CREATE TABLE recomputation (
    person TEXT NOT NULL,
    from_date TEXT NOT NULL,
    to_date TEXT NOT NULL,
    PRIMARY KEY (person, from_date, to_date)
)
;
CREATE INDEX sighting_path ON sighting (path)
;
CREATE INDEX table_row_person ON table_row (person, kind, date)
;
CREATE INDEX table_row_kind ON table_row (kind, date)
;
ALTER TABLE sighting ADD COLUMN since TEXT
;
UPDATE sighting SET since = first_seen
;
ALTER TABLE person_state ADD COLUMN marks BIGINT NOT NULL DEFAULT 0
;
ALTER TABLE day ADD COLUMN plan TEXT NOT NULL DEFAULT '{}'
;
ALTER TABLE finding RENAME COLUMN region TO about
;
ALTER TABLE alert RENAME COLUMN region TO about
;
ALTER TABLE alert ADD COLUMN shelved_until TEXT
