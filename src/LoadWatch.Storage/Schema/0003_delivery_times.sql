-- When a delivery was tried and is due again, and what a notice knew when it was decided.
ALTER TABLE delivery ADD COLUMN first_attempt TEXT
;
ALTER TABLE delivery ADD COLUMN next_attempt TEXT
;
ALTER TABLE notice ADD COLUMN decided TEXT
;
ALTER TABLE notice ADD COLUMN flagged TEXT
