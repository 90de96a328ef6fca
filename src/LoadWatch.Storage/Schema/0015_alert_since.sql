-- When an alert was raised last, the first time or again.
ALTER TABLE alert ADD COLUMN stands_since TEXT NOT NULL DEFAULT ''
;
UPDATE alert SET stands_since = COALESCE(
    (SELECT MAX(date) FROM alert_change WHERE alert_change.alert = alert.id AND reason IN ('raised', 'raised_again')),
    raised)
