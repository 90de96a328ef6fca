-- What can be emptied and computed again to the same rows (I-5).
CREATE TABLE derived_state (
    key TEXT NOT NULL PRIMARY KEY,
    value TEXT NOT NULL
)
;
CREATE TABLE recording (
    sha TEXT NOT NULL REFERENCES arrival (sha),
    part BIGINT NOT NULL,
    person TEXT NOT NULL,
    start TEXT NOT NULL,
    local_offset_seconds BIGINT NOT NULL,
    sport TEXT NOT NULL,
    elapsed_seconds DOUBLE PRECISION,
    timer_seconds DOUBLE PRECISION,
    source TEXT NOT NULL,
    channels BIGINT NOT NULL,
    samples BIGINT NOT NULL,
    sets BIGINT NOT NULL,
    samples_digest BIGINT NOT NULL,
    PRIMARY KEY (sha, part)
)
;
CREATE INDEX recording_person ON recording (person, start)
;
CREATE TABLE activity (
    key TEXT NOT NULL PRIMARY KEY,
    sha TEXT NOT NULL,
    part BIGINT NOT NULL,
    person TEXT NOT NULL,
    date TEXT NOT NULL,
    recordings TEXT NOT NULL,
    heart_rate_mean_bpm DOUBLE PRECISION,
    heart_rate_max_bpm BIGINT,
    power_mean_watts DOUBLE PRECISION,
    power_max_watts DOUBLE PRECISION,
    usable_share TEXT NOT NULL,
    times_in_zone TEXT NOT NULL,
    remarks TEXT NOT NULL,
    FOREIGN KEY (sha, part) REFERENCES recording (sha, part) ON DELETE CASCADE
)
;
CREATE INDEX activity_recording ON activity (sha, part)
;
CREATE INDEX activity_person ON activity (person, date)
;
CREATE TABLE histogram (
    activity TEXT NOT NULL REFERENCES activity (key) ON DELETE CASCADE,
    channel TEXT NOT NULL,
    bins BLOB NOT NULL,
    PRIMARY KEY (activity, channel)
)
;
CREATE TABLE quantity (
    activity TEXT NOT NULL REFERENCES activity (key) ON DELETE CASCADE,
    name TEXT NOT NULL,
    value DOUBLE PRECISION NOT NULL,
    unit TEXT NOT NULL,
    estimated BIGINT NOT NULL,
    PRIMARY KEY (activity, name)
)
;
CREATE TABLE stimulus (
    activity TEXT NOT NULL REFERENCES activity (key) ON DELETE CASCADE,
    region TEXT NOT NULL,
    grade TEXT NOT NULL,
    channel TEXT NOT NULL,
    hard_bouts_low DOUBLE PRECISION,
    hard_bouts_mid DOUBLE PRECISION,
    hard_bouts_high DOUBLE PRECISION,
    hard_repetitions_low DOUBLE PRECISION,
    hard_repetitions_mid DOUBLE PRECISION,
    hard_repetitions_high DOUBLE PRECISION,
    hard_sets BIGINT,
    slow_seconds_low DOUBLE PRECISION,
    slow_seconds_mid DOUBLE PRECISION,
    slow_seconds_high DOUBLE PRECISION,
    medium_seconds_low DOUBLE PRECISION,
    medium_seconds_mid DOUBLE PRECISION,
    medium_seconds_high DOUBLE PRECISION,
    large_seconds_low DOUBLE PRECISION,
    large_seconds_mid DOUBLE PRECISION,
    large_seconds_high DOUBLE PRECISION,
    not_seen TEXT NOT NULL,
    PRIMARY KEY (activity, region)
)
;
CREATE TABLE day (
    person TEXT NOT NULL,
    date TEXT NOT NULL,
    state TEXT NOT NULL,
    state_source TEXT,
    load DOUBLE PRECISION,
    acute DOUBLE PRECISION,
    chronic DOUBLE PRECISION,
    chronic_before DOUBLE PRECISION,
    ratio_coupled DOUBLE PRECISION,
    ratio_uncoupled DOUBLE PRECISION,
    ratio_ewma DOUBLE PRECISION,
    ewma_acute DOUBLE PRECISION,
    ewma_chronic DOUBLE PRECISION,
    weekly_change DOUBLE PRECISION,
    monotony DOUBLE PRECISION,
    strain DOUBLE PRECISION,
    chronic_median DOUBLE PRECISION,
    coverage7 DOUBLE PRECISION NOT NULL,
    coverage28 DOUBLE PRECISION NOT NULL,
    days_since_first_covered BIGINT,
    days_since_recorded BIGINT,
    regions TEXT NOT NULL,
    PRIMARY KEY (person, date)
)
;
CREATE TABLE finding (
    person TEXT NOT NULL,
    date TEXT NOT NULL,
    rule TEXT NOT NULL,
    region TEXT NOT NULL,
    severity TEXT NOT NULL,
    since TEXT NOT NULL,
    value DOUBLE PRECISION NOT NULL,
    limit_value DOUBLE PRECISION NOT NULL,
    unit TEXT NOT NULL,
    text TEXT NOT NULL,
    evidence TEXT NOT NULL,
    PRIMARY KEY (person, date, rule, region)
)
;
CREATE TABLE person_state (
    person TEXT NOT NULL PRIMARY KEY,
    dirty_from TEXT,
    computed_to TEXT
)
