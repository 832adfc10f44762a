/** Schema 1: projects, their jobs, the jobs' revisions, settings. */
import type Database from 'better-sqlite3'

export const recordTables = (database: Database.Database): void => {
  database.exec(SCHEMA)
}

/**
 * `AUTOINCREMENT`: an id once given never names another thing. `text` is the job as entered, letter by letter. `hash` is
 * over all other columns of a revision, for SQLite keeps no checksum of its own.
 * A revision is the next of its job or it is refused; that also meets a REPLACE, which would delete a row in silence.
 */
const SCHEMA = `
CREATE TABLE projects (
  id INTEGER PRIMARY KEY AUTOINCREMENT,
  name TEXT NOT NULL CHECK (name <> ''),
  numbering TEXT NOT NULL CHECK (numbering IN ('letters', 'numbers'))
) STRICT;

CREATE TABLE jobs (
  id INTEGER PRIMARY KEY AUTOINCREMENT,
  project INTEGER NOT NULL REFERENCES projects (id) ON UPDATE RESTRICT ON DELETE RESTRICT,
  name TEXT NOT NULL CHECK (name <> '')
) STRICT;

CREATE INDEX jobs_of_project ON jobs (project);

CREATE TABLE revisions (
  id INTEGER PRIMARY KEY AUTOINCREMENT,
  job INTEGER NOT NULL REFERENCES jobs (id) ON UPDATE RESTRICT ON DELETE RESTRICT,
  sequence INTEGER NOT NULL CHECK (sequence >= 0),
  label TEXT NOT NULL CHECK (label <> ''),
  purpose TEXT NOT NULL,
  author TEXT NOT NULL,
  checker TEXT NOT NULL,
  date TEXT NOT NULL CHECK (date GLOB '[0-9][0-9][0-9][0-9]-[0-9][0-9]-[0-9][0-9]'),
  note TEXT NOT NULL,
  text TEXT NOT NULL CHECK (text <> ''),
  result TEXT NOT NULL CHECK (json_valid(result)),
  program TEXT NOT NULL CHECK (program <> ''),
  fingerprint TEXT NOT NULL CHECK (length(fingerprint) = 64),
  hash TEXT NOT NULL CHECK (length(hash) = 64),
  UNIQUE (job, sequence),
  UNIQUE (job, label)
) STRICT;

CREATE TRIGGER revisions_come_next BEFORE INSERT ON revisions
WHEN EXISTS (SELECT 1 FROM revisions WHERE id = NEW.id)
  OR NEW.sequence <> (SELECT count(*) FROM revisions WHERE job = NEW.job)
  OR EXISTS (SELECT 1 FROM revisions WHERE job = NEW.job AND label = NEW.label)
BEGIN
  SELECT RAISE(ABORT, 'a revision is kept as the next of its job');
END;

CREATE TRIGGER revisions_never_change BEFORE UPDATE ON revisions
BEGIN
  SELECT RAISE(ABORT, 'a kept revision is never changed');
END;

CREATE TRIGGER revisions_never_go BEFORE DELETE ON revisions
BEGIN
  SELECT RAISE(ABORT, 'a kept revision is never deleted');
END;

CREATE TABLE settings (
  name TEXT PRIMARY KEY NOT NULL CHECK (name <> ''),
  value TEXT NOT NULL CHECK (json_valid(value))
) STRICT, WITHOUT ROWID;
`
