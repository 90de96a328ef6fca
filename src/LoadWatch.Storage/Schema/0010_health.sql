-- Which folder each inbox was, what is wrong with the service since when, moments that the clock is held against, and a checksum of what was computed.
CREATE TABLE inbox_root (
    inbox TEXT NOT NULL PRIMARY KEY,
    path TEXT NOT NULL,
    folder_id TEXT NOT NULL,
    held_entries BIGINT NOT NULL
)
;
CREATE TABLE trouble (
    name TEXT NOT NULL PRIMARY KEY,
    since TEXT NOT NULL,
    sentence TEXT NOT NULL
)
;
CREATE TABLE service_moment (
    name TEXT NOT NULL PRIMARY KEY,
    moment TEXT NOT NULL
)
;
CREATE INDEX sighting_first_seen ON sighting (first_seen)
;
ALTER TABLE activity ADD COLUMN checksum TEXT
