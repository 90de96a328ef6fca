-- What derived rows were computed on, part by part, and which contents are to be computed again because a part of it changed.
CREATE TABLE basis (
    scope TEXT NOT NULL,
    part TEXT NOT NULL,
    value TEXT NOT NULL,
    PRIMARY KEY (scope, part)
)
;
CREATE TABLE outdated (
    sha TEXT NOT NULL PRIMARY KEY REFERENCES arrival (sha),
    object_sha TEXT NOT NULL,
    person TEXT NOT NULL
)
;
CREATE INDEX outdated_person ON outdated (person, object_sha, sha)
;
CREATE INDEX arrival_parent ON arrival (parent_sha) WHERE parent_sha IS NOT NULL
