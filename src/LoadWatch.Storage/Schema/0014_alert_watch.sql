-- Whether an alert is watched, and by which limits of its rule its finding held last.
ALTER TABLE alert ADD COLUMN watch TEXT NOT NULL DEFAULT 'watched'
;
ALTER TABLE alert ADD COLUMN limits_hash TEXT
