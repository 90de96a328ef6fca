-- What a day tells beside its sums: the error of converted loads, the usual week and the change against the last ordinary one, the largest sessions of 30 days.
-- When the day of a recording's owner begins. What the limits leave open today.
ALTER TABLE day ADD COLUMN load_error DOUBLE PRECISION
;
ALTER TABLE day ADD COLUMN weekly_change_ordinary DOUBLE PRECISION
;
ALTER TABLE day ADD COLUMN usual_week DOUBLE PRECISION
;
ALTER TABLE day ADD COLUMN largest_session30 DOUBLE PRECISION
;
ALTER TABLE day ADD COLUMN longest_run_metres30 DOUBLE PRECISION
;
ALTER TABLE recording ADD COLUMN day_begins_seconds BIGINT NOT NULL DEFAULT 0
;
CREATE TABLE todays_room (
    person TEXT NOT NULL PRIMARY KEY,
    date TEXT NOT NULL,
    detail TEXT NOT NULL
)
