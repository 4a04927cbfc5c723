-- What was planned, what ran and what was said of it. Rows are added and never changed: a re-run,
-- a verdict or a reuse is a row of its own.
-- Digests and keys are bytes; times of day are milliseconds since 1970 UTC; lengths are nanoseconds.

PRAGMA application_id = 1400138873; -- "Stly" in ASCII
PRAGMA user_version = 1;

-- The words behind the small integers of the other tables, for people who look in here.
CREATE TABLE word (
  kind TEXT NOT NULL,
  code INTEGER NOT NULL,
  name TEXT NOT NULL,
  PRIMARY KEY (kind, code)
) STRICT, WITHOUT ROWID;

INSERT INTO word (kind, code, name) VALUES
  ('status', 0, 'OPTIMAL'), ('status', 1, 'FEASIBLE'), ('status', 2, 'INFEASIBLE'),
  ('status', 3, 'UNKNOWN'),
  ('ending', 0, 'COMPLETED'), ('ending', 1, 'TIME_LIMIT'), ('ending', 2, 'WORK_LIMIT'),
  ('ending', 3, 'MEMORY_LIMIT'), ('ending', 4, 'CRASHED'), ('ending', 5, 'UNSUPPORTED'),
  ('ending', 6, 'STOPPED'),
  ('verdict', 0, 'UNCHECKED'), ('verdict', 1, 'VALID'), ('verdict', 2, 'INVALID'),
  ('goal', 0, 'SATISFY'), ('goal', 1, 'OPTIMISE'), ('goal', 2, 'ENUMERATE'),
  ('mode', 0, 'COLD'), ('mode', 1, 'WARM');

-- What is compared.

CREATE TABLE family_code (
  id INTEGER PRIMARY KEY,
  name TEXT NOT NULL,
  digest BLOB NOT NULL,
  UNIQUE (name, digest)
) STRICT;

CREATE TABLE instance (
  id INTEGER PRIMARY KEY,
  family TEXT NOT NULL,
  name TEXT NOT NULL,
  content BLOB NOT NULL,
  UNIQUE (family, name, content)
) STRICT;

CREATE TABLE recipe (
  id INTEGER PRIMARY KEY,
  family_code INTEGER NOT NULL REFERENCES family_code,
  content BLOB NOT NULL,
  amendments TEXT NOT NULL, -- JSON array, in order of application
  UNIQUE (family_code, content, amendments)
) STRICT;

CREATE TABLE model (
  id INTEGER PRIMARY KEY,
  as_built BLOB NOT NULL,
  search BLOB NOT NULL,
  canonical BLOB NOT NULL,
  plain_canonical BLOB NOT NULL,
  groups BLOB NOT NULL, -- digest of the rows in model_group: the other digests do not see them
  variables INTEGER NOT NULL,
  postings INTEGER NOT NULL,
  UNIQUE (as_built, search, canonical, plain_canonical, groups)
) STRICT;

CREATE TABLE model_group (
  model INTEGER NOT NULL REFERENCES model,
  name TEXT NOT NULL,
  digest BLOB NOT NULL,
  postings INTEGER NOT NULL,
  PRIMARY KEY (model, name)
) STRICT, WITHOUT ROWID;

-- Answers are compared within one problem: the instance's content and what plain makes of it.
CREATE TABLE problem (
  id INTEGER PRIMARY KEY,
  content BLOB NOT NULL,
  plain_canonical BLOB NOT NULL,
  UNIQUE (content, plain_canonical)
) STRICT;

-- What a recipe builds, or why it builds nothing.
CREATE TABLE recipe_model (
  recipe INTEGER PRIMARY KEY REFERENCES recipe,
  model INTEGER REFERENCES model,
  problem INTEGER REFERENCES problem,
  failure TEXT,
  CHECK ((model IS NULL) <> (failure IS NULL)),
  CHECK ((model IS NULL) = (problem IS NULL))
) STRICT;

CREATE TABLE backend_build (
  id INTEGER PRIMARY KEY,
  adapter TEXT NOT NULL,
  version TEXT NOT NULL,
  digest BLOB NOT NULL,
  UNIQUE (adapter, version, digest)
) STRICT;

CREATE TABLE settings (
  id INTEGER PRIMARY KEY,
  options TEXT NOT NULL UNIQUE -- JSON object, sorted
) STRICT;

-- Where and how runs are made.

CREATE TABLE limits (
  id INTEGER PRIMARY KEY,
  wall_seconds REAL NOT NULL,
  work_unit TEXT NOT NULL, -- empty for a wall limit
  work_amount REAL NOT NULL, -- 0 for a wall limit
  memory_bytes INTEGER NOT NULL,
  UNIQUE (wall_seconds, work_unit, work_amount, memory_bytes)
) STRICT;

CREATE TABLE machine (
  id INTEGER PRIMARY KEY,
  class TEXT NOT NULL,
  facts TEXT NOT NULL, -- JSON object, sorted
  UNIQUE (class, facts)
) STRICT;

CREATE TABLE session (
  id INTEGER PRIMARY KEY,
  name TEXT NOT NULL UNIQUE,
  started INTEGER NOT NULL,
  machine INTEGER NOT NULL REFERENCES machine,
  harness TEXT NOT NULL,
  launch TEXT NOT NULL -- JSON object, sorted
) STRICT;

