// Reads every file of a folder with fit-file-parser and prints one line of JSON each: what it gives of the values that LoadWatch gives too.
// Times are milliseconds since 1970; what is absent is null.
import fs from 'node:fs';
import path from 'node:path';
import FitParser from 'fit-file-parser';

const time = value => value instanceof Date ? value.getTime() : null;
const some = value => value === undefined ? null : value;
const word = (table, value) => typeof value === 'number' ? `${table}_${value}` : some(value);

const record = of => [
  time(of.timestamp), some(of.heart_rate), some(of.power), some(of.enhanced_speed ?? of.speed),
  some(of.cadence), some(of.distance), some(of.enhanced_altitude ?? of.altitude),
];

const values = data => ({
  fileType: word('file', data.file_ids[0]?.type),
  serial: some(data.file_ids[0]?.serial_number),
  records: data.records.map(record),
  sessions: data.sessions.map(of => ({
    start: time(of.start_time), sport: word('sport', of.sport), subSport: word('sub_sport', of.sub_sport),
    elapsed: some(of.total_elapsed_time), timer: some(of.total_timer_time), distance: some(of.total_distance),
  })),
  sets: data.sets.map(of => ({
    start: time(of.start_time ?? of.timestamp), duration: some(of.duration), active: of.set_type !== 'rest',
    category: word('exercise_category', (of.category ?? []).find(guess => guess !== null)), repetitions: some(of.repetitions), weight: some(of.weight),
  })),
  laps: data.laps.map(of => time(of.start_time ?? of.timestamp)),
  lengths: data.lengths.map(of => time(of.start_time ?? of.timestamp)),
  beats: (data.messages.hr ?? []).flatMap(of => of.filtered_bpm ?? []),
  intervals: data.hrv.flatMap(of => of.time ?? []),
  timer: data.events.filter(of => of.event === 'timer').map(of => ({ time: time(of.timestamp), type: word('event_type', of.event_type) })),
  activity: data.activity ? [time(data.activity.timestamp), time(data.activity.local_timestamp)] : null,
  monitored: data.monitors.map(of => ({ time: time(of.timestamp), heartRate: some(of.heart_rate), cycles: some(of.cycles), kind: word('activity_type', of.activity_type) })),
});

const read = file => {
  let line = { error: 'no answer' };
  try {
    new FitParser({ force: false, mode: 'list' }).parse(fs.readFileSync(file), (error, data) => { line = error ? { error: String(error) } : values(data); });
  } catch (error) {
    line = { error: String(error.message) };
  }

  return line;
};

const folder = process.argv[2];
const repeat = Number(process.argv[3] ?? 1);
for (const name of fs.readdirSync(folder).sort()) {
  for (let i = 1; i < repeat; i++)
    read(path.join(folder, name));

  process.stdout.write(JSON.stringify({ name, ...read(path.join(folder, name)) }) + '\n');
}
