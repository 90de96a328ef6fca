-- What of a session does not count, where and why, and everything that is wrong with a file beside the first. What was computed before is computed again.
ALTER TABLE activity ADD COLUMN cuts TEXT NOT NULL DEFAULT '[]'
;
UPDATE activity SET checksum = NULL
;
ALTER TABLE arrival ADD COLUMN problems TEXT NOT NULL DEFAULT '[]'
