-- An activity is one row: its quantities and its stimulus stand in it as JSON. What was computed before is computed again.
DROP TABLE quantity
;
DROP TABLE stimulus
;
ALTER TABLE activity ADD COLUMN quantities TEXT NOT NULL DEFAULT '[]'
;
ALTER TABLE activity ADD COLUMN stimulus TEXT NOT NULL DEFAULT '[]'
;
DELETE FROM derived_state
