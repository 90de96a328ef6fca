-- A notice as its mail says it, where that holds fewer names than text and page.
ALTER TABLE notice ADD COLUMN mail_text TEXT
;
ALTER TABLE notice ADD COLUMN mail_html TEXT
