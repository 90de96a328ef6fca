-- Which channels a recording holds from when to when, and what each recording gives to its activity. What was computed before is computed again.
ALTER TABLE recording DROP COLUMN channels
;
ALTER TABLE recording ADD COLUMN channels TEXT NOT NULL DEFAULT '[]'
;
ALTER TABLE recording ADD COLUMN distance_metres DOUBLE PRECISION
;
ALTER TABLE activity ADD COLUMN session TEXT
;
UPDATE activity SET recordings = '[]'
;
DELETE FROM derived_state
