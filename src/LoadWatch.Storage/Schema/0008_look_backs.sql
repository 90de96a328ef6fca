-- What look-backs read, in bounded ranges of dates: the sessions of a day and what is carried behind it, the last date that a row speaks for.
ALTER TABLE day ADD COLUMN sessions TEXT NOT NULL DEFAULT '[]'
;
ALTER TABLE day ADD COLUMN carried TEXT NOT NULL DEFAULT '{}'
;
ALTER TABLE question ADD COLUMN about TEXT NOT NULL DEFAULT ''
;
ALTER TABLE table_row ADD COLUMN until TEXT NOT NULL DEFAULT ''
;
CREATE INDEX table_row_plan ON table_row (until, date) WHERE kind = 'plan'
;
ALTER TABLE decision ADD COLUMN about_from TEXT
;
UPDATE decision SET about_from = json_extract(detail, '$.from')
;
CREATE INDEX decision_person ON decision (person, kind, about_from)
;
-- Derived rows of before have none of it: the next sweep computes them again.
DELETE FROM derived_state