CREATE TABLE calibration (
  id INTEGER PRIMARY KEY,
  session INTEGER NOT NULL REFERENCES session,
  at INTEGER NOT NULL,
  ns INTEGER NOT NULL,
  steal_ns INTEGER NOT NULL,
  swapped_pages INTEGER NOT NULL
) STRICT;
CREATE INDEX calibration_session ON calibration (session);

-- The plan. Names live here; runs do not know them.

CREATE TABLE sweep (
  id INTEGER PRIMARY KEY,
  name TEXT NOT NULL UNIQUE, -- the sweep's random id
  title TEXT NOT NULL -- the name in its file
) STRICT;

CREATE TABLE sweep_plan (
  sweep INTEGER PRIMARY KEY REFERENCES sweep,
  planned INTEGER NOT NULL,
  plan BLOB NOT NULL,
  in_service TEXT, -- a candidate
  file TEXT NOT NULL
) STRICT;

CREATE TABLE candidate (
  id INTEGER PRIMARY KEY,
  sweep INTEGER NOT NULL REFERENCES sweep,
  family TEXT NOT NULL,
  alias TEXT NOT NULL, -- empty where there is none
  variant TEXT NOT NULL,
  backend TEXT NOT NULL,
  setting TEXT NOT NULL,
  UNIQUE (sweep, family, alias, variant, backend, setting)
) STRICT;

CREATE TABLE block (
  id INTEGER PRIMARY KEY,
  sweep INTEGER NOT NULL REFERENCES sweep,
  number INTEGER NOT NULL,
  instance INTEGER NOT NULL REFERENCES instance,
  path TEXT NOT NULL,
  class TEXT NOT NULL,
  weight REAL NOT NULL,
  seed INTEGER NOT NULL,
  UNIQUE (sweep, number)
) STRICT;

CREATE TABLE cell (
  block INTEGER NOT NULL REFERENCES block,
  position INTEGER NOT NULL,
  candidate INTEGER NOT NULL REFERENCES candidate,
  recipe INTEGER NOT NULL REFERENCES recipe,
  backend_build INTEGER NOT NULL REFERENCES backend_build,
  settings INTEGER NOT NULL REFERENCES settings,
  key BLOB NOT NULL CHECK (length(key) = 16),
  PRIMARY KEY (block, position)
) STRICT, WITHOUT ROWID;

-- What ran.

CREATE TABLE run (
  id INTEGER PRIMARY KEY,
  name TEXT NOT NULL UNIQUE, -- the run's random id
  key BLOB NOT NULL CHECK (length(key) = 16),
  attempt INTEGER NOT NULL,
  block INTEGER REFERENCES block, -- null for a run in the foreground
  position INTEGER,
  recipe INTEGER NOT NULL REFERENCES recipe,
  model INTEGER REFERENCES model, -- null if nothing was built, as is problem
  problem INTEGER REFERENCES problem,
  backend_build INTEGER NOT NULL REFERENCES backend_build,
  settings INTEGER NOT NULL REFERENCES settings,
  seed INTEGER NOT NULL,
  threads INTEGER NOT NULL,
  goal INTEGER NOT NULL,
  limits INTEGER NOT NULL REFERENCES limits,
  mode INTEGER NOT NULL,
  session INTEGER NOT NULL REFERENCES session,
  status INTEGER NOT NULL,
  ending INTEGER NOT NULL,
  killed INTEGER NOT NULL, -- 0 or 1, as are minimize and disturbed
  minimize INTEGER NOT NULL,
  objective INTEGER,
  bound INTEGER,
  lower_ns INTEGER NOT NULL,
  solve_ns INTEGER NOT NULL,
  answer_ns INTEGER NOT NULL,
  overshoot_ns INTEGER NOT NULL,
  cpu_ns INTEGER, -- of lower, solve and answer
  rss INTEGER NOT NULL,
  decisions INTEGER,
  failures INTEGER,
  propagations INTEGER,
  restarts INTEGER,
  disturbed INTEGER NOT NULL,
  finished INTEGER NOT NULL
) STRICT;
CREATE INDEX run_key ON run (key);
CREATE INDEX run_block ON run (block, key) WHERE block IS NOT NULL;
CREATE INDEX run_problem ON run (problem) WHERE problem IS NOT NULL;

-- The whole record, apart from the narrow rows that are scanned. Records of one session resemble
-- each other: the first is the dictionary by which the others are compressed.
CREATE TABLE record (
  run INTEGER PRIMARY KEY REFERENCES run,
  basis INTEGER REFERENCES record (run), -- null: compressed by itself
  zlib BLOB NOT NULL -- JSON in the ZLIB format (RFC 1950); the dictionary is the basis's JSON
) STRICT;

CREATE TABLE session_basis (
  session INTEGER PRIMARY KEY REFERENCES session,
  run INTEGER NOT NULL REFERENCES record (run)
) STRICT;

-- A cell that takes a run which was made elsewhere under the same key.
CREATE TABLE reuse (
  block INTEGER NOT NULL,
  position INTEGER NOT NULL,
  run INTEGER NOT NULL REFERENCES run,
  PRIMARY KEY (block, position),
  FOREIGN KEY (block, position) REFERENCES cell (block, position)
) STRICT, WITHOUT ROWID;

-- What judging said; the newest verdict on a run stands.
CREATE TABLE verdict (
  id INTEGER PRIMARY KEY,
  run INTEGER NOT NULL REFERENCES run,
  judge BLOB NOT NULL,
  verdict INTEGER NOT NULL,
  detail TEXT NOT NULL,
  at INTEGER NOT NULL
) STRICT;
CREATE INDEX verdict_run ON verdict (run);
