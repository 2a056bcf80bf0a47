// Adds to one counter many times, reading before it writes, as a second process of the shop would.
import Database from 'better-sqlite3';

const [, , file, times] = process.argv;
const db = new Database(file, { timeout: 20_000 });
for (let time = 0; time < Number(times); time += 1) {
  db.exec('begin immediate');
  const { value } = db.prepare('select value from counters').get();
  db.prepare('update counters set value = ?').run(value + 1);
  db.exec('commit');
}
db.close();
